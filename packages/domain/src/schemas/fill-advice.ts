import { z } from "zod";
import { lengthMm } from "./quantities.ts";

/** What one station asks for. */
export const FillStation = z
  .strictObject({
    station_mm: lengthMm("Station along the seam", 12),
    gap_mm: lengthMm("Gap measured", 0.8),
    area_mm2: z.number().meta({ description: "Weld metal that the joint asks for, mm²", example: 31.2 }),
    travel_mm_s: z
      .number()
      .meta({ description: "Travel speed that gives it at the same wire feed, mm/s", example: 5.1 }),
    heat_input_kj_mm: z.number().nullable().meta({
      description: "Heat input at that speed, kJ/mm; null where the procedure gives none",
      example: 1.31,
    }),
    inside: z.boolean().meta({ description: "Whether speed and heat input stay inside the procedure" }),
  })
  .meta({ id: "FillStation", description: "What one station asks for" });
export type FillStation = z.infer<typeof FillStation>;

/** Fill that the measured gap asks for: advice for the coordinator, never a command. */
export const FillAdvice = z
  .strictObject({
    nominal_area_mm2: z
      .number()
      .meta({ description: "Weld metal of the joint as designed, mm²", example: 25 }),
    nominal_travel_mm_s: z.number().meta({
      description: "Travel speed it is welded at: the middle of the procedure's range, mm/s",
      example: 6.5,
    }),
    nominal_heat_input_kj_mm: z.number().nullable().meta({
      description: "Heat input at that speed, from the middles of the procedure's ranges, kJ/mm",
      example: 1.05,
    }),
    all_inside: z.boolean().meta({ description: "Whether every station stays inside the procedure" }),
    notice: z.string().meta({ description: "What this is and is not" }),
    stations: z.array(FillStation).meta({ description: "Stations whose gap was measured" }),
  })
  .meta({ id: "FillAdvice", description: "Fill that the measured gap asks for" });
export type FillAdvice = z.infer<typeof FillAdvice>;
