import { useVirtualizer } from "@tanstack/react-virtual";
import { type ReactElement, type ReactNode, useRef, useState } from "react";
import { usePrinting } from "../page/use-printing.ts";
import { type Column, nextSort, type Sort, sortRows } from "./columns.ts";
import { useShownColumns } from "./shown-columns.ts";
import { TableBody } from "./table-body.tsx";
import { TableHead } from "./table-head.tsx";
import { TableTools } from "./table-tools.tsx";

export interface DataTableProps<Row> {
  /** What the table holds, for those who listen. */
  caption: string;
  rows: readonly Row[];
  columns: readonly Column<Row>[];
  rowKey: (row: Row) => string;
  /** Where a row leads; the first column becomes its link, Enter and a click open it. */
  rowHref?: (row: Row) => string;
  /** Sort held outside, in the URL; without `onSort` the table keeps it itself. */
  sort?: Sort | null;
  onSort?: (sort: Sort | null) => void;
  /** Remembers the columns chosen under this name. */
  storeKey?: string;
  /** Offers an export under this name, without ".csv". */
  fileName?: string;
  /** Filters, at the left above the table. */
  filters?: ReactNode;
  /** Stands in place of the rows where there are none. */
  empty?: ReactNode;
  /** Rows of 36 px instead of 48. */
  dense?: boolean;
  /** A small table inside a sheet: no tools above it. */
  plain?: boolean;
  /** Keys of rows that changed a moment ago. */
  changed?: ReadonlySet<string>;
}

/** From this many rows on only those in view are drawn. */
const VIRTUAL_FROM = 60;

/** A list of things: sortable, by keyboard, with a choice of columns and an export. Thousands of rows just scroll. */
export function DataTable<Row>(props: DataTableProps<Row>): ReactElement {
  const { columns, rows } = props;
  const [ownSort, setOwnSort] = useState<Sort | null>(null);
  const sort = props.onSort === undefined ? ownSort : (props.sort ?? null);
  const [shown, setShown] = useShownColumns(columns, props.storeKey);
  const visible = columns.filter((column) => shown.has(column.id));
  const sorted = sortRows(rows, columns, sort);
  const scroller = useRef<HTMLDivElement>(null);
  const isPrinting = usePrinting();
  const isVirtual = rows.length > VIRTUAL_FROM && !isPrinting;
  const virtualizer = useVirtualizer({
    count: isVirtual ? sorted.length : 0,
    getScrollElement: () => scroller.current,
    estimateSize: () => (props.dense === true ? 36 : 49),
    overscan: 12,
  });
  return (
    <div>
      {props.plain === true ? null : (
        <TableTools
          filters={props.filters}
          columns={columns}
          shown={shown}
          onShown={setShown}
          {...(props.fileName !== undefined && { fileName: props.fileName })}
          rows={sorted}
          visible={visible}
        />
      )}
      {rows.length === 0 && props.empty !== undefined ? (
        props.empty
      ) : (
        <div
          ref={scroller}
          className={`overflow-x-auto ${isVirtual ? "max-h-[calc(100vh-14rem)] overflow-y-auto" : ""}`}
        >
          <table aria-rowcount={sorted.length + 1} className="w-full border-collapse">
            <caption className="sr-only">{props.caption}</caption>
            <TableHead
              columns={visible}
              sort={sort}
              onSort={(column) => (props.onSort ?? setOwnSort)(nextSort(sort, column))}
            />
            <TableBody
              rows={sorted}
              columns={visible}
              rowKey={props.rowKey}
              {...(props.rowHref !== undefined && { rowHref: props.rowHref })}
              {...(props.changed !== undefined && { changed: props.changed })}
              dense={props.dense === true}
              virtualizer={isVirtual ? virtualizer : null}
            />
          </table>
        </div>
      )}
    </div>
  );
}
