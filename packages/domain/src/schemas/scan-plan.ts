import { z } from "zod";
import { lengthMm } from "./quantities.ts";

const positive = (description: string, unit: string, example: number) =>
  z
    .number()
    .positive()
    .meta({ description: `${description}, ${unit}`, example });

/** A laser-line scanner by its data sheet. */
export const ScannerData = z
  .strictObject({
    profile_rate_hz: positive("Profiles a second at the setting used", "Hz", 200),
    points_per_profile: z.int().min(2).meta({ description: "Points across", example: 1280 }),
    near_mm: lengthMm("Stand-off at which measuring begins", 120).positive(),
    far_mm: lengthMm("Stand-off at which it ends", 220).positive(),
    width_near_mm: lengthMm("Width of the field there", 60).positive(),
    width_far_mm: lengthMm("Width of the field there", 100).positive(),
    exposure_ms: z.number().min(0).optional().meta({ description: "Exposure of a profile, ms", example: 1 }),
  })
  .refine(({ near_mm, far_mm }) => far_mm > near_mm, {
    message: "far_mm must be above near_mm",
    path: ["far_mm"],
  })
  .meta({ id: "ScannerData", description: "A scanner by its data sheet" });
export type ScannerData = z.infer<typeof ScannerData>;

/** How a seam is to be scanned. */
export const ScanPlanInput = z
  .strictObject({
    scanner: ScannerData,
    stand_off_mm: lengthMm("Stand-off the scanner is driven at", 170).positive(),
    travel_mm_s: positive("Travel speed while scanning", "mm/s", 100),
    run_off_mm: lengthMm("Way beyond each end, to see the ends", 5).min(0).default(5),
    approach_s: z.number().min(0).default(2).meta({ description: "Approach and return, s", example: 2 }),
  })
  .meta({ id: "ScanPlanInput", description: "How a seam is to be scanned" });
export type ScanPlanInput = z.infer<typeof ScanPlanInput>;

export const PLAN_CHECKS = [
  "profile_spacing",
  "point_spacing",
  "field_width",
  "depth",
  "stand_off",
  "motion_blur",
  "points_on_faces",
  "limit_uncertainty",
] as const;

/** One thing that a plan is held against. */
export const PlanCheck = z
  .strictObject({
    check: z.enum(PLAN_CHECKS).meta({ description: "What was looked at", example: "field_width" }),
    ok: z.boolean().meta({ description: "Whether it serves" }),
    value: z.number().meta({ description: "What the plan gives, in `unit`", example: 78 }),
    wanted: z.number().meta({ description: "What is wanted, in `unit`", example: 66 }),
    unit: z.enum(["mm", "points"]).meta({ description: "Unit of both" }),
    text: z
      .string()
      .meta({ description: "As a sentence", example: "The field is 78.0 mm wide, 66.0 are wanted." }),
  })
  .meta({ id: "PlanCheck", description: "One thing that a plan is held against" });
export type PlanCheck = z.infer<typeof PlanCheck>;

/** What a scan of a seam will give, and whether it serves. */
export const ScanPlan = z
  .strictObject({
    profile_spacing_mm: lengthMm("Distance from profile to profile", 0.5),
    point_spacing_mm: lengthMm("Distance from point to point across, at the stand-off", 0.06),
    field_width_mm: lengthMm("Width of the field at the stand-off", 80),
    profiles: z.int().meta({ description: "Profiles of one pass", example: 641 }),
    passes: z
      .int()
      .meta({ description: "Passes side by side that cover the joint and its limits", example: 1 }),
    points: z.int().meta({ description: "Points of all passes", example: 820480 }),
    time_s: z.number().meta({ description: "Time for all passes with approach, s", example: 5.2 }),
    serves: z.boolean().meta({ description: "Whether every check is met" }),
    checks: z.array(PlanCheck).meta({ description: "Every check, met or not" }),
  })
  .meta({ id: "ScanPlan", description: "What a scan of a seam will give" });
export type ScanPlan = z.infer<typeof ScanPlan>;
