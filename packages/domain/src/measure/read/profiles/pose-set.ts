import { type FaultList, placeWords } from "../fault-list.ts";
import type { ProfileKey } from "./profile-key.ts";
import type { SensorPose } from "./sensor-pose.ts";

/** Numbers kept a pose: the point, then the sensor's x and z axes in the part frame. */
const PER_POSE = 9;

/** Stations that differ by no more are the same station, in mm: files round them differently. */
export const STATION_TOLERANCE_MM = 1e-3;

/** The poses of one scan in ascending order of their key, ready to carry points into the part frame. */
export class PoseSet {
  /** Keys, ascending: stations in mm, or numbers of profiles. */
  readonly keys: Float64Array;
  readonly #frames: Float64Array;
  readonly #tolerance: number;
  /** The last point carried, mm, part frame. */
  x_mm = 0;
  y_mm = 0;
  z_mm = 0;

  /** @param sorted ascending by key */
  constructor(sorted: readonly SensorPose[], key: ProfileKey) {
    this.keys = Float64Array.from(sorted, (pose) => pose.key);
    this.#frames = new Float64Array(PER_POSE * sorted.length);
    this.#tolerance = key === "station" ? STATION_TOLERANCE_MM : 0;
    sorted.forEach((pose, i) => {
      this.#frames.set(frameOf(pose), PER_POSE * i);
    });
  }

  /** Index of the pose with this key, the nearest within the tolerance; -1 where there is none. */
  find(key: number): number {
    const { keys } = this;
    let low = 0;
    let high = keys.length;
    while (low < high) {
      const middle = (low + high) >>> 1;
      if (keys[middle]! < key) low = middle + 1;
      else high = middle;
    }
    const after = low < keys.length ? keys[low]! - key : Number.POSITIVE_INFINITY;
    const before = low > 0 ? key - keys[low - 1]! : Number.POSITIVE_INFINITY;
    if (!(Math.min(after, before) <= this.#tolerance)) return -1;
    return after <= before ? low : low - 1;
  }

  /** Carries the return (x, z) of profile `index` into the part frame: p = P + R(q) (x, 0, z). */
  carry(index: number, x_mm: number, z_mm: number): void {
    const f = this.#frames;
    const at = PER_POSE * index;
    this.x_mm = f[at]! + f[at + 3]! * x_mm + f[at + 6]! * z_mm;
    this.y_mm = f[at + 1]! + f[at + 4]! * x_mm + f[at + 7]! * z_mm;
    this.z_mm = f[at + 2]! + f[at + 5]! * x_mm + f[at + 8]! * z_mm;
  }
}

/** The set of these poses; null, with a fault each, where two have the same key or there is none at all. */
export function poseSetOf(poses: readonly SensorPose[], key: ProfileKey, faults: FaultList): PoseSet | null {
  const sorted = poses.toSorted((a, b) => a.key - b.key);
  if (sorted.length === 0) faults.add("scan-poses-missing", "it holds no pose");
  for (let i = 1; i < sorted.length; i++) {
    const [first, second] = [sorted[i - 1]!, sorted[i]!];
    if (first.key !== second.key) continue;
    const what = `a second pose for ${key} ${second.key}; the first stands at ${placeWords(first.place)}`;
    faults.add("scan-pose-invalid", what, { ...second.place, field: key });
  }
  return faults.any ? null : new PoseSet(sorted, key);
}

/** Point, x axis and z axis of a pose; the axes are columns 1 and 3 of the quaternion's rotation matrix. */
function frameOf({ point_mm, quaternion }: SensorPose): number[] {
  const [w, x, y, z] = quaternion;
  const xAxis = [1 - 2 * (y * y + z * z), 2 * (x * y + w * z), 2 * (x * z - w * y)];
  const zAxis = [2 * (x * z + w * y), 2 * (y * z - w * x), 1 - 2 * (x * x + y * y)];
  return [...point_mm, ...xAxis, ...zAxis];
}
