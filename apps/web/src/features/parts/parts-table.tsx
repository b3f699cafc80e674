import type { Part } from "@beadroll/domain/schemas/part";
import type { ReactElement, ReactNode } from "react";
import { pathTo } from "../../app/paths.ts";
import { StateMark } from "../../kit/states/state-mark.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { partLook, partState } from "./part-words.ts";
import { TallyBar } from "./tally-bar.tsx";

const COLUMNS: readonly Column<Part>[] = [
  { id: "name", head: "Part", value: (part) => part.name },
  {
    id: "drawing",
    head: "Drawing",
    value: (part) => `${part.drawing_number} ${part.drawing_revision}`,
    figures: true,
    width: "8rem",
    wideOnly: true,
  },
  {
    id: "order",
    head: "Order",
    value: (part) => part.order_no,
    figures: true,
    width: "7rem",
    wideOnly: true,
  },
  {
    id: "seams",
    head: "Seams",
    value: (part) => part.seams.total,
    cell: (part) => <TallyBar tally={part.seams} />,
    width: "24rem",
    wideOnly: true,
  },
  {
    id: "state",
    head: "State",
    value: (part) => partState(part.seams),
    cell: (part) => <StateMark {...partLook(part.seams)} />,
    width: "8rem",
  },
  {
    id: "started",
    head: "Started",
    value: (part) => part.created_at,
    cell: (part) => <InstantText at={part.created_at} />,
    width: "10rem",
    wideOnly: true,
  },
  { id: "tag", head: "Tag", value: (part) => part.tag, figures: true, optional: true, width: "9rem" },
];

/** Parts as a list. */
export function PartsTable(props: {
  parts: readonly Part[];
  filters: ReactNode;
  empty: ReactNode;
}): ReactElement {
  return (
    <DataTable
      caption="Parts"
      rows={props.parts}
      columns={COLUMNS}
      rowKey={(part) => part.id}
      rowHref={(part) => pathTo("part", { tag: part.tag })}
      storeKey="parts"
      fileName="parts"
      filters={props.filters}
      empty={props.empty}
    />
  );
}
