import type { Matrix, Vector } from "../result/rotation.ts";
import { cross, dot, times } from "../result/rotation.ts";

/** A = U diag(s) Vᵀ, singular values falling; U and V have orthonormal columns, given as three vectors each. */
export interface Svd3 {
  readonly u: readonly [Vector, Vector, Vector];
  readonly s: Vector;
  readonly v: readonly [Vector, Vector, Vector];
}

const column = (m: readonly number[][], k: number): Vector => [m[0]![k]!, m[1]![k]!, m[2]![k]!];

/** A unit vector square to one or two others. */
function squareTo(a: Vector, b: Vector | null): Vector {
  const other: Vector = b ?? (Math.abs(a[0]) < 0.7 ? [1, 0, 0] : [0, 1, 0]);
  const c = cross(a, other);
  return times(c, 1 / Math.hypot(...c));
}

/**
 * Singular values of a 3 by 3 matrix by one-sided Jacobi rotations (Hestenes 1958): the columns are turned until they
 * are square to each other, so that small singular values keep their digits.
 */
export function svd3(matrix: Matrix): Svd3 {
  const a = matrix.map((row) => [...row]);
  const v = [
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
  ];
  for (let sweep = 0; sweep < 40; sweep++) {
    let turned = false;
    for (const [p, q] of [
      [0, 1],
      [0, 2],
      [1, 2],
    ] as const) {
      const [cp, cq] = [column(a, p), column(a, q)];
      const [alpha, beta, gamma] = [dot(cp, cp), dot(cq, cq), dot(cp, cq)];
      if (Math.abs(gamma) <= 1e-16 * Math.sqrt(alpha * beta) || gamma === 0) continue;
      turned = true;
      const zeta = (beta - alpha) / (2 * gamma);
      const t = (zeta >= 0 ? 1 : -1) / (Math.abs(zeta) + Math.hypot(1, zeta));
      const c = 1 / Math.hypot(1, t);
      const s = c * t;
      for (const m of [a, v])
        for (const row of m) {
          const [x, y] = [row[p]!, row[q]!];
          row[p] = c * x - s * y;
          row[q] = s * x + c * y;
        }
    }
    if (!turned) break;
  }
  const order = [0, 1, 2].sort((i, j) => Math.hypot(...column(a, j)) - Math.hypot(...column(a, i)));
  const s = order.map((k) => Math.hypot(...column(a, k)));
  const [s0 = 0, s1 = 0, s2 = 0] = s;
  const unit = (k: number) => times(column(a, order[k]!), 1 / s[k]!);
  const u0: Vector = s0 > 0 ? unit(0) : [1, 0, 0];
  const u1 = s1 > 1e-14 * s0 ? unit(1) : squareTo(u0, null);
  const u2 = s2 > 1e-14 * s0 ? unit(2) : squareTo(u0, u1);
  return {
    u: [u0, u1, u2],
    s: [s0, s1, s2],
    v: [column(v, order[0]!), column(v, order[1]!), column(v, order[2]!)],
  };
}
