/** When an arc counts as burning. */
export interface ArcOnRule {
  /** The arc is on once the current reaches this, A. */
  readonly on_a: number;
  /** It is off once the current falls below this, A; not above `on_a`, so that ripple does not switch it. */
  readonly off_a: number;
  /** A burn shorter than this is a failed strike and does not count, s, above 0. */
  readonly shortest_burn_s: number;
  /** A gap shorter than this is part of the burn (transfer, a missed reading), s. */
  readonly shortest_gap_s: number;
}

/**
 * The rule used unless another is given: low enough for the base current of a pulsed arc and for fine TIG work,
 * above the leakage that power sources report with the arc out. Our own choice, no standard's.
 */
export const DEFAULT_ARC_ON: ArcOnRule = { on_a: 15, off_a: 8, shortest_burn_s: 0.1, shortest_gap_s: 0.3 };

/** Time stamps are no finer than this; differences below it are rounding, s. */
const CLOCK_S = 1e-6;

/** One stretch of burning arc, from its first to its last sample. */
export interface Burn {
  readonly first: number;
  readonly last: number;
}

/**
 * When the arc burned, from its current, with hysteresis and debounce.
 * @param times_s    time of each sample, s, never decreasing
 * @param currents_a current at each sample, A, without sign; same length
 * @returns burns in order, as sample indices; each end is late or early by one sampling interval at most. Empty when
 *   the arc never burned
 * @throws RangeError when the lengths differ or the rule contradicts itself
 * Example: with samples each second, 0 200 210 0 A gives one burn from sample 1 to sample 2.
 */
export function findArcOn(
  times_s: Float64Array,
  currents_a: Float64Array,
  rule: ArcOnRule = DEFAULT_ARC_ON,
): readonly Burn[] {
  checkRule(rule);
  if (times_s.length !== currents_a.length) {
    throw new RangeError(`currents_a: expected ${times_s.length} values, got ${currents_a.length}`);
  }
  const burns: { first: number; last: number }[] = [];
  let burning = false;
  for (let i = 0; i < times_s.length; i++) {
    burning = currents_a[i]! >= (burning ? rule.off_a : rule.on_a);
    if (!burning) continue;
    const open = burns.at(-1);
    const goesOn = open !== undefined && continues(times_s, open.last, i, rule);
    if (goesOn) open.last = i;
    else burns.push({ first: i, last: i });
  }
  return burns.filter(
    ({ first, last }) => times_s[last]! - times_s[first]! >= rule.shortest_burn_s - CLOCK_S,
  );
}

/** Whether the arc that was on at sample `last` is the same one at sample `i`. */
function continues(times_s: Float64Array, last: number, i: number, rule: ArcOnRule): boolean {
  return last === i - 1 || times_s[i]! - times_s[last]! < rule.shortest_gap_s - CLOCK_S;
}

function checkRule({ on_a, off_a, shortest_burn_s }: ArcOnRule): void {
  if (!(off_a > 0 && off_a <= on_a)) {
    throw new RangeError(`rule: expected 0 < off_a ≤ on_a, got off_a ${off_a} and on_a ${on_a}`);
  }
  if (!(shortest_burn_s > 0))
    throw new RangeError(`rule: expected shortest_burn_s above 0, got ${shortest_burn_s}`);
}
