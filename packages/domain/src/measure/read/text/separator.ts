import { BLANK, COMMA, DOT, MINUS, PLUS, SEMICOLON, TAB, ZERO } from "./bytes.ts";
import { TextRows } from "./text-rows.ts";

/** One line of a text. */
export interface Line {
  readonly start: number;
  /** Byte after the last, without the line end. */
  readonly end: number;
  /** 1-based. */
  readonly line: number;
  /** Where the next line begins. */
  readonly next: number;
}

/** The cells of one line; none where it is blank. */
export function cellsOf(bytes: Uint8Array, { start, end, line }: Line, separator: number): TextRows {
  const rows = new TextRows(bytes.subarray(start, end), separator, 0, line - 1);
  if (!rows.next()) rows.count = 0;
  return rows;
}

/**
 * Separator of one line: semicolon, tab or comma, the first of these that stands between cells and leaves no blank
 * inside a number; else blanks.
 */
export function lineSeparator(bytes: Uint8Array, line: Line): number {
  for (const separator of [SEMICOLON, TAB, COMMA]) {
    const rows = cellsOf(bytes, line, separator);
    if (rows.count > 1 && !splitsBadly(rows)) return separator;
  }
  return BLANK;
}

/** The decimal mark of the first number that has one; dot where none has, and where the comma is the separator. */
export function decimalMark(bytes: Uint8Array, separator: number, from: number): number {
  if (separator === COMMA || bytes.indexOf(COMMA, from) < 0) return DOT;
  const rows = new TextRows(bytes, separator, from);
  while (rows.next()) {
    for (let cell = 0; cell < rows.count && cell < rows.starts.length; cell++) {
      const start = rows.starts[cell]!;
      if (!beginsNumber(bytes[start])) continue;
      for (let at = start; at < rows.ends[cell]!; at++) {
        if (bytes[at] === DOT || bytes[at] === COMMA) return bytes[at]!;
      }
    }
  }
  return DOT;
}

/** True where a cell begins like a number and has a blank inside. */
function splitsBadly(rows: TextRows): boolean {
  const { bytes } = rows;
  for (let cell = 0; cell < rows.count && cell < rows.starts.length; cell++) {
    const start = rows.starts[cell]!;
    if (!beginsNumber(bytes[start])) continue;
    for (let at = start; at < rows.ends[cell]!; at++) {
      if (bytes[at] === BLANK || bytes[at] === TAB) return true;
    }
  }
  return false;
}

function beginsNumber(byte: number | undefined): boolean {
  if (byte === undefined) return false;
  return (byte >= ZERO && byte <= ZERO + 9) || [MINUS, PLUS, DOT, COMMA].includes(byte);
}
