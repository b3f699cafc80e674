import type { BLIND_REASONS, ScanResult, StationResult, VerdictReason } from "../../schemas/scan-result.ts";
import type { ResolvedLimits } from "../../schemas/seam-model.ts";

type BlindReason = (typeof BLIND_REASONS)[number];

/** Why a station is blind, in words that follow "because". */
export const BLIND_WORDS: Record<BlindReason, string> = {
  no_points: "there are no points there",
  few_points_a: "too few points lie on plate A",
  few_points_b: "too few points lie on plate B",
  plate_a_not_found: "plate A was not found near the model",
  plate_b_not_found: "plate B was not found near the model",
  ambiguous: "two places explain the points alike",
  root_not_seen: "the root cannot be constructed from what is seen",
  beyond_end: "the scan does not reach there",
};

function commonest(stations: readonly StationResult[]): BlindReason | null {
  const counts = new Map<BlindReason, number>();
  for (const { why } of stations) if (why) counts.set(why, (counts.get(why) ?? 0) + 1);
  return (
    [...counts].reduce<[BlindReason, number] | null>((a, b) => (a && a[1] >= b[1] ? a : b), null)?.[0] ?? null
  );
}

const mm = (value: number) => `${Number(value.toFixed(1))} mm`;
const percent = (share: number) => `${Math.floor(share * 1000) / 10} %`;

/** Reasons from what was not measured: too small a share, or too long a stretch. Both hold the seam. */
export function coverageReasons(
  stations: readonly StationResult[],
  coverage: ScanResult["coverage"],
  limits: ResolvedLimits,
): VerdictReason[] {
  const why = commonest(stations);
  const because = why ? `: mostly because ${BLIND_WORDS[why]}` : "";
  const common = { check: "coverage", level: "adapt", proof: "not_measured" } as const;
  const from_mm = coverage.blind_from_mm ?? stations[0]?.station_mm ?? 0;
  const to_mm = coverage.blind_to_mm ?? stations.at(-1)?.station_mm ?? 0;
  const reasons: VerdictReason[] = [];
  if (coverage.share < limits.coverage_share)
    reasons.push({
      ...common,
      station_mm: from_mm,
      value: Math.round(coverage.share * 1e4) / 1e4,
      limit: limits.coverage_share,
      unit: "share",
      from_mm,
      to_mm,
      text: `${percent(coverage.share)} of the stations were measured, ${percent(limits.coverage_share)} are asked for${because}`,
    });
  if (coverage.longest_blind_mm > limits.longest_blind_mm)
    reasons.push({
      ...common,
      station_mm: from_mm,
      value: coverage.longest_blind_mm,
      limit: limits.longest_blind_mm,
      unit: "mm",
      from_mm,
      to_mm,
      text: `Nothing measured from ${mm(from_mm)} to ${mm(to_mm)}; ${mm(limits.longest_blind_mm)} may stay unmeasured${because}`,
    });
  return reasons;
}
