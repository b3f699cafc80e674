import type { ScanCloud } from "../scan-cloud.ts";

/** A scan's points as they are sent to be drawn. */
export interface DrawnCloud {
  /** Points of the scan, of which some are left out. */
  readonly count: number;
  /** x, y, z of each point shown, mm, part frame; length 3 n. */
  readonly xyz_mm: Float32Array;
}

/** Two numbers before the points: how many the scan has, how many follow. */
const HEADER_BYTES = 8;
const BYTES_PER_POINT = 12;

/**
 * A scan's points as bytes, evenly thinned: little-endian, uint32 points of the scan, uint32 points that follow, then x, y, z
 * of each as float32, mm.
 * @param most points kept at most, > 0
 * @throws RangeError where `most` is not positive
 */
export function encodeCloud({ xyz_mm, count }: ScanCloud, most: number): Uint8Array {
  if (!(most > 0)) throw new RangeError(`most: expected > 0, got ${most}`);
  const every = Math.max(1, Math.ceil(count / most));
  const shown = Math.ceil(count / every);
  const bytes = new Uint8Array(HEADER_BYTES + shown * BYTES_PER_POINT);
  const view = new DataView(bytes.buffer);
  view.setUint32(0, count, true);
  view.setUint32(4, shown, true);
  for (let k = 0; k < shown; k++)
    for (let axis = 0; axis < 3; axis++)
      view.setFloat32(
        HEADER_BYTES + k * BYTES_PER_POINT + 4 * axis,
        xyz_mm[3 * k * every + axis] ?? Number.NaN,
        true,
      );
  return bytes;
}

/**
 * The points that {@link encodeCloud} wrote.
 * @throws RangeError where the bytes are cut
 */
export function decodeCloud(bytes: Uint8Array): DrawnCloud {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const shown = bytes.length >= HEADER_BYTES ? view.getUint32(4, true) : -1;
  if (bytes.length !== HEADER_BYTES + shown * BYTES_PER_POINT)
    throw new RangeError(`cloud: expected ${shown} points, got ${bytes.length} bytes`);
  const xyz_mm = new Float32Array(3 * shown);
  for (let i = 0; i < 3 * shown; i++) xyz_mm[i] = view.getFloat32(HEADER_BYTES + 4 * i, true);
  return { count: view.getUint32(0, true), xyz_mm };
}
