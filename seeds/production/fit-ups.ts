import type { SeamDesign } from "../design/product.ts";
import type { Random } from "../random.ts";
import { type BlindStretch, type Course, type FitUp, level, type Tack } from "../simulate/fit-up.ts";
import type { PartPose } from "../simulate/scan-seam.ts";
import type { Misfit } from "./part-plan.ts";

/** How a joint is meant to stand: near its model, off it so that the path must follow, or not fit to weld. */
export type Fit = "near" | "off" | Misfit;

/** Of a hundred joints that nothing is said about, this many stand off their model. */
const OFF_SHARE = 0.27;

/** The fit of a joint that no story is told about. */
export function commonFit(random: Random): "near" | "off" {
  return random.chance(OFF_SHARE) ? "off" : "near";
}

const limited = (value: number, most: number): number => Math.min(most, Math.max(-most, value));

function smallCourse(random: Random, spread: number): Course {
  const middle = limited(spread * random.normal(), 1.6 * spread);
  const lean = limited(0.6 * spread * random.normal(), spread);
  return { start: middle - lean, end: middle + lean, bow: limited(0.5 * spread * random.normal(), spread) };
}

function tacksOf({ line, plate_a_mm }: SeamDesign, random: Random): Tack[] {
  const count = Math.max(1, Math.round(line.length_mm / 150));
  return Array.from({ length: count }, (_, i) => ({
    at_mm: (line.length_mm * (i + 0.5)) / count + random.either(4, 18),
    half_mm: random.between(5, 9),
    leg_mm: Math.min(plate_a_mm / 3, random.between(2.4, 3.6)),
  }));
}

/** A joint as a good fitter leaves it. */
function nearFit(seam: SeamDesign, random: Random): FitUp {
  const butt = seam.joint === "butt_v";
  const gap = butt
    ? smallCourse(random, 0.14)
    : { ...level(random.between(0, 0.14)), end: random.between(0, 0.2) };
  return {
    lateral_mm: smallCourse(random, 0.16),
    normal_mm: smallCourse(random, 0.1),
    gap_mm: { ...gap, start: gap.start + seam.gap_mm, end: gap.end + seam.gap_mm },
    mismatch_mm: butt ? smallCourse(random, 0.14) : level(0),
    turn_a_deg: smallCourse(random, 0.25),
    turn_b_deg: smallCourse(random, 0.35),
    tacks: tacksOf(seam, random),
    blind: [],
    spatter: random.between(0, 2.5),
  };
}

const OFF_WAYS = ["leaning", "leaning", "shifted", "shifted", "bowed", "raised", "gaping"] as const;

/** A joint whose path must follow: inside what its limits allow for that. */
function offFit(near: FitUp, random: Random): FitUp {
  const { lateral_mm, normal_mm, gap_mm } = near;
  switch (random.pick(OFF_WAYS)) {
    case "leaning":
      return { ...near, lateral_mm: { ...lateral_mm, end: lateral_mm.end + random.either(1.3, 2.2) } };
    case "shifted":
      return { ...near, lateral_mm: shiftedBy(lateral_mm, random.either(1.15, 2.1)) };
    case "bowed":
      return { ...near, lateral_mm: { ...lateral_mm, bow: random.either(1.2, 2.1) } };
    case "raised":
      return { ...near, normal_mm: shiftedBy(normal_mm, random.either(1.05, 1.4)) };
    case "gaping":
      return { ...near, gap_mm: { ...gap_mm, bump: bump(random, random.between(0.85, 0.95)) } };
  }
}

function shiftedBy(course: Course, by: number): Course {
  return { ...course, start: course.start + by, end: course.end + by };
}

function bump(random: Random, height: number) {
  return { at: random.between(0.25, 0.75), width: random.between(0.08, 0.13), height };
}

function blindStretch(length_mm: number, random: Random): BlindStretch {
  const from_mm = random.between(0.2, 0.5) * length_mm;
  return { from_mm, to_mm: from_mm + Math.min(0.4 * length_mm, random.between(48, 80)) };
}

function misfit(kind: Misfit, near: FitUp, seam: SeamDesign, random: Random): FitUp {
  switch (kind) {
    case "gap":
      return { ...near, gap_mm: { ...near.gap_mm, bump: bump(random, random.between(2.2, 3)) } };
    case "offset":
      return { ...near, lateral_mm: { ...near.lateral_mm, end: random.either(3.6, 4.6) } };
    case "mismatch":
      return {
        ...near,
        mismatch_mm: { start: random.between(0.6, 1), end: random.between(2.1, 2.7), bow: 0 },
      };
    case "blind":
      return { ...near, blind: [blindStretch(seam.line.length_mm, random)] };
  }
}

/** How a joint stands, for a fit that is asked for. */
export function fitUpFor(seam: SeamDesign, fit: Fit, random: Random): FitUp {
  const near = nearFit(seam, random);
  if (fit === "near") return near;
  return fit === "off" ? offFit(near, random) : misfit(fit, near, seam, random);
}

/** How a part stands in its fixture. */
export function partPose(random: Random): PartPose {
  return {
    move_mm: [0.1 * random.normal(), 0.1 * random.normal(), 0.06 * random.normal()],
    turn_deg: limited(0.004 * random.normal(), 0.01),
    about_mm: [500, 300],
  };
}
