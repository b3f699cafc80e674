import { LF } from "./bytes.ts";

/** Bytes looked at to learn how long rows are. */
const LOOKED_AT = 65_536;

/** About how many rows follow, a little more rather than less: what to make room for. */
export function rowsExpected(bytes: Uint8Array, from: number): number {
  const end = Math.min(bytes.length, from + LOOKED_AT);
  let rows = 1;
  for (let at = from; at < end; at++) if (bytes[at] === LF) rows++;
  return Math.ceil((rows / Math.max(1, end - from)) * (bytes.length - from) * 1.02);
}
