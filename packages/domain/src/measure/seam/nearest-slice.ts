/** A station is measured only where a slice lies within this share of the usual pitch: never across a lost profile. */
const NEAR_SHARE = 0.6;

/** With a single slice there is no pitch: it speaks for this far, mm. */
const ALONE_MM = 1;

/** How far from a station its slice may lie, mm. */
export const nearMm = (pitch_mm: number): number => (pitch_mm > 0 ? NEAR_SHARE * pitch_mm : ALONE_MM) + 1e-6;

/** Index of the slice nearest to a place along the seam; -1 where there is none. */
export function nearestSlice(at_mm: Float64Array, s_mm: number): number {
  let low = 0;
  let high = at_mm.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (at_mm[middle]! < s_mm) low = middle + 1;
    else high = middle;
  }
  if (low === 0) return at_mm.length > 0 ? 0 : -1;
  if (low === at_mm.length) return low - 1;
  return s_mm - at_mm[low - 1]! <= at_mm[low]! - s_mm ? low - 1 : low;
}
