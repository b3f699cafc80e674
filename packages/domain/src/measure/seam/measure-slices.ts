import { expectedFromNeighbours } from "../along/odd-slices.ts";
import type { FittedLine } from "../fit/line-fit.ts";
import type { JointFaces } from "../joints/joint-faces.ts";
import type { SectionSlice } from "../section/face-fit.ts";
import {
  fitSection,
  type KnownDirection,
  refit,
  type SectionFit,
  type SliceInput,
} from "../section/fit-section.ts";
import { measureSlice, type SliceOutcome } from "../section/measure-slice.ts";
import type { Placement } from "../section/placement.ts";
import { type Guides, guidesFor } from "./guides.ts";
import type { SeamPlacement } from "./place-seam.ts";
import type { Slices } from "./slices.ts";

/** A guided face may lie this far from its guide, mm. */
const GUIDED_BAND_MM = 0.5;

/** A guided fit replaces a free one only if it is carried by at least this share of its weight. */
const CARRIED = 0.6;

/** A face this far off its neighbours' direction, radians and standard uncertainties, does not know its own. */
const ODD_TURN_RAD = (1.5 * Math.PI) / 180;
const ODD_TURN_U = 3;

/** A face that knows its direction no better than this takes its neighbours', radians. */
const UNSURE_RAD = (1.2 * Math.PI) / 180;

export const sliceAt = (slices: Slices, i: number): SectionSlice => ({
  l_mm: slices.l_mm,
  n_mm: slices.n_mm,
  from: slices.starts[i]!,
  to: slices.starts[i + 1]!,
});

const carried = (joint: JointFaces, fits: SectionFit) =>
  (fits[joint.root[0]]?.weight ?? 0) + (fits[joint.root[1]]?.weight ?? 0);

/** Faces whose direction is better taken from the sections beside, with that direction. */
function borrowed(fits: SectionFit, guides: Guides): (KnownDirection | null)[] {
  return fits.map((fit: FittedLine | null, f) => {
    const known = guides.directions[f];
    if (!fit || !known) return null;
    const u = fit.scale_mm / Math.sqrt(Math.max(1e-9, fit.spread_mm2));
    const off = Math.abs(fit.angle_rad - known.angle_rad);
    const isOdd = off > Math.max(ODD_TURN_RAD, ODD_TURN_U * Math.hypot(u, known.u_rad));
    return isOdd || u > UNSURE_RAD ? known : null;
  });
}

/** What the neighbours' faces make of a slice; null where they cannot help. */
function guided(input: SliceInput, outcome: SliceOutcome, guides: Guides): SliceOutcome | null {
  if (guides.lines.every((line) => line === null)) return null;
  const { joint } = input;
  const free = refit(input, guides.lines, GUIDED_BAND_MM);
  const known = borrowed(free, guides);
  const fits = known.some((one) => one !== null)
    ? refit(input, guides.lines, GUIDED_BAND_MM, { known })
    : free;
  const again = measureSlice(input, fits, guides.directions);
  if (!again.found) return null;
  const isBetter = !outcome.found || carried(joint, fits) >= CARRIED * carried(joint, outcome.result.fits);
  return isBetter ? again : null;
}

/** Root positions of all slices, as columns. */
function columnsOf(outcomes: readonly SliceOutcome[]) {
  const column = (pick: "at" | "u", key: "lateral_mm" | "normal_mm") =>
    Float64Array.from(outcomes, (one) => (one.found ? one.result[pick][key] : Number.NaN));
  return (["lateral_mm", "normal_mm"] as const).map((key) => ({
    values: column("at", key),
    u: column("u", key),
  }));
}

const standsAlone = (columns: ReturnType<typeof columnsOf>, i: number) =>
  columns.some(({ values, u }) => expectedFromNeighbours(values, u, i)?.odd ?? false);

/** Slices not found, standing alone, under a tack, or with a face that does not know its direction are looked at again. */
function lookedAtAgain(
  slices: Slices,
  inputs: readonly SliceInput[],
  outcomes: readonly SliceOutcome[],
): SliceOutcome[] {
  const columns = columnsOf(outcomes);
  return outcomes.map((outcome, i) => {
    const input = inputs[i]!;
    const guides = guidesFor(slices, outcomes, i, input.joint.faces.length);
    const isSound =
      outcome.found &&
      !outcome.result.tack &&
      !standsAlone(columns, i) &&
      borrowed(outcome.result.fits, guides).every((one) => one === null);
    return isSound ? outcome : (guided(input, outcome, guides) ?? outcome);
  });
}

/** A slice that its neighbours on both sides still contradict is no measurement: it is said to be ambiguous. */
function withoutLoners(outcomes: readonly SliceOutcome[]): SliceOutcome[] {
  const columns = columnsOf(outcomes);
  return outcomes.map((outcome, i) =>
    outcome.found && standsAlone(columns, i) ? { found: false, why: "ambiguous" } : outcome,
  );
}

/** A slice measured by itself, at the first placement that serves; the first is kept where none does. */
function measuredAlone(
  slice: SectionSlice,
  joint: JointFaces,
  placements: readonly Placement[],
  seed: number,
): { input: SliceInput; outcome: SliceOutcome } {
  let first: { input: SliceInput; outcome: SliceOutcome } | null = null;
  for (const placement of placements) {
    const input = { slice, joint, placement };
    const outcome = measureSlice(input, fitSection(input, seed));
    if (outcome.found) return { input, outcome };
    first ??= { input, outcome };
  }
  if (!first) throw new RangeError("placements: expected at least one");
  return first;
}

/**
 * Measures every slice by itself, then looks again, with the help of the sections beside, at those that are covered,
 * contradicted or unsure.
 * @param placed where the joint is expected along the seam
 */
export function measureSlices(slices: Slices, joint: JointFaces, placed: SeamPlacement): SliceOutcome[] {
  const alone = Array.from({ length: slices.count }, (_, i) =>
    measuredAlone(sliceAt(slices, i), joint, placed(slices.at_mm[i]!), 7919 * (i + 1)),
  );
  const inputs = alone.map(({ input }) => input);
  return withoutLoners(
    lookedAtAgain(
      slices,
      inputs,
      alone.map(({ outcome }) => outcome),
    ),
  );
}
