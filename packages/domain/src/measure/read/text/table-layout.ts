import { type CellKind, cellKind } from "../number/cell-kind.ts";
import type { OpenFile } from "../scan-input.ts";
import { BLANK, COMMA, CR, DOT, HASH, LF, SLASH, TAB, utf8Text } from "./bytes.ts";
import { cellsOf, decimalMark, type Line, lineSeparator } from "./separator.ts";
import type { TextRows } from "./text-rows.ts";
import { checkCommentUnit } from "./unit-comment.ts";

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

interface Names {
  readonly names: readonly string[];
  readonly line: number;
  readonly separator: number;
  readonly isComment: boolean;
}

/** What stands above the first row of numbers. */
interface Head {
  readonly header: Names | null;
  readonly declared: number | null;
  /** The first row of numbers; null where there is none. */
  readonly first: Line | null;
}

/**
 * Finds separator, decimal mark, header and count line of a text of numbers.
 * A header is a row with text and without a number; a count line is one whole number alone, before the first row.
 * A comment that states another unit than the file was declared in is noted as a fault.
 */
export function tableLayout(file: OpenFile): TableLayout {
  const { bytes } = file;
  const { header: found, declared, first } = readHead(file);
  const separator = bodySeparator(bytes, found, first);
  const header = fitsBody(bytes, found, first, separator) ? found : null;
  const bodyAt = first?.start ?? bytes.length;
  return {
    bytes,
    separator,
    mark: decimalMark(bytes, separator, bodyAt),
    names: header?.names ?? null,
    namesLine: header?.line ?? 0,
    declared,
    bodyAt,
    bodyLine: first === null ? 0 : first.line - 1,
  };
}

function readHead(file: OpenFile): Head {
  const { bytes, from } = file;
  let header: Names | null = null;
  let declared: number | null = null;
  let line = lineAt(bytes, from, 1);
  for (; line !== null; line = lineAt(bytes, line.next, line.line + 1)) {
    if (isBlank(bytes, line)) continue;
    const comment = commentText(bytes, line);
    if (comment !== null) {
      checkCommentUnit(utf8Text(bytes, comment.start, comment.end), line.line, file);
      header ??= namesInComment(bytes, comment);
      continue;
    }
    const count: number | null = declared === null ? countIn(bytes, line) : null;
    const names: Names | null = count === null ? headerNames(bytes, line) : null;
    if (count !== null) declared = count;
    else if (names !== null && (header === null || header.isComment)) header = names;
    else break;
  }
  return { header, declared, first: line };
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

function countIn(bytes: Uint8Array, { start, end }: Line): number | null {
  const text = utf8Text(bytes, start, Math.min(end, start + 40)).trim();
  return end - start < 40 && /^\d{1,15}$/.test(text) ? Number(text) : null;
}

/** Names in a comment such as `# x y z`; only one that names z, so that prose is not taken for names. */
function namesInComment(bytes: Uint8Array, comment: Line): Names | null {
  const found = headerNames(bytes, comment);
  if (found === null || !found.names.some((name) => /^"?z([_ ([]|"?$)/i.test(name))) return null;
  return { ...found, isComment: true };
}

function headerNames(bytes: Uint8Array, line: Line): Names | null {
  const separator = lineSeparator(bytes, line);
  const rows = cellsOf(bytes, line, separator);
  let texts = 0;
  const names: string[] = [];
  for (let cell = 0; cell < rows.count && cell < rows.starts.length; cell++) {
    const kind = kindOfCell(rows, cell, separator);
    if (kind === "number") return null;
    if (kind === "text") texts++;
    names.push(utf8Text(rows.bytes, rows.starts[cell]!, rows.ends[cell]!));
  }
  if (texts === 0) return null;
  const whole = separator === BLANK ? withUnits(names) : withoutEnd(names);
  return { names: whole, line: line.line, separator, isComment: false };
}

/** Kind of a cell while the decimal mark is not known yet. */
function kindOfCell({ bytes, starts, ends }: TextRows, cell: number, separator: number): CellKind {
  const kind = cellKind(bytes, starts[cell]!, ends[cell]!, DOT);
  return kind === "text" && separator !== COMMA ? cellKind(bytes, starts[cell]!, ends[cell]!, COMMA) : kind;
}

/** Between blanks `x [mm] y [mm]` are two names, not four. */
function withUnits(words: readonly string[]): string[] {
  return words
    .join(" ")
    .replace(/ +(?=[[(])/g, "")
    .split(" ");
}

/** A separator at the end of a row adds no column. */
function withoutEnd(names: readonly string[]): string[] {
  const last = names.findLastIndex((name) => name !== "");
  return names.slice(0, last + 1);
}

/** Separator of the rows: the header's, unless that has none; then that of the first row. */
function bodySeparator(bytes: Uint8Array, header: Names | null, first: Line | null): number {
  if (header !== null && !header.isComment && header.separator !== BLANK) return header.separator;
  if (first !== null) return lineSeparator(bytes, first);
  return header?.separator ?? BLANK;
}

/** A comment is taken for names only where there is one for each cell of the first row. */
function fitsBody(bytes: Uint8Array, header: Names | null, first: Line | null, separator: number): boolean {
  if (header === null || !header.isComment || first === null) return true;
  return cellsOf(bytes, first, separator).count === header.names.length;
}
