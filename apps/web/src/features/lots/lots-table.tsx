import type { Lot } from "@beadroll/domain/schemas/lot";
import type { ReactElement, ReactNode } from "react";
import { pathTo } from "../../app/paths.ts";
import { StateMark } from "../../kit/states/state-mark.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { useUrlSort } from "../../kit/tables/url-state.ts";
import { DayText } from "../../kit/units/instant-text.tsx";
import { KIND_WORDS } from "./lot-words.ts";

const COLUMNS: readonly Column<Lot>[] = [
  { id: "number", head: "Number", value: (lot) => lot.number, figures: true, width: "9rem" },
  { id: "kind", head: "Kind", value: (lot) => KIND_WORDS[lot.kind], width: "6rem" },
  { id: "grade", head: "Grade", value: (lot) => lot.grade },
  { id: "supplier", head: "Supplier", value: (lot) => lot.supplier, wideOnly: true },
  { id: "dimension", head: "Size", value: (lot) => lot.dimension ?? "", figures: true, wideOnly: true },
  {
    id: "quantity",
    head: "Amount",
    cell: (lot) => `${lot.quantity} ${lot.unit}`,
    value: (lot) => lot.quantity,
    align: "right",
    figures: true,
    wideOnly: true,
  },
  {
    id: "received",
    head: "Came in",
    cell: (lot) => <DayText day={lot.received_on} />,
    value: (lot) => lot.received_on,
    width: "8rem",
    wideOnly: true,
  },
  {
    id: "state",
    head: "State",
    cell: (lot) => <StateMark state={lot.state} />,
    value: (lot) => lot.state,
    width: "9rem",
  },
  { id: "tag", head: "Tag", value: (lot) => lot.tag, figures: true, optional: true },
];

/** Lots as a list. */
export function LotsTable(props: {
  lots: readonly Lot[];
  filters: ReactNode;
  empty: ReactNode;
}): ReactElement {
  const [sort, setSort] = useUrlSort();
  return (
    <DataTable
      caption="Lots"
      rows={props.lots}
      columns={COLUMNS}
      rowKey={(lot) => lot.id}
      rowHref={(lot) => pathTo("lot", { tag: lot.tag })}
      sort={sort}
      onSort={setSort}
      storeKey="lots"
      fileName="lots"
      filters={props.filters}
      empty={props.empty}
    />
  );
}
