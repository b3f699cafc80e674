import { BEAD_QUANTITIES, type BeadResult, type BeadStation } from "../../schemas/bead-result.ts";
import { nearestSlice, nearMm } from "../seam/nearest-slice.ts";
import type { SeamFrames } from "../seam/seam-frames.ts";
import type { BeadQuantity, Figure, Figures } from "./bead-geometry.ts";
import type { MeasuredBead } from "./measure-bead.ts";

const round = (value: number, digits: number) => Math.round(value * 10 ** digits) / 10 ** digits + 0;
const digitsOf = (quantity: BeadQuantity) => (quantity.endsWith("_deg") ? 2 : 4);

/** A dent is told at the deepest of the sections that a station stands for, all else at the nearest. */
const DEEPEST = new Set<BeadQuantity>(["undercut_a_mm", "undercut_b_mm"]);

/** Half the distance to the stations beside, mm. */
function halfStep({ stations_mm, count }: SeamFrames, j: number): number {
  const before = j > 0 ? stations_mm[j]! - stations_mm[j - 1]! : Number.POSITIVE_INFINITY;
  const after = j < count - 1 ? stations_mm[j + 1]! - stations_mm[j]! : Number.POSITIVE_INFINITY;
  return Math.min(before, after) / 2;
}

function deepest(
  measured: MeasuredBead,
  at_mm: number,
  half_mm: number,
  quantity: BeadQuantity,
): Figure | null {
  let found: Figure | null = null;
  measured.outcomes.forEach((one, i) => {
    if (!one.found || Math.abs(measured.slices.at_mm[i]! - at_mm) > half_mm) return;
    const figure = one.section.figures[quantity];
    if (figure && (!found || figure.value > found.value)) found = figure;
  });
  return found;
}

function fieldsOf(figures: Figures, common_mm: number): Record<string, number> {
  const fields: Record<string, number> = {};
  for (const quantity of BEAD_QUANTITIES) {
    const figure = figures[quantity];
    if (!figure) continue;
    const isAngle = quantity.endsWith("_deg");
    fields[quantity] = round(figure.value, digitsOf(quantity));
    fields[`u_${quantity}`] = round(isAngle ? figure.u : Math.hypot(figure.u, common_mm), digitsOf(quantity));
  }
  return fields;
}

/**
 * The weld at each station: the section nearest to it, undercuts the deepest of the sections that it stands for.
 * @param common_mm standard uncertainty that all sizes share (the scanner's accuracy), mm
 */
export function beadStations(measured: MeasuredBead, frames: SeamFrames, common_mm: number): BeadStation[] {
  const { slices, outcomes } = measured;
  const near_mm = nearMm(slices.pitch_mm);
  return Array.from(frames.stations_mm, (station_mm, j): BeadStation => {
    const i = nearestSlice(slices.at_mm, station_mm);
    if (i < 0) return { station_mm, measured: false, why: "no_points" };
    if (Math.abs(slices.at_mm[i]! - station_mm) > near_mm) {
      const isBeyond = station_mm < slices.at_mm[0]! || station_mm > slices.at_mm[slices.count - 1]!;
      return { station_mm, measured: false, why: isBeyond ? "beyond_end" : "no_points" };
    }
    const outcome = outcomes[i];
    if (!outcome?.found) return { station_mm, measured: false, why: outcome?.why ?? "no_points" };
    const half_mm = halfStep(frames, j);
    const figures: Record<string, Figure> = { ...outcome.section.figures };
    for (const quantity of DEEPEST) {
      const found = deepest(measured, station_mm, half_mm, quantity);
      if (found) figures[quantity] = found;
    }
    return { station_mm, measured: true, ...fieldsOf(figures, common_mm) };
  });
}

/** Mean, least and largest of each figure along the weld. */
export function beadSummary(stations: readonly BeadStation[]): BeadResult["summary"] {
  const summary: BeadResult["summary"] = {};
  for (const quantity of BEAD_QUANTITIES) {
    const values = stations.flatMap((station) => station[quantity] ?? []);
    if (values.length === 0) continue;
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    summary[quantity] = {
      mean: round(mean, 4),
      min: Math.min(...values),
      max: Math.max(...values),
    };
  }
  return summary;
}
