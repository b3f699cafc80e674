import type { PointSink } from "./point-sink.ts";
import { type Scalar, viewOf } from "./scalar.ts";

/** One coordinate in every record. */
export interface StridedField {
  readonly scalar: Scalar;
  /** Byte of the first record's value. */
  readonly at: number;
  /** Bytes from one record's value to the next. */
  readonly stride: number;
}

/** Coordinates of `count` points in a block of bytes, whatever their order and type. */
export interface StridedPoints {
  readonly bytes: Uint8Array;
  readonly count: number;
  readonly little: boolean;
  /** Millimetres in a unit of the file. */
  readonly scale: number;
  readonly xyz: readonly [StridedField, StridedField, StridedField];
}

/** Reads all points into the sink; the caller has made sure that the bytes are there. */
export function readStrided(points: StridedPoints, sink: PointSink): void {
  const xyz_mm = sink.room(points.count);
  if (xyz_mm === null) return;
  if (points.xyz.every(({ scalar }) => scalar.isFloat32)) readFloats(points, xyz_mm);
  else readAny(points, xyz_mm);
  sink.fill(points.count);
}

/** The usual case apart: three 32-bit floats, read without a call through a table. */
function readFloats({ bytes, count, little, scale, xyz }: StridedPoints, xyz_mm: Float64Array): void {
  const view = viewOf(bytes);
  const [x, y, z] = xyz;
  for (let i = 0; i < count; i++) {
    xyz_mm[3 * i] = view.getFloat32(x.at + i * x.stride, little) * scale;
    xyz_mm[3 * i + 1] = view.getFloat32(y.at + i * y.stride, little) * scale;
    xyz_mm[3 * i + 2] = view.getFloat32(z.at + i * z.stride, little) * scale;
  }
}

function readAny({ bytes, count, little, scale, xyz }: StridedPoints, xyz_mm: Float64Array): void {
  const view = viewOf(bytes);
  xyz.forEach(({ scalar, at, stride }, axis) => {
    for (let i = 0; i < count; i++) xyz_mm[3 * i + axis] = scalar.read(view, at + i * stride, little) * scale;
  });
}
