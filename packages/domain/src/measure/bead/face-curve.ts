import { type FittedLine, orthogonalLine, robustLine } from "../fit/line-fit.ts";
import { medianOf } from "../fit/median.ts";

/**
 * Returns of one profile share part of their error: a mean of them is less sure than their count says. By how much
 * was found on simulated welds whose truth is known (tests/simulation), not derived.
 */
export const SHARED_ERROR = 1.6;

const TUKEY = 4.685;
const MAD_TO_SIGMA = 1.482602;
const ROUNDS = 3;

/** A weld's face beside a toe: a parabola over the line that lies nearest, in the parent face's axes. */
export interface FaceCurve {
  readonly line: FittedLine;
  /** w = c0 + c1 s + c2 s², s along the line from its centroid, w square to it, mm. */
  readonly c: readonly [c0: number, c1: number, c2: number];
  /** Inverse of the weighted normal matrix, row by row, and the spread of the points, mm. */
  readonly inverse: readonly number[];
  readonly scale_mm: number;
}

/** Solves the symmetric 3 × 3 normal equations; null where the points carry no parabola. */
function inverse3(m: readonly number[]): number[] | null {
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0] = m;
  const A = d * f - e * e;
  const B = c * e - b * f;
  const C = b * e - c * d;
  const det = a * A + b * B + c * C;
  if (!(Math.abs(det) > 1e-9 * a * d * f)) return null;
  const [D, E, F] = [a * f - c * c, b * c - a * e, a * d - b * b];
  return [A, B, C, B, D, E, C, E, F].map((value) => value / det);
}

/** Points nearest to a line from its centroid: along it and square to it. */
function turned(line: FittedLine, t: Float64Array, h: Float64Array) {
  const [c, s] = [Math.cos(line.angle_rad), Math.sin(line.angle_rad)];
  return {
    s: Float64Array.from(t, (at, i) => (at - line.t_mm) * c + (h[i]! - line.d_mm) * s),
    w: Float64Array.from(t, (at, i) => (h[i]! - line.d_mm) * c - (at - line.t_mm) * s),
  };
}

/**
 * A parabola through the points of a weld's face, with Tukey's weights; where the points carry none, the line.
 * @param t along the parent face, @param h over it, mm
 * @returns null with fewer than four points, or where they have no direction
 */
export function faceCurve(t: Float64Array, h: Float64Array): FaceCurve | null {
  const count = t.length;
  if (count < 4) return null;
  const start = orthogonalLine(t, h, count);
  const line = start && robustLine({ ts: t, ds: h, count }, start, 1);
  if (!line) return null;
  const { s, w } = turned(line, t, h);
  let c: [number, number, number] = [0, 0, 0];
  let scale_mm = line.scale_mm;
  let inverse: number[] | null = null;
  for (let round = 0; round < ROUNDS; round++) {
    const off = Float64Array.from(s, (at, i) => Math.abs(w[i]! - (c[0] + c[1] * at + c[2] * at * at)));
    scale_mm = Math.max(1e-3, MAD_TO_SIGMA * medianOf(off));
    const sums = new Float64Array(8);
    for (let i = 0; i < count; i++) {
      const rest = 1 - (off[i]! / (TUKEY * scale_mm)) ** 2;
      if (rest <= 0) continue;
      const weight = rest * rest;
      const at = s[i]!;
      let power = weight;
      for (let k = 0; k < 5; k++, power *= at) {
        sums[k]! += power;
        if (k < 3) sums[5 + k]! += power * w[i]!;
      }
    }
    const [s0 = 0, s1 = 0, s2 = 0, s3 = 0, s4 = 0, y0 = 0, y1 = 0, y2 = 0] = sums;
    inverse = inverse3([s0, s1, s2, s2, s3, s4]);
    if (!inverse) break;
    const row = (k: number) => inverse![k]! * y0 + inverse![k + 1]! * y1 + inverse![k + 2]! * y2;
    c = [row(0), row(3), row(6)];
  }
  return inverse
    ? { line, c, inverse, scale_mm }
    : { line, c: [0, 0, 0], inverse: lineInverse(line), scale_mm: line.scale_mm };
}

const lineInverse = ({ weight, spread_mm2 }: FittedLine): number[] => [
  1 / Math.max(1, weight),
  0,
  0,
  0,
  1 / Math.max(1e-6, spread_mm2),
  0,
  0,
  0,
  0,
];

/** Where a weld's face meets its parent face, and how. */
export interface Meeting {
  readonly t_mm: number;
  /** Standard uncertainty of the face's place there, square to it, mm. */
  readonly u_mm: number;
  /** How steeply the face rises over the parent face, seen from the toe, radians; and its uncertainty. */
  readonly lean_rad: number;
  readonly u_lean_rad: number;
}

const uOf = ({ inverse, scale_mm }: FaceCurve, x: readonly number[]): number => {
  let square = 0;
  for (let i = 0; i < 3; i++) for (let k = 0; k < 3; k++) square += x[i]! * inverse[3 * i + k]! * x[k]!;
  return SHARED_ERROR * scale_mm * Math.sqrt(Math.max(0, square));
};

/**
 * Where a face curve meets the parent face (h = 0), by Newton's method from where its line does.
 * @param near_mm along the parent face; the meeting is looked for within `reach_mm` of it
 * @returns null where it does not come down to the parent face there
 */
export function meetParent(curve: FaceCurve, near_mm: number, reach_mm: number): Meeting | null {
  const { line, c } = curve;
  const [cos, sin] = [Math.cos(line.angle_rad), Math.sin(line.angle_rad)];
  const w = (s: number) => c[0] + c[1] * s + c[2] * s * s;
  const rise = (s: number) => c[1] + 2 * c[2] * s;
  const t = (s: number) => line.t_mm + s * cos - w(s) * sin;
  const h = (s: number) => line.d_mm + s * sin + w(s) * cos;
  let s = Math.abs(sin) > 0.03 ? -line.d_mm / sin : near_mm - line.t_mm;
  for (let round = 0; round < 8; round++) {
    const slope = sin + rise(s) * cos;
    if (Math.abs(slope) < 0.03) return null;
    s -= Math.max(-1, Math.min(1, h(s) / slope));
  }
  const t_mm = t(s);
  if (!(Math.abs(h(s)) < 0.01 && Math.abs(t_mm - near_mm) <= reach_mm)) return null;
  // Outward along the parent face t grows and the weld's face falls.
  const lean_rad = Math.atan2(-(sin + rise(s) * cos), cos - rise(s) * sin);
  return {
    t_mm,
    u_mm: uOf(curve, [1, s, s * s]),
    lean_rad: cos - rise(s) * sin < 0 ? lean_rad + (lean_rad < 0 ? Math.PI : 0) : lean_rad,
    u_lean_rad: uOf(curve, [0, 1, 2 * s]),
  };
}
