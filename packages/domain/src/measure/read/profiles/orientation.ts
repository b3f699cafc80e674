import type { FaultList, FaultPlace } from "../fault-list.ts";

type Quaternion = readonly [w: number, x: number, y: number, z: number];

/** A way to write an orientation: its columns, and what they mean. The names of the columns declare the convention. */
export interface OrientationColumns {
  readonly columns: readonly string[];
  /** The quaternion, sensor to part; null, with a fault, where the numbers are no rotation. */
  readonly quaternionOf: (
    values: ArrayLike<number>,
    from: number,
    at: FaultPlace,
    faults: FaultList,
  ) => Quaternion | null;
}

/** How far a matrix's rows may be from unit length and from square to each other: files write few digits. */
const MATRIX_TOLERANCE = 1e-3;

const RAD = Math.PI / 180;

const about = (axis: 1 | 2 | 3, degrees: number): Quaternion => {
  const half = (degrees * RAD) / 2;
  const q: [number, number, number, number] = [Math.cos(half), 0, 0, 0];
  q[axis] = Math.sin(half);
  return q;
};

/** Hamilton's product: the right turn is done first. */
export function quaternionProduct(a: Quaternion, b: Quaternion): Quaternion {
  const [aw, ax, ay, az] = a;
  const [bw, bx, by, bz] = b;
  return [
    aw * bw - ax * bx - ay * by - az * bz,
    aw * bx + ax * bw + ay * bz - az * by,
    aw * by - ax * bz + ay * bw + az * bx,
    aw * bz + ax * by - ay * bx + az * bw,
  ];
}

/** Turns about the fixed axes x, y, z in this order (roll, pitch, yaw): M = Rz Ry Rx. */
export const fromFixedXyz = (x_deg: number, y_deg: number, z_deg: number): Quaternion =>
  quaternionProduct(about(3, z_deg), quaternionProduct(about(2, y_deg), about(1, x_deg)));

/** Turns about z, the new y, the new z: M = Rz Ry Rz. */
export const fromZyz = (first_deg: number, second_deg: number, third_deg: number): Quaternion =>
  quaternionProduct(about(3, first_deg), quaternionProduct(about(2, second_deg), about(3, third_deg)));

/**
 * The quaternion of a rotation matrix, row by row, w ≥ 0. The largest of the four components is found first, so that
 * half turns lose no digits (Shepperd 1978).
 */
export function fromMatrix(m: ArrayLike<number>, from = 0): Quaternion {
  const at = (row: number, column: number) => m[from + 3 * row + column]!;
  const trace = at(0, 0) + at(1, 1) + at(2, 2);
  const candidates = [trace, at(0, 0), at(1, 1), at(2, 2)];
  const largest = candidates.indexOf(Math.max(...candidates));
  if (largest === 0) {
    const s = 2 * Math.sqrt(1 + trace);
    return [s / 4, (at(2, 1) - at(1, 2)) / s, (at(0, 2) - at(2, 0)) / s, (at(1, 0) - at(0, 1)) / s];
  }
  const [i, j, k] = [
    [0, 1, 2],
    [1, 2, 0],
    [2, 0, 1],
  ][largest - 1] as [number, number, number];
  const s = 2 * Math.sqrt(Math.max(0, 1 + at(i, i) - at(j, j) - at(k, k)));
  const q = [0, 0, 0, 0];
  q[0] = (at(k, j) - at(j, k)) / s;
  q[1 + i] = s / 4;
  q[1 + j] = (at(j, i) + at(i, j)) / s;
  q[1 + k] = (at(k, i) + at(i, k)) / s;
  const sign = q[0] < 0 ? -1 : 1;
  return [sign * q[0], sign * q[1]!, sign * q[2]!, sign * q[3]!];
}

/** Whether nine numbers are a rotation: rows of unit length, square to each other, right-handed. */
function isRotation(m: ArrayLike<number>, from: number): boolean {
  const row = (k: number) => [m[from + 3 * k]!, m[from + 3 * k + 1]!, m[from + 3 * k + 2]!] as const;
  const [a, b, c] = [row(0), row(1), row(2)];
  const dot = (p: readonly number[], q: readonly number[]) => p[0]! * q[0]! + p[1]! * q[1]! + p[2]! * q[2]!;
  const det =
    a[0] * (b[1] * c[2] - b[2] * c[1]) -
    a[1] * (b[0] * c[2] - b[2] * c[0]) +
    a[2] * (b[0] * c[1] - b[1] * c[0]);
  const off = [dot(a, a) - 1, dot(b, b) - 1, dot(c, c) - 1, dot(a, b), dot(a, c), dot(b, c)];
  return det > 0 && off.every((value) => Math.abs(value) <= 2 * MATRIX_TOLERANCE);
}

/** The ways an orientation can be written, the first of which a file names the first column of. */
export const ORIENTATIONS: readonly OrientationColumns[] = [
  {
    columns: ["qw", "qx", "qy", "qz"],
    quaternionOf: (v, from) => [v[from]!, v[from + 1]!, v[from + 2]!, v[from + 3]!],
  },
  {
    columns: ["r11", "r12", "r13", "r21", "r22", "r23", "r31", "r32", "r33"],
    quaternionOf: (v, from, at, faults) => {
      if (isRotation(v, from)) return fromMatrix(v, from);
      faults.add("scan-pose-invalid", "r11 to r33 are no rotation matrix", { ...at, field: "r11" });
      return null;
    },
  },
  {
    columns: ["fixed_x_deg", "fixed_y_deg", "fixed_z_deg"],
    quaternionOf: (v, from) => fromFixedXyz(v[from]!, v[from + 1]!, v[from + 2]!),
  },
  {
    columns: ["zyz_1_deg", "zyz_2_deg", "zyz_3_deg"],
    quaternionOf: (v, from) => fromZyz(v[from]!, v[from + 1]!, v[from + 2]!),
  },
];
