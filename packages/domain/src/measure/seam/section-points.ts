import type { ScanCloud } from "../scan-cloud.ts";
import type { SeamFrames } from "./seam-frames.ts";

/** A point farther than this from the nominal root, in the section, is none of the joint's. */
export const REACH_MM = 60;

/** How far past each open end points are kept, to see whether the joint runs on there. */
export const RUN_OFF_MM = 15;

/** The points of a scan near a seam, in the order of the scan. */
export interface SectionPoints {
  readonly count: number;
  /** Place along the seam, mm; below 0 and beyond the length where the scan runs past the ends of an open one. */
  readonly s_mm: Float64Array;
  /** Length of a closed seam, after which its places begin anew; 0 for an open one. */
  readonly period_mm: number;
  readonly l_mm: Float64Array;
  readonly n_mm: Float64Array;
  /** Profile of each point, or null for a plain cloud. */
  readonly profiles: Int32Array | null;
  /** Points of the scan that are near no place of the seam. */
  readonly outside: number;
}

type Finder = (x: number, y: number, z: number) => number;

/**
 * The station nearest to a point. Scans come profile by profile, so the station of the point before is tried
 * first; where that leads nowhere near, a few spread anchors are asked.
 */
function stationFinder(frames: SeamFrames): Finder {
  const { points_mm: p, tangents: t, count, closed } = frames;
  const every = Math.max(1, Math.round(Math.sqrt(count) / 1.5));
  const along = (i: number, x: number, y: number, z: number) =>
    (x - p[3 * i]!) * t[3 * i]! + (y - p[3 * i + 1]!) * t[3 * i + 1]! + (z - p[3 * i + 2]!) * t[3 * i + 2]!;
  const square = (i: number, x: number, y: number, z: number) =>
    (x - p[3 * i]!) ** 2 + (y - p[3 * i + 1]!) ** 2 + (z - p[3 * i + 2]!) ** 2;
  const downhill = (from: number, x: number, y: number, z: number) => {
    let best = from;
    let here = along(best, x, y, z);
    for (let step = 0; step < count; step++) {
      let next = here >= 0 ? best + 1 : best - 1;
      if (closed) next = (next + count) % count;
      if (next < 0 || next >= count) break;
      const there = along(next, x, y, z);
      if (Math.abs(there) >= Math.abs(here)) break;
      best = next;
      here = there;
    }
    return best;
  };
  let before = -1;
  return (x, y, z) => {
    if (before >= 0) {
      const near = downhill(before, x, y, z);
      if (square(near, x, y, z) < (REACH_MM * REACH_MM) / 4) {
        before = near;
        return near;
      }
    }
    let anchor = 0;
    for (let i = every; i < count; i += every) if (square(i, x, y, z) < square(anchor, x, y, z)) anchor = i;
    before = downhill(anchor, x, y, z);
    return before;
  };
}

/**
 * Moves a point from its station's frame to the frame of the curved line right under it, so that a bent seam reads
 * like a straight one: (ds, l, n) of a point on the nominal root line is (ds, 0, 0) for every ds. The line between
 * two stations is the cubic through both with their tangents.
 */
function unbend(frames: SeamFrames, i: number, at: Float64Array, x: number, y: number, z: number): void {
  const { points_mm: p, tangents: t, laterals: l, normals: m, count, closed } = frames;
  let j = at[0]! >= 0 ? i + 1 : i - 1;
  if (closed) j = (j + count) % count;
  if (j < 0 || j >= count) return;
  const toJ =
    (x - p[3 * j]!) * t[3 * j]! + (y - p[3 * j + 1]!) * t[3 * j + 1]! + (z - p[3 * j + 2]!) * t[3 * j + 2]!;
  const whole = Math.abs(at[0]!) + Math.abs(toJ);
  if (whole < 1e-9) return;
  const u = Math.abs(at[0]!) / whole;
  const chord = Math.hypot(
    p[3 * j]! - p[3 * i]!,
    p[3 * j + 1]! - p[3 * i + 1]!,
    p[3 * j + 2]! - p[3 * i + 2]!,
  );
  const span = at[0]! >= 0 ? chord : -chord;
  const ease = u * u * (3 - 2 * u);
  const bow = u * (1 - u);
  let lateral = 0;
  let normal = 0;
  for (let k = 0; k < 3; k++) {
    const pi = p[3 * i + k]!;
    const origin =
      pi + ease * (p[3 * j + k]! - pi) + span * bow * ((1 - u) * t[3 * i + k]! - u * t[3 * j + k]!);
    const off = (k === 0 ? x : k === 1 ? y : z) - origin;
    lateral += off * (l[3 * i + k]! + u * (l[3 * j + k]! - l[3 * i + k]!));
    normal += off * (m[3 * i + k]! + u * (m[3 * j + k]! - m[3 * i + k]!));
  }
  at[0] = u * span;
  // The mixed axes are shorter than one by (angle between frames)² / 8 at most: below 1e-4 of a millimetre here.
  at[1] = lateral;
  at[2] = normal;
}

/**
 * The points of a scan as (place along the seam, lateral, normal), mm; those farther than 60 mm from the nominal
 * root or more than 15 mm past an open end are left out.
 *
 * Cost: linear in the points.
 */
export function sectionPoints(frames: SeamFrames, cloud: ScanCloud): SectionPoints {
  const { count } = cloud;
  const { points_mm: p, tangents: t, laterals: l, normals: m, stations_mm } = frames;
  const find: Finder = frames.straight ? () => 0 : stationFinder(frames);
  const period_mm = frames.closed ? frames.length_mm : 0;
  const last_mm = frames.closed ? frames.length_mm : stations_mm[frames.count - 1]!;
  const s_mm = new Float64Array(count);
  const l_mm = new Float64Array(count);
  const n_mm = new Float64Array(count);
  const profiles = cloud.profiles ? new Int32Array(count) : null;
  const at = new Float64Array(3);
  let kept = 0;
  for (let k = 0; k < count; k++) {
    const x = cloud.xyz_mm[3 * k]!;
    const y = cloud.xyz_mm[3 * k + 1]!;
    const z = cloud.xyz_mm[3 * k + 2]!;
    const i = find(x, y, z);
    const dx = x - p[3 * i]!;
    const dy = y - p[3 * i + 1]!;
    const dz = z - p[3 * i + 2]!;
    at[0] = dx * t[3 * i]! + dy * t[3 * i + 1]! + dz * t[3 * i + 2]!;
    at[1] = dx * l[3 * i]! + dy * l[3 * i + 1]! + dz * l[3 * i + 2]!;
    at[2] = dx * m[3 * i]! + dy * m[3 * i + 1]! + dz * m[3 * i + 2]!;
    if (!(Math.abs(at[1]) <= REACH_MM && Math.abs(at[2]) <= REACH_MM)) continue;
    if (!frames.straight) unbend(frames, i, at, x, y, z);
    const along = stations_mm[i]! + at[0];
    const s = period_mm > 0 ? along - period_mm * Math.floor(along / period_mm) : along;
    if (!(s >= stations_mm[0]! - RUN_OFF_MM && s <= last_mm + RUN_OFF_MM)) continue;
    s_mm[kept] = s;
    l_mm[kept] = at[1];
    n_mm[kept] = at[2];
    if (profiles && cloud.profiles) profiles[kept] = cloud.profiles[k]!;
    kept += 1;
  }
  return {
    count: kept,
    period_mm,
    s_mm: s_mm.subarray(0, kept),
    l_mm: l_mm.subarray(0, kept),
    n_mm: n_mm.subarray(0, kept),
    profiles: profiles?.subarray(0, kept) ?? null,
    outside: count - kept,
  };
}
