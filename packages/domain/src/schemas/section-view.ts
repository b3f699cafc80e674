import { z } from "zod";
import { lengthMm } from "./quantities.ts";

const point2 = z.tuple([z.number(), z.number()]);

/** Why a point of a section was not used. */
export const REJECTIONS = ["outside", "spike", "ghost", "tack", "spatter", "edge", "not_a_plate"] as const;

/** A cross-section at a station, in the section frame: (lateral, normal), mm. */
export const SectionView = z
  .object({
    station_mm: lengthMm("Station along the seam", 120),
    measured: z.boolean().meta({ description: "Whether the section could be measured" }),
    why: z.string().nullable().meta({ description: "Why it could not be measured" }),
    kept: z
      .array(point2)
      .max(4000)
      .meta({ description: "Points used, (lateral, normal) in mm; thinned above 4000" }),
    rejected: z
      .array(z.object({ point: point2, why: z.enum(REJECTIONS) }))
      .max(2000)
      .meta({ description: "Points not used, and why; thinned above 2000" }),
    plates: z
      .array(
        z.object({
          plate: z.enum(["a", "b"]),
          from: point2,
          to: point2,
          rms_mm: z.number(),
          points: z.int(),
        }),
      )
      .meta({ description: "Fitted faces as segments, with the rms of their residuals" }),
    root: point2.nullable().meta({ description: "Root found, (lateral, normal) in mm" }),
    toes: z
      .array(point2)
      .max(2)
      .optional()
      .meta({ description: "Finished bead: toes on plate A and plate B, (lateral, normal) in mm" }),
    model: z.array(z.array(point2)).meta({ description: "Outline of the model's section as polylines" }),
  })
  .meta({ id: "SectionView" });
export type SectionView = z.infer<typeof SectionView>;
