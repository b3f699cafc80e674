import type { FaultList, FaultPlace } from "../fault-list.ts";

/** How far a quaternion's length may be from 1: files write few digits. */
export const QUATERNION_TOLERANCE = 1e-3;

/** Where the sensor stood at one profile. */
export interface SensorPose {
  /** Station in mm, or the profile's number. */
  readonly key: number;
  /** Origin of the sensor frame in the part frame, mm. */
  readonly point_mm: readonly [number, number, number];
  /** Quaternion w, x, y, z: turns the sensor frame into the part frame. */
  readonly quaternion: readonly [number, number, number, number];
  /** Where it stands in its file. */
  readonly place: FaultPlace;
}

/**
 * A pose with its quaternion brought to length 1.
 * @returns null, with a fault, where the quaternion's length is off by more than QUATERNION_TOLERANCE
 */
export function checkPose(pose: SensorPose, field: string, faults: FaultList): SensorPose | null {
  const length = Math.hypot(...pose.quaternion);
  if (Math.abs(length - 1) <= QUATERNION_TOLERANCE) {
    const [w, x, y, z] = pose.quaternion;
    return { ...pose, quaternion: [w / length, x / length, y / length, z / length] };
  }
  const what = `the quaternion's length is ${Number(length.toPrecision(6))} where 1 was expected`;
  faults.add("scan-pose-invalid", what, { ...pose.place, field });
  return null;
}
