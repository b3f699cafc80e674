/** Coverage factor of an expanded uncertainty (JCGM 100, 6.3.3): about 95 % for normal errors. */
export const COVERAGE_FACTOR = 2;

/** A few units in the last place: on the bound is inside. */
const ROUNDING = 1e-9;

/** What a result proves about a limit that holds either way from zero. */
export type Proof = "inside" | "outside" | "not_proven" | "too_coarse";

/**
 * The decision rule of ISO 14253-1 with guard bands of the expanded uncertainty: inside only when the result with
 * its uncertainty is inside, outside only when it is outside by more than that.
 * @param departure departure from the nominal value, either sign
 * @param limit     largest departure allowed, > 0, same unit
 * @param u         standard uncertainty, ≥ 0
 * @returns `too_coarse` where 2 u reaches the limit, so that no result could be proved inside
 */
export function decide(departure: number, limit: number, u: number): Proof {
  const size = Math.abs(departure);
  const expanded = COVERAGE_FACTOR * u;
  const slack = ROUNDING * Math.max(1, limit);
  if (size - expanded > limit + slack) return "outside";
  if (size + expanded <= limit + slack) return "inside";
  return expanded >= limit ? "too_coarse" : "not_proven";
}
