import { z } from "zod";
import { id, instant, note } from "./quantities.ts";

/** Methods by the abbreviations of ISO 17635: visual, penetrant, magnetic, radiographic, ultrasonic. */
export const INSPECTION_METHODS = ["VT", "PT", "MT", "RT", "UT"] as const;
export const INSPECTION_RESULTS = ["accepted", "rejected"] as const;
export type InspectionResult = (typeof INSPECTION_RESULTS)[number];

/** One examination of one seam. */
export const Inspection = z
  .object({
    id: id("Inspection"),
    seam_tag: z.string().meta({ description: "Tag of the seam", example: "S-8K3F7Q2NS" }),
    attempt: z.int().meta({ description: "Attempt examined", example: 1 }),
    method: z.enum(INSPECTION_METHODS).meta({ description: "Method, abbreviated as in ISO 17635" }),
    result: z.enum(INSPECTION_RESULTS).meta({ description: "Against the seam's quality level" }),
    note: note("What was seen", "Even toes, no undercut above 0.3 mm"),
    inspector_name: z.string().meta({ description: "Who examined it", example: "Marek Solheim" }),
    performed_at: instant("When it was examined"),
    received_at: instant("When it was recorded"),
    ledger_seq: z.int().meta({ description: "Ledger entry that recorded it", example: 414 }),
  })
  .meta({ id: "Inspection" });
export type Inspection = z.infer<typeof Inspection>;

/** A new inspection. A rejection says what was seen. */
export const InspectionCreate = z
  .strictObject({
    method: Inspection.shape.method,
    result: Inspection.shape.result,
    note: Inspection.shape.note.default(""),
    performed_at: instant("When it was examined; now if absent").optional(),
  })
  .refine((inspection) => inspection.result === "accepted" || inspection.note.length > 0, {
    path: ["note"],
    message: "say what was seen: a rejection needs a note",
  })
  .meta({ id: "InspectionCreate" });
export type InspectionCreate = z.infer<typeof InspectionCreate>;
