import type { Burn } from "./arc-on.ts";

/** What a quantity was over the arc time, each moment weighing the same. */
export interface ArcStatistics {
  readonly mean: number;
  readonly min: number;
  readonly max: number;
  readonly sd: number;
}

/**
 * Readings without gaps: straight lines between the readings on either side, level before the first and after the last.
 * @param times_s time of each sample, s, never decreasing
 * @param values  same length; NaN where nothing was read
 * @returns `values` itself when there is no gap, null when nothing was read at all
 */
export function fillGaps(times_s: Float64Array, values: Float64Array): Float64Array | null {
  const firstRead = values.findIndex((value) => !Number.isNaN(value));
  if (firstRead < 0) return null;
  if (!values.some(Number.isNaN)) return values;
  const filled = values.slice().fill(values[firstRead]!, 0, firstRead);
  let before = firstRead;
  for (let i = firstRead + 1; i < values.length; i++) {
    if (Number.isNaN(values[i]!)) continue;
    for (let k = before + 1; k < i; k++) filled[k] = between(times_s, values, [before, i], k);
    before = i;
  }
  return filled.fill(values[before]!, before + 1);
}

function between(times_s: Float64Array, values: Float64Array, [a, b]: [number, number], k: number): number {
  const span_s = times_s[b]! - times_s[a]!;
  const share = span_s > 0 ? (times_s[k]! - times_s[a]!) / span_s : 0;
  return values[a]! + (values[b]! - values[a]!) * share;
}

/**
 * Time-weighted statistics over the arc time by the trapezoid rule, so that uneven sampling does not weigh. The
 * deviation is that of the straight lines between the samples, ∫(x − mean)² dt, exact on each.
 * @param values same length as `times_s`, without gaps
 * @throws RangeError when the burns hold no time
 */
export function statisticsOver(
  times_s: Float64Array,
  values: Float64Array,
  burns: readonly Burn[],
): ArcStatistics {
  const time_s = arcTime(times_s, burns);
  if (!(time_s > 0)) throw new RangeError("burns: expected some time in them, got none");
  let [integral, min, max] = [0, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const { first, last } of burns) {
    for (let i = first; i <= last; i++) {
      const value = values[i]!;
      if (value < min) min = value;
      if (value > max) max = value;
      if (i > first) integral += ((times_s[i]! - times_s[i - 1]!) * (values[i - 1]! + value)) / 2;
    }
  }
  const mean = integral / time_s;
  return { mean, min, max, sd: Math.sqrt(squaresAbout(mean, times_s, values, burns) / time_s) };
}

function squaresAbout(
  mean: number,
  times_s: Float64Array,
  values: Float64Array,
  burns: readonly Burn[],
): number {
  let squares = 0;
  for (const { first, last } of burns) {
    for (let i = first + 1; i <= last; i++) {
      const [a, b] = [values[i - 1]! - mean, values[i]! - mean];
      squares += ((times_s[i]! - times_s[i - 1]!) * (a * a + a * b + b * b)) / 3;
    }
  }
  return squares;
}

/** A quantity at every sample of a log. */
export interface Course {
  readonly times_s: Float64Array;
  /** Same length, without gaps. */
  readonly values: Float64Array;
}

/** The share of the arc time for which a quantity lies outside a range, 0 to 1; crossings are interpolated. */
export function shareOutside(
  { times_s, values }: Course,
  burns: readonly Burn[],
  range: { readonly min: number; readonly max: number },
): number {
  let outside_s = 0;
  for (const { first, last } of burns) {
    for (let i = first + 1; i <= last; i++) {
      const [from, to] = [values[i - 1]!, values[i]!];
      const share = shareAbove(from, to, range.max) + shareAbove(-from, -to, -range.min);
      outside_s += (times_s[i]! - times_s[i - 1]!) * share;
    }
  }
  return Math.min(1, outside_s / arcTime(times_s, burns));
}

/** The share of a straight line from `from` to `to` that lies above `limit`. */
function shareAbove(from: number, to: number, limit: number): number {
  const [low, high] = from < to ? [from, to] : [to, from];
  if (high <= limit) return 0;
  return low >= limit ? 1 : (high - limit) / (high - low);
}

/** The integral of a quantity over the arc time up to each sample, same length as the log; level while the arc is out. */
export function accumulated(
  times_s: Float64Array,
  values: Float64Array,
  burns: readonly Burn[],
): Float64Array {
  const sums = new Float64Array(times_s.length);
  let [sum, filledTo] = [0, 0];
  for (const { first, last } of burns) {
    sums.fill(sum, filledTo, first + 1);
    for (let i = first + 1; i <= last; i++) {
      sum += ((times_s[i]! - times_s[i - 1]!) * (values[i - 1]! + values[i]!)) / 2;
      sums[i] = sum;
    }
    filledTo = last + 1;
  }
  return sums.fill(sum, filledTo);
}

/** Time the arc burned, s. */
export function arcTime(times_s: Float64Array, burns: readonly Burn[]): number {
  return burns.reduce((sum, { first, last }) => sum + (times_s[last]! - times_s[first]!), 0);
}
