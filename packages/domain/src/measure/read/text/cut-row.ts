import { CR, LF } from "./bytes.ts";
import type { TextRows } from "./text-rows.ts";

/**
 * Rows before the last that are compared with it, and how many are needed at least to say anything: programs that
 * leave out zeros at the end give one number of decimals for so many rows hardly ever.
 */
const ROWS_COMPARED = 256;
const ROWS_NEEDED = 20;

/**
 * Whether the last row of a text without a last line end was cut inside its last number: all rows before it end
 * with one and the same number of decimals, and it has fewer. A cut number is a wrong number that looks right.
 * @param rows standing at the last row
 */
export function wasCut(rows: TextRows, separator: number, mark: number): boolean {
  const { bytes } = rows;
  const last = decimalsBefore(bytes, rows.rowEnd, separator, mark);
  let end = lineBefore(bytes, rows.rowStart);
  let usual = -1;
  let compared = 0;
  while (end > 0 && compared < ROWS_COMPARED) {
    const decimals = decimalsBefore(bytes, end, separator, mark);
    if (decimals === null) break;
    if (usual >= 0 && decimals !== usual) return false;
    usual = decimals;
    compared++;
    end = lineBefore(bytes, lineStart(bytes, end));
  }
  return compared >= ROWS_NEEDED && last !== null && last < usual;
}

/** Decimals of the number that ends at `end`; null where the characters before are no plain number. */
function decimalsBefore(bytes: Uint8Array, end: number, separator: number, mark: number): number | null {
  let at = end;
  while (at > 0 && bytes[at - 1]! >= 0x30 && bytes[at - 1]! <= 0x39) at--;
  const digits = end - at;
  if (at > 0 && bytes[at - 1] === mark && mark !== separator) return digits;
  return digits > 0 ? 0 : null;
}

/** End of the line before the one that starts at `start`, its line end left out. */
function lineBefore(bytes: Uint8Array, start: number): number {
  let end = start;
  if (end > 0 && bytes[end - 1] === LF) end--;
  if (end > 0 && bytes[end - 1] === CR) end--;
  return end;
}

function lineStart(bytes: Uint8Array, end: number): number {
  let at = end;
  while (at > 0 && bytes[at - 1] !== LF && bytes[at - 1] !== CR) at--;
  return at;
}
