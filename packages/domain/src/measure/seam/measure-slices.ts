import { expectedFromNeighbours } from "../along/odd-slices.ts";
import type { Line } from "../fit/line-fit.ts";
import { medianOf } from "../fit/median.ts";
import type { JointFaces } from "../joints/joint-faces.ts";
import type { SectionSlice } from "../section/face-fit.ts";
import { fitSection, refit, type SectionFit } from "../section/fit-section.ts";
import { measureSlice, type SliceOutcome } from "../section/measure-slice.ts";
import type { Placement } from "../section/placement.ts";
import type { Slices } from "./slices.ts";

/** Neighbours whose faces show where an odd slice's should be. */
const GUIDES = 5;
/** They must lie this near, mm. */
const GUIDE_REACH_MM = 12;
/** A guided face may lie this far from its guide, mm. */
const GUIDED_BAND_MM = 0.5;

/** A guided fit replaces a free one only if it is carried by at least this share of its weight. */
const CARRIED = 0.6;

export const sliceAt = (slices: Slices, i: number): SectionSlice => ({
  l_mm: slices.l_mm,
  n_mm: slices.n_mm,
  from: slices.starts[i]!,
  to: slices.starts[i + 1]!,
});

/** The lines that the found slices around one have in common, per face. */
function guidesFor(
  slices: Slices,
  outcomes: readonly SliceOutcome[],
  index: number,
  faces: number,
): (Line | null)[] {
  const near: SectionFit[] = [];
  for (let by = 1; near.length < 2 * GUIDES && by < outcomes.length; by++) {
    for (const k of [index - by, index + by]) {
      const one = outcomes[k];
      if (one?.found && Math.abs(slices.at_mm[k]! - slices.at_mm[index]!) <= GUIDE_REACH_MM)
        near.push(one.result.fits);
    }
    if (by * slices.pitch_mm > GUIDE_REACH_MM) break;
  }
  return Array.from({ length: faces }, (_, f) => {
    const lines = near.flatMap((fits) => fits[f] ?? []);
    if (lines.length < 2) return null;
    return {
      t_mm: 0,
      d_mm: medianOf(lines.map((line) => line.d_mm - line.t_mm * Math.tan(line.angle_rad))),
      angle_rad: medianOf(lines.map((line) => line.angle_rad)),
    };
  });
}

const carried = (joint: JointFaces, fits: SectionFit) =>
  (fits[joint.root[0]]?.weight ?? 0) + (fits[joint.root[1]]?.weight ?? 0);

/** Slices that were not found, or stand alone among their neighbours, are looked at again with the neighbours' faces. */
function guided(slices: Slices, joint: JointFaces, outcomes: readonly SliceOutcome[]): SliceOutcome[] {
  const column = (pick: "at" | "u", key: "lateral_mm" | "normal_mm") =>
    Float64Array.from(outcomes, (one) => (one.found ? one.result[pick][key] : Number.NaN));
  const columns = (["lateral_mm", "normal_mm"] as const).map(
    (key) => [column("at", key), column("u", key)] as const,
  );
  return outcomes.map((outcome, i) => {
    const odd =
      outcome.found && columns.some(([values, u]) => expectedFromNeighbours(values, u, i)?.odd ?? false);
    if (outcome.found && !odd) return outcome;
    const guides = guidesFor(slices, outcomes, i, joint.faces.length);
    if (guides.every((line) => line === null)) return outcome;
    const slice = sliceAt(slices, i);
    const fits = refit(slice, joint, guides, GUIDED_BAND_MM);
    const again = measureSlice(slice, joint, fits);
    if (!again.found) return outcome;
    const isBetter = !outcome.found || carried(joint, fits) >= CARRIED * carried(joint, outcome.result.fits);
    return isBetter ? again : outcome;
  });
}

/**
 * Measures every slice by itself, then looks again at those that their neighbours contradict.
 * @param placed where the joint is expected along the seam
 */
export function measureSlices(
  slices: Slices,
  joint: JointFaces,
  placed: (at_mm: number) => Placement,
): SliceOutcome[] {
  const outcomes = Array.from({ length: slices.count }, (_, i): SliceOutcome => {
    const slice = sliceAt(slices, i);
    return measureSlice(slice, joint, fitSection(slice, joint, placed(slices.at_mm[i]!), 7919 * (i + 1)));
  });
  return guided(slices, joint, outcomes);
}
