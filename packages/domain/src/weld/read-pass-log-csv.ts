import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import { assembleLog, chooseColumns, clockFault, type ReadColumn } from "./log-columns.ts";
import { LOG_FAULTS_MAX, type PassLog } from "./pass-log.ts";

type Separator = "," | ";" | "\t";

/** Where reading stands: grown arrays, one for each column read, and the faults found so far. */
interface Rows {
  readonly columns: readonly ReadColumn[];
  /** Cells that each row must have. */
  readonly width: number;
  readonly separator: Separator;
  readonly values: Float64Array[];
  readonly timeColumn: number;
  readonly faults: Fault[];
  count: number;
}

/**
 * Reads a pass log from CSV text; see `readPassLog` for what is accepted.
 * @param text    one UTF-16 unit a byte (Latin-1): only digits and separators matter here
 * @param readable turns a cell back into what a person would see, for the faults
 */
export function readPassLogCsv(text: string, readable: (cell: string) => string): Outcome<PassLog> {
  const lines = new LineReader(text);
  const header = nextContent(lines);
  if (header === undefined)
    return refused({ code: "file-empty", detail: "The log has no line but comments." });
  const separator = separatorOf(header.text);
  const names = splitRow(header.text, separator).map((cell) => readable(cell));
  const chosen = chooseColumns(names, header.line);
  if (!chosen.ok) return chosen;
  const capacity = Math.max(16, Math.ceil(text.length / (2 * chosen.value.length)));
  const rows: Rows = {
    columns: chosen.value,
    width: names.length,
    separator,
    values: chosen.value.map(() => new Float64Array(Math.min(capacity, 65_536))),
    timeColumn: chosen.value.findIndex((column) => column.quantity === "time_s"),
    faults: [],
    count: 0,
  };
  readRows(lines, rows, readable);
  if (rows.faults.length > 0) return refused(...rows.faults);
  if (rows.count < 2) {
    const detail = `A log needs two samples at least; this has ${rows.count}.`;
    return refused({ code: rows.count === 0 ? "file-empty" : "file-truncated", detail, line: header.line });
  }
  return good(
    assembleLog(
      rows.columns,
      rows.values.map((array) => array.slice(0, rows.count)),
    ),
  );
}

function readRows(lines: LineReader, rows: Rows, readable: (cell: string) => string): void {
  for (let row = nextContent(lines); row !== undefined; row = nextContent(lines)) {
    if (rows.faults.length >= LOG_FAULTS_MAX) return;
    const cells = splitRow(row.text, rows.separator);
    if (cells.length !== rows.width && !isPaddedRow(cells, rows.width)) {
      rows.faults.push(widthFault(cells.length, rows.width, row));
      continue;
    }
    readCells(cells, rows, row, readable);
  }
}

function readCells(
  cells: readonly string[],
  rows: Rows,
  row: Line,
  readable: (cell: string) => string,
): void {
  if (rows.count === rows.values[0]!.length) grow(rows.values);
  let whole = true;
  for (let i = 0; i < rows.columns.length; i++) {
    const column = rows.columns[i]!;
    const value = numberIn(cells[column.place]!, rows.separator);
    if (Number.isNaN(value) && (column.required || !isBlank(cells[column.place]!))) {
      rows.faults.push(valueFault(readable(cells[column.place]!), column, row));
      whole = false;
    }
    rows.values[i]![rows.count] = value * column.factor;
  }
  if (!whole) return;
  const times = rows.values[rows.timeColumn]!;
  if (rows.count > 0 && times[rows.count]! < times[rows.count - 1]!) {
    rows.faults.push(clockFault(times[rows.count - 1]!, times[rows.count]!, { line: row.line }));
  }
  rows.count++;
}

function widthFault(found: number, expected: number, row: Line): Fault {
  if (row.cut && found < expected) {
    const detail = `The last row has ${found} of ${expected} cells and no line end: the file was cut.`;
    return { code: "file-truncated", detail, line: row.line };
  }
  const hint = found > expected ? " Decimal commas need semicolons or tabs between the cells." : "";
  const detail = `The row has ${found} cells where the header has ${expected}.${hint}`;
  return { code: "file-value-invalid", detail, line: row.line };
}

function valueFault(cell: string, column: ReadColumn, row: Line): Fault {
  const place = `column ${column.place + 1}, ${column.name}`;
  if (row.cut && isBlank(cell)) {
    return {
      code: "file-truncated",
      detail: `The last row ends before ${place}.`,
      line: row.line,
      field: column.name,
    };
  }
  const what = isBlank(cell) ? "nothing" : `"${cell.trim().slice(0, 40)}"`;
  const detail = `Expected a number in ${place}, got ${what}.`;
  return { code: "file-value-invalid", detail, line: row.line, field: column.name };
}

/** The separator of the header: a semicolon or tab where there is one, else the comma. */
function separatorOf(header: string): Separator {
  if (header.includes(";")) return ";";
  return header.includes("\t") ? "\t" : ",";
}

function splitRow(text: string, separator: Separator): string[] {
  const cells = text.split(separator);
  return text.includes('"') ? cells.map((cell) => cell.trim().replace(/^"(.*)"$/, "$1")) : cells;
}

/** Some writers end each row with one separator more. */
function isPaddedRow(cells: readonly string[], width: number): boolean {
  return cells.length === width + 1 && isBlank(cells[width]!);
}

function isBlank(cell: string): boolean {
  const text = cell.trim();
  return text === "" || text.toLowerCase() === "nan";
}

/** The number in a cell, NaN if there is none; a decimal comma counts only where the comma does not separate. */
function numberIn(cell: string, separator: Separator): number {
  const text = separator === "," ? cell.trim() : cell.trim().replace(",", ".");
  // Number() alone would also take "0x10", "Infinity" and the empty text.
  return /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d{1,3})?$/i.test(text) ? finite(Number(text)) : Number.NaN;
}

function finite(value: number): number {
  return Number.isFinite(value) ? value : Number.NaN;
}

function grow(arrays: Float64Array[]): void {
  for (const [i, array] of arrays.entries()) {
    const larger = new Float64Array(array.length * 2);
    larger.set(array);
    arrays[i] = larger;
  }
}

interface Line {
  readonly text: string;
  readonly line: number;
  /** The file ends within this line, without a line end. */
  readonly cut: boolean;
}

class LineReader {
  private at = 0;
  private line = 0;
  private readonly text: string;

  constructor(text: string) {
    this.text = text;
  }

  next(): Line | undefined {
    if (this.at >= this.text.length) return undefined;
    const end = this.text.indexOf("\n", this.at);
    const cut = end < 0;
    const raw = this.text.slice(this.at, cut ? this.text.length : end);
    this.at = cut ? this.text.length : end + 1;
    this.line++;
    return { text: raw.endsWith("\r") ? raw.slice(0, -1) : raw, line: this.line, cut };
  }
}

/** The next line that is neither blank nor a comment. */
function nextContent(lines: LineReader): Line | undefined {
  for (let line = lines.next(); line !== undefined; line = lines.next()) {
    const text = line.text.trim();
    if (text !== "" && !text.startsWith("#")) return line;
  }
  return undefined;
}
