import type { ScanCloud } from "../scan-cloud.ts";
import type { SeamFrames } from "./seam-frames.ts";

/** A point farther than this from the nominal root, in the section, is none of the joint's. */
export const REACH_MM = 60;

/** Points of a scan sorted by station, each in its station's section frame. */
export interface Sections {
  /** Points of station i are those from starts[i] to starts[i + 1]. Length stations + 1. */
  readonly starts: Int32Array;
  /** Lateral of each point, mm. */
  readonly l_mm: Float64Array;
  /** Normal of each point, mm. */
  readonly n_mm: Float64Array;
  /** Where along the seam each point lies, from its own station, mm. */
  readonly ds_mm: Float64Array;
  /** Points of the scan that lie in no section. */
  readonly outside: number;
}

/** Station nearest to a point: the nearest of a few spread anchors, then downhill along the line. */
function stationFinder(frames: SeamFrames): (x: number, y: number, z: number) => number {
  const { points_mm: p, tangents: t, count, closed } = frames;
  const every = Math.max(1, Math.round(Math.sqrt(count) / 1.5));
  const along = (i: number, x: number, y: number, z: number) =>
    (x - p[3 * i]!) * t[3 * i]! + (y - p[3 * i + 1]!) * t[3 * i + 1]! + (z - p[3 * i + 2]!) * t[3 * i + 2]!;
  return (x, y, z) => {
    let best = 0;
    let least = Number.POSITIVE_INFINITY;
    for (let i = 0; i < count; i += every) {
      const square = (x - p[3 * i]!) ** 2 + (y - p[3 * i + 1]!) ** 2 + (z - p[3 * i + 2]!) ** 2;
      if (square < least) {
        least = square;
        best = i;
      }
    }
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
}

/** On one straight line with even stations the station is a division. */
function straightFinder(frames: SeamFrames): ((x: number, y: number, z: number) => number) | null {
  const { points_mm: p, tangents: t, stations_mm: s, count } = frames;
  if (!frames.straight || count < 2) return null;
  const step = (s[count - 1]! - s[0]!) / (count - 1);
  for (let i = 0; i < count; i++) if (Math.abs(s[i]! - s[0]! - i * step) > 0.01 * step) return null;
  return (x, y, z) => {
    const along = (x - p[0]!) * t[0]! + (y - p[1]!) * t[1]! + (z - p[2]!) * t[2]!;
    return Math.max(0, Math.min(count - 1, Math.round(along / step)));
  };
}

/**
 * Moves a point from its station's frame to the frame of the curved line right under it, so that a bent seam reads
 * like a straight one: (ds, l, n) of a point on the nominal root line is (ds, 0, 0) for every ds.
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
 * Sorts the points of a scan to the stations of a seam, once, by their place along it.
 * @returns each station's points in (lateral, normal), mm; a point farther than half the spacing along the seam or
 * 60 mm from the nominal root is in no section
 *
 * Cost: linear in the points; on a curved seam times the square root of the stations.
 */
export function gatherSections(frames: SeamFrames, cloud: ScanCloud): Sections {
  const { count } = cloud;
  const { points_mm: p, tangents: t, laterals: l, normals: m, halves_mm } = frames;
  const find = straightFinder(frames) ?? stationFinder(frames);
  const station = new Int32Array(count);
  const local = new Float64Array(3 * count);
  const starts = new Int32Array(frames.count + 1);
  const at = new Float64Array(3);
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
    station[k] = -1;
    if (Math.abs(at[1]) > REACH_MM || Math.abs(at[2]) > REACH_MM) continue;
    if (!frames.straight) unbend(frames, i, at, x, y, z);
    if (Math.abs(at[0]) > halves_mm[i]! * 1.0001 + 1e-6) continue;
    station[k] = i;
    starts[i + 1]! += 1;
    local.set(at, 3 * k);
  }
  for (let i = 0; i < frames.count; i++) starts[i + 1]! += starts[i]!;
  return sorted(starts, station, local);
}

function sorted(starts: Int32Array, station: Int32Array, local: Float64Array): Sections {
  const inside = starts[starts.length - 1]!;
  const l_mm = new Float64Array(inside);
  const n_mm = new Float64Array(inside);
  const ds_mm = new Float64Array(inside);
  const next = starts.slice(0, -1);
  for (let k = 0; k < station.length; k++) {
    const i = station[k]!;
    if (i < 0) continue;
    const to = next[i]!;
    next[i] = to + 1;
    ds_mm[to] = local[3 * k]!;
    l_mm[to] = local[3 * k + 1]!;
    n_mm[to] = local[3 * k + 2]!;
  }
  return { starts, l_mm, n_mm, ds_mm, outside: station.length - inside };
}
