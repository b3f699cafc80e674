/**
 * Local polynomials: the value at x = 0 of the weighted least-squares line or parabola through points around it. On even
 * stations and equal weights that is Savitzky-Golay's smoothing (Savitzky and Golay 1964, degrees 1 and 2 or 3), on uneven ones
 * local regression (Cleveland 1979) with the weights that the caller gives.
 */

/** A value along the seam with its standard uncertainty. */
export interface Estimate {
  readonly value: number;
  readonly u: number;
}

/** Weighted sums of powers of x up to the fourth, and of y times powers of x. */
export type Sums = Float64Array;
export const noSums = (): Sums => new Float64Array(8);

/** Adds a point with its standard uncertainty; its weight is 1 / u². */
export function add(sums: Sums, x: number, y: number, u: number): void {
  const w = 1 / (u * u);
  sums[0]! += w;
  sums[1]! += w * x;
  sums[2]! += w * x * x;
  sums[3]! += w * x * x * x;
  sums[4]! += w * x * x * x * x;
  sums[5]! += w * y;
  sums[6]! += w * x * y;
  sums[7]! += w * x * x * y;
}

/** The weighted straight line's value at x = 0; a mean where all points lie at one place. */
export function lineAtZero(sums: Sums): Estimate {
  const w = sums[0]!;
  const x = sums[1]!;
  const xx = sums[2]!;
  const y = sums[5]!;
  const xy = sums[6]!;
  const det = w * xx - x * x;
  if (det <= 1e-9 * w * xx) return { value: y / w, u: 1 / Math.sqrt(w) };
  return { value: (xx * y - x * xy) / det, u: Math.sqrt(xx / det) };
}

/** The weighted parabola's value at x = 0; null where the places do not carry one. Cramer's rule. */
export function parabolaAtZero(sums: Sums): Estimate | null {
  const [s0 = 0, s1 = 0, s2 = 0, s3 = 0, s4 = 0, y0 = 0, y1 = 0, y2 = 0] = sums;
  const c0 = s2 * s4 - s3 * s3;
  const c1 = s2 * s3 - s1 * s4;
  const c2 = s1 * s3 - s2 * s2;
  const det = s0 * c0 + s1 * c1 + s2 * c2;
  if (!(det > 1e-9 * s0 * s2 * s4)) return null;
  return { value: (c0 * y0 + c1 * y1 + c2 * y2) / det, u: Math.sqrt(c0 / det) };
}
