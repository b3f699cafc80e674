import { type Fault, good, type Outcome, refused } from "../../faults/fault.ts";
import { cross, dot, type Matrix, minus, plus, times, turned, type Vector } from "../result/rotation.ts";
import { svd3 } from "./svd3.ts";

/** A point where it should be and where it was measured, mm. */
export interface DatumPoint {
  readonly nominal: Vector;
  readonly measured: Vector;
  /** How much it counts; 1 if absent. */
  readonly weight?: number;
}

/** The motion that takes measured points to their nominal places: p goes to R p + t. */
export interface Registration {
  readonly rotation: Matrix;
  readonly translation_mm: Vector;
  /** Root mean square of what is left at the points, weighted, mm. */
  readonly rms_mm: number;
  readonly residuals_mm: readonly number[];
  /** Second singular value over the first: 0 where the points lie on a line. */
  readonly condition: number;
  /** True where a mirror image would fit far better: swapped points, or a mirrored part. */
  readonly mirrored: boolean;
}

/** Points count as lying on a line when the second singular value is below this share of the first. */
const ON_A_LINE = 1e-9;

const centroid = (points: readonly Vector[], weights: readonly number[]): Vector => {
  const total = weights.reduce((a, b) => a + b, 0);
  return times(
    points.reduce<Vector>((sum, p, i) => plus(sum, times(p, weights[i]!)), [0, 0, 0]),
    1 / total,
  );
};

const det = (a: Vector, b: Vector, c: Vector) => dot(cross(a, b), c);

const fault = (detail: string): Fault => ({ code: "registration-undetermined", detail });

const places = (v: Vector) => v.map((x) => x.toFixed(3)).join(", ");

/**
 * The best rigid motion between corresponding points, in the sense of least squares, by the singular values of their
 * covariance; never a reflection.
 * @param points at least three, not on one line; weights > 0
 * @returns the motion from measured to nominal, or the fault `registration-undetermined`, naming the direction about which
 *   nothing is known
 * Source: Kabsch 1976; Umeyama 1991.
 */
export function registerPoints(points: readonly DatumPoint[]): Outcome<Registration> {
  if (points.length < 3)
    return refused(fault(`${points.length} points fix no pose; at least three that are not on one line do.`));
  const weights = points.map((point) => point.weight ?? 1);
  const total = weights.reduce((a, b) => a + b, 0);
  const x0 = centroid(
    points.map((p) => p.measured),
    weights,
  );
  const y0 = centroid(
    points.map((p) => p.nominal),
    weights,
  );
  const s: [number, number, number][] = [
    [0, 0, 0],
    [0, 0, 0],
    [0, 0, 0],
  ];
  points.forEach((point, i) => {
    const x = minus(point.measured, x0);
    const y = minus(point.nominal, y0);
    for (let r = 0; r < 3; r++)
      for (let c = 0; c < 3; c++) s[r]![c]! += (weights[i]! * y[r]! * x[c]!) / total;
  });
  const { u, s: values, v } = svd3([s[0]!, s[1]!, s[2]!]);
  if (!(values[1] > ON_A_LINE * values[0]))
    return refused(
      fault(
        values[0] > 0
          ? `The points lie on one line; the turn about the direction (${places(v[0])}) is not determined.`
          : "All points lie in one place; no turn is determined.",
      ),
    );
  const sign = Math.sign(det(...u) * det(...v)) || 1;
  const row = (k: 0 | 1 | 2): Vector => {
    const at = (c: 0 | 1 | 2) => u[0][k] * v[0][c] + u[1][k] * v[1][c] + sign * u[2][k] * v[2][c];
    return [at(0), at(1), at(2)];
  };
  const rotation: Matrix = [row(0), row(1), row(2)];
  const translation_mm = minus(y0, turned(rotation, x0));
  const residuals_mm = points.map((point) =>
    Math.hypot(...minus(point.nominal, plus(turned(rotation, point.measured), translation_mm))),
  );
  const square = residuals_mm.reduce((sum, r, i) => sum + weights[i]! * r * r, 0) / total;
  return good({
    rotation,
    translation_mm,
    rms_mm: Math.sqrt(square),
    residuals_mm,
    condition: values[1] / values[0],
    // The guard against reflection gives up twice the last singular value; worth telling when that is most of the rest.
    mirrored: sign < 0 && 4 * values[2] > 0.5 * square && values[2] > 1e-6 * values[0],
  });
}
