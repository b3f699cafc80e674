import { consensusLine } from "../fit/consensus-line.ts";
import { type FittedLine, type Line, robustLine } from "../fit/line-fit.ts";
import { medianOf } from "../fit/median.ts";
import type { Face } from "../joints/joint-faces.ts";
import { faceEnd, fitFace, type SectionSlice } from "../section/face-fit.ts";
import { meetingAlong } from "../section/fit-section.ts";

type Point = readonly [x: number, z: number];

/** Two surfaces with an opening between them, seen in one profile; mm, in the profile's axes (z out of the steel). */
export interface Opening {
  /** Where the surfaces end: their last points that others follow. */
  readonly left_edge: Point;
  readonly right_edge: Point;
  /** From edge to edge. */
  readonly width_mm: number;
  /** From the floor to the middle of the two surfaces over it, square to the left one; null where no floor is seen. */
  readonly depth_mm: number | null;
  /** Height of the right surface over the left one in the opening's middle, along the left surface's normal. */
  readonly hi_lo_mm: number;
  /** Robust spread of the points about both surfaces. */
  readonly noise_mm: number;
  /** With slanting walls that are seen: a groove. Null for a slot, whose walls stand square or in the shadow. */
  readonly groove: Groove | null;
}

/** What slanting walls add. */
export interface Groove {
  readonly shoulders: readonly [left: Point, right: Point];
  readonly floor_corners: readonly [left: Point, right: Point];
  /** From shoulder to shoulder, and from floor corner to floor corner. */
  readonly opening_mm: number;
  readonly floor_width_mm: number;
  /** Angle between the walls. */
  readonly included_angle_deg: number;
}

/** A point this far under the surface lies in an opening, mm. */
const UNDER_MM = 1;

/** A point this near to the surface lies on it: standard deviations, and never less, mm. Two plates may differ by it. */
const ON_SIGMAS = 5;
const ON_MM = 0.6;

/** Fewer points than this under the surface are stray returns. */
const FEWEST_UNDER = 8;

/** So many points in a row on the surface end an opening. */
const BACK_ON = 4;

/** Surfaces are fitted over this much beside the opening: plates are flat so near, seldom beyond, mm. */
const SURFACE_MM = 15;

/** A surface lies this near to the line that most surfaces lie on, mm. */
const SURFACE_BAND_MM = 1;

/** Corners are rounded by the width of the laser line: points this near to one carry no face, mm. */
const CORNER_MM = 1;

/** A surface's edge is its last point within this of it, mm. */
const EDGE_BAND_MM = 0.5;

const TURN_RAD = (14 * Math.PI) / 180;
const BAND_MM = 0.15;
const TRIALS = 96;

/** The floor is looked for between its outermost points within this of its usual depth, and this far from it, mm. */
const FLOOR_ENDS_MM = 0.3;
const FLOOR_BAND_MM = 0.8;

/** Walls are read between these shares of the depth. */
const WALL_FROM = 0.15;
const WALL_TO = 0.85;

/** A wall with fewer points, or steeper than this, is not read as a face. */
const FEWEST_ON_WALL = 12;
const STEEPEST_RAD = (75 * Math.PI) / 180;

const distance = ([a, b]: Point, [c, d]: Point) => Math.hypot(c - a, d - b);

/** Points of a profile by growing x, those without a number left out. */
function ordered(x: Float64Array, z: Float64Array): SectionSlice {
  const order = Array.from(x.keys())
    .filter((i) => Number.isFinite(x[i]) && Number.isFinite(z[i]))
    .sort((a, b) => x[a]! - x[b]!);
  return {
    l_mm: Float64Array.from(order, (i) => x[i]!),
    n_mm: Float64Array.from(order, (i) => z[i]!),
    from: 0,
    to: order.length,
  };
}

/** The line that the surfaces on both sides of all openings lie on, by consensus. */
function surfaceLine({ l_mm, n_mm, to }: SectionSlice, seed: number): FittedLine | null {
  const found = consensusLine(l_mm, n_mm, to, { turn_rad: TURN_RAD, band_mm: BAND_MM, trials: TRIALS, seed });
  return found && robustLine({ ts: l_mm, ds: n_mm, count: to }, found.line, 0.5);
}

interface Stretch {
  /** Last point before and first point after the opening. */
  readonly before: number;
  readonly after: number;
  readonly under: readonly number[];
}

/** Stretches of the profile that lie under the surface, each between points on it. */
function stretches(heights: Float64Array, on_mm: number): Stretch[] {
  const found: Stretch[] = [];
  let [before, on] = [-1, 0];
  let under: number[] = [];
  heights.forEach((height, i) => {
    if (height < -UNDER_MM) {
      under.push(i);
      on = 0;
      return;
    }
    if (Math.abs(height) > on_mm) return;
    on += 1;
    if (under.length === 0) before = i;
    else if (on >= BACK_ON) {
      if (before >= 0 && under.length >= FEWEST_UNDER) found.push({ before, after: i - BACK_ON + 1, under });
      [before, under] = [i, []];
    }
  });
  return found;
}

function faceFrom(near: Point, far: Point): Face {
  const [l, n] = [far[0] - near[0], far[1] - near[1]];
  return {
    plate: "a",
    near,
    far,
    length_mm: Math.hypot(l, n),
    direction_rad: Math.atan2(n, l),
    forms_root: false,
    far_is_corner: false,
  };
}

interface Fitted {
  readonly face: Face;
  readonly fit: FittedLine;
}

const HERE: Line = { t_mm: 0, d_mm: 0, angle_rad: 0 };

/** A face through the points near the way from one place to another. */
function fitted(
  slice: SectionSlice,
  near: Point,
  far: Point,
  { band_mm, seed }: { band_mm: number; seed: number },
): Fitted | null {
  const face = faceFrom(near, far);
  const clear = Math.min(CORNER_MM, 0.15 * face.length_mm);
  const to_mm = face.length_mm - clear;
  const fit = fitFace(slice, face, { line: HERE, band_mm, from_mm: clear, to_mm, seed });
  return fit && { face, fit };
}

/** A place on a fitted face. */
function on({ face, fit }: Fitted, t_mm: number): Point {
  const d = fit.d_mm + (t_mm - fit.t_mm) * Math.tan(fit.angle_rad);
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  return [face.near[0] + t_mm * c - d * s, face.near[1] + t_mm * s + d * c];
}

/** Where two fitted faces meet; null where they are parallel. */
function corner(a: Fitted, b: Fitted): Point | null {
  const t_mm = meetingAlong(a.face, a.fit, b.face, b.fit);
  return t_mm === null ? null : on(a, t_mm);
}

const directionOf = ({ face, fit }: Fitted) => face.direction_rad + fit.angle_rad;

/** The wall between a shoulder and the floor, from its points between two shares of the depth. */
function wall(
  slice: SectionSlice,
  shoulder: Point,
  inside: readonly { readonly point: Point; readonly share: number }[],
  seed: number,
): Fitted | null {
  const own = inside.filter(({ share }) => share > WALL_FROM && share < WALL_TO);
  if (own.length < FEWEST_ON_WALL) return null;
  const lowest = own.reduce((low, one) => (one.share > low.share ? one : low));
  const { direction_rad } = faceFrom(shoulder, lowest.point);
  if (Math.abs(Math.sin(direction_rad)) > Math.sin(STEEPEST_RAD)) return null;
  return fitted(slice, shoulder, lowest.point, { band_mm: 1, seed });
}

function grooveOf(
  slice: SectionSlice,
  surfaces: readonly [Fitted, Fitted],
  floor: Fitted | null,
  walls: readonly [Fitted | null, Fitted | null],
): Groove | null {
  const [left, right] = walls;
  if (!floor || !left || !right) return null;
  const points = [
    corner(surfaces[0], left),
    corner(left, floor),
    corner(floor, right),
    corner(right, surfaces[1]),
  ];
  const [a, b, c, d] = points;
  if (!a || !b || !c || !d || slice.to === 0) return null;
  const turn = Math.abs(directionOf(left) - directionOf(right));
  return {
    shoulders: [a, d],
    floor_corners: [b, c],
    opening_mm: distance(a, d),
    floor_width_mm: distance(b, c),
    included_angle_deg: (Math.min(turn, 2 * Math.PI - turn) * 180) / Math.PI,
  };
}

/** Height of a point over a fitted surface's line, z outward. */
function over(surface: Fitted, [x, z]: Point): number {
  const angle = directionOf(surface);
  const [px, pz] = on(surface, surface.fit.t_mm);
  const sign = Math.cos(angle) >= 0 ? 1 : -1;
  return sign * ((z - pz) * Math.cos(angle) - (x - px) * Math.sin(angle));
}

/** The place of a surface right over a point, square to another surface. */
function heightAt(surface: Fitted, base: Fitted, under: Point): number {
  const angle = directionOf(base);
  const sign = Math.cos(angle) >= 0 ? 1 : -1;
  const normal: Point = [-sign * Math.sin(angle), sign * Math.cos(angle)];
  const ray: Fitted = { face: faceFrom(under, [under[0] + normal[0], under[1] + normal[1]]), fit: FLAT };
  const meeting = corner(surface, ray);
  return meeting ? over(base, meeting) : Number.NaN;
}

const FLAT: FittedLine = { ...HERE, scale_mm: 0, inliers: 0, weight: 0, spread_mm2: 0 };

/** The floor, taken to run along the surface before it is fitted: at its ends it may meet standing walls. */
function floorFrom(
  slice: SectionSlice,
  first: Point,
  last: Point,
  along: Point,
  seed: number,
): Fitted | null {
  const length_mm = (last[0] - first[0]) * along[0] + (last[1] - first[1]) * along[1];
  const far: Point = [first[0] + length_mm * along[0], first[1] + length_mm * along[1]];
  return fitted(slice, first, far, { band_mm: FLOOR_BAND_MM, seed });
}

function openingOf(slice: SectionSlice, line: FittedLine, stretch: Stretch, seed: number): Opening | null {
  const at = (i: number): Point => [slice.l_mm[i]!, slice.n_mm[i]!];
  const along: Point = [Math.cos(line.angle_rad), Math.sin(line.angle_rad)];
  // The last points on the surface may lie a little down the wall: the surface itself is the line's.
  const onto = (i: number): Point => {
    const [x, z] = at(i);
    const t = (x - line.t_mm) * along[0] + (z - line.d_mm) * along[1];
    return [line.t_mm + t * along[0], line.d_mm + t * along[1]];
  };
  const [before, after] = [onto(stretch.before), onto(stretch.after)];
  const surfaceFrom = (edge: Point, way: -1 | 1, own: number) =>
    fitted(slice, edge, [edge[0] + way * SURFACE_MM * along[0], edge[1] + way * SURFACE_MM * along[1]], {
      band_mm: SURFACE_BAND_MM,
      seed: seed + own,
    });
  const [left, right] = [surfaceFrom(before, -1, 1), surfaceFrom(after, 1, 2)];
  if (!left || !right) return null;
  const surfaces: [Fitted, Fitted] = [left, right];
  const edges = surfaces.map((surface) => {
    const end = faceEnd(slice, surface.face, surface.fit, { band_mm: EDGE_BAND_MM, from_mm: -2 });
    return end ? on(surface, end.t_mm) : surface.face.near;
  });
  const [left_edge = before, right_edge = after] = edges;
  const depths = stretch.under.map((i) => -over(left, at(i)));
  const sorted = [...depths].sort((a, b) => a - b);
  const deep = sorted[Math.floor(0.9 * (sorted.length - 1))] ?? 0;
  const depth = medianOf(depths.filter((one) => one > 0.75 * deep));
  const inside = stretch.under.map((i) => ({ point: at(i), share: -over(left, at(i)) / depth }));
  const low = inside.filter(({ share }) => Math.abs(share - 1) * depth < FLOOR_ENDS_MM);
  const [first, last] = [low[0]?.point, low.at(-1)?.point];
  const floor =
    first && last && low.length >= FEWEST_UNDER ? floorFrom(slice, first, last, along, seed + 3) : null;
  const middle: Point = [(left_edge[0] + right_edge[0]) / 2, (left_edge[1] + right_edge[1]) / 2];
  const half = (way: -1 | 1) => inside.filter(({ point }) => way * (point[0] - middle[0]) > 0);
  const walls = [
    wall(slice, left_edge, half(-1), seed + 4),
    wall(slice, right_edge, half(1), seed + 5),
  ] as const;
  const hi_lo_mm = heightAt(right, left, middle);
  return {
    left_edge,
    right_edge,
    width_mm: distance(left_edge, right_edge),
    depth_mm: floor ? hi_lo_mm / 2 - heightAt(floor, left, middle) : null,
    hi_lo_mm,
    noise_mm: Math.hypot(left.fit.scale_mm, right.fit.scale_mm) / Math.SQRT2,
    groove: grooveOf(slice, surfaces, floor, walls),
  };
}

/**
 * The openings across a profile of a scanner: the surfaces beside each are found by consensus and fitted as the faces
 * of a joint are; corners are where neighbouring faces meet, edges where a surface's points end. Lost returns and
 * spikes bend nothing.
 * @param x,z the profile in its own axes, mm, z growing out of the steel; not a number where a return was lost
 * @param seed of the consensus draws
 * @returns openings over 1 mm deep between two surfaces, from left to right
 */
export function openingsIn(x: Float64Array, z: Float64Array, seed = 1): Opening[] {
  const slice = ordered(x, z);
  const line = slice.to >= 2 * FEWEST_UNDER ? surfaceLine(slice, seed) : null;
  if (!line) return [];
  const [cos, sin] = [Math.cos(line.angle_rad), Math.sin(line.angle_rad)];
  const heights = slice.n_mm.map((n, i) => (n - line.d_mm) * cos - (slice.l_mm[i]! - line.t_mm) * sin);
  const on_mm = Math.max(ON_MM, ON_SIGMAS * line.scale_mm);
  return stretches(heights, on_mm).flatMap(
    (stretch, k) => openingOf(slice, line, stretch, seed + 10 * (k + 1)) ?? [],
  );
}
