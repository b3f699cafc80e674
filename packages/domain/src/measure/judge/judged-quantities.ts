import type { StationResult, VerdictReason } from "../../schemas/scan-result.ts";
import type { LimitSet, SeamModel } from "../../schemas/seam-model.ts";

/** A quantity that is held against limits, and how a station gives it. */
export interface JudgedQuantity {
  readonly check: Exclude<VerdictReason["check"], "coverage">;
  readonly unit: "mm" | "deg";
  readonly name: string;
  readonly limitOf: (limits: LimitSet) => number;
  readonly nominalOf: (section: SeamModel["section"]) => number;
  readonly value: (station: StationResult) => number | undefined;
  readonly u: (station: StationResult) => number | undefined;
}

/** Everything that a verdict looks at. Gap and mismatch count by their departure from the nominal sizes. */
export const JUDGED: readonly JudgedQuantity[] = [
  {
    check: "lateral",
    unit: "mm",
    name: "Lateral deviation",
    limitOf: (limits) => limits.lateral_mm,
    nominalOf: () => 0,
    value: (station) => station.lateral_mm,
    u: (station) => station.u_lateral_mm,
  },
  {
    check: "normal",
    unit: "mm",
    name: "Normal deviation",
    limitOf: (limits) => limits.normal_mm,
    nominalOf: () => 0,
    value: (station) => station.normal_mm,
    u: (station) => station.u_normal_mm,
  },
  {
    check: "gap",
    unit: "mm",
    name: "Gap",
    limitOf: (limits) => limits.gap_mm,
    nominalOf: (section) => section.gap_mm ?? 0,
    value: (station) => station.gap_mm,
    u: (station) => station.u_gap_mm,
  },
  {
    check: "mismatch",
    unit: "mm",
    name: "Mismatch",
    limitOf: (limits) => limits.mismatch_mm,
    nominalOf: (section) => section.mismatch_mm ?? 0,
    value: (station) => station.mismatch_mm,
    u: (station) => station.u_mismatch_mm,
  },
  {
    check: "angle",
    unit: "deg",
    name: "Angle deviation",
    limitOf: (limits) => limits.angle_deg,
    nominalOf: () => 0,
    value: (station) => station.angle_deg,
    u: (station) => station.u_angle_deg,
  },
];
