import { utf8Text } from "../text/bytes.ts";
import { parseNumber } from "./parse-number.ts";

/** What a cell holds: nothing, a number, a word for "no number" (nan, inf), or other text. */
export type CellKind = "empty" | "number" | "nan" | "text";

/** Words that programs write for "no number" or "out of range", lower case; also those of the Microsoft C library. */
const NOT_FINITE = /^[+-]?(nan|nan\(\w*\)|inf|infinity|1[.,]#\w+)$/;

/** Kind of the cell between two bytes, without blanks around it. */
export function cellKind(bytes: Uint8Array, start: number, end: number, mark: number): CellKind {
  if (start >= end) return "empty";
  const value = parseNumber(bytes, start, end, mark);
  if (!Number.isNaN(value)) return Number.isFinite(value) ? "number" : "nan";
  return NOT_FINITE.test(utf8Text(bytes, start, end).toLowerCase()) ? "nan" : "text";
}
