import type { ScanResult } from "../../schemas/scan-result.ts";
import type { MeasuredSeam } from "../seam/measure-seam.ts";

/** Slices without the joint beyond an end, before it is believed. */
const FEWEST_BEYOND = 2;

const rounded = (value: number) => Math.round(value * 1e3) / 1e3 + 0;

/**
 * Where the joint begins and ends along the seam. An end is seen where the scan runs on past it without finding the
 * joint; it then lies half a pitch before the first slice that shows it. Otherwise the scan's own end is given.
 */
export function endsOf({ slices, outcomes }: MeasuredSeam): ScanResult["ends"] {
  const found = (i: number) => outcomes[i]?.found === true;
  let first = 0;
  // One find alone beyond an end is chance: the next slice must show the joint as well.
  while (first < slices.count && !(found(first) && (found(first + 1) || slices.count === 1))) first += 1;
  let last = slices.count - 1;
  while (last >= 0 && !(found(last) && (found(last - 1) || slices.count === 1))) last -= 1;
  if (first > last) return { start_mm: null, end_mm: null, start_seen: false, end_seen: false };
  const start_seen = first >= FEWEST_BEYOND;
  const end_seen = slices.count - 1 - last >= FEWEST_BEYOND;
  const half_mm = slices.pitch_mm / 2;
  return {
    start_mm: rounded(slices.at_mm[first]! - (start_seen ? half_mm : 0)),
    end_mm: rounded(slices.at_mm[last]! + (end_seen ? half_mm : 0)),
    start_seen,
    end_seen,
  };
}
