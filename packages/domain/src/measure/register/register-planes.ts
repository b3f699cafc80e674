import { type Fault, good, type Outcome, refused } from "../../faults/fault.ts";
import { medianOf } from "../fit/median.ts";
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
} from "../result/rotation.ts";
import { solveDetermined, symmetricEigen } from "../result/symmetric-solve.ts";

/** A point and the plane that it belongs to: a point of the plane and its unit normal, mm. */
export interface PlanePair {
  readonly point: Vector;
  readonly on: Vector;
  readonly normal: Vector;
}

/** How the pairs of a moved point are found; the motion so far takes p to R p + t. */
export type Pairing = (moved: (p: Vector) => Vector) => readonly PlanePair[];

/** What point-to-plane registration found. */
export interface PlaneRegistration {
  readonly rotation: Matrix;
  readonly translation_mm: Vector;
  /** Robust root mean square of what is left (1.4826 times the median), mm. */
  readonly rms_mm: number;
  readonly rounds: number;
  /** Smallest over largest eigenvalue of the motions that the planes show, 0 to 1. */
  readonly condition: number;
  /** Motions that the planes do not show, each as turn (radians per mm of size) and slide; left at 0. */
  readonly free: readonly (readonly number[])[];
}

const MOST_ROUNDS = 50;
const SETTLED = 1e-9;
/** Tukey's biweight on the distances, with a scale from their median. */
const TUKEY = 4.685;

/** A motion counts as shown by the planes from this share of the best-shown one's eigenvalue on. */
const SHOWN = 1e-6;

const centreOf = (pairs: readonly PlanePair[]): Vector =>
  times(
    pairs.reduce<Vector>((sum, pair) => plus(sum, pair.point), [0, 0, 0]),
    1 / pairs.length,
  );

/** Rows of the linear system, about a centre and scaled to unit size: (p × n, n). */
function rowOf(pair: PlanePair, centre: Vector, size_mm: number): number[] {
  const arm = times(minus(pair.point, centre), 1 / size_mm);
  return [...cross(arm, pair.normal), ...pair.normal];
}

/** Sum of weight × row × rowᵀ, and of weight × row × distance. */
function equations(pairs: readonly PlanePair[], weights: readonly number[], centre: Vector, size_mm: number) {
  const matrix = Array.from({ length: 6 }, () => new Array<number>(6).fill(0));
  const right = new Array<number>(6).fill(0);
  pairs.forEach((pair, k) => {
    const row = rowOf(pair, centre, size_mm);
    const off = dot(minus(pair.on, pair.point), pair.normal);
    for (let i = 0; i < 6; i++) {
      right[i]! += weights[k]! * row[i]! * off;
      for (let j = 0; j < 6; j++) matrix[i]![j]! += weights[k]! * row[i]! * row[j]!;
    }
  });
  return { matrix, right };
}

/**
 * Eigenvalues of how well planes show each motion, smallest first, with the motions: (turn about the centre, slide),
 * the points scaled to mean radius 1. Source: Gelfand, Ikemoto, Rusinkiewicz, Levoy 2003.
 */
export function observability(pairs: readonly PlanePair[]): { value: number; motion: readonly number[] }[] {
  const centre = centreOf(pairs);
  const radius =
    pairs.reduce((sum, pair) => sum + Math.hypot(...minus(pair.point, centre)), 0) / pairs.length;
  const { matrix } = equations(
    pairs,
    pairs.map(() => 1 / pairs.length),
    centre,
    Math.max(1e-12, radius),
  );
  const { values, vectors } = symmetricEigen(matrix);
  return values
    .map((value, k) => ({ value: Math.max(0, value), motion: vectors.map((row) => row[k]!) }))
    .sort((a, b) => a.value - b.value);
}

/** A motion, (turn about the centre, slide), in words. */
export const motionWords = (motion: readonly number[]): string => {
  const [a = 0, b = 0, c = 0, x = 0, y = 0, z = 0] = motion;
  const words = (v: Vector) => v.map((part) => part.toFixed(2)).join(", ");
  return Math.hypot(x, y, z) >= Math.hypot(a, b, c)
    ? `sliding along (${words([x, y, z])})`
    : `turning about (${words([a, b, c])})`;
};

/**
 * Moves points onto planes: Gauss-Newton on the distances square to the planes, exact rotations, Tukey weights; pairs
 * are found anew each round.
 * @param options.leave_out true: motions that the planes do not show are left at 0 and given in `free`; else the
 *   fault `registration-undetermined` names them
 * Source: Chen and Medioni 1992.
 */
export function registerPlanes(
  pairing: Pairing,
  options: { readonly leave_out?: boolean; readonly robust?: boolean } = {},
): Outcome<PlaneRegistration> {
  let rotation: Matrix = rotationOf([0, 0, 0]);
  let translation: Vector = [0, 0, 0];
  const moved = (p: Vector) => plus(turned(rotation, p), translation);
  const fault = (detail: string): Fault => ({ code: "registration-undetermined", detail });
  let pairs = pairing(moved);
  if (pairs.length < 6)
    return refused(fault(`${pairs.length} points lie near the plates; that fixes no pose.`));
  const seen = observability(pairs);
  const largest = seen.at(-1)?.value ?? 0;
  const hidden = seen.filter(({ value }) => value <= SHOWN * largest);
  if (hidden.length > 0 && options.leave_out !== true)
    return refused(
      fault(
        `The plates do not show ${hidden.map(({ motion }) => motionWords(motion)).join(", nor ")}. Give datum points.`,
      ),
    );
  let rounds = 0;
  for (; rounds < MOST_ROUNDS; rounds++) {
    const offs = pairs.map((pair) => dot(minus(pair.on, pair.point), pair.normal));
    const scale = options.robust === false ? 0 : 1.4826 * medianOf(offs.map(Math.abs));
    const weights = offs.map((off) =>
      scale > 1e-9 ? Math.max(0, 1 - (off / (TUKEY * scale)) ** 2) ** 2 : 1,
    );
    const centre = centreOf(pairs);
    const size = Math.max(
      1e-9,
      pairs.reduce((sum, pair) => sum + Math.hypot(...minus(pair.point, centre)), 0) / pairs.length,
    );
    const { matrix, right } = equations(pairs, weights, centre, size);
    const { x } = solveDetermined(matrix, right, SHOWN);
    const turn = rotationOf([x[0]! / size, x[1]! / size, x[2]! / size]);
    const slide: Vector = [x[3]!, x[4]!, x[5]!];
    rotation = product(turn, rotation);
    translation = plus(plus(turned(turn, minus(translation, centre)), centre), slide);
    pairs = pairing(moved);
    if (Math.hypot(...x) < SETTLED) break;
  }
  const left = pairs.map((pair) => Math.abs(dot(minus(pair.on, pair.point), pair.normal)));
  return good({
    rotation,
    translation_mm: translation,
    rms_mm: 1.4826 * medianOf(left),
    rounds: rounds + 1,
    condition: largest > 0 ? (seen[hidden.length]?.value ?? 0) / largest : 0,
    free: hidden.map(({ motion }) => motion),
  });
}
