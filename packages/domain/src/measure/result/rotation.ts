/** A vector of three, mm or unitless. */
export type Vector = readonly [number, number, number];

/** A rotation matrix, row by row. */
export type Matrix = readonly [Vector, Vector, Vector];

export const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const minus = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const plus = (a: Vector, b: Vector): Vector => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const times = (a: Vector, by: number): Vector => [a[0] * by, a[1] * by, a[2] * by];
export const cross = (a: Vector, b: Vector): Vector => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];

export const turned = (m: Matrix, v: Vector): Vector => [dot(m[0], v), dot(m[1], v), dot(m[2], v)];

/** Product of two rotations: the right one is done first. */
export function product(a: Matrix, b: Matrix): Matrix {
  const column = (k: 0 | 1 | 2): Vector => [b[0][k], b[1][k], b[2][k]];
  const [x, y, z] = [column(0), column(1), column(2)];
  const row = (r: Vector): Vector => [dot(r, x), dot(r, y), dot(r, z)];
  return [row(a[0]), row(a[1]), row(a[2])];
}

/** The rotation about a vector's axis by its length, radians (Rodrigues). */
export function rotationOf(vector: Vector): Matrix {
  const angle = Math.hypot(...vector);
  // sin x / x and (1 - cos x) / x² by their series near 0, where the quotients lose their digits.
  const a = angle < 1e-4 ? 1 - angle ** 2 / 6 : Math.sin(angle) / angle;
  const b = angle < 1e-4 ? 0.5 - angle ** 2 / 24 : (1 - Math.cos(angle)) / angle ** 2;
  const [x, y, z] = vector;
  return [
    [1 - b * (y * y + z * z), b * x * y - a * z, b * x * z + a * y],
    [b * x * y + a * z, 1 - b * (x * x + z * z), b * y * z - a * x],
    [b * x * z - a * y, b * y * z + a * x, 1 - b * (x * x + y * y)],
  ];
}

/** The rotation vector of a rotation by less than half a turn, radians. */
export function vectorOf(m: Matrix): Vector {
  const twice: Vector = [m[2][1] - m[1][2], m[0][2] - m[2][0], m[1][0] - m[0][1]];
  const sine = Math.hypot(...twice) / 2;
  const angle = Math.atan2(sine, (m[0][0] + m[1][1] + m[2][2] - 1) / 2);
  return times(twice, sine < 1e-9 ? 0.5 : angle / (2 * sine));
}
