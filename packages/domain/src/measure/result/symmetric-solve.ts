/** Eigenvalues and unit eigenvectors (columns) of a symmetric matrix. */
export interface Eigen {
  readonly values: readonly number[];
  readonly vectors: readonly (readonly number[])[];
}

/** Jacobi's method: rotations that clear one pair at a time. Exact enough for six unknowns in a handful of sweeps. */
export function symmetricEigen(matrix: readonly (readonly number[])[]): Eigen {
  const size = matrix.length;
  const a = matrix.map((row) => [...row]);
  const v: number[][] = a.map((_, i) => a.map((__, j) => (i === j ? 1 : 0)));
  for (let sweep = 0; sweep < 40; sweep++) {
    let off = 0;
    for (let p = 0; p < size; p++) for (let q = p + 1; q < size; q++) off += a[p]![q]! ** 2;
    if (off < 1e-26) break;
    for (let p = 0; p < size; p++)
      for (let q = p + 1; q < size; q++) {
        if (Math.abs(a[p]![q]!) < 1e-300) continue;
        const theta = (a[q]![q]! - a[p]![p]!) / (2 * a[p]![q]!);
        const t = (theta >= 0 ? 1 : -1) / (Math.abs(theta) + Math.hypot(theta, 1));
        const c = 1 / Math.hypot(t, 1);
        const s = t * c;
        for (let k = 0; k < size; k++) {
          const [kp, kq] = [a[k]![p]!, a[k]![q]!];
          a[k]![p] = c * kp - s * kq;
          a[k]![q] = s * kp + c * kq;
        }
        for (let k = 0; k < size; k++) {
          const [pk, qk] = [a[p]![k]!, a[q]![k]!];
          a[p]![k] = c * pk - s * qk;
          a[q]![k] = s * pk + c * qk;
          const [vp, vq] = [v[k]![p]!, v[k]![q]!];
          v[k]![p] = c * vp - s * vq;
          v[k]![q] = s * vp + c * vq;
        }
      }
  }
  return { values: a.map((row, i) => row[i]!), vectors: v };
}

/** A solution that leaves out what the equations do not determine. */
export interface Solution {
  readonly x: readonly number[];
  /** Unit directions of the unknowns that nothing determines. */
  readonly free: readonly (readonly number[])[];
}

/**
 * Least-norm solution of a symmetric system; directions whose eigenvalue is below `share` of the largest are left at 0.
 */
export function solveDetermined(
  matrix: readonly (readonly number[])[],
  right: readonly number[],
  share: number,
): Solution {
  const { values, vectors } = symmetricEigen(matrix);
  const largest = Math.max(...values);
  const x = right.map(() => 0);
  const free: number[][] = [];
  values.forEach((value, k) => {
    const direction = vectors.map((row) => row[k]!);
    if (!(value > share * largest) || !(largest > 0)) {
      free.push(direction);
      return;
    }
    const along = direction.reduce((sum, d, i) => sum + d * right[i]!, 0) / value;
    for (const [i, d] of direction.entries()) x[i]! += along * d;
  });
  return { x, free };
}
