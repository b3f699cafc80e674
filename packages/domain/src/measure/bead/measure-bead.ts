import type { SeamModel } from "../../schemas/seam-model.ts";
import { medianOf } from "../fit/median.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import { sliceAt } from "../seam/measure-slices.ts";
import { placeSeam } from "../seam/place-seam.ts";
import { lineFrames } from "../seam/seam-frames.ts";
import { sectionPoints } from "../seam/section-points.ts";
import { type Slices, slicesOf } from "../seam/slices.ts";
import type { BeadQuantity } from "./bead-geometry.ts";
import { type BeadJoint, beadJoint } from "./bead-joint.ts";
import { type BeadOutcome, measureBeadSection } from "./bead-section.ts";

/** A scan of a finished weld cut into slices, each measured by itself. */
export interface MeasuredBead {
  readonly bead: BeadJoint;
  readonly slices: Slices;
  readonly outcomes: readonly BeadOutcome[];
}

/** Sections to either side that say what one between them should be, within this of it, mm. */
const ABOUT = 4;
const REACH_MM = 10;

/** A section stands alone where a size differs this much from those about it, mm (and spreads, and uncertainties). */
const ALONE_MM = 0.6;
const ALONE_SPREADS = 6;
const ALONE_U = 4;

const COMPARED: readonly BeadQuantity[] = [
  "leg_a_mm",
  "leg_b_mm",
  "throat_mm",
  "throat_actual_mm",
  "convexity_mm",
  "width_mm",
  "excess_mm",
];

/** Sizes of the sections about one, of one kind. */
function sizesAbout(slices: Slices, outcomes: readonly BeadOutcome[], i: number, quantity: BeadQuantity) {
  const sizes: number[] = [];
  for (let k = Math.max(0, i - ABOUT); k <= Math.min(outcomes.length - 1, i + ABOUT); k++) {
    const one = outcomes[k];
    if (k === i || !one?.found || Math.abs(slices.at_mm[k]! - slices.at_mm[i]!) > REACH_MM) continue;
    const figure = one.section.figures[quantity];
    if (figure) sizes.push(figure.value);
  }
  return sizes;
}

function standsAlone(slices: Slices, outcomes: readonly BeadOutcome[], i: number): boolean {
  const outcome = outcomes[i];
  if (!outcome?.found) return false;
  return COMPARED.some((quantity) => {
    const figure = outcome.section.figures[quantity];
    const sizes = figure ? sizesAbout(slices, outcomes, i, quantity) : [];
    if (!figure || sizes.length < 4) return false;
    const usual = medianOf(sizes);
    const spread = 1.4826 * medianOf(sizes.map((size) => Math.abs(size - usual)));
    const allowed = Math.max(ALONE_MM, ALONE_SPREADS * spread, ALONE_U * figure.u);
    return Math.abs(figure.value - usual) > allowed;
  });
}

/** A section that those on both sides contradict is a ball of spatter or a reflection, no weld: it is said so. */
function withoutLoners(slices: Slices, outcomes: readonly BeadOutcome[]): BeadOutcome[] {
  return outcomes.map((outcome, i) =>
    standsAlone(slices, outcomes, i) ? { found: false, why: "ambiguous" } : outcome,
  );
}

/**
 * Cuts a scan of a finished weld into slices along the model's seam and measures the weld in each. Nothing is
 * smoothed along the weld: its ripple is real.
 * @param weld_size_mm nominal throat or thickness: how far from the root the parent faces are looked for
 */
export function measureBead(model: SeamModel, cloud: ScanCloud, weld_size_mm: number): MeasuredBead {
  const slices = slicesOf(sectionPoints(lineFrames(model), cloud));
  const bead = beadJoint(model, weld_size_mm);
  const placed = placeSeam(slices, bead.visible);
  const outcomes = Array.from({ length: slices.count }, (_, i): BeadOutcome => {
    const placements = placed?.(slices.at_mm[i]!) ?? [];
    let first: BeadOutcome = { found: false, why: "plate_a_not_found" };
    for (const [k, placement] of placements.entries()) {
      const outcome = measureBeadSection(sliceAt(slices, i), bead, placement, 7919 * (i + 1));
      if (outcome.found) return outcome;
      if (k === 0) first = outcome;
    }
    return first;
  });
  return { bead, slices, outcomes: withoutLoners(slices, outcomes) };
}
