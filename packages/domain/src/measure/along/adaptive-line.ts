import { add, type Estimate, lineAtZero, noSums, parabolaAtZero, type Sums } from "./local-fit.ts";
import type { Series } from "./scatter.ts";

/** The longest stretch to either side that a value may lean on, mm. */
export const SPAN_MM = 15;

/** Slices to either side, at most. */
const MOST_SLICES = 15;

/** Windows grow by about a half each time. */
const WIDTHS = [1, 2, 3, 5, 7, 10, 15];

/** How far two windows' estimates may lie apart, in standard uncertainties, and still be of one straight stretch. */
const AGREEMENT = 2;

/**
 * The window is chosen by the same values that are then averaged, which makes the average look surer than it is.
 * By how much was found on simulated scans whose truth is known (tests/simulation), not derived.
 */
const CHOSEN = 1.1;

/** Empty stretches this many times the usual pitch are not bridged. */
const BRIDGE = 2.6;

/** Sums that serve again at every place: they are asked for some hundred times at each. */
const room = { side: noSums(), moved: noSums(), both: noSums() };

const measured = ({ values, u }: Series, k: number) => Number.isFinite(values[k]) && u[k]! > 0;

/** The slices to one side of `from`, itself first, none across a blind stretch. */
function onSide(series: Series, from: number, way: -1 | 1, pitch_mm: number): number[] {
  const side: number[] = [];
  let last_mm = series.at_mm[from]!;
  for (let k = from; k >= 0 && k < series.values.length && side.length <= MOST_SLICES; k += way) {
    const at_mm = series.at_mm[k]!;
    if (Math.abs(at_mm - last_mm) > BRIDGE * pitch_mm + 1e-9) break;
    if (Math.abs(at_mm - series.at_mm[from]!) > SPAN_MM) break;
    if (!measured(series, k)) continue;
    last_mm = at_mm;
    side.push(k);
  }
  return side;
}

/** A slice this many standard uncertainties off the line of those before it begins another stretch. */
const BREAK = 4;

/** Whether a slice lies where the line through those before it leads; two are needed to lead anywhere. */
function follows(sums: Sums, count: number, x: number, y: number, u: number): boolean {
  if (count < 2) return true;
  const { value, u: u_line } = lineAtZero(shifted(sums, x));
  return (y - value) ** 2 <= BREAK * BREAK * (u * u + u_line * u_line);
}

/** The sums about another origin, as far as a line needs them. */
function shifted(sums: Sums, by: number): Sums {
  const w = sums[0]!;
  const x = sums[1]!;
  const xx = sums[2]!;
  const y = sums[5]!;
  const xy = sums[6]!;
  const { moved } = room;
  moved[0] = w;
  moved[1] = x - by * w;
  moved[2] = xx - 2 * by * x + by * by * w;
  moved[5] = y;
  moved[6] = xy - by * y;
  return moved;
}

/** Any two slices lie on a line: a neighbour counts only where a third one lies on it too. */
const confirmed = (kept: number) => (kept < 3 ? 1 : kept);

/** How many slices of a side agree with one straight line through the place: the intersection of their intervals. */
function agreeing(series: Series, side: readonly number[], x_mm: number): number {
  let low = Number.NEGATIVE_INFINITY;
  let high = Number.POSITIVE_INFINITY;
  let kept = 1;
  const sums = room.side.fill(0);
  let used = 0;
  for (const width of WIDTHS) {
    while (used < Math.min(width, side.length)) {
      const k = side[used]!;
      const x = series.at_mm[k]! - x_mm;
      const y = series.values[k]!;
      const u = series.u[k]!;
      if (!follows(sums, used, x, y, u)) return confirmed(kept);
      add(sums, x, y, u);
      used += 1;
    }
    const { value, u } = lineAtZero(sums);
    low = Math.max(low, value - AGREEMENT * u);
    high = Math.min(high, value + AGREEMENT * u);
    if (low > high) break;
    kept = used;
    if (used === side.length) break;
  }
  return confirmed(kept);
}

/** Slices needed on each side before a parabola is drawn through them. */
const CURVED_SIDE = 3;

/**
 * The value of a series at a place, from as much of its neighbourhood as lies on one smooth stretch with it.
 *
 * To each side the window grows while the straight lines fitted in ever wider windows agree (intersection of
 * confidence intervals), so it reaches far where the joint runs evenly and stops before a step or a sharp bend; then
 * one weighted parabola (near an end or a step: a straight line) is fitted over both sides. A single section that
 * differs from both its sides keeps its own value. Nothing is carried across a blind stretch.
 * @param nearest index of the measured slice nearest to the place
 * Source: Goldenshluger and Nemirovski 1997; Katkovnik 1999 (local polynomial estimates, ICI rule).
 */
export function adaptiveLine(series: Series, nearest: number, x_mm: number, pitch_mm: number): Estimate {
  const back = onSide(series, nearest, -1, pitch_mm);
  const on = onSide(series, nearest, 1, pitch_mm);
  const before = agreeing(series, back, series.at_mm[nearest]!);
  const after = agreeing(series, on, series.at_mm[nearest]!);
  const sums = room.both.fill(0);
  for (const k of [...back.slice(0, before), ...on.slice(1, after)])
    add(sums, series.at_mm[k]! - x_mm, series.values[k]!, series.u[k]!);
  const isCurved = Math.min(before, after) > CURVED_SIDE;
  const { value, u } = (isCurved ? parabolaAtZero(sums) : null) ?? lineAtZero(sums);
  return { value, u: Math.hypot(CHOSEN * u, series.floor_u?.[nearest] ?? 0) };
}
