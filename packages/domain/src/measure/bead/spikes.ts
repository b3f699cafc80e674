import { medianOf } from "../fit/median.ts";

/** A point this far off the median of those about it is a spike or a ghost, mm (and standard deviations). */
const ODD_MM = 0.25;
const ODD_SIGMAS = 5;

/** Points to either side that say what a point should be. */
const ABOUT = 3;

/** Slope of a few points, by the median of the slopes of pairs far apart (Theil 1950, Sen 1968). */
function slopeOf(x: Float64Array, y: Float64Array, from: number, to: number): number {
  const half = (to - from) >> 1;
  const slopes: number[] = [];
  for (let i = from; i + half < to; i++) {
    const run = x[i + half]! - x[i]!;
    if (run > 1e-6) slopes.push((y[i + half]! - y[i]!) / run);
  }
  return slopes.length > 0 ? medianOf(slopes) : 0;
}

/**
 * Which points of a profile follow those about them: 1, or 0 for a spike (Hampel's identifier about a local slope).
 * @param x growing, @param y over it, mm
 */
export function followers(x: Float64Array, y: Float64Array, count: number, noise_mm: number): Uint8Array {
  const limit_mm = Math.max(ODD_MM, ODD_SIGMAS * noise_mm);
  const follows = new Uint8Array(count);
  const level = new Float64Array(2 * ABOUT + 1);
  for (let i = 0; i < count; i++) {
    const [from, to] = [Math.max(0, i - ABOUT), Math.min(count, i + ABOUT + 1)];
    const slope = slopeOf(x, y, from, to);
    for (let k = from; k < to; k++) level[k - from] = y[k]! - slope * (x[k]! - x[i]!);
    follows[i] = Math.abs(medianOf(level.subarray(0, to - from)) - y[i]!) <= limit_mm ? 1 : 0;
  }
  return follows;
}
