import type { PassQuantity } from "../schemas/pass-result.ts";

/** One column of readings, one value a sample; NaN where the log has none. */
export type Readings = Float64Array;

/** A weld log as read: what the cell recorded while one pass was welded, in the product's units. */
export interface PassLog {
  /** Time of each sample by the log's own clock, s; never decreasing. */
  readonly times_s: Float64Array;
  /** Same length as `times_s`; null when the log does not have the quantity. Current and voltage without sign. */
  readonly readings: Readonly<Record<PassQuantity, Readings | null>> & {
    readonly current_a: Readings;
    readonly voltage_v: Readings;
  };
  /** Workpiece temperature, °C, same length; null when the log does not have it. */
  readonly interpass_c: Readings | null;
}

/** What a column of a log file can be. */
export type LogQuantity = "time_s" | PassQuantity | "interpass_c";

interface LogColumn {
  readonly quantity: LogQuantity;
  /** Multiplies the file's number to give the product's unit. */
  readonly factor: number;
}

const MM_PER_INCH = 25.4;

/** Every column name that a log may use, with what it means here. Other columns are passed over. */
export const LOG_COLUMNS: Readonly<Record<string, LogColumn>> = {
  time_s: { quantity: "time_s", factor: 1 },
  time_ms: { quantity: "time_s", factor: 1e-3 },
  current_a: { quantity: "current_a", factor: 1 },
  voltage_v: { quantity: "voltage_v", factor: 1 },
  wire_feed_m_min: { quantity: "wire_feed_m_min", factor: 1 },
  wire_feed_mm_s: { quantity: "wire_feed_m_min", factor: 60 / 1000 },
  wire_feed_in_min: { quantity: "wire_feed_m_min", factor: MM_PER_INCH / 1000 },
  travel_mm_s: { quantity: "travel_mm_s", factor: 1 },
  travel_mm_min: { quantity: "travel_mm_s", factor: 1 / 60 },
  travel_cm_min: { quantity: "travel_mm_s", factor: 10 / 60 },
  travel_in_min: { quantity: "travel_mm_s", factor: MM_PER_INCH / 60 },
  gas_l_min: { quantity: "gas_l_min", factor: 1 },
  interpass_c: { quantity: "interpass_c", factor: 1 },
};

/** What a log must have; without one of these no arc time and no heat input can be told. */
export const REQUIRED_QUANTITIES: readonly LogQuantity[] = ["time_s", "current_a", "voltage_v"];

/** Most faults that reading a log gives at once. */
export const LOG_FAULTS_MAX = 20;
