import type { StripStation } from "./strip-groups.ts";

/**
 * The stations of a strip at list size: evenly spaced bins from start to end, each a signed share of the limit, null
 * where it was not measured. Each stands in the middle of its bin.
 */
export function stationsFromShares(shares: readonly (number | null)[], length_mm: number): StripStation[] {
  return shares.map((share, bin) => {
    const station_mm = ((bin + 0.5) / shares.length) * length_mm;
    return share === null ? { station_mm, measured: false } : { station_mm, measured: true, share };
  });
}
