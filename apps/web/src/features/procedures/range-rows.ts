import type { ProcedureRanges } from "@beadroll/domain/schemas/procedure";

/** One limited quantity of a procedure, in words. */
export interface RangeRow {
  readonly id: keyof ProcedureRanges;
  readonly title: string;
  readonly unit: string;
  readonly range: { readonly min: number; readonly max: number } | null;
}

const QUANTITIES: readonly Omit<RangeRow, "range">[] = [
  { id: "current_a", title: "Current", unit: "A" },
  { id: "voltage_v", title: "Voltage", unit: "V" },
  { id: "wire_feed_m_min", title: "Wire feed", unit: "m/min" },
  { id: "travel_mm_s", title: "Travel speed", unit: "mm/s" },
  { id: "gas_l_min", title: "Gas flow", unit: "l/min" },
  { id: "heat_input_kj_mm", title: "Heat input", unit: "kJ/mm" },
  { id: "interpass_c", title: "Interpass temperature", unit: "°C" },
];

/** A procedure's ranges in the order they are read. */
export const rangeRows = (ranges: ProcedureRanges): RangeRow[] =>
  QUANTITIES.map((quantity) => ({ ...quantity, range: ranges[quantity.id] }));
