/**
 * A scan in the part frame: what every reader gives and every measuring step takes.
 * Points keep the order of the file. Non-finite returns are left out and counted by the reader.
 */
export interface ScanCloud {
  /** x, y, z of each point in mm, part frame; length 3 n. */
  readonly xyz_mm: Float64Array;
  /** Number of points, n. */
  readonly count: number;
  /** Index of the profile each point came from, ascending by pose order; null for a plain cloud. Length n. */
  readonly profiles: Int32Array | null;
  /** Returns in the file that had no usable number (lost returns, nan). */
  readonly lost: number;
}

/** The unit a scan declares; lengths are turned into mm once, by the reader. */
export type LengthUnit = "mm" | "in" | "m";
