import { z } from "zod";
import { id, instant, line, version } from "./quantities.ts";

const range = (what: string, unit: string, example: { min: number; max: number }) =>
  z
    .strictObject({
      min: z.number().meta({ description: `Lowest allowed, ${unit}`, example: example.min }),
      max: z.number().meta({ description: `Highest allowed, ${unit}`, example: example.max }),
    })
    .refine((r) => r.min <= r.max, { message: "min must not be above max" })
    .nullable()
    .meta({ description: `${what}, ${unit}; null when the procedure does not limit it`, example });

/** The ranges a procedure allows, for what a cell reports. */
export const ProcedureRanges = z
  .strictObject({
    current_a: range("Welding current", "A", { min: 220, max: 280 }),
    voltage_v: range("Arc voltage", "V", { min: 26, max: 30 }),
    wire_feed_m_min: range("Wire feed", "m/min", { min: 7, max: 9.5 }),
    travel_mm_s: range("Travel speed", "mm/s", { min: 5, max: 8 }),
    gas_l_min: range("Gas flow", "l/min", { min: 15, max: 20 }),
    heat_input_kj_mm: range("Heat input", "kJ/mm", { min: 0.8, max: 1.4 }),
    interpass_c: range("Interpass temperature", "°C", { min: 20, max: 250 }),
  })
  .meta({ id: "ProcedureRanges" });
export type ProcedureRanges = z.infer<typeof ProcedureRanges>;

const procedureFields = {
  number: line("WPS number", "PB-135-07", 40),
  revision: line("Revision", "2", 10),
  title: line("Title", "Fillet a5, plate 8 to 15, PB"),
  process: line("Process number, ISO 4063", "135", 8),
  position: line("Welding position, ISO 6947", "PB", 8),
  ranges: ProcedureRanges,
};

/** A welding procedure specification (WPS), by number and revision. */
export const Procedure = z
  .object({
    id: id("Procedure"),
    ...procedureFields,
    status: z.enum(["draft", "approved", "withdrawn"]).meta({ description: "Whether it may be welded to" }),
    used: z.boolean().meta({ description: "A pass was welded to it; its ranges are frozen" }),
    created_at: instant("When recorded"),
    version,
  })
  .meta({ id: "Procedure" });
export type Procedure = z.infer<typeof Procedure>;

/** A new procedure or revision. */
export const ProcedureCreate = z.strictObject(procedureFields).meta({ id: "ProcedureCreate" });
export type ProcedureCreate = z.infer<typeof ProcedureCreate>;

/** A change of a procedure. The ranges of one in use cannot change: make a new revision. */
export const ProcedurePatch = z
  .strictObject({
    title: procedureFields.title.optional(),
    ranges: ProcedureRanges.optional(),
    status: Procedure.shape.status.optional(),
  })
  .meta({ id: "ProcedurePatch" });
export type ProcedurePatch = z.infer<typeof ProcedurePatch>;
