import { medianOf } from "../fit/median.ts";
import type { SliceOutcome } from "../section/measure-slice.ts";
import { expectedFromNeighbours } from "./odd-slices.ts";

/** Slices with a seen edge needed to hold a plate's size against them. */
const FEWEST_SEEN = 8;

/** An edge is seen a little late or early where the laser line is cut by it, mm. Common practice, no source. */
const EDGE_BIAS_MM = 0.05;

/** A plate whose size differs by less than this is taken as the model has it, mm. */
const SIZE_TRUSTED_MM = 0.3;

/** The gap of each slice, unsmoothed, with where it comes from. */
export interface GapSeries {
  readonly values: Float64Array;
  readonly u: Float64Array;
  /** What does not average out along the seam: an edge is known to the spacing of the points however many show it. */
  readonly floor_u: Float64Array | null;
  /** By how much the plate differs from the model, thicker positive, where the edge shows it plainly; else 0. mm. */
  readonly size_departure_mm: number;
}

const of = (
  outcomes: readonly SliceOutcome[],
  pick: (one: Extract<SliceOutcome, { found: true }>["result"]) => number,
) => Float64Array.from(outcomes, (one) => (one.found ? pick(one.result) : Number.NaN));

/** How far the gap by the chain of sizes lies from the edge as seen, where many slices show it. */
function departure(outcomes: readonly SliceOutcome[]): { readonly by_mm: number; readonly u_mm: number } {
  const open: number[] = [];
  const closed: number[] = [];
  for (const one of outcomes) {
    if (!one.found) continue;
    const { seen_gap, at } = one.result;
    if (!seen_gap || !Number.isFinite(at.gap_mm)) continue;
    if (seen_gap.is_open) open.push(seen_gap.gap_mm - at.gap_mm);
    else closed.push(seen_gap.begins_mm - at.gap_mm);
  }
  // Where the joint is closed the seen edge is an upper bound: it can only show that the chain says too much.
  const isOpen = open.length > closed.length;
  const seen = isOpen ? open : [...open, ...closed];
  if (seen.length < FEWEST_SEEN) return { by_mm: 0, u_mm: 0 };
  const by_mm = medianOf(seen);
  const spread_mm = 1.4826 * medianOf(seen.map((off) => Math.abs(off - by_mm)));
  const u_mm = Math.hypot((1.25 * spread_mm) / Math.sqrt(seen.length), EDGE_BIAS_MM);
  const shown = Math.abs(by_mm) > Math.max(SIZE_TRUSTED_MM, 3 * u_mm) && (isOpen || by_mm < 0);
  return shown ? { by_mm, u_mm } : { by_mm: 0, u_mm: 0 };
}

/**
 * The gap by the edge alone. Where a joint shows no opening, its gap lies anywhere from nothing to where the points
 * begin. A lost return or a ball of spatter at the root makes an edge seem late, never early: a section that shows
 * much more than those on both its sides shows that, not the gap.
 */
function seenSeries(outcomes: readonly SliceOutcome[]): GapSeries {
  const values = of(outcomes, (one) => one.seen_gap?.gap_mm ?? Number.NaN);
  const u = of(outcomes, (one) => one.seen_gap?.u_mm ?? Number.NaN);
  const late = Array.from(values.keys()).filter((i) => {
    const expected = expectedFromNeighbours(values, u, i, LATE_U);
    return expected?.odd && values[i]! > expected.value;
  });
  for (const i of late) values[i] = Number.NaN;
  const floor_u = of(outcomes, (one) =>
    Math.hypot(EDGE_BIAS_MM, one.seen_gap?.is_open ? 0 : (one.seen_gap?.u_mm ?? 0)),
  );
  return { values, u, floor_u, size_departure_mm: 0 };
}

/** An edge this many standard uncertainties later than those beside it is not the gap's. */
const LATE_U = 3;

/**
 * The gap of a T, lap or corner joint. Where a plate's far corner is seen the gap is what its size leaves of the way
 * from the root to that corner: far surer than an edge known only to the spacing of points. The size itself is held
 * against the edge that the slices see, all together; where they contradict it, the plate as seen is taken. Where no
 * corner is seen the edge serves; under a tack, then, nothing does.
 */
export function gapOfMeeting(outcomes: readonly SliceOutcome[]): GapSeries {
  const chain = of(outcomes, (one) => one.at.gap_mm);
  const found = outcomes.filter((one) => one.found).length;
  const chained = chain.reduce((sum, value) => sum + (Number.isFinite(value) ? 1 : 0), 0);
  if (chained < found / 2) {
    return seenSeries(outcomes);
  }
  const { by_mm, u_mm } = departure(outcomes);
  return {
    values: chain.map((value) => value + by_mm),
    u: of(outcomes, (one) => one.u.gap_mm),
    floor_u: null,
    size_departure_mm: u_mm > 0 ? -by_mm : 0,
  };
}

/** The gap of a butt joint: the distance of its constructed root edges. */
export function gapOfButt(outcomes: readonly SliceOutcome[]): GapSeries {
  return {
    values: of(outcomes, (one) => one.at.gap_mm),
    u: of(outcomes, (one) => one.u.gap_mm),
    floor_u: null,
    size_departure_mm: 0,
  };
}
