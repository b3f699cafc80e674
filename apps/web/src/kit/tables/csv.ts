import type { CellValue, Column } from "./columns.ts";

/** Characters with which a spreadsheet begins a formula (OWASP, "CSV Injection"). */
const FORMULA_START = /^[=+\-@\t\r\uFF0B\uFF0D\uFF1D\uFF20]/;

/**
 * Rows as CSV (RFC 4180, CRLF): the columns that have a value, in the order given. Text that a spreadsheet would
 * take for a formula gets an apostrophe in front; numbers stay numbers, a minus included.
 */
export function toCsv<Row>(rows: readonly Row[], columns: readonly Column<Row>[]): string {
  const exported = columns.filter((column) => column.value !== undefined);
  const head = exported.map((column) => csvCell(column.field ?? column.head));
  const lines = rows.map((row) => exported.map((column) => csvCell(column.value?.(row) ?? null)));
  return [head, ...lines].map((cells) => `${cells.join(",")}\r\n`).join("");
}

function csvCell(value: CellValue): string {
  if (value === null) return "";
  if (typeof value !== "string") return String(value);
  const guarded = FORMULA_START.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(guarded) ? `"${guarded.replaceAll('"', '""')}"` : guarded;
}
