import type { ProcedureRanges } from "@beadroll/domain/schemas/procedure";
import type { ReactElement } from "react";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { type RangeRow, rangeRows } from "./range-rows.ts";

const COLUMNS: readonly Column<RangeRow>[] = [
  { id: "title", head: "Quantity", value: (row) => row.title },
  {
    id: "min",
    head: "From",
    value: (row) => row.range?.min ?? null,
    align: "right",
    figures: true,
    width: "7rem",
  },
  {
    id: "max",
    head: "To",
    value: (row) => row.range?.max ?? null,
    align: "right",
    figures: true,
    width: "7rem",
  },
  {
    id: "unit",
    head: "Unit",
    cell: (row) => (row.range === null ? "not limited" : row.unit),
    value: (row) => row.unit,
    width: "8rem",
  },
];

/** The ranges a procedure allows. */
export function RangesTable(props: { ranges: ProcedureRanges }): ReactElement {
  return (
    <DataTable
      caption="Ranges of this procedure"
      rows={rangeRows(props.ranges)}
      columns={COLUMNS}
      rowKey={(row) => row.id}
      plain
      dense
    />
  );
}
