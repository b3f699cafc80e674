/** A point this far off the median of those about it is a spike or a ghost, mm (and standard deviations). */
const ODD_MM = 0.25;
const ODD_SIGMAS = 5;

/** Points to either side that say what a point should be. */
const ABOUT = 3;
const WINDOW = 2 * ABOUT + 1;

const room = { slopes: new Float64Array(WINDOW), levels: new Float64Array(WINDOW) };

/** Median of the first few values, which are put in order: so few are sorted soonest by insertion. */
function medianOfFew(values: Float64Array, count: number): number {
  for (let i = 1; i < count; i++) {
    const value = values[i]!;
    let k = i - 1;
    for (; k >= 0 && values[k]! > value; k--) values[k + 1] = values[k]!;
    values[k + 1] = value;
  }
  const half = count >> 1;
  return count % 2 === 1 ? values[half]! : (values[half - 1]! + values[half]!) / 2;
}

/** Slope of a few points, by the median of the slopes of pairs far apart (Theil 1950, Sen 1968). */
function slopeOf(x: Float64Array, y: Float64Array, from: number, to: number): number {
  const half = (to - from) >> 1;
  const { slopes } = room;
  let count = 0;
  for (let i = from; i + half < to; i++) {
    const run = x[i + half]! - x[i]!;
    if (run > 1e-6) slopes[count++] = (y[i + half]! - y[i]!) / run;
  }
  return count > 0 ? medianOfFew(slopes, count) : 0;
}

/**
 * Which points of a profile follow those about them: 1, or 0 for a spike (Hampel's identifier about a local slope).
 * @param x growing, @param y over it, mm
 */
export function followers(x: Float64Array, y: Float64Array, count: number, noise_mm: number): Uint8Array {
  const limit_mm = Math.max(ODD_MM, ODD_SIGMAS * noise_mm);
  const follows = new Uint8Array(count);
  const { levels } = room;
  for (let i = 0; i < count; i++) {
    const [from, to] = [Math.max(0, i - ABOUT), Math.min(count, i + ABOUT + 1)];
    const slope = slopeOf(x, y, from, to);
    for (let k = from; k < to; k++) levels[k - from] = y[k]! - slope * (x[k]! - x[i]!);
    follows[i] = Math.abs(medianOfFew(levels, to - from) - y[i]!) <= limit_mm ? 1 : 0;
  }
  return follows;
}
