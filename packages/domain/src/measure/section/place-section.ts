import type { JointFaces } from "../joints/joint-faces.ts";
import type { SectionSlice } from "./face-fit.ts";
import type { Placement } from "./placement.ts";

/** How far the real joint is looked for from the nominal one, mm. */
export const SEARCH_MM = 16;
const STEP_MM = 1.6;
const TURNS_RAD = [0, -3, 3, -6, 6].map((deg) => (deg * Math.PI) / 180);

/** A point this far from every face speaks for none, mm: wide for the first search's steps, then near. */
const WIDE_MM = 2.4;
const NEAR_MM = 1.2;

/** The field of distances to the nominal faces. */
const HALF_FIELD_MM = 48;
const CELL_MM = 0.25;
const CELLS = Math.round((2 * HALF_FIELD_MM) / CELL_MM);

/** Points asked in each trial; more where only an opening of a few points tells the place. */
const ASKED = 64;
const ASKED_BUTT = 256;

/** What a point in the open groove of a butt joint counts against a place. */
const AGAINST = -1;

/** Of places that explain the points alike, the nearest to the model is taken. */
const NEARER = 4e-4;

/** Support of a point by how far it is from the nominal joint: 1 on a face, 0 beyond a tolerance. */
type Field = Float32Array;

/** The fields of a joint, made once for a scan. */
export interface SupportFields {
  readonly wide: Field;
  readonly near: Field;
  /** How many points a trial asks. */
  readonly asked: number;
  /** Support at which a place beside the last find is believed. */
  readonly believed: number;
}

/** Rows of the drawing as segments. */
function segmentsOf(joint: JointFaces): number[][] {
  const { plate_a, plate_b } = joint.profile;
  return [plate_a, plate_b].flatMap((points) =>
    points.slice(1).map((to, i) => [points[i]?.[0] ?? 0, points[i]?.[1] ?? 0, to[0], to[1]]),
  );
}

function squareToSegment(l: number, n: number, [l0 = 0, n0 = 0, l1 = 0, n1 = 0]: readonly number[]): number {
  const [dl, dn] = [l1 - l0, n1 - n0];
  const whole = dl * dl + dn * dn;
  const share = whole > 0 ? Math.max(0, Math.min(1, ((l - l0) * dl + (n - n0) * dn) / whole)) : 0;
  return (l - l0 - share * dl) ** 2 + (n - n0 - share * dn) ** 2;
}

/** The support fields of a joint. */
export function supportFields(joint: JointFaces): SupportFields {
  const isButt = joint.kind === "butt";
  return {
    wide: fieldOf(joint, WIDE_MM),
    near: fieldOf(joint, NEAR_MM),
    asked: isButt ? ASKED_BUTT : ASKED,
    believed: isButt ? BELIEVED_BUTT : BELIEVED,
  };
}

/** Only cells near a face are written. */
function fieldOf(joint: JointFaces, tolerance_mm: number): Field {
  const field = new Float32Array(CELLS * CELLS);
  const cell = (mm: number) => Math.floor((mm + HALF_FIELD_MM) / CELL_MM);
  const clamp = (i: number) => Math.max(0, Math.min(CELLS - 1, i));
  for (const segment of segmentsOf(joint)) {
    const [l0 = 0, n0 = 0, l1 = 0, n1 = 0] = segment;
    const [left, right] = [Math.min(l0, l1) - tolerance_mm, Math.max(l0, l1) + tolerance_mm];
    const [low, high] = [Math.min(n0, n1) - tolerance_mm, Math.max(n0, n1) + tolerance_mm];
    for (let i = clamp(cell(low)); i <= clamp(cell(high)); i++) {
      const n = (i + 0.5) * CELL_MM - HALF_FIELD_MM;
      for (let j = clamp(cell(left)); j <= clamp(cell(right)); j++) {
        const l = (j + 0.5) * CELL_MM - HALF_FIELD_MM;
        const support = 1 - squareToSegment(l, n, segment) / (tolerance_mm * tolerance_mm);
        const at = i * CELLS + j;
        if (support > field[at]!) field[at] = support;
      }
    }
  }
  if (joint.kind === "butt") markOpening(field, joint);
  return field;
}

/** Between the plates of a butt joint there is no steel: surfaces that slide along themselves are held by that. */
function markOpening(field: Field, joint: JointFaces): void {
  const [a, b] = joint.faces;
  if (!a || !b) return;
  const depth = Math.max(...joint.depth_mm);
  const sides = [a, b].map((face, side) => {
    const isEdge = joint.form[side as 0 | 1] === "edge";
    const slope = isEdge ? 0 : Math.cos(face.direction_rad) / Math.max(0.2, Math.sin(face.direction_rad));
    const at = isEdge ? face.near[0] : face.near[0] - face.near[1] * slope;
    return { at, slope };
  });
  const [left, right] = sides;
  if (!left || !right) return;
  for (let i = 0; i < CELLS; i++) {
    const n = (i + 0.5) * CELL_MM - HALF_FIELD_MM;
    if (n > depth + OPEN_ABOVE_MM || n < -OPEN_BELOW_MM) continue;
    const height = Math.max(0, Math.min(n, depth));
    const from = left.at + height * left.slope + CLEAR_MM;
    const to = right.at + height * right.slope - CLEAR_MM;
    for (let j = 0; j < CELLS; j++) {
      const l = (j + 0.5) * CELL_MM - HALF_FIELD_MM;
      if (l > from && l < to) field[i * CELLS + j] = AGAINST;
    }
  }
}

/** The opening reaches a little above the surfaces and below the root, and keeps clear of the edges' own noise, mm. */
const OPEN_ABOVE_MM = 1;
const OPEN_BELOW_MM = 4;
const CLEAR_MM = 0.35;

interface Asked {
  readonly l: Float64Array;
  readonly n: Float64Array;
  readonly count: number;
}

function supportAt(field: Field, asked: Asked, l_mm: number, n_mm: number): number {
  let sum = 0;
  for (let k = 0; k < asked.count; k++) {
    const j = Math.floor((asked.l[k]! - l_mm + HALF_FIELD_MM) / CELL_MM);
    const i = Math.floor((asked.n[k]! - n_mm + HALF_FIELD_MM) / CELL_MM);
    if (i >= 0 && j >= 0 && i < CELLS && j < CELLS) sum += field[i * CELLS + j]!;
  }
  return sum / asked.count - NEARER * (Math.abs(l_mm) + Math.abs(n_mm));
}

/** Some of the section's points, turned back. */
function asked(slice: SectionSlice, turn_rad: number, most: number): Asked {
  const size = slice.to - slice.from;
  const count = Math.min(most, size);
  const [cos, sin] = [Math.cos(-turn_rad), Math.sin(-turn_rad)];
  const l = new Float64Array(count);
  const n = new Float64Array(count);
  for (let k = 0; k < count; k++) {
    const i = slice.from + Math.floor(((k + 0.5) * size) / count);
    l[k] = slice.l_mm[i]! * cos - slice.n_mm[i]! * sin;
    n[k] = slice.l_mm[i]! * sin + slice.n_mm[i]! * cos;
  }
  return { l, n, count };
}

/** A placement and how well it explains the points, 0 to 1. */
export interface Placed extends Placement {
  readonly support: number;
}

/** A place that explains this share of the points is believed without a search of all others. */
const BELIEVED = 0.75;
const BELIEVED_BUTT = 0.9;

interface Trial {
  readonly l: number;
  readonly n: number;
  readonly support: number;
}

/** Halves the step about a place until it is a tenth of a millimetre. */
function refined(field: Field, points: Asked, from: Trial, step_mm: number): Trial {
  let here = { ...from, support: supportAt(field, points, from.l, from.n) };
  for (let step = step_mm; step > 0.1; step /= 2) {
    const { l, n } = here;
    for (const dl of [-step, 0, step])
      for (const dn of [-step, 0, step]) {
        const support = supportAt(field, points, l + dl, n + dn);
        if (support > here.support) here = { l: l + dl, n: n + dn, support };
      }
  }
  return here;
}

/** The best place on the whole grid, for one turn. */
function searched(fields: SupportFields, points: Asked): Trial {
  const reach = Math.round(SEARCH_MM / STEP_MM);
  let here: Trial = { l: 0, n: 0, support: Number.NEGATIVE_INFINITY };
  for (let i = -reach; i <= reach; i++)
    for (let j = -reach; j <= reach; j++) {
      const support = supportAt(fields.wide, points, j * STEP_MM, i * STEP_MM);
      if (support > here.support) here = { l: j * STEP_MM, n: i * STEP_MM, support };
    }
  return refined(fields.near, points, here, STEP_MM / 2);
}

/** The shift is found in the turned-back section: turned again it is the placement's own. */
function placedBack(here: Trial, turn_rad: number): Placed {
  const [cos, sin] = [Math.cos(turn_rad), Math.sin(turn_rad)];
  return {
    l_mm: here.l * cos - here.n * sin,
    n_mm: here.l * sin + here.n * cos,
    turn_rad,
    support: here.support,
  };
}

/** A placement's shift as it is found in the section turned back by another turn. */
function turnedBack({ l_mm, n_mm }: Placement, turn_rad: number): Trial {
  const [cos, sin] = [Math.cos(turn_rad), Math.sin(turn_rad)];
  return { l: l_mm * cos + n_mm * sin, n: n_mm * cos - l_mm * sin, support: 0 };
}

/**
 * Finds where the joint lies in a section by trying the nominal faces on a grid of places and turns, then halving
 * the step. Returns the place with the most support; its accuracy is a few tenths of a millimetre.
 * @param near a place that held a little way along the seam: if it still explains the points, nothing else is tried
 */
export function placeSection(slice: SectionSlice, fields: SupportFields, near: Placement | null): Placed {
  let best: Placed = { l_mm: 0, n_mm: 0, turn_rad: 0, support: Number.NEGATIVE_INFINITY };
  const take = (trial: Trial, turn_rad: number) => {
    if (trial.support > best.support + 1e-9) best = placedBack(trial, turn_rad);
  };
  const turns = TURNS_RAD.map((turn_rad) => ({ turn_rad, points: asked(slice, turn_rad, fields.asked) }));
  if (near)
    for (const { turn_rad, points } of turns)
      take(refined(fields.near, points, turnedBack(near, turn_rad), STEP_MM / 2), turn_rad);
  if (best.support >= fields.believed) return best;
  for (const { turn_rad, points } of turns) take(searched(fields, points), turn_rad);
  return best;
}
