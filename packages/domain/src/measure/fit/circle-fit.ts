import { drawsFrom } from "./consensus-line.ts";
import { medianOf } from "./median.ts";

/** A circle in a plane, mm. */
export interface Circle {
  readonly x_mm: number;
  readonly y_mm: number;
  readonly radius_mm: number;
}

/** A circle fitted to points of which some may be outliers. */
export interface FittedCircle extends Circle {
  /** Robust standard deviation of the distances from the circle, mm. */
  readonly scale_mm: number;
  /** Points that weigh at least a half. */
  readonly inliers: number;
}

const MAD_TO_SIGMA = 1.482602;
const TUKEY = 4.685;
const ROUNDS = 30;

/** The circle through three points; null where they lie on a line. */
function throughThree(
  x: Float64Array,
  y: Float64Array,
  [i, j, k]: readonly [number, number, number],
): Circle | null {
  const [ax, ay] = [x[j]! - x[i]!, y[j]! - y[i]!];
  const [bx, by] = [x[k]! - x[i]!, y[k]! - y[i]!];
  const cross = 2 * (ax * by - ay * bx);
  if (Math.abs(cross) < 1e-9) return null;
  const [a, b] = [ax * ax + ay * ay, bx * bx + by * by];
  const [cx, cy] = [(by * a - ay * b) / cross, (ax * b - bx * a) / cross];
  return { x_mm: x[i]! + cx, y_mm: y[i]! + cy, radius_mm: Math.hypot(cx, cy) };
}

/**
 * Taubin's algebraic circle: gradient-weighted, nearly without bias on short arcs.
 * Newton's method on the characteristic polynomial, Chernov, Circular and Linear Regression (2010), section 5.9.
 * @returns null with fewer than three points, or where they lie on a line
 */
export function taubinCircle(x: Float64Array, y: Float64Array, weights?: Float64Array): Circle | null {
  const count = x.length;
  const weight = (i: number) => (weights ? weights[i]! : 1);
  let [sum, mx, my] = [0, 0, 0];
  for (let i = 0; i < count; i++) {
    sum += weight(i);
    mx += weight(i) * x[i]!;
    my += weight(i) * y[i]!;
  }
  if (!(sum > 0) || count < 3) return null;
  mx /= sum;
  my /= sum;
  let [xx, yy, xy, xz, yz, zz] = [0, 0, 0, 0, 0, 0];
  for (let i = 0; i < count; i++) {
    const [u, v, w] = [x[i]! - mx, y[i]! - my, weight(i) / sum];
    const z = u * u + v * v;
    xx += w * u * u;
    yy += w * v * v;
    xy += w * u * v;
    xz += w * u * z;
    yz += w * v * z;
    zz += w * z * z;
  }
  const z = xx + yy;
  const cov = xx * yy - xy * xy;
  const varZ = zz - z * z;
  const a3 = 4 * z;
  const a2 = -3 * z * z - zz;
  const a1 = varZ * z + 4 * cov * z - xz * xz - yz * yz;
  const a0 = xz * (xz * yy - yz * xy) + yz * (yz * xx - xz * xy) - varZ * cov;
  let root = 0;
  let value = a0;
  for (let round = 0; round < 99; round++) {
    const slope = a1 + root * (2 * a2 + 3 * a3 * root);
    const next = root - value / slope;
    if (!Number.isFinite(next) || next === root) break;
    const there = a0 + next * (a1 + next * (a2 + next * a3));
    if (Math.abs(there) >= Math.abs(value)) break;
    [root, value] = [next, there];
  }
  const det = root * root - root * z + cov;
  if (!(Math.abs(det) > 1e-12 * z * z)) return null;
  const cx = (xz * (yy - root) - yz * xy) / det / 2;
  const cy = (yz * (xx - root) - xz * xy) / det / 2;
  return { x_mm: cx + mx, y_mm: cy + my, radius_mm: Math.sqrt(cx * cx + cy * cy + z) };
}

/** Solves a symmetric 3 × 3 system; null where it is singular. */
function solve3(m: readonly number[], v: readonly number[]): [number, number, number] | null {
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0] = m;
  const [p = 0, q = 0, r = 0] = v;
  const [A, B, C] = [d * f - e * e, c * e - b * f, b * e - c * d];
  const det = a * A + b * B + c * C;
  if (!(Math.abs(det) > 1e-12 * Math.abs(a * d * f))) return null;
  const [D, E, F] = [a * f - c * c, b * c - a * e, a * d - b * b];
  return [(A * p + B * q + C * r) / det, (B * p + D * q + E * r) / det, (C * p + E * q + F * r) / det];
}

/**
 * The circle whose weighted squared distances to the points are least, from a start near it: Gauss-Newton on centre and
 * radius (Gander, Golub and Strebel 1994).
 * @returns null where the points determine no circle
 */
export function geometricCircle(
  x: Float64Array,
  y: Float64Array,
  start: Circle,
  weights?: Float64Array,
): Circle | null {
  let { x_mm, y_mm, radius_mm } = start;
  for (let round = 0; round < ROUNDS; round++) {
    const m = [0, 0, 0, 0, 0, 0];
    const v = [0, 0, 0];
    for (let i = 0; i < x.length; i++) {
      const w = weights ? weights[i]! : 1;
      if (w === 0) continue;
      const [dx, dy] = [x[i]! - x_mm, y[i]! - y_mm];
      const range = Math.hypot(dx, dy);
      if (range < 1e-9) continue;
      const [gx, gy, off] = [dx / range, dy / range, range - radius_mm];
      m[0]! += w * gx * gx;
      m[1]! += w * gx * gy;
      m[2]! += w * gx;
      m[3]! += w * gy * gy;
      m[4]! += w * gy;
      m[5]! += w;
      v[0]! += w * gx * off;
      v[1]! += w * gy * off;
      v[2]! += w * off;
    }
    const step = solve3(m, v);
    if (!step) return null;
    x_mm += step[0];
    y_mm += step[1];
    radius_mm += step[2];
    if (Math.hypot(...step) < 1e-10 * (1 + radius_mm)) break;
  }
  return radius_mm > 0 && Number.isFinite(x_mm + y_mm) ? { x_mm, y_mm, radius_mm } : null;
}

/** How a circle is looked for. */
export interface CircleSearch {
  /** Inlier band of the consensus, mm. */
  readonly band_mm: number;
  readonly trials: number;
  readonly seed: number;
  /** Radii outside are no candidates, mm. */
  readonly radii_mm: readonly [least: number, most: number];
}

/** Points scored in a trial. */
const SCORED = 400;

/**
 * A circle among points of which many may be outliers: consensus of triples (Fischler and Bolles 1981), Taubin's circle of
 * the points near it, then the geometric circle with Tukey's weights.
 * @returns null where no triple gives a circle within the radii
 */
export function robustCircle(x: Float64Array, y: Float64Array, search: CircleSearch): FittedCircle | null {
  const count = x.length;
  if (count < 3) return null;
  const draw = drawsFrom(search.seed);
  const pick = () => Math.floor(draw() * count);
  const every = Math.max(1, Math.floor(count / SCORED));
  const off = (circle: Circle, i: number) =>
    Math.abs(Math.hypot(x[i]! - circle.x_mm, y[i]! - circle.y_mm) - circle.radius_mm);
  let best: { circle: Circle; score: number } | null = null;
  for (let trial = 0; trial < search.trials; trial++) {
    const circle = throughThree(x, y, [pick(), pick(), pick()]);
    if (!circle || circle.radius_mm < search.radii_mm[0] || circle.radius_mm > search.radii_mm[1]) continue;
    let score = 0;
    for (let i = 0; i < count; i += every) score += Math.max(0, 1 - (off(circle, i) / search.band_mm) ** 2);
    if (!best || score > best.score) best = { circle, score };
  }
  if (!best) return null;
  let circle = best.circle;
  let scale_mm = search.band_mm / 2;
  const weights = new Float64Array(count);
  for (let round = 0; round < 8; round++) {
    const near: number[] = [];
    for (let i = 0; i < count; i++) {
      const distance = off(circle, i);
      if (distance <= 3 * search.band_mm) near.push(distance);
    }
    if (near.length < 3) return null;
    if (round > 0) scale_mm = Math.max(1e-4, MAD_TO_SIGMA * medianOf(near));
    for (let i = 0; i < count; i++) {
      const rest = 1 - (off(circle, i) / (TUKEY * scale_mm)) ** 2;
      weights[i] = rest > 0 ? rest * rest : 0;
    }
    const start = round === 0 ? (taubinCircle(x, y, weights) ?? circle) : circle;
    const next = geometricCircle(x, y, start, weights);
    if (!next) return null;
    circle = next;
  }
  const inliers = weights.reduce((sum, weight) => sum + (weight >= 0.5 ? 1 : 0), 0);
  return { ...circle, scale_mm, inliers };
}
