import type { ScanResult, StationResult } from "../../schemas/scan-result.ts";
import { medianOf } from "../fit/median.ts";
import type { SeamFrames } from "../seam/seam-frames.ts";
import {
  cross,
  dot,
  type Matrix,
  minus,
  plus,
  product,
  rotationOf,
  times,
  turned,
  type Vector,
  vectorOf,
} from "./rotation.ts";
import { solveDetermined } from "./symmetric-solve.ts";

const DEG = 180 / Math.PI;
const ROUNDS = 12;

/**
 * Smallest share of the best-determined motion's weight at which a motion counts as determined. Turns are scaled with
 * the seam's half length, so a share of 1e-4 is a hundredth of that motion's sharpness.
 */
const DETERMINED = 1e-4;

/** A rigid motion of the seam about its midpoint: p goes to R (p - c) + c + t. */
export interface RigidMotion {
  readonly rotation: Matrix;
  readonly translation_mm: Vector;
  readonly centre_mm: Vector;
}

const at = (flat: Float64Array, i: number): Vector => [flat[3 * i]!, flat[3 * i + 1]!, flat[3 * i + 2]!];

/** Midpoint of the nominal line's ends, or of all stations for a closed seam. */
function centreOf(frames: SeamFrames): Vector {
  const last = frames.count - 1;
  if (!frames.closed) return at(frames.points_mm, Math.round(last / 2));
  let sum: Vector = [0, 0, 0];
  for (let i = 0; i < frames.count; i++) sum = plus(sum, at(frames.points_mm, i));
  return times(sum, 1 / frames.count);
}

interface Sights {
  readonly nominal: readonly Vector[];
  readonly tangents: readonly Vector[];
  readonly roots: readonly Vector[];
}

function sightsOf(stations: readonly StationResult[], frames: SeamFrames): Sights {
  const seen = stations.flatMap((station, i) => (station.root_mm ? [{ i, root: station.root_mm }] : []));
  return {
    nominal: seen.map(({ i }) => at(frames.points_mm, i)),
    tangents: seen.map(({ i }) => at(frames.tangents, i)),
    roots: seen.map(({ root }) => root),
  };
}

/** One Gauss-Newton step: what is left of each root's way to the moved line, square to it. */
function step({ nominal, tangents, roots }: Sights, motion: RigidMotion, scale_mm: number) {
  const matrix = Array.from({ length: 6 }, () => new Array<number>(6).fill(0));
  const right = new Array<number>(6).fill(0);
  nominal.forEach((point, i) => {
    const arm = turned(motion.rotation, minus(point, motion.centre_mm));
    const tangent = turned(motion.rotation, tangents[i]!);
    const off = minus(roots[i]!, plus(plus(arm, motion.centre_mm), motion.translation_mm));
    const off_square = minus(off, times(tangent, dot(off, tangent)));
    const axes: Vector[] = [
      [1, 0, 0],
      [0, 1, 0],
      [0, 0, 1],
    ];
    const columns = [...axes.map((axis) => times(cross(axis, arm), 1 / scale_mm)), ...axes].map((column) =>
      minus(column, times(tangent, dot(column, tangent))),
    );
    for (let p = 0; p < 6; p++) {
      right[p]! += dot(columns[p]!, off_square);
      for (let q = 0; q < 6; q++) matrix[p]![q]! += dot(columns[p]!, columns[q]!);
    }
  });
  return solveDetermined(matrix, right, DETERMINED);
}

interface Found {
  readonly motion: RigidMotion;
  readonly free: readonly (readonly number[])[];
}

function bestMotion(sights: Sights, centre_mm: Vector): Found {
  const spread = sights.nominal.reduce((sum, p) => sum + dot(minus(p, centre_mm), minus(p, centre_mm)), 0);
  const scale_mm = Math.max(1e-6, Math.sqrt(spread / sights.nominal.length));
  let motion: RigidMotion = { rotation: rotationOf([0, 0, 0]), translation_mm: [0, 0, 0], centre_mm };
  let free: readonly (readonly number[])[] = [];
  for (let round = 0; round < ROUNDS; round++) {
    const solution = step(sights, motion, scale_mm);
    free = solution.free;
    const [a = 0, b = 0, c = 0, x = 0, y = 0, z = 0] = solution.x;
    const turn: Vector = [a / scale_mm, b / scale_mm, c / scale_mm];
    motion = {
      centre_mm,
      rotation: product(rotationOf(turn), motion.rotation),
      translation_mm: plus(motion.translation_mm, [x, y, z]),
    };
    if (Math.hypot(...solution.x) < 1e-10) break;
  }
  return { motion, free };
}

/** What of a motion the roots cannot show: sliding along the seam, and the turn about a straight seam. */
function unseen(free: Found["free"]): ScanResult["rigid"]["unobservable"] {
  const names: ScanResult["rigid"]["unobservable"] = [];
  const turns = free.some((d) => Math.hypot(d[0] ?? 0, d[1] ?? 0, d[2] ?? 0) > 0.7);
  const slides = free.some((d) => Math.hypot(d[3] ?? 0, d[4] ?? 0, d[5] ?? 0) > 0.7);
  if (slides) names.push("along_seam");
  if (turns) names.push("turn_about_seam");
  return names;
}

/** Turn of the joint about its own line as the plates show it: the middle of both plates' turns, radians. */
function turnOfPlates(stations: readonly StationResult[]): number | null {
  const turns = stations.flatMap(({ plate_a_rot_deg: a, plate_b_rot_deg: b }) =>
    a === undefined || b === undefined ? [] : [(a + b) / 2],
  );
  return turns.length === 0 ? null : medianOf(turns) / DEG;
}

const rounded = (v: Vector): [number, number, number] => [
  Math.round(v[0] * 1e5) / 1e5 + 0,
  Math.round(v[1] * 1e5) / 1e5 + 0,
  Math.round(v[2] * 1e5) / 1e5 + 0,
];

/**
 * The rigid part of a seam's deviation: the motion of the nominal line that brings it nearest to the measured roots,
 * measured square to the moved line (what lies along the line a section cannot see). The turn about a straight seam
 * comes from the plates.
 * @returns null where fewer than two stations were measured
 */
export function rigidPart(
  stations: readonly StationResult[],
  frames: SeamFrames,
): { readonly motion: RigidMotion; readonly report: ScanResult["rigid"] } | null {
  const sights = sightsOf(stations, frames);
  if (sights.nominal.length < 2) return null;
  const centre_mm = centreOf(frames);
  const { motion, free } = bestMotion(sights, centre_mm);
  const names = unseen(free);
  const turn = names.includes("turn_about_seam") ? turnOfPlates(stations) : null;
  const middle = at(frames.tangents, Math.round((frames.count - 1) / 2));
  const isRight = dot(cross(middle, at(frames.laterals, 0)), at(frames.normals, 0)) > 0;
  const about = turn === null ? rotationOf([0, 0, 0]) : rotationOf(times(middle, isRight ? turn : -turn));
  const rotation = product(motion.rotation, about);
  return {
    motion,
    report: {
      translation_mm: rounded(motion.translation_mm),
      rotation_deg: rounded(times(vectorOf(rotation), DEG)),
      unobservable: turn === null ? names : names.filter((name) => name !== "turn_about_seam"),
    },
  };
}
