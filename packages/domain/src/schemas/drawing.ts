import { z } from "zod";
import { QUALITY_LEVELS } from "../quality/iso-5817/limit.ts";
import { id, instant, lengthMm, line, version } from "./quantities.ts";
import { DEFAULT_LIMITS, JointType, SeamLimits, SeamModel } from "./seam-model.ts";

const drawingFields = {
  number: line("Drawing number", "FW-2210", 60),
  revision: line("Revision", "C", 10),
  title: line("Title", "Skid frame"),
};

/** A product's drawing, by number and revision; it carries model seams. */
export const Drawing = z
  .object({
    id: id("Drawing"),
    ...drawingFields,
    status: z.enum(["draft", "current", "superseded"]).meta({ description: "Whether parts are made to it" }),
    model_seam_count: z.int().meta({ description: "Model seams it carries", example: 14 }),
    part_count: z.int().meta({ description: "Parts made to it", example: 40 }),
    created_at: instant("When recorded"),
    version,
  })
  .meta({ id: "Drawing" });
export type Drawing = z.infer<typeof Drawing>;

/** A new drawing or revision. */
export const DrawingCreate = z
  .strictObject({ ...drawingFields, status: Drawing.shape.status.default("current") })
  .meta({ id: "DrawingCreate" });
export type DrawingCreate = z.infer<typeof DrawingCreate>;

/** A change of a drawing. */
export const DrawingPatch = z
  .strictObject({ title: drawingFields.title.optional(), status: Drawing.shape.status.optional() })
  .meta({ id: "DrawingPatch" });
export type DrawingPatch = z.infer<typeof DrawingPatch>;

export const SCAN_RULES = ["always", "sample", "never"] as const;

const modelSeamFields = {
  number: line("Seam number on the drawing", "S4", 12),
  sequence: z.int().min(1).meta({ description: "Place in the welding sequence", example: 4 }),
  weld_size_mm: lengthMm("Weld size: throat a of a fillet, depth of a butt weld", 5).positive(),
  quality_level: z.enum(QUALITY_LEVELS).meta({ description: "Quality level, ISO 5817" }),
  procedure_id: id("Procedure").nullable(),
  scan_rule: z.enum(SCAN_RULES).meta({ description: "Whether the cell scans it" }),
};

/** A seam as designed. The model itself (nominal line, section, limits) is `GET /model-seams/{id}/model`. */
export const ModelSeam = z
  .object({
    id: id("Model seam"),
    drawing_id: id("Drawing"),
    ...modelSeamFields,
    joint_type: JointType,
    length_mm: lengthMm("Length of the seam", 320),
    limits: SeamLimits.meta({ description: "Limits in force, defaults filled in", example: DEFAULT_LIMITS }),
    procedure_name: z
      .string()
      .nullable()
      .meta({ description: "Number and revision of the procedure", example: "PB-135-07 rev 2" }),
    seam_count: z.int().meta({ description: "Seams made to it", example: 40 }),
    created_at: instant("When recorded"),
    version,
  })
  .meta({ id: "ModelSeam" });
export type ModelSeam = z.infer<typeof ModelSeam>;

/** A new model seam with its model. */
export const ModelSeamCreate = z
  .strictObject({
    ...modelSeamFields,
    procedure_id: modelSeamFields.procedure_id.optional(),
    scan_rule: modelSeamFields.scan_rule.default("always"),
    model: SeamModel,
  })
  .meta({ id: "ModelSeamCreate" });
export type ModelSeamCreate = z.infer<typeof ModelSeamCreate>;

/** A change of a model seam. Limits apply to scans from then on; scans taken keep the limits they were judged by. */
export const ModelSeamPatch = z
  .strictObject({
    sequence: modelSeamFields.sequence.optional(),
    weld_size_mm: modelSeamFields.weld_size_mm.optional(),
    quality_level: modelSeamFields.quality_level.optional(),
    procedure_id: modelSeamFields.procedure_id.optional(),
    scan_rule: modelSeamFields.scan_rule.optional(),
    limits: SeamLimits.optional(),
  })
  .meta({ id: "ModelSeamPatch" });
export type ModelSeamPatch = z.infer<typeof ModelSeamPatch>;

/** A drawing with its model seams in welding sequence. */
export const DrawingPage = Drawing.extend({
  model_seams: z.array(ModelSeam).meta({ description: "In welding sequence" }),
}).meta({ id: "DrawingPage" });
export type DrawingPage = z.infer<typeof DrawingPage>;
