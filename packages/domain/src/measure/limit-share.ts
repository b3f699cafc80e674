import type { StationResult } from "../schemas/scan-result.ts";
import type { LimitSet, SeamModel } from "../schemas/seam-model.ts";

const part = (departure: number | undefined, limit: number): number =>
  departure === undefined ? 0 : Math.abs(departure) / limit;

/**
 * How much of the limits a station uses: the largest of its quantities' shares, 1 at the limit, more beyond it.
 * Gap and mismatch count by their departure from the model's nominal sizes.
 * @returns null for a station that was not measured
 */
export function limitShare(
  station: StationResult,
  section: SeamModel["section"],
  limits: LimitSet,
): number | null {
  if (!station.measured) return null;
  const from = (value: number | undefined, nominal: number | null | undefined) =>
    value === undefined ? undefined : value - (nominal ?? 0);
  return Math.max(
    part(station.lateral_mm, limits.lateral_mm),
    part(station.normal_mm, limits.normal_mm),
    part(from(station.gap_mm, section.gap_mm), limits.gap_mm),
    part(from(station.mismatch_mm, section.mismatch_mm), limits.mismatch_mm),
    part(station.angle_deg, limits.angle_deg),
  );
}
