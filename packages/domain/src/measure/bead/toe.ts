import { distanceFrom, type FittedLine } from "../fit/line-fit.ts";
import { medianOf } from "../fit/median.ts";
import { type BeadProfile, onParent } from "./bead-frame.ts";
import { faceCurve, meetParent, SHARED_ERROR } from "./face-curve.ts";
import { putInOrder } from "./in-order.ts";
import type { ParentFace } from "./parent-faces.ts";
import { followers } from "./spikes.ts";

/** Where the metal of a weld ends on a parent face. */
export interface Toe {
  /** Along the parent face, mm. */
  readonly t_mm: number;
  readonly u_t_mm: number;
  /** In the section. */
  readonly at: readonly [l: number, n: number];
  /** Angle of air between the weld's face and the parent face, degrees: 180 where the one runs into the other. */
  readonly angle_deg: number;
  readonly u_angle_deg: number;
  /** Depth of the parent face's lowest place beside the toe, mm; 0 where none shows. */
  readonly undercut_mm: number;
  readonly u_undercut_mm: number;
  /** Towards a shallower one: a hidden part only makes it deeper. */
  readonly u_undercut_down_mm: number;
  /** From here on the parent face is as it was, mm along it. */
  readonly clear_mm: number;
}

/** The parent face is itself again where it is so for this far, mm. */
const SUSTAINED_MM = 1.2;
const SUSTAINED_SHARE = 0.85;

/** A point within this of a parent face lies on it: standard deviations, and never less, mm. */
const ON_FACE_SIGMAS = 3.2;
const ON_FACE_MM = 0.05;

/** Undercuts lie within this of the toe, mm. */
const UNDERCUT_REACH_MM = 4;

/** The weld's face at its toe is taken over this share of the leg, within these bounds, mm. */
const SLOPE_SHARE = 0.45;
const SLOPE_LEAST_MM = 1;
const SLOPE_MOST_MM = 4;

/** The weld's face meets its parent face within this of the last point that stands over it, mm. */
const MEETING_MM = 0.8;

/** A face that runs out flat shows no angle: it may be anything near 180 degrees. */
const UNSURE_DEG = 10;

/** Toes are rounded by the width of the laser line: no angle is known better, degrees. Found on simulated welds. */
const ROUNDED_DEG = 1;

const DEG = 180 / Math.PI;

/** A rounded corner is no undercut: points this near to the end of a face do not count, mm. */
const CORNER_MM = 0.7;

/** Deeper than this is the far side of an edge, no undercut, mm. */
const DEEPEST_MM = 3;

/** Undercuts less deep than this many standard uncertainties are not told from a flat face. */
const SHOWS = 2;

interface Across {
  /** Along the parent face, mm, growing outward. */
  readonly t: Float64Array;
  /** Over the parent face, mm. */
  readonly h: Float64Array;
  readonly count: number;
  /** Which points of the profile they are. */
  readonly index: Int32Array;
}

/**
 * The profile's points as one side sees them, from the middle of the weld outward along the parent face: in these
 * axes the weld's face, an undercut and the parent face lie one after the other.
 */
export function across(profile: BeadProfile, parent: ParentFace, which: 0 | 1): Across {
  const { near, direction_rad } = parent.side.face;
  const [c, s] = [Math.cos(direction_rad), Math.sin(direction_rad)];
  const [ts, hs] = [new Float64Array(profile.count), new Float64Array(profile.count)];
  const places = new Int32Array(profile.count);
  let all = 0;
  for (let i = 0; i < profile.count; i++) {
    if (which === 0 ? profile.u_mm[i]! > 0 : profile.u_mm[i]! < 0) continue;
    const [l, n] = [profile.l_mm[i]! - near[0], profile.n_mm[i]! - near[1]];
    ts[all] = l * c + n * s;
    hs[all] = parent.side.open * distanceFrom(parent.fit, ts[all]!, n * c - l * s);
    places[all] = i;
    all += 1;
  }
  putInOrder(ts, [hs, places], all);
  const follows = followers(ts, hs, all, parent.fit.scale_mm);
  let count = 0;
  for (let i = 0; i < all; i++) {
    if (follows[i] === 0) continue;
    ts[count] = ts[i]!;
    hs[count] = hs[i]!;
    places[count] = places[i]!;
    count += 1;
  }
  return { t: ts.subarray(0, count), h: hs.subarray(0, count), index: places.subarray(0, count), count };
}

/** The first point from the middle outward from which on the points lie on the parent face; -1 where they never do. */
function clearFrom({ t, h, count }: Across, on_mm: number, end_mm: number): number {
  for (let i = 0; i < count; i++) {
    if (Math.abs(h[i]!) > on_mm) continue;
    let [on, all] = [0, 0];
    for (let k = i; k < count && t[k]! <= t[i]! + SUSTAINED_MM && t[k]! <= end_mm; k++) {
      all += 1;
      if (Math.abs(h[k]!) <= on_mm) on += 1;
    }
    const isShort = t[i]! + SUSTAINED_MM > end_mm;
    if (all >= (isShort ? 3 : 4) && on >= SUSTAINED_SHARE * all) return i;
  }
  return -1;
}

/** Running median of three. */
function median3(values: Float64Array, i: number, count: number): number {
  const [a, b, c] = [values[Math.max(0, i - 1)]!, values[i]!, values[Math.min(count - 1, i + 1)]!];
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}

/** Where the weld's metal stops standing over the parent face: the last point before the clear face that does. */
function lastOver({ t, h, count }: Across, clear: number, on_mm: number): number {
  for (let i = clear; i >= 0 && t[i]! >= t[clear]! - UNDERCUT_REACH_MM; i--)
    if (median3(h, i, count) > on_mm) return i;
  return -1;
}

/** Standard uncertainty of a line's height at a place, mm. */
export function heightU({ scale_mm, weight, spread_mm2, t_mm }: FittedLine, at_mm: number): number {
  const square = 1 / Math.max(1, weight) + (at_mm - t_mm) ** 2 / Math.max(1e-6, spread_mm2);
  return SHARED_ERROR * scale_mm * Math.sqrt(square);
}

/** A hole in the returns wider than this hides a part of the undercut, mm. */
const HOLE_MM = 0.35;

/** A partly hidden undercut may be deeper than what is seen of it by about this share. Found on simulated welds. */
const HIDDEN_SHARE = 0.2;

/** The width of the laser line fills the bottom of an undercut by about this share. Found on simulated welds. */
const ROUNDED_SHARE = 0.05;

/**
 * The lowest place of the parent face between the toe and where it is clear. A steep undercut hides its far wall from
 * a scanner that looks along the face: the deepest return seen is told then, and that it may be deeper.
 */
function undercutOf(
  points: Across,
  { toe_mm, clear_mm, end_mm }: { toe_mm: number; clear_mm: number; end_mm: number },
  noise_mm: number,
) {
  const to_mm = Math.min(Math.max(clear_mm, toe_mm + 1) + 0.3, end_mm - CORNER_MM);
  let [lowest, isHidden] = [0, false];
  for (let i = 0; i < points.count; i++) {
    const t = points.t[i]!;
    if (t < toe_mm - 0.2 || t > to_mm) continue;
    const isAtHole = i + 1 < points.count && points.t[i + 1]! - t > HOLE_MM;
    const height = isAtHole ? points.h[i]! : median3(points.h, i, points.count);
    if (height >= lowest || height < -DEEPEST_MM) continue;
    [lowest, isHidden] = [height, isAtHole];
  }
  // A median of three knows 0.67 of what one value does not (normal noise).
  const u = 0.67 * SHARED_ERROR * noise_mm;
  const shows = -lowest > SHOWS * u;
  const depth = shows ? -lowest : 0;
  const u_down = Math.hypot(u, depth * ROUNDED_SHARE);
  return { undercut_mm: depth, u: isHidden ? Math.hypot(u, depth * HIDDEN_SHARE) : u_down, u_down };
}

/**
 * The toe of a weld on one parent face: where a line through the weld's face beside it meets the parent face. Beside
 * it the parent face may lie lower than it should: the undercut.
 * @returns null where the parent face is never reached, or the weld's face beside the toe is not seen
 */
export function toeOn(profile: BeadProfile, parent: ParentFace, which: 0 | 1): Toe | null {
  const noise_mm = parent.fit.scale_mm;
  const points = across(profile, parent, which);
  const on_mm = Math.max(ON_FACE_MM, ON_FACE_SIGMAS * noise_mm);
  const clear = clearFrom(points, on_mm, parent.end_mm);
  const isCovered = clear < 0 && Number.isFinite(parent.end_mm);
  if (clear < 0 && !isCovered) return null;
  if (isCovered) return toeAtCorner(points, parent, noise_mm);
  const clear_mm = points.t[clear]!;
  const over = lastOver(points, clear, on_mm);
  const begin_mm = points.t[0]!;
  const last = over < 0 ? clear : over;
  const length_mm = Math.min(
    SLOPE_MOST_MM,
    Math.max(SLOPE_LEAST_MM, SLOPE_SHARE * (points.t[last]! - begin_mm)),
  );
  let first = last;
  while (first > 0 && points.t[first - 1]! > points.t[last]! - length_mm) first -= 1;
  const curve = faceCurve(points.t.slice(first, last + 1), points.h.slice(first, last + 1));
  const meeting = curve && meetParent(curve, points.t[last]!, MEETING_MM);
  // A face that runs out flat has its toe where it can no longer be told from the parent face.
  const t_mm = meeting?.t_mm ?? points.t[last]!;
  const u_height = Math.hypot(heightU(parent.fit, t_mm), meeting?.u_mm ?? noise_mm);
  const lean = Math.max(0.15, Math.sin(meeting?.lean_rad ?? 0));
  const { undercut_mm, u, u_down } = undercutOf(
    points,
    { toe_mm: t_mm, clear_mm, end_mm: parent.end_mm },
    noise_mm,
  );
  return {
    t_mm,
    u_t_mm: Math.hypot(u_height / lean, profile.spacing_mm / Math.sqrt(12)),
    at: onParent(parent, t_mm),
    angle_deg: meeting ? Math.min(180, 180 - meeting.lean_rad * DEG) : 180,
    u_angle_deg: meeting ? Math.hypot(meeting.u_lean_rad * DEG, ROUNDED_DEG) : UNSURE_DEG,
    undercut_mm: over < 0 ? 0 : undercut_mm,
    u_undercut_mm: Math.hypot(u, heightU(parent.fit, t_mm)),
    u_undercut_down_mm: Math.hypot(u_down, heightU(parent.fit, t_mm)),
    clear_mm,
  };
}

/** The weld covers its face up to the corner: its toe is the corner, and nothing shows how it meets the face. */
function toeAtCorner(points: Across, parent: ParentFace, noise_mm: number): Toe | null {
  if (points.count < 8) return null;
  const reached = medianOf(points.h.subarray(Math.max(0, points.count - 5), points.count));
  if (!Number.isFinite(reached)) return null;
  return {
    t_mm: parent.end_mm,
    u_t_mm: Math.max(0.1, 2 * noise_mm),
    at: onParent(parent, parent.end_mm),
    angle_deg: Number.NaN,
    u_angle_deg: Number.NaN,
    undercut_mm: 0,
    u_undercut_mm: Number.NaN,
    u_undercut_down_mm: Number.NaN,
    clear_mm: parent.end_mm,
  };
}
