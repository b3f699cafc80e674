/** Departures beyond this many expected ones count as this many: a step says nothing about scatter. */
const CAPPED = 3.5;

/** Fewer comparisons than this say nothing about the scatter. */
const FEWEST = 8;

/** Taken where there are too few slices to see it: neighbouring points of a laser line share part of their error. */
const USUAL_FACTOR = 1.6;

/** A series along the seam: one value a slice, with the uncertainty its own points give it. NaN where not measured. */
export interface Series {
  readonly at_mm: Float64Array;
  readonly values: Float64Array;
  readonly u: Float64Array;
  /** Part of the uncertainty that neighbours share, so that it never averages out; null: none. */
  readonly floor_u?: Float64Array | null;
}

/**
 * How many times larger the scatter from slice to slice is than the points of each slice promise. Pose jitter and
 * error shared by neighbouring points are in it, slow changes along the seam are not: each value is held against the
 * straight line between its two neighbours, and the mean square taken, large ones capped.
 * @returns a factor to multiply the slices' own uncertainty with, 0.7 to 20
 */
export function scatterFactor({ at_mm, values, u }: Series): number {
  const squares = new Float64Array(values.length);
  let count = 0;
  let [i, j] = [-1, -1];
  for (let k = 0; k < values.length; k++) {
    if (!(Number.isFinite(values[k]) && u[k]! > 0)) continue;
    if (i >= 0 && j >= 0) {
      const share = (at_mm[j]! - at_mm[i]!) / (at_mm[k]! - at_mm[i]!);
      const off = values[j]! - values[i]! - share * (values[k]! - values[i]!);
      const expected = Math.hypot(u[j]!, (1 - share) * u[i]!, share * u[k]!);
      squares[count++] = (off / expected) ** 2;
    }
    i = j;
    j = k;
  }
  if (count < FEWEST) return USUAL_FACTOR;
  return Math.max(0.7, Math.min(20, settled(squares.subarray(0, count))));
}

/** The factor at which the capped mean square of the departures is one: found by repeating, from the plain mean. */
function settled(squares: Float64Array): number {
  let factor = Math.sqrt(squares.reduce((sum, one) => sum + one, 0) / squares.length);
  for (let round = 0; round < 30; round++) {
    const cap = (CAPPED * factor) ** 2;
    const mean = squares.reduce((sum, one) => sum + Math.min(one, cap), 0) / squares.length;
    const next = Math.sqrt(mean);
    if (Math.abs(next - factor) <= 1e-6 * factor) break;
    factor = next;
  }
  return factor;
}
