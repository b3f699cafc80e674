/** How far a quaternion's length may be from 1: files write few digits. */
export const QUATERNION_TOLERANCE = 1e-3;

/**
 * A quaternion of length 1 from one that is nearly so.
 * @returns null where its length differs from 1 by more than the tolerance
 */
export function unitQuaternion(
  quaternion: readonly [number, number, number, number],
): [number, number, number, number] | null {
  const length = Math.hypot(...quaternion);
  if (!(Math.abs(length - 1) <= QUATERNION_TOLERANCE)) return null;
  const [w, x, y, z] = quaternion;
  return [w / length, x / length, y / length, z / length];
}
