import { z } from "zod";
import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import { BeadRequirement } from "./bead-requirement.ts";
import { lengthMm } from "./quantities.ts";
import { checkVertices } from "./seam-vertices.ts";

/** The joints that can be measured; definitions with pictures stand in docs/measuring.md. */
export const JOINT_TYPES = [
  "fillet_t",
  "lap",
  "corner_open",
  "corner_closed",
  "butt_v",
  "butt_half_v",
  "butt_square",
] as const;

/** A joint type as the model names it. */
export const JointType = z
  .enum(JOINT_TYPES)
  .meta({ id: "JointType", description: "Type of joint", example: "fillet_t" });
export type JointType = z.infer<typeof JointType>;

const vector = (description: string, example: [number, number, number]) =>
  z.tuple([z.number(), z.number(), z.number()]).meta({ description, example });

/** One station of the nominal line with its section frame, part frame. */
export const SeamVertex = z
  .looseObject({
    station_mm: lengthMm("Arc length from the seam's start", 12),
    point: vector("Nominal root, mm, part frame", [12, 127, 0]),
    tangent: vector("Unit vector along growing station", [1, 0, 0]),
    lateral: vector("Unit vector in plate A's surface, across the seam, toward plate B", [0, 1, 0]),
    normal: vector("Unit outward normal of plate A's surface", [0, 0, 1]),
  })
  .meta({ id: "SeamVertex", description: "A station of the nominal line" });
export type SeamVertex = z.infer<typeof SeamVertex>;

const polyline = (description: string) =>
  z
    .array(z.tuple([z.number(), z.number()]))
    .min(2)
    .meta({
      description,
      example: [
        [-40, 0],
        [0, 0],
      ],
    });

const plate = (description: string) =>
  z
    .looseObject({
      thickness_mm: lengthMm("Thickness", 6).positive(),
      height_mm: lengthMm("Height of an upright above plate A", 20).positive().optional(),
    })
    .meta({ description, example: { thickness_mm: 6 } });

/** The nominal cross-section: plates, root, gap and angle. */
export const SeamSection = z
  .looseObject({
    plate_a: plate("Plate A: the base, lower, left or first plate"),
    plate_b: plate("Plate B: the upright, upper, right or second plate"),
    nominal_profile: z
      .looseObject({
        plate_a: polyline("Visible faces of plate A as (lateral, normal) points, mm"),
        plate_b: polyline("Visible faces of plate B as (lateral, normal) points, mm"),
      })
      .optional()
      .meta({ description: "Visible faces of the nominal joint; worked out from the sizes where absent" }),
    gap_mm: lengthMm("Nominal gap at the root", 0).min(0).optional(),
    mismatch_mm: lengthMm("Nominal mismatch (hi-lo), butt joints only", 0).nullable().optional(),
    included_angle_deg: z
      .number()
      .min(0)
      .max(180)
      .optional()
      .meta({ description: "Nominal angle of the open groove, degrees", example: 90 }),
    groove_angle_deg: z
      .number()
      .min(0)
      .max(150)
      .optional()
      .meta({ description: "Groove angle of a V or half V, degrees", example: 60 }),
    root_face_mm: lengthMm("Height of the root face (land)", 2).min(0).optional(),
    root_depth_below_surface_mm: lengthMm("Depth of the root edges below plate A's surface", 8)
      .min(0)
      .optional(),
  })
  .meta({ id: "SeamSection", description: "Nominal cross-section" });
export type SeamSection = z.infer<typeof SeamSection>;

const limit = (description: string, unit: string, example: number) =>
  z
    .number()
    .positive()
    .optional()
    .meta({ description: `${description}, ${unit}`, example });

const limitSet = (description: string) =>
  z
    .strictObject({
      lateral_mm: limit("Largest lateral deviation either way", "mm", 0.5),
      normal_mm: limit("Largest normal deviation either way", "mm", 0.5),
      gap_mm: limit("Largest departure of the gap from the nominal gap", "mm", 0.5),
      mismatch_mm: limit("Largest departure of the mismatch from the nominal one", "mm", 0.5),
      angle_deg: limit("Largest departure of the included angle from the nominal one", "degrees", 3),
    })
    .meta({ description, example: { lateral_mm: 0.5, normal_mm: 0.5, gap_mm: 0.5 } });

/** What a seam allows: what is absent is taken from {@link DEFAULT_LIMITS}. */
export const SeamLimits = z
  .strictObject({
    within: limitSet("Inside these the nominal path serves").optional(),
    adapt: limitSet("Inside these the path may follow the joint; beyond them the seam is held").optional(),
    coverage_share: z
      .number()
      .min(0)
      .max(1)
      .optional()
      .meta({ description: "Smallest share of stations that must be measured, 0 to 1", example: 0.9 }),
    longest_blind_mm: lengthMm("Longest stretch that may stay unmeasured", 10).min(0).optional(),
  })
  .meta({ id: "SeamLimits", description: "Limits of a seam" });
export type SeamLimits = z.infer<typeof SeamLimits>;

/**
 * A seam as designed: the nominal line with a section frame at each station, the nominal cross-section and
 * the limits. Lengths in mm, angles in degrees, part frame. Keys beyond these are kept and not read.
 */
export const SeamModel = z
  .looseObject({
    case: z
      .string()
      .trim()
      .min(1)
      .max(200)
      .optional()
      .meta({ description: "The model's id", example: "B-1107-12" }),
    title: z.string().max(400).optional().meta({ description: "Title for people", example: "Web to base" }),
    units: z
      .looseObject({
        length: z.literal("mm").meta({ description: "Unit of lengths", example: "mm" }),
        angle: z.literal("deg").meta({ description: "Unit of angles", example: "deg" }),
      })
      .optional()
      .meta({ description: "Units; only mm and degrees are taken", example: { length: "mm", angle: "deg" } }),
    joint_type: JointType,
    seam: z
      .looseObject({
        length_mm: lengthMm("Length of the nominal line", 127).positive(),
        closed: z
          .boolean()
          .optional()
          .meta({ description: "Whether the end joins the start", example: false }),
        vertices: z
          .array(SeamVertex)
          .min(2)
          .max(100_000)
          .meta({ description: "Stations in growing order, at least two" }),
      })
      .meta({ description: "Nominal line" }),
    section: SeamSection,
    limits: SeamLimits.optional(),
    weld: BeadRequirement.optional(),
  })
  .meta({ id: "SeamModel", description: "A seam as designed" });
export type SeamModel = z.infer<typeof SeamModel>;

/** A complete set of limits for one level. */
export interface LimitSet {
  readonly lateral_mm: number;
  readonly normal_mm: number;
  readonly gap_mm: number;
  readonly mismatch_mm: number;
  readonly angle_deg: number;
}

/** Limits with nothing left out. */
export interface ResolvedLimits {
  readonly within: LimitSet;
  readonly adapt: LimitSet;
  readonly coverage_share: number;
  readonly longest_blind_mm: number;
}

/**
 * Limits that serve where the model gives none. `within` is about what a gas-shielded arc bridges without the
 * path being moved; `adapt` stays below what ISO 5817 allows at level C for common plate. Set your own: these
 * know nothing of the part.
 */
export const DEFAULT_LIMITS: ResolvedLimits = {
  within: { lateral_mm: 0.5, normal_mm: 0.5, gap_mm: 0.5, mismatch_mm: 0.5, angle_deg: 3 },
  adapt: { lateral_mm: 10, normal_mm: 5, gap_mm: 1.5, mismatch_mm: 1.5, angle_deg: 6 },
  coverage_share: 0.9,
  longest_blind_mm: 10,
};

const filled = (own: SeamLimits["within"], fallback: LimitSet): LimitSet => ({
  lateral_mm: own?.lateral_mm ?? fallback.lateral_mm,
  normal_mm: own?.normal_mm ?? fallback.normal_mm,
  gap_mm: own?.gap_mm ?? fallback.gap_mm,
  mismatch_mm: own?.mismatch_mm ?? fallback.mismatch_mm,
  angle_deg: own?.angle_deg ?? fallback.angle_deg,
});

/** A seam's own limits, each one that is absent taken from {@link DEFAULT_LIMITS}. */
export function resolveLimits(limits: SeamLimits | undefined): ResolvedLimits {
  return {
    within: filled(limits?.within, DEFAULT_LIMITS.within),
    adapt: filled(limits?.adapt, DEFAULT_LIMITS.adapt),
    coverage_share: limits?.coverage_share ?? DEFAULT_LIMITS.coverage_share,
    longest_blind_mm: limits?.longest_blind_mm ?? DEFAULT_LIMITS.longest_blind_mm,
  };
}

/** Faults named at most, so that a broken file of a hundred thousand vertices stays readable. */
const MOST_FAULTS = 50;

const pointer = (path: readonly PropertyKey[]) =>
  path.map((key) => `/${String(key).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");

function faultsOfIssue(issue: z.core.$ZodIssue): Fault[] {
  const keys = issue.code === "unrecognized_keys" ? issue.keys : [];
  if (keys.length === 0)
    return [{ code: "model-invalid", detail: issue.message, pointer: pointer(issue.path) }];
  return keys.map((key) => ({
    code: "model-invalid",
    detail: `"${key}" is not a known limit`,
    pointer: pointer([...issue.path, key]),
  }));
}

/**
 * A model from JSON, checked: shape, finite numbers, growing stations, unit and orthogonal section frames
 * (to 0.001), the nominal line as long as its stations say.
 * @param json the parsed file; any value
 * @returns the model, or every fault found (50 at most), each with a JSON pointer; code `model-invalid`
 */
export function parseSeamModel(json: unknown): Outcome<SeamModel> {
  const parsed = SeamModel.safeParse(json);
  if (!parsed.success) return refused(...parsed.error.issues.flatMap(faultsOfIssue).slice(0, MOST_FAULTS));
  const faults = checkVertices(parsed.data.seam);
  return faults.length === 0 ? good(parsed.data) : refused(...faults.slice(0, MOST_FAULTS));
}
