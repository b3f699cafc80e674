/** A number type of a binary point file. */
export interface Scalar {
  readonly bytes: number;
  readonly read: (view: DataView, at: number, little: boolean) => number;
  /** Set where the type is the 32-bit float, which has a fast path. */
  readonly isFloat32: boolean;
}

const scalar = (bytes: number, read: Scalar["read"], isFloat32 = false): Scalar => ({
  bytes,
  read,
  isFloat32,
});

export const INT8 = scalar(1, (view, at) => view.getInt8(at));
export const UINT8 = scalar(1, (view, at) => view.getUint8(at));
export const INT16 = scalar(2, (view, at, little) => view.getInt16(at, little));
export const UINT16 = scalar(2, (view, at, little) => view.getUint16(at, little));
export const INT32 = scalar(4, (view, at, little) => view.getInt32(at, little));
export const UINT32 = scalar(4, (view, at, little) => view.getUint32(at, little));
export const INT64 = scalar(8, (view, at, little) => Number(view.getBigInt64(at, little)));
export const UINT64 = scalar(8, (view, at, little) => Number(view.getBigUint64(at, little)));
export const FLOAT32 = scalar(4, (view, at, little) => view.getFloat32(at, little), true);
export const FLOAT64 = scalar(8, (view, at, little) => view.getFloat64(at, little));

/** A view of all bytes of an array. */
export function viewOf(bytes: Uint8Array): DataView {
  return new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
}
