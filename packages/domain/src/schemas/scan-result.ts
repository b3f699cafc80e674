import { z } from "zod";
import { angleDeg, lengthMm, share } from "./quantities.ts";

const count = (description: string, example: number) => z.int().min(0).meta({ description, example });
const u = (description: string, unit: string, example: number) =>
  z
    .number()
    .min(0)
    .optional()
    .meta({ description: `Standard uncertainty of ${description}, ${unit}`, example });
const triple = (description: string, example: [number, number, number]) =>
  z.tuple([z.number(), z.number(), z.number()]).meta({ description, example });

export const VERDICTS = ["within", "adapt", "hold"] as const;
export const CHECKS = ["lateral", "normal", "gap", "mismatch", "angle", "coverage"] as const;

/** What a scan's deviations mean. */
export const Verdict = z
  .enum(VERDICTS)
  .meta({ id: "Verdict", description: "What the deviations mean", example: "adapt" });
export type Verdict = z.infer<typeof Verdict>;

/** One reason why a verdict is not `within`. */
export const VerdictReason = z
  .strictObject({
    check: z.enum(CHECKS).meta({ description: "What was checked", example: "gap" }),
    station_mm: lengthMm("Station of the worst value", 90),
    value: z.number().meta({ description: "Value found, in `unit`", example: 0.92 }),
    limit: z
      .number()
      .meta({ description: "Limit that it crosses or cannot be proved to keep", example: 0.5 }),
    unit: z.enum(["mm", "deg", "share"]).meta({ description: "Unit of value and limit", example: "mm" }),
    level: z
      .enum(["within", "adapt"])
      .meta({ description: "Which set of limits; `adapt` means hold", example: "within" }),
    proof: z.enum(["outside", "not_proven", "too_coarse", "not_measured"]).meta({
      description:
        "outside: beyond the limit by more than its expanded uncertainty; not_proven: too near to say; too_coarse: the scan cannot prove this limit at all; not_measured: too little seen",
      example: "outside",
    }),
    expanded_u: z
      .number()
      .min(0)
      .optional()
      .meta({ description: "Expanded uncertainty of the value (k = 2), in `unit`", example: 0.06 }),
    from_mm: lengthMm("First station of the stretch", 84).optional(),
    to_mm: lengthMm("Last station of the stretch", 97.5).optional(),
    text: z
      .string()
      .meta({ description: "The reason as a sentence", example: "Gap 0.92 mm at 90 mm: above 0.50 mm" }),
  })
  .meta({ id: "VerdictReason", description: "A reason of the verdict" });
export type VerdictReason = z.infer<typeof VerdictReason>;

export const BLIND_REASONS = [
  "no_points",
  "few_points_a",
  "few_points_b",
  "plate_a_not_found",
  "plate_b_not_found",
  "ambiguous",
  "root_not_seen",
  "beyond_end",
] as const;

/** The joint at one station. */
export const StationResult = z
  .strictObject({
    station_mm: lengthMm("Arc length from the seam's start", 12),
    measured: z.boolean().meta({ description: "Whether the joint could be measured here", example: true }),
    why: z
      .enum(BLIND_REASONS)
      .optional()
      .meta({ description: "Why not, where it could not", example: "few_points_b" }),
    lateral_mm: lengthMm("Root, measured minus model, toward plate B", 0.12).optional(),
    normal_mm: lengthMm("Root, measured minus model, out of plate A", -0.05).optional(),
    gap_mm: lengthMm("Gap measured at the root; absent where it is covered or not seen", 0.1).optional(),
    mismatch_mm: lengthMm(
      "Mismatch (hi-lo) measured, + where B stands proud; butt joints only",
      0.2,
    ).optional(),
    angle_deg: angleDeg("Included angle, measured minus model", -0.4).optional(),
    u_lateral_mm: u("lateral_mm", "mm", 0.015),
    u_normal_mm: u("normal_mm", "mm", 0.014),
    u_gap_mm: u("gap_mm", "mm", 0.03),
    u_mismatch_mm: u("mismatch_mm", "mm", 0.02),
    u_angle_deg: u("angle_deg", "degrees", 0.2),
    root_mm: triple("Root measured, mm, part frame", [12, 127.12, -0.05]).optional(),
    plate_a_rot_deg: angleDeg(
      "Turn of plate A about the tangent, from lateral toward normal",
      0.1,
    ).optional(),
    plate_b_rot_deg: angleDeg(
      "Turn of plate B about the tangent, from lateral toward normal",
      -0.3,
    ).optional(),
    tack: z.boolean().optional().meta({
      description: "True under a tack weld: the root is constructed from the faces beside it",
      example: true,
    }),
    points_a: count("Points that carry plate A's face", 140).optional(),
    points_b: count("Points that carry plate B's face", 80).optional(),
    rejected: count("Points of the section rejected", 6).optional(),
    residual_mm: lengthMm("Robust spread of the points about the faces", 0.03).min(0).optional(),
  })
  .meta({ id: "StationResult", description: "The joint at one station" });
export type StationResult = z.infer<typeof StationResult>;

const statistic = (description: string, unit: string) =>
  z
    .strictObject({
      max_abs: z
        .number()
        .min(0)
        .meta({ description: `Largest absolute value, ${unit}`, example: 0.92 }),
      at_mm: lengthMm("Station of the largest absolute value", 54),
      rms: z
        .number()
        .min(0)
        .meta({ description: `Root mean square, ${unit}`, example: 0.41 }),
      p95_abs: z
        .number()
        .min(0)
        .meta({ description: `95th percentile of the absolute values, ${unit}`, example: 0.88 }),
    })
    .optional()
    .meta({ description });

/** Largest, root mean square and 95th percentile of each quantity; absent where nothing was measured. */
export const ScanSummary = z
  .strictObject({
    lateral_mm: statistic("Lateral deviation", "mm"),
    normal_mm: statistic("Normal deviation", "mm"),
    gap_mm: statistic("Gap, as measured", "mm"),
    mismatch_mm: statistic("Mismatch, as measured", "mm"),
    angle_deg: statistic("Deviation of the included angle", "degrees"),
  })
  .meta({ id: "ScanSummary", description: "The seam in figures" });
export type ScanSummary = z.infer<typeof ScanSummary>;

/** What an evaluation gives: the JSON of `beadroll evaluate --json`. */
export const ScanResult = z
  .strictObject({
    engine: z
      .string()
      .meta({ description: "Name and version of the measuring code", example: "beadroll-measure 1.0.0" }),
    model: z.string().meta({ description: "The model's id", example: "B-1107-12" }),
    joint_type: z.string().meta({ description: "Joint type of the model", example: "fillet_t" }),
    points: count("Points in the scan", 40574),
    points_used: count("Points that carry a fitted face", 30120),
    points_lost: count("Returns without a usable number", 386),
    verdict: Verdict,
    reasons: z.array(VerdictReason).meta({ description: "Every reason why it is not `within`" }),
    warnings: z.array(z.string()).meta({
      description: "What a person should know besides",
      example: ["No movement along the seam can be seen."],
    }),
    coverage: z
      .strictObject({
        share: share("Share of stations measured", 1),
        longest_blind_mm: lengthMm("Longest stretch without a measured station", 0).min(0),
        blind_from_mm: lengthMm("Where that stretch begins", 40).optional(),
        blind_to_mm: lengthMm("Where that stretch ends", 52).optional(),
      })
      .meta({ description: "How much of the seam was measured" }),
    ends: z
      .strictObject({
        start_mm: lengthMm("First station where the joint is seen; null if nowhere", 0).nullable(),
        end_mm: lengthMm("Last station where the joint is seen; null if nowhere", 127).nullable(),
        start_seen: z.boolean().meta({
          description: "True where the scan runs on past the start, so that it is a real end",
          example: false,
        }),
        end_seen: z.boolean().meta({
          description: "True where the scan runs on past the end, so that it is a real end",
          example: false,
        }),
      })
      .meta({ description: "Ends along the seam" }),
    rigid: z
      .strictObject({
        translation_mm: triple("Translation of the seam's midpoint, mm, part frame", [0, 5.05, 0]),
        rotation_deg: triple("Rotation vector about the seam's midpoint, degrees, part frame", [0, 0, -2.3]),
        unobservable: z
          .array(z.enum(["along_seam", "turn_about_seam", "all"]))
          .meta({ description: "What the scan cannot show; left at 0", example: ["along_seam"] }),
      })
      .meta({ description: "The rigid part of the deviation" }),
    remaining: z
      .strictObject({
        max_abs_mm: lengthMm("Largest deviation after the rigid part is taken out", 0.1).min(0),
        at_mm: lengthMm("Its station", 64),
        rms_mm: lengthMm("Root mean square after the rigid part is taken out", 0.03).min(0),
        bend_lateral_mm: lengthMm("Bow across the seam: middle against the chord of the ends", 0.05),
        bend_normal_mm: lengthMm("Bow along plate A's normal: middle against the chord of the ends", 0.02),
        twist_deg: angleDeg("Turn of plate A at the end against the start", 0.1),
      })
      .optional()
      .meta({ description: "What remains when the rigid part is taken out" }),
    registration: z
      .strictObject({
        by: z.enum(["datums", "plates"]).meta({ description: "What the scan was placed by" }),
        translation_mm: triple("Translation from the scan's frame to the part's, mm", [0.4, -1.2, 0]),
        rotation_deg: triple("Rotation vector of the same, degrees", [0, 0, 0.3]),
        rms_mm: lengthMm("What is left at the datum points or plates, root mean square", 0.03).min(0),
        condition: z.number().min(0).max(1).meta({
          description: "How well the pose is determined: 0 not at all, 1 as well as can be",
          example: 0.4,
        }),
        u_mm: lengthMm("Standard uncertainty that it leaves at the seam, each axis", 0.015).min(0),
        free: z
          .array(z.string())
          .meta({ description: "What it leaves undetermined", example: ["along_seam"] }),
      })
      .optional()
      .meta({ description: "How the scan was brought into the part frame; absent where it came in it" }),
    summary: ScanSummary,
    stations: z.array(StationResult).meta({ description: "One entry a station, in growing order" }),
  })
  .meta({ id: "ScanResult", description: "A scan held against its model" });
export type ScanResult = z.infer<typeof ScanResult>;
