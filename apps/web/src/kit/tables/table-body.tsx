import type { Virtualizer } from "@tanstack/react-virtual";
import {
  type KeyboardEvent,
  type MouseEvent,
  type ReactElement,
  type ReactNode,
  useRef,
  useState,
} from "react";
import { Link, useNavigate } from "react-router";
import { type Column, columnClass } from "./columns.ts";
import { rowAfterKey } from "./row-keys.ts";

interface TableBodyProps<Row> {
  rows: readonly Row[];
  columns: readonly Column<Row>[];
  rowKey: (row: Row) => string;
  rowHref?: (row: Row) => string;
  changed?: ReadonlySet<string>;
  dense: boolean;
  /** Null where all rows are drawn. */
  virtualizer: Virtualizer<HTMLDivElement, Element> | null;
}

const CONTROLS = "a, button, input, select, textarea, label";

/** The rows. One of them is in the Tab order; arrow keys move it, Enter opens it, the right arrow enters its strip. */
export function TableBody<Row>(props: TableBodyProps<Row>): ReactElement {
  const { rows, virtualizer, rowHref } = props;
  const body = useRef<HTMLTableSectionElement>(null);
  const navigate = useNavigate();
  const [current, setCurrent] = useState(0);
  const at = Math.min(current, rows.length - 1);
  const open = (index: number) => {
    const row = rows[index];
    if (row !== undefined && rowHref !== undefined) void navigate(rowHref(row));
  };
  const focusRow = (index: number) => {
    setCurrent(index);
    virtualizer?.scrollToIndex(index);
    requestAnimationFrame(() => rowElement(body.current, index)?.focus());
  };
  const onKeyDown = (event: KeyboardEvent<HTMLTableSectionElement>) => {
    const row = event.target instanceof Element ? event.target.closest("tr") : null;
    if (row === null) return;
    if (event.target !== row) return leaveStrip(event, row);
    const next = rowAfterKey(event.key, at, rows.length);
    if (event.key === "Enter") open(at);
    else if (event.key === "ArrowRight") row.querySelector<HTMLElement>("[role=slider]")?.focus();
    else if (next !== null) focusRow(next);
    else return;
    event.preventDefault();
  };
  const onClick = (event: MouseEvent, index: number) => {
    setCurrent(index);
    const isControl = event.target instanceof Element && event.target.closest(CONTROLS) !== null;
    if (!isControl && getSelection()?.isCollapsed !== false) open(index);
  };
  const items = virtualizer?.getVirtualItems();
  const indices = items?.map((item) => item.index) ?? rows.map((_, index) => index);
  const above = items?.[0]?.start ?? 0;
  const below = virtualizer === null ? 0 : virtualizer.getTotalSize() - (items?.at(-1)?.end ?? 0);
  const hasCurrent = indices.includes(at);
  return (
    <>
      <Spacer height={above} columns={props.columns.length} />
      <tbody ref={body} onKeyDown={onKeyDown}>
        {indices.map((index) => {
          const row = rows[index];
          if (row === undefined) return null;
          const isChanged = props.changed?.has(props.rowKey(row)) === true;
          return (
            <tr
              key={props.rowKey(row)}
              ref={virtualizer?.measureElement}
              data-index={index}
              aria-rowindex={index + 2}
              tabIndex={index === at || (!hasCurrent && index === indices[0]) ? 0 : -1}
              onFocus={() => setCurrent(index)}
              onClick={(event) => onClick(event, index)}
              className={`border-b border-row -outline-offset-2! hover:bg-hush ${rowHref === undefined ? "" : "cursor-pointer"} ${isChanged ? "kit-changed" : ""}`}
            >
              {props.columns.map((column, place) => (
                <td
                  key={column.id}
                  className={`${props.dense ? "h-9 py-1" : "h-12 py-1.5"} px-2 ${columnClass(column)} ${column.figures === true ? "figures whitespace-nowrap" : ""}`}
                >
                  <Cell
                    row={row}
                    column={column}
                    {...(place === 0 && rowHref !== undefined && { href: rowHref(row) })}
                  />
                </td>
              ))}
            </tr>
          );
        })}
      </tbody>
      <Spacer height={below} columns={props.columns.length} />
    </>
  );
}

function rowElement(body: HTMLElement | null, index: number): HTMLElement | null {
  return body?.querySelector<HTMLElement>(`tr[data-index="${index}"]`) ?? null;
}

/** Inside a row's strip: Escape goes back to the row, up and down stay with the strip's row. */
function leaveStrip(event: KeyboardEvent, row: HTMLElement): void {
  if (event.key !== "Escape") return;
  row.focus();
  event.preventDefault();
}

function Cell<Row>(props: { row: Row; column: Column<Row>; href?: string }): ReactNode {
  const { row, column, href } = props;
  const content = column.cell?.(row) ?? String(column.value?.(row) ?? "");
  if (href === undefined) return content;
  return (
    <Link to={href} tabIndex={-1} className="text-ink no-underline hover:underline">
      {content}
    </Link>
  );
}

function Spacer(props: { height: number; columns: number }): ReactElement | null {
  if (props.height <= 0) return null;
  return (
    <tbody aria-hidden="true">
      <tr>
        <td colSpan={props.columns} style={{ height: props.height }} className="p-0" />
      </tr>
    </tbody>
  );
}
