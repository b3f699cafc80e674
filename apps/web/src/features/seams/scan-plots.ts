import { limitShare } from "@beadroll/domain/measure/limit-share";
import type { ScanResult, StationResult } from "@beadroll/domain/schemas/scan-result";
import { type ResolvedLimits, resolveLimits, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { PlotBand, PlotSpec } from "../../kit/plots/plot-spec.ts";
import type { StripStation } from "../../kit/strip/strip-groups.ts";

/** Expanded uncertainty is twice the standard one, as in the verdict (ISO 14253-1). */
const COVERAGE_FACTOR = 2;

/** A quantity of a scan: where it stands in a station, and what its model says it should be. */
export interface ScanQuantity {
  readonly id: "lateral_mm" | "normal_mm" | "gap_mm" | "mismatch_mm" | "angle_deg";
  readonly title: string;
  readonly unit: string;
  readonly signed: boolean;
  readonly nominal: (model: SeamModel) => number;
  readonly uncertainty: (station: StationResult) => number | undefined;
}

/** The quantities in the order they are read. */
export const SCAN_QUANTITIES: readonly ScanQuantity[] = [
  {
    id: "lateral_mm",
    title: "Lateral",
    unit: "mm",
    signed: true,
    nominal: () => 0,
    uncertainty: (s) => s.u_lateral_mm,
  },
  {
    id: "normal_mm",
    title: "Normal",
    unit: "mm",
    signed: true,
    nominal: () => 0,
    uncertainty: (s) => s.u_normal_mm,
  },
  {
    id: "gap_mm",
    title: "Gap",
    unit: "mm",
    signed: false,
    nominal: ({ section }) => section.gap_mm ?? 0,
    uncertainty: (s) => s.u_gap_mm,
  },
  {
    id: "mismatch_mm",
    title: "Mismatch",
    unit: "mm",
    signed: true,
    nominal: ({ section }) => section.mismatch_mm ?? 0,
    uncertainty: (s) => s.u_mismatch_mm,
  },
  {
    id: "angle_deg",
    title: "Angle",
    unit: "°",
    signed: true,
    nominal: () => 0,
    uncertainty: (s) => s.u_angle_deg,
  },
];

const band = (kind: PlotBand["kind"], quantity: ScanQuantity, nominal: number, limit: number): PlotBand => ({
  kind,
  // A gap is never below nothing, so its limits are not drawn there.
  low: quantity.id === "gap_mm" ? Math.max(0, nominal - limit) : nominal - limit,
  high: nominal + limit,
  word: kind,
});

/** A scan's quantities as plots, with the limits it was judged by. A quantity that the joint does not have is left out. */
export function scanPlots(result: ScanResult, model: SeamModel): PlotSpec[] {
  const limits = resolveLimits(model.limits);
  const stations_mm = result.stations.map((station) => station.station_mm);
  return SCAN_QUANTITIES.filter(({ id }) => result.stations.some((station) => station[id] !== undefined)).map(
    (quantity) => {
      const nominal = quantity.nominal(model);
      return {
        id: quantity.id,
        title: quantity.title,
        unit: quantity.unit,
        signed: quantity.signed,
        stations_mm,
        values: result.stations.map((station) => station[quantity.id] ?? null),
        expanded_u: result.stations.map((station) => {
          const u = quantity.uncertainty(station);
          return u === undefined ? null : COVERAGE_FACTOR * u;
        }),
        bands: [
          band("adapt", quantity, nominal, limits.adapt[quantity.id]),
          band("within", quantity, nominal, limits.within[quantity.id]),
        ],
      };
    },
  );
}

/** A scan's stations as ripples: shifted by the lateral deviation, coloured by the worst share of the limits. */
export function scanRipples(result: ScanResult, model: SeamModel): StripStation[] {
  const limits: ResolvedLimits = resolveLimits(model.limits);
  return result.stations.map((station) => {
    const share = limitShare(station, model.section, limits.adapt);
    if (share === null) return { station_mm: station.station_mm, measured: false };
    return { station_mm: station.station_mm, measured: true, share, deviation: station.lateral_mm ?? 0 };
  });
}
