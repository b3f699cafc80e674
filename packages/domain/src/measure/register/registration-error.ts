import { dot, minus, plus, times, type Vector } from "../result/rotation.ts";
import { symmetricEigen } from "../result/symmetric-solve.ts";

/**
 * Expected root mean square of what is left at datum points after registration: √(1 − 2/N) of the error of a point.
 * It is smaller than that error, and no measure of the error elsewhere.
 * @param error_mm root mean square error of one point, all axes together, mm
 * Source: Sibson 1979.
 */
export const expectedResidual = (count: number, error_mm: number): number =>
  error_mm * Math.sqrt(Math.max(0, 1 - 2 / count));

/**
 * Root mean square error that a registration by datum points leaves at a place:
 * TRE² = FLE²/N (1 + ⅓ Σ d²/f²), d the place's distance from a principal axis of the points, f the points' own.
 * @param datums at least three points, mm
 * @param error_mm root mean square error of one point, all axes together, mm
 * Source: Fitzpatrick, West, Maurer, IEEE Trans. Med. Imaging 17 (1998) 694.
 */
export function targetError(datums: readonly Vector[], error_mm: number, place: Vector): number {
  const n = datums.length;
  const centre = times(
    datums.reduce<Vector>((sum, p) => plus(sum, p), [0, 0, 0]),
    1 / n,
  );
  const spread = [0, 1, 2].map((i) =>
    [0, 1, 2].map((j) => datums.reduce((sum, p) => sum + (p[i]! - centre[i]!) * (p[j]! - centre[j]!), 0)),
  );
  const { vectors } = symmetricEigen(spread);
  const square = (p: Vector, axis: Vector) => {
    const off = minus(p, centre);
    return dot(off, off) - dot(off, axis) ** 2;
  };
  let sum = 1;
  for (let k = 0; k < 3; k++) {
    const axis: Vector = [vectors[0]![k]!, vectors[1]![k]!, vectors[2]![k]!];
    const f = datums.reduce((total, p) => total + square(p, axis), 0) / n;
    if (f > 0) sum += square(place, axis) / f / 3;
  }
  return error_mm * Math.sqrt(sum / n);
}
