import { medianOf } from "../fit/median.ts";
import type { JointFaces } from "../joints/joint-faces.ts";
import { type Placed, placeSection, supportFields } from "../section/place-section.ts";
import type { Placement } from "../section/placement.ts";
import type { Slices } from "./slices.ts";

/** Places along the seam where the joint is looked for from nothing: one in 25 mm, within these bounds. */
const APART_MM = 25;
const FEWEST_PLACES = 5;
const MOST_PLACES = 12;

/** A place that explains less of the points than this is no find. */
const LEAST_SUPPORT = 0.3;

/** A find this far from the finds beside it is left out, mm. */
const ODD_MM = 3;

const FEWEST_POINTS = 24;

/** Where the joint was found at one place along the seam. */
interface Find extends Placed {
  readonly at_mm: number;
}

function chosen(slices: Slices): number[] {
  const usable = Array.from({ length: slices.count }, (_, i) => i).filter(
    (i) => slices.starts[i + 1]! - slices.starts[i]! >= FEWEST_POINTS,
  );
  const length_mm = (slices.at_mm[slices.count - 1] ?? 0) - (slices.at_mm[0] ?? 0);
  const count = Math.min(
    usable.length,
    Math.max(FEWEST_PLACES, Math.min(MOST_PLACES, Math.round(length_mm / APART_MM))),
  );
  return Array.from({ length: count }, (_, k) => usable[Math.floor(((k + 0.5) * usable.length) / count)]!);
}

/** Slices to each side whose points help to place a butt joint, no further along than this, mm. */
const POOLED_SLICES = 3;
const POOLED_MM = 6;

/** The points that place a slice: its own, and for a butt joint its neighbours', whose lost returns lie elsewhere. */
function pooled(slices: Slices, joint: JointFaces, i: number): { from: number; to: number } {
  let [first, last] = [i, i];
  if (joint.kind === "butt") {
    const isNear = (k: number) => Math.abs(slices.at_mm[k]! - slices.at_mm[i]!) <= POOLED_MM;
    while (first > 0 && i - first < POOLED_SLICES && isNear(first - 1)) first -= 1;
    while (last < slices.count - 1 && last - i < POOLED_SLICES && isNear(last + 1)) last += 1;
  }
  return { from: slices.starts[first]!, to: slices.starts[last + 1]! };
}

/** Finds that agree with those beside them. */
function agreed(finds: readonly Find[]): Find[] {
  if (finds.length < 4) return [...finds];
  return finds.filter((find, i) => {
    const around = finds.slice(Math.max(0, i - 2), i + 3);
    const l = medianOf(around.map((one) => one.l_mm));
    const n = medianOf(around.map((one) => one.n_mm));
    return Math.abs(find.l_mm - l) <= ODD_MM && Math.abs(find.n_mm - n) <= ODD_MM;
  });
}

/**
 * Placements to try at a place along the seam, likeliest first: between the finds on both sides, then as at the one
 * before and as at the one after, for where the joint steps between them.
 */
export type SeamPlacement = (at_mm: number) => readonly Placement[];

/**
 * Where the joint lies along the whole seam, found at a few places.
 * @returns null where the joint is found nowhere
 */
export function placeSeam(slices: Slices, joint: JointFaces): SeamPlacement | null {
  const fields = supportFields(joint);
  const finds: Find[] = [];
  for (const i of chosen(slices)) {
    const slice = { l_mm: slices.l_mm, n_mm: slices.n_mm, ...pooled(slices, joint, i) };
    const find = { ...placeSection(slice, fields, finds.at(-1) ?? null), at_mm: slices.at_mm[i]! };
    if (find.support >= LEAST_SUPPORT) finds.push(find);
  }
  const places = agreed(finds);
  return places.length === 0 ? null : (at_mm) => tried(places, at_mm);
}

function tried(places: readonly Find[], at_mm: number): Placement[] {
  let k = 0;
  while (k < places.length - 2 && places[k + 1]!.at_mm < at_mm) k += 1;
  const a = places[k]!;
  const b = places[Math.min(k + 1, places.length - 1)]!;
  const run = b.at_mm - a.at_mm;
  const share = run > 0 ? Math.max(0, Math.min(1, (at_mm - a.at_mm) / run)) : 0;
  const mix = (from: number, to: number) => from + share * (to - from);
  const middle = {
    l_mm: mix(a.l_mm, b.l_mm),
    n_mm: mix(a.n_mm, b.n_mm),
    turn_rad: mix(a.turn_rad, b.turn_rad),
  };
  const isStep = Math.hypot(b.l_mm - a.l_mm, b.n_mm - a.n_mm) > STEP_MM;
  return isStep ? [middle, a, b] : [middle];
}

/** Finds that differ by more than this may have a step between them, mm. */
const STEP_MM = 0.8;
