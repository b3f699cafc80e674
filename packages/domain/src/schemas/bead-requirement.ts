import { z } from "zod";
import { ISO_5817_CURRENT, ISO_5817_EDITIONS, QUALITY_LEVELS } from "../quality/iso-5817/limit.ts";
import { lengthMm } from "./quantities.ts";

/** What a finished weld is judged by. */
export const BeadRequirement = z
  .strictObject({
    weld_size_mm: lengthMm("Throat a of a fillet weld, thickness s of a butt weld", 5).positive(),
    quality_level: z.enum(QUALITY_LEVELS).meta({ description: "Quality level, ISO 5817", example: "C" }),
    edition: z
      .enum(ISO_5817_EDITIONS)
      .default(ISO_5817_CURRENT)
      .meta({ description: "Edition of ISO 5817", example: "2023" }),
  })
  .meta({ id: "BeadRequirement" });
export type BeadRequirement = z.infer<typeof BeadRequirement>;
