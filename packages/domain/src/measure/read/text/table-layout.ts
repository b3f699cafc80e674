import { BLANK, COMMA, CR, DOT, HASH, LF, MINUS, PLUS, SEMICOLON, SLASH, TAB, utf8Text } from "./bytes.ts";
import { cellKind } from "./cell-kind.ts";
import { TextRows } from "./text-rows.ts";

/** How a text of numbers is laid out. */
export interface TableLayout {
  readonly bytes: Uint8Array;
  /** The byte between cells; BLANK stands for any run of blanks and tabs. */
  readonly separator: number;
  /** Decimal mark: dot or comma. */
  readonly mark: number;
  /** Columns named by a header or by a comment above the numbers; null where none are. */
  readonly names: readonly string[] | null;
  /** 1-based line of the names, 0 where there are none. */
  readonly namesLine: number;
  /** Number of rows that a count line promises; null where there is none. */
  readonly declared: number | null;
  /** Where the first row of numbers begins, and how many lines stand before it. */
  readonly bodyAt: number;
  readonly bodyLine: number;
}

interface Line {
  readonly start: number;
  readonly end: number;
  readonly line: number;
  readonly next: number;
}

interface Names {
  readonly names: readonly string[];
  readonly line: number;
  readonly separator: number;
}

/**
 * Finds separator, decimal mark, header and count line of a text of numbers.
 * A header is a row with text and without a number; a count line is one whole number alone, before the first row.
 * @param from where the text begins, after a byte order mark
 */
export function tableLayout(bytes: Uint8Array, from: number): TableLayout {
  let header: Names | null = null;
  let declared: number | null = null;
  let line = lineAt(bytes, from, 1);
  for (; line !== null; line = lineAt(bytes, line.next, line.line + 1)) {
    if (isBlank(bytes, line)) continue;
    const comment = commentText(bytes, line);
    if (comment !== null) {
      header ??= namesInComment(bytes, comment);
    } else if (declared === null && isCount(bytes, line)) {
      declared = Number(utf8Text(bytes, line.start, line.end));
    } else {
      const names = headerNames(bytes, line);
      if (names === null) break;
      if (header !== null && header.line > 0) break;
      header = names;
    }
  }
  const separator = bodySeparator(bytes, header, line);
  const bodyAt = line?.start ?? bytes.length;
  const bodyLine = line === null ? 0 : line.line - 1;
  const mark = separator === COMMA ? DOT : decimalMark(new TextRows(bytes, separator, bodyAt, bodyLine));
  const named = { names: header?.names ?? null, namesLine: Math.abs(header?.line ?? 0) };
  return { bytes, separator, mark, ...named, declared, bodyAt, bodyLine };
}

function lineAt(bytes: Uint8Array, start: number, line: number): Line | null {
  if (start >= bytes.length) return null;
  let end = start;
  while (end < bytes.length && bytes[end] !== LF && bytes[end] !== CR) end++;
  const next = bytes[end] === CR && bytes[end + 1] === LF ? end + 2 : end + 1;
  return { start, end, line, next };
}

function isBlank(bytes: Uint8Array, { start, end }: Line): boolean {
  for (let at = start; at < end; at++) if (bytes[at] !== BLANK && bytes[at] !== TAB) return false;
  return true;
}

/** The line without its comment sign, null where it is no comment. */
function commentText(bytes: Uint8Array, line: Line): Line | null {
  let start = line.start;
  while (bytes[start] === BLANK || bytes[start] === TAB) start++;
  if (bytes[start] === HASH) return { ...line, start: start + 1 };
  return bytes[start] === SLASH && bytes[start + 1] === SLASH ? { ...line, start: start + 2 } : null;
}

function isCount(bytes: Uint8Array, { start, end }: Line): boolean {
  return /^\s*\d{1,15}\s*$/.test(utf8Text(bytes, start, Math.min(end, start + 40))) && end - start < 40;
}

/** Names in a comment such as `# x y z`; only one that names z, so that prose is never taken for names. */
function namesInComment(bytes: Uint8Array, comment: Line): Names | null {
  const found = headerNames(bytes, comment);
  if (found === null || !found.names.some((name) => /^"?z\b|^"?z_/i.test(name))) return null;
  // A negative line marks names that a real header may still replace.
  return { ...found, line: -found.line };
}

function headerNames(bytes: Uint8Array, line: Line): Names | null {
  const separator = lineSeparator(bytes, line);
  const rows = rowOf(bytes, line, separator);
  let texts = 0;
  const names: string[] = [];
  for (let cell = 0; cell < rows.count && cell < rows.starts.length; cell++) {
    const kind = cellKind(rows.bytes, rows.starts[cell]!, rows.ends[cell]!, DOT);
    if (kind === "number") return null;
    if (kind === "text") texts++;
    names.push(utf8Text(rows.bytes, rows.starts[cell]!, rows.ends[cell]!));
  }
  return texts > 0 ? { names, line: line.line, separator } : null;
}

function rowOf(bytes: Uint8Array, { start, end, line }: Line, separator: number): TextRows {
  const rows = new TextRows(bytes.subarray(start, end), separator, 0, line - 1);
  if (!rows.next()) rows.count = 0;
  return rows;
}

/** Separator of the rows: the header's, unless that has none; then that of the first row. */
function bodySeparator(bytes: Uint8Array, header: Names | null, first: Line | null): number {
  if (header !== null && header.line > 0 && header.separator !== BLANK) return header.separator;
  if (first !== null) return lineSeparator(bytes, first);
  return header?.separator ?? BLANK;
}

/**
 * Separator of one line: semicolon, tab or comma, whichever comes first in this order, leaves no cell with a blank
 * inside a number and stands between cells; else blanks.
 */
function lineSeparator(bytes: Uint8Array, line: Line): number {
  for (const separator of [SEMICOLON, TAB, COMMA]) {
    const rows = rowOf(bytes, line, separator);
    if (rows.count > 1 && !splitsBadly(rows)) return separator;
  }
  return BLANK;
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
  return byte !== undefined && ((byte >= 0x30 && byte <= 0x39) || isSignOrMark(byte));
}

function isSignOrMark(byte: number): boolean {
  return byte === MINUS || byte === PLUS || byte === DOT || byte === COMMA;
}

/** The decimal mark of the first number that has one; dot where none has. */
function decimalMark(rows: TextRows): number {
  const { bytes } = rows;
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
