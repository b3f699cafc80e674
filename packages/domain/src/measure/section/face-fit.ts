import { consensusLine } from "../fit/consensus-line.ts";
import { type FittedLine, type Line, offsetLine, robustLine } from "../fit/line-fit.ts";
import { selectKth } from "../fit/median.ts";
import type { Face } from "../joints/joint-faces.ts";

/** Points of one section: a stretch of the slices' arrays. */
export interface SectionSlice {
  readonly l_mm: Float64Array;
  readonly n_mm: Float64Array;
  readonly from: number;
  readonly to: number;
}

/** Where a face is looked for, in its own axes. */
export interface FaceSearch {
  /** Where it is expected. */
  readonly line: Line;
  /** Points this far from the expected line, square to it, are looked at, mm. */
  readonly band_mm: number;
  /** Stretch along the face, mm. */
  readonly from_mm: number;
  readonly to_mm: number;
  /** Seed of the consensus draws; absent: the expected line is near enough to begin with. */
  readonly seed?: number;
  /** Direction taken as known, from the sections beside: only the offset is fitted. */
  readonly known?: { readonly angle_rad: number; readonly u_rad: number };
}

/** Fewer points than this carry no face. */
export const FEWEST_POINTS = 8;

/** How far a plate may be turned against the model and still be taken for it, radians. */
const TURN_RAD = (14 * Math.PI) / 180;

/** Consensus band: about four standard deviations of a good sensor's noise, mm. */
const CONSENSUS_MM = 0.15;
const TRIALS = 48;

/** After consensus, points beyond this never count, mm. */
const FIT_BAND_MM = 0.5;

const room = { ts: new Float64Array(1024), ds: new Float64Array(1024) };

/** Copies the points near a place into the face's axes; returns how many. */
function gather(slice: SectionSlice, face: Face, search: FaceSearch): number {
  const size = slice.to - slice.from;
  if (room.ts.length < size) {
    room.ts = new Float64Array(2 * size);
    room.ds = new Float64Array(2 * size);
  }
  const { ts, ds } = room;
  const { l_mm, n_mm, to } = slice;
  const { from_mm, to_mm, band_mm, line } = search;
  const cos = Math.cos(face.direction_rad);
  const sin = Math.sin(face.direction_rad);
  const l0 = face.near[0];
  const n0 = face.near[1];
  const { t_mm, d_mm } = line;
  const slope = Math.tan(line.angle_rad);
  let count = 0;
  for (let i = slice.from; i < to; i++) {
    const l = l_mm[i]! - l0;
    const n = n_mm[i]! - n0;
    const t = l * cos + n * sin;
    if (t < from_mm || t > to_mm) continue;
    const d = n * cos - l * sin;
    if (Math.abs(d - d_mm - slope * (t - t_mm)) > band_mm) continue;
    ts[count] = t;
    ds[count] = d;
    count += 1;
  }
  return count;
}

/**
 * One face of a section: consensus among the points where it is expected, then orthogonal regression with Tukey's
 * weights.
 * @returns null where fewer than eight points carry it
 */
export function fitFace(slice: SectionSlice, face: Face, search: FaceSearch): FittedLine | null {
  const count = gather(slice, face, search);
  if (count < FEWEST_POINTS) return null;
  const points = { ts: room.ts, ds: room.ds, count };
  if (search.known) {
    const held = offsetLine(points, search.line, {
      band_mm: Math.min(FIT_BAND_MM, search.band_mm),
      ...search.known,
    });
    return held && held.inliers >= FEWEST_POINTS ? held : null;
  }
  let start: Line | null = search.line;
  if (search.seed !== undefined) {
    const found = consensusLine(room.ts, room.ds, count, {
      turn_rad: TURN_RAD,
      band_mm: CONSENSUS_MM,
      trials: TRIALS,
      seed: search.seed,
    });
    start = found?.line ?? null;
  }
  const fitted = start && robustLine(points, start, Math.min(FIT_BAND_MM, search.band_mm));
  if (!fitted || fitted.inliers < FEWEST_POINTS || Math.abs(fitted.angle_rad) > 1.5 * TURN_RAD) return null;
  return fitted;
}

/** Steps of a nearly ordered run that are put right one by one; a run that needs more is sorted. */
const FEW_MOVES = 8;

/**
 * Sorts places along a face. A scanner gives them nearly in order, forward or backward, so moving the few stray ones
 * is most often enough.
 */
function sortedRun(ts: Float64Array): Float64Array {
  const count = ts.length;
  if (count > 1 && ts[0]! > ts[count - 1]!) ts.reverse();
  let moves = FEW_MOVES * count;
  for (let i = 1; i < count; i++) {
    const t = ts[i]!;
    let k = i;
    for (; k > 0 && ts[k - 1]! > t; k--) ts[k] = ts[k - 1]!;
    ts[k] = t;
    moves -= i - k;
    if (moves < 0) return ts.sort();
  }
  return ts;
}

/** The median step of a growing run, the upper middle of an even count; 0 of a single place. */
function usualStep(ts: Float64Array): number {
  const { ds: steps } = room;
  const count = ts.length - 1;
  if (count < 1) return 0;
  for (let i = 0; i < count; i++) steps[i] = ts[i + 1]! - ts[i]!;
  return selectKth(steps, count, count >> 1);
}

/** Places of the points on a face, mm along it, in growing order. */
export function alongFace(slice: SectionSlice, face: Face, search: FaceSearch): Float64Array {
  return sortedRun(room.ts.slice(0, gather(slice, face, search)));
}

/** Where a face's points begin, seen from the root. */
export interface FaceEnd {
  /** First point that carries the face, mm along it. */
  readonly t_mm: number;
  /** Usual distance between its points there, mm. */
  readonly spacing_mm: number;
}

/** Points looked at to find the spacing. */
const END_POINTS = 6;

/**
 * The end of a face on its root side: the first of its points that others follow, stray ones left out.
 * @param line the fitted face; points within `band_mm` of it are its own
 * @param from_mm where to begin: past the points of a face that it meets
 */
export function faceEnd(
  slice: SectionSlice,
  face: Face,
  line: Line,
  { band_mm, from_mm }: { readonly band_mm: number; readonly from_mm: number },
): FaceEnd | null {
  const ts = alongFace(slice, face, { line, band_mm, from_mm, to_mm: face.length_mm + 8 });
  const count = ts.length;
  if (count < END_POINTS) return null;
  const spacing_mm = Math.max(1e-3, usualStep(ts));
  // A ghost or spike stands alone: the end is where four points follow within eight usual steps.
  for (let i = 0; i + 4 < count; i++)
    if (ts[i + 4]! - ts[i]! <= 8 * spacing_mm && ts[i + 1]! - ts[i]! <= 3 * spacing_mm)
      return { t_mm: ts[i]!, spacing_mm };
  return null;
}
