import type { ReactElement } from "react";
import { type Column, columnClass, type Sort } from "./columns.ts";

interface TableHeadProps<Row> {
  columns: readonly Column<Row>[];
  sort: Sort | null;
  onSort: (column: string) => void;
}

/** The heads of the columns, kept in view; a press sorts by them. */
export function TableHead<Row>(props: TableHeadProps<Row>): ReactElement {
  return (
    <thead>
      <tr aria-rowindex={1}>
        {props.columns.map((column) => (
          <th
            key={column.id}
            scope="col"
            aria-sort={ariaSort(column.id, props.sort)}
            style={column.width === undefined ? undefined : { width: column.width, minWidth: column.width }}
            className={`table-head sticky top-0 z-10 bg-sheet px-2 pt-1 pb-1.5 align-bottom font-semibold sm:whitespace-nowrap shadow-[inset_0_-1px_0_var(--ink)] ${columnClass(column)}`}
          >
            {column.value === undefined ? (
              column.head
            ) : (
              <button
                type="button"
                onClick={() => props.onSort(column.id)}
                className={`inline-flex min-h-6 items-center gap-1.5 hover:text-ink aria-pressed:text-ink ${column.align === "right" ? "flex-row-reverse" : ""}`}
              >
                {column.head}
                <SortArrow at={ariaSort(column.id, props.sort)} />
              </button>
            )}
          </th>
        ))}
      </tr>
    </thead>
  );
}

function ariaSort(column: string, sort: Sort | null): "ascending" | "descending" | undefined {
  if (sort?.column !== column) return undefined;
  return sort.descending ? "descending" : "ascending";
}

function SortArrow(props: { at: "ascending" | "descending" | undefined }): ReactElement {
  const shape = props.at === "descending" ? "M0 1h8L4 6z" : "M0 6h8L4 1z";
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 8 7"
      className={`size-2 ${props.at === undefined ? "invisible" : ""}`}
    >
      <path d={shape} fill="currentColor" />
    </svg>
  );
}
