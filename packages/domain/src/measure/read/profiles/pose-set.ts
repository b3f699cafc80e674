/** Numbers kept a pose: the point, then the sensor's x and z axes in the part frame. */
const PER_POSE = 9;

/** Stations that differ by less are the same station, in mm: files round them differently. */
export const STATION_TOLERANCE_MM = 1e-3;

/** Where the sensor stood at one profile. */
export interface SensorPose {
  /** Station in mm, or the profile's number. */
  readonly key: number;
  readonly point_mm: readonly [number, number, number];
  /** Unit quaternion w, x, y, z: turns the sensor frame into the part frame. */
  readonly quaternion: readonly [number, number, number, number];
  /** 1-based line, 0 where there is none. */
  readonly line: number;
}

/** The poses of one scan in ascending order of their key, ready to carry points into the part frame. */
export class PoseSet {
  /** Keys, ascending. */
  readonly keys: Float64Array;
  /** Line of each pose in its file, by the same order. */
  readonly lines: Int32Array;
  readonly #frames: Float64Array;
  readonly #tolerance: number;
  /** The last point carried, mm, part frame. */
  x_mm = 0;
  y_mm = 0;
  z_mm = 0;

  /** @param tolerance keys that differ by no more are the same */
  constructor(poses: readonly SensorPose[], tolerance: number) {
    const sorted = poses.toSorted((a, b) => a.key - b.key);
    this.keys = Float64Array.from(sorted, (pose) => pose.key);
    this.lines = Int32Array.from(sorted, (pose) => pose.line);
    this.#frames = new Float64Array(PER_POSE * sorted.length);
    this.#tolerance = tolerance;
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
    if (Math.min(after, before) > this.#tolerance) return -1;
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

/** Point, x axis and z axis of a pose; the axes are columns 1 and 3 of the quaternion's rotation matrix. */
function frameOf({ point_mm, quaternion }: SensorPose): number[] {
  const [w, x, y, z] = quaternion;
  const xAxis = [1 - 2 * (y * y + z * z), 2 * (x * y + w * z), 2 * (x * z - w * y)];
  const zAxis = [2 * (x * z + w * y), 2 * (y * z - w * x), 1 - 2 * (x * x + y * y)];
  return [...point_mm, ...xAxis, ...zAxis];
}
