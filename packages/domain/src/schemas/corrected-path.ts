import { z } from "zod";
import { angleDeg, lengthMm } from "./quantities.ts";
import { Verdict } from "./scan-result.ts";

const vector = (description: string, example: [number, number, number]) =>
  z.tuple([z.number(), z.number(), z.number()]).meta({ description, example });

/** One place of a corrected path. */
export const PathPoint = z
  .strictObject({
    station_mm: lengthMm("Station along the nominal line", 12),
    point_mm: vector("Root as measured, part frame", [12, 127.12, -0.05]),
    tangent: vector("Unit vector of travel along the measured line, part frame", [1, 0, 0]),
    tool_axis: vector(
      "Unit vector from the joint toward the torch, square to the travel, part frame",
      [0, -0.6, 0.8],
    ),
    tilt_deg: angleDeg("Turn of the tool axis about the travel against the model, as the plates turn", 0.4),
    shift_mm: lengthMm("How far the point lies from the nominal line", 0.13),
  })
  .meta({ id: "PathPoint", description: "A place of a corrected path" });
export type PathPoint = z.infer<typeof PathPoint>;

/** The nominal line moved to the joint as measured: advice for the coordinator, no command to a robot. */
export const CorrectedPath = z
  .strictObject({
    model: z.string().meta({ description: "The model's id", example: "B-1107-12" }),
    engine: z
      .string()
      .meta({ description: "Name and version of the measuring code", example: "beadroll-measure 1.0.0" }),
    frame: z.literal("part").meta({ description: "Frame of all points" }),
    verdict: Verdict,
    complete: z.boolean().meta({ description: "Whether every station was measured; gaps are never bridged" }),
    notice: z.string().meta({ description: "What this path is and is not" }),
    points: z
      .array(PathPoint)
      .meta({ description: "Measured stations in growing order; others are left out" }),
  })
  .meta({ id: "CorrectedPath", description: "A corrected path" });
export type CorrectedPath = z.infer<typeof CorrectedPath>;
