import type {
  BEAD_QUANTITIES,
  BeadFinding,
  BeadResult,
  BeadStation,
} from "@beadroll/domain/schemas/bead-result";
import type { PlotBand, PlotSpec } from "../../kit/plots/plot-spec.ts";

type Quantity = (typeof BEAD_QUANTITIES)[number];

/** Expanded uncertainty is twice the standard one, as in the findings (ISO 14253-1). */
const COVERAGE_FACTOR = 2;

interface BeadPlot {
  readonly quantity: Quantity;
  readonly title: string;
  readonly unit: "mm" | "°";
  /** The finding whose limit is drawn. */
  readonly code?: string;
  readonly plate?: "a" | "b";
}

/** The figures in the order they are read; a weld has those of its kind. */
const PLOTS: readonly BeadPlot[] = [
  { quantity: "throat_mm", title: "Throat", unit: "mm", code: "5213" },
  { quantity: "leg_a_mm", title: "Leg A", unit: "mm" },
  { quantity: "leg_b_mm", title: "Leg B", unit: "mm" },
  { quantity: "convexity_mm", title: "Convexity", unit: "mm", code: "503" },
  { quantity: "excess_mm", title: "Excess", unit: "mm", code: "502" },
  { quantity: "underfill_mm", title: "Underfill", unit: "mm", code: "511" },
  { quantity: "mismatch_mm", title: "Mismatch", unit: "mm", code: "5071" },
  { quantity: "undercut_a_mm", title: "Undercut A", unit: "mm", code: "501", plate: "a" },
  { quantity: "undercut_b_mm", title: "Undercut B", unit: "mm", code: "501", plate: "b" },
  { quantity: "toe_angle_a_deg", title: "Toe angle A", unit: "°", code: "505", plate: "a" },
  { quantity: "toe_angle_b_deg", title: "Toe angle B", unit: "°", code: "505", plate: "b" },
];

/** What a finding's limit means on a figure's own axis. */
function bandOf({ quantity }: BeadPlot, finding: BeadFinding, asked_mm: number, top: number): PlotBand {
  const limit = finding.limit ?? 0;
  const band = { kind: "within", word: "level" } as const;
  if (quantity === "throat_mm")
    return { ...band, low: asked_mm - limit, high: Math.max(top, asked_mm), edge: "low" };
  if (quantity.startsWith("toe_angle")) return { ...band, low: limit, high: 180, edge: "low" };
  return { ...band, low: quantity === "mismatch_mm" ? -limit : 0, high: limit };
}

const figures = (stations: readonly BeadStation[], quantity: Quantity) =>
  stations.map((station) => station[quantity] ?? null);

/** A finished weld's figures as plots along it, with the limits of its quality level where they have one. */
export function beadPlots({ stations, findings, requirement }: BeadResult): PlotSpec[] {
  const stations_mm = stations.map(({ station_mm }) => station_mm);
  return PLOTS.flatMap((plot): PlotSpec[] => {
    const values = figures(stations, plot.quantity);
    if (values.every((value) => value === null)) return [];
    const finding = findings.find(
      ({ code, plate }) => plot.code !== undefined && code.startsWith(plot.code) && plate === plot.plate,
    );
    const top = Math.max(...values.map((value) => value ?? 0));
    return [
      {
        id: plot.quantity,
        title: plot.title,
        unit: plot.unit,
        stations_mm,
        values,
        expanded_u: stations.map((station) => {
          const u = station[`u_${plot.quantity}`];
          return u === undefined ? null : COVERAGE_FACTOR * u;
        }),
        ...(plot.unit === "°" && { decimals: 0 }),
        ...(finding && { bands: [bandOf(plot, finding, requirement.weld_size_mm, top)] }),
      },
    ];
  });
}
