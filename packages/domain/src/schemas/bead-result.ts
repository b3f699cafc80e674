import { z } from "zod";
import { BeadRequirement } from "./bead-requirement.ts";
import { angleDeg, lengthMm, share } from "./quantities.ts";
import { Verdict } from "./scan-result.ts";

/** Figures of a finished weld in one section; which of them a station has follows from its joint. */
export const BEAD_QUANTITIES = [
  "leg_a_mm",
  "leg_b_mm",
  "throat_mm",
  "throat_actual_mm",
  "convexity_mm",
  "concavity_mm",
  "asymmetry_mm",
  "width_mm",
  "excess_mm",
  "underfill_mm",
  "mismatch_mm",
  "toe_angle_a_deg",
  "toe_angle_b_deg",
  "undercut_a_mm",
  "undercut_b_mm",
] as const;

export const BEAD_BLIND_REASONS = [
  "no_points",
  "plate_a_not_found",
  "plate_b_not_found",
  "root_not_found",
  "toe_a_not_found",
  "toe_b_not_found",
  "face_not_seen",
  "ambiguous",
  "beyond_end",
] as const;

const size = (description: string, example: number) => lengthMm(description, example).optional();
const u = (of: string, unit: string) =>
  z
    .number()
    .min(0)
    .optional()
    .meta({ description: `Standard uncertainty of ${of}, ${unit}`, example: unit === "mm" ? 0.05 : 2 });

/** The finished weld at one station. */
export const BeadStation = z
  .strictObject({
    station_mm: lengthMm("Arc length from the seam's start", 12),
    measured: z.boolean().meta({ description: "Whether the weld could be measured here", example: true }),
    why: z
      .enum(BEAD_BLIND_REASONS)
      .optional()
      .meta({ description: "Why not, where it could not", example: "toe_b_not_found" }),
    leg_a_mm: size("Leg on plate A, from the root to the toe", 7.2),
    leg_b_mm: size("Leg on plate B, from the root to the toe", 6.9),
    throat_mm: size("Throat: height of the largest isosceles triangle inside the weld", 4.9),
    throat_actual_mm: size("Height of the weld's face over the root, along the bisector", 5.6),
    convexity_mm: size("Highest place of the face over the line from toe to toe", 0.7),
    concavity_mm: size("Deepest place of the face under the line from toe to toe", 0),
    asymmetry_mm: size("Difference of the legs", 0.3),
    width_mm: size("Width from toe to toe", 10),
    excess_mm: size("Highest place of a butt weld over the line from toe to toe", 1.4),
    underfill_mm: size("Deepest place of a butt weld under the line from toe to toe", 0),
    mismatch_mm: size("Mismatch (hi-lo) of a butt joint, + where B stands proud", 0.2),
    toe_angle_a_deg: angleDeg("Angle of air at the toe on plate A", 132).optional(),
    toe_angle_b_deg: angleDeg("Angle of air at the toe on plate B", 128).optional(),
    undercut_a_mm: size("Depth of the undercut on plate A; 0 where none shows", 0),
    undercut_b_mm: size("Depth of the undercut on plate B; 0 where none shows", 0.4),
    u_leg_a_mm: u("leg_a_mm", "mm"),
    u_leg_b_mm: u("leg_b_mm", "mm"),
    u_throat_mm: u("throat_mm", "mm"),
    u_throat_actual_mm: u("throat_actual_mm", "mm"),
    u_convexity_mm: u("convexity_mm", "mm"),
    u_concavity_mm: u("concavity_mm", "mm"),
    u_asymmetry_mm: u("asymmetry_mm", "mm"),
    u_width_mm: u("width_mm", "mm"),
    u_excess_mm: u("excess_mm", "mm"),
    u_underfill_mm: u("underfill_mm", "mm"),
    u_mismatch_mm: u("mismatch_mm", "mm"),
    u_toe_angle_a_deg: u("toe_angle_a_deg", "degrees"),
    u_toe_angle_b_deg: u("toe_angle_b_deg", "degrees"),
    u_undercut_a_mm: u("undercut_a_mm", "mm"),
    u_undercut_b_mm: u("undercut_b_mm", "mm"),
  })
  .meta({ id: "BeadStation", description: "The finished weld at one station" });
export type BeadStation = z.infer<typeof BeadStation>;

export const FINDING_STATES = ["met", "not_met", "not_proven"] as const;

/** One imperfection, measured along the weld and held against the quality level. */
export const BeadFinding = z
  .strictObject({
    code: z.string().meta({ description: "Number in ISO 6520-1", example: "5011" }),
    name: z.string().meta({ description: "Its name", example: "continuous undercut" }),
    plate: z
      .enum(["a", "b"])
      .optional()
      .meta({ description: "The plate on whose side it lies", example: "b" }),
    state: z.enum(FINDING_STATES).meta({
      description:
        "met: proved inside; not_met: proved outside; not_proven: too near the limit to say (ISO 14253-1)",
      example: "not_met",
    }),
    station_mm: lengthMm("Station of the worst value", 212),
    value: z.number().meta({ description: "Worst value, in `unit`", example: 0.72 }),
    expanded_u: z
      .number()
      .min(0)
      .meta({ description: "Expanded uncertainty of the value (k = 2), in `unit`", example: 0.06 }),
    limit: z
      .number()
      .nullable()
      .meta({ description: "Limit in `unit`; null where the level does not permit it at all", example: 0.5 }),
    unit: z.enum(["mm", "deg"]).meta({ description: "Unit of value and limit", example: "mm" }),
    length_mm: lengthMm("Length of weld on which it is not proved to keep the limit", 14).min(0),
    source: z.string().meta({ description: "Where the limit stands", example: "ISO 5817:2023 Table 1, 1.7" }),
    text: z.string().meta({
      description: "The finding as a sentence",
      example: "5011 continuous undercut, plate B: 0.72 mm at 212 mm, 0.50 mm allowed",
    }),
  })
  .meta({ id: "BeadFinding", description: "An imperfection held against the quality level" });
export type BeadFinding = z.infer<typeof BeadFinding>;

const figure = z
  .strictObject({
    mean: z.number().meta({ description: "Mean along the weld", example: 5.1 }),
    min: z.number().meta({ description: "Smallest", example: 4.7 }),
    max: z.number().meta({ description: "Largest", example: 5.6 }),
  })
  .meta({ description: "A figure along the weld" });

/** What evaluating a scan of the finished bead gives: the JSON of `beadroll evaluate --stage bead --json`. */
export const BeadResult = z
  .strictObject({
    engine: z
      .string()
      .meta({ description: "Name and version of the measuring code", example: "beadroll-measure 1.1.0" }),
    stage: z.literal("bead").meta({ description: "A scan of the finished bead" }),
    model: z.string().meta({ description: "The model's id", example: "B-1107-12" }),
    joint_type: z.string().meta({ description: "Joint type of the model", example: "fillet_t" }),
    points: z.int().min(0).meta({ description: "Points in the scan", example: 40574 }),
    points_lost: z.int().min(0).meta({ description: "Returns without a usable number", example: 386 }),
    requirement: BeadRequirement,
    verdict: Verdict,
    reasons: z.array(z.string()).meta({
      description: "Every reason why it is `hold`, as sentences",
      example: ["5011 continuous undercut, plate B: 0.72 mm at 212 mm, 0.50 mm allowed"],
    }),
    findings: z.array(BeadFinding).meta({
      description: "Every imperfection that the scan can measure, the worst first; `met` ones too",
    }),
    warnings: z.array(z.string()).meta({
      description: "What a person should know besides",
      example: [
        "A scan does not show cracks, lack of fusion, pores or penetration: a person looks for them.",
      ],
    }),
    coverage: z
      .strictObject({
        share: share("Share of stations measured", 1),
        longest_blind_mm: lengthMm("Longest stretch without a measured station", 0).min(0),
      })
      .meta({ description: "How much of the weld was measured" }),
    summary: z
      .partialRecord(z.enum(BEAD_QUANTITIES), figure)
      .meta({ description: "Each figure along the weld", example: {} }),
    stations: z.array(BeadStation).meta({ description: "One entry a station, in growing order" }),
  })
  .meta({ id: "BeadResult", description: "A finished weld, measured and judged" });
export type BeadResult = z.infer<typeof BeadResult>;
