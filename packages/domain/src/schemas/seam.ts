import { z } from "zod";
import { QUALITY_LEVELS } from "../quality/iso-5817/limit.ts";
import { ModelSeam } from "./drawing.ts";
import { Inspection } from "./inspection.ts";
import { PassRecord } from "./pass.ts";
import { id, instant, lengthMm, line } from "./quantities.ts";
import { ScanRecord } from "./scan.ts";
import { Verdict } from "./scan-result.ts";
import { JointType } from "./seam-model.ts";

/** Seam states, always derived from facts (domain/quality/seam-state), never typed in. */
export const SEAM_STATES = [
  "planned",
  "held",
  "clear",
  "welded",
  "accepted",
  "rejected",
  "repair",
  "released",
] as const;
export type SeamState = (typeof SEAM_STATES)[number];

/**
 * A seam's bead strip at list size: evenly spaced bins from start to end. The size of each number is the
 * share of the limit used there by the worst quantity, its sign that of the lateral deviation; null is
 * a bin that was not measured.
 */
export const Strip = z
  .array(z.number().nullable())
  .max(96)
  .meta({
    id: "Strip",
    description: "Signed share of the limit per bin, null where not measured",
    example: [0.1, -0.2, null],
  });
export type Strip = z.infer<typeof Strip>;

/** A seam as lists show it. */
export const SeamRow = z
  .object({
    id: id("Seam"),
    tag: z.string().meta({ description: "Tag", example: "S-8K3F7Q2NS" }),
    number: line("Seam number on the drawing", "S4"),
    attempt: z.int().meta({ description: "1, or 2 and more after repairs", example: 1 }),
    joint_type: JointType,
    weld_size_mm: lengthMm("Weld size", 5),
    length_mm: lengthMm("Length", 320),
    state: z.enum(SEAM_STATES).meta({ description: "Derived from the facts recorded" }),
    verdict: Verdict.nullable().meta({ description: "Of the latest fit-up scan" }),
    largest_mm: lengthMm("Largest deviation from the model", 1.98).nullable(),
    heat_input_kj_mm: z
      .number()
      .nullable()
      .meta({ description: "Mean heat input of the latest pass, kJ/mm", example: 1.2 }),
    strip: Strip.nullable(),
    part_tag: z.string().meta({ description: "Tag of its part", example: "P-8K3F7Q2NA" }),
    part_name: z.string().meta({ description: "Title and serial of its part", example: "Skid frame 0418" }),
    changed_at: instant("Last fact recorded"),
  })
  .meta({ id: "SeamRow" });
export type SeamRow = z.infer<typeof SeamRow>;

/** A consumable of a pass: what was mounted on its cell while the arc burned. */
export const PassLot = z
  .object({
    pass_id: id("Pass"),
    slot: z.string().meta({ description: "Slot of the cell", example: "wire" }),
    lot_tag: z.string().meta({ description: "Tag of the lot" }),
    lot_number: z.string().meta({ description: "Number of the lot", example: "W-3391" }),
    grade: z.string().meta({ description: "Designation", example: "G 42 4 M21 3Si1" }),
    from_at: instant("From when it served this pass"),
    to_at: instant("Until when"),
  })
  .meta({ id: "PassLot" });
export type PassLot = z.infer<typeof PassLot>;

/** A piece of the part the seam is on. */
export const SeamPiece = z
  .object({
    position: z.string().meta({ description: "What it is in the part", example: "Web plate" }),
    lot_tag: z.string().meta({ description: "Tag of its lot" }),
    lot_number: z.string().meta({ description: "Heat number", example: "H48812" }),
    grade: z.string().meta({ description: "Grade", example: "S355J2" }),
  })
  .meta({ id: "SeamPiece" });

/** A seam's whole record. */
export const SeamPage = SeamRow.extend({
  drawing_number: z.string().meta({ description: "Drawing number", example: "FW-2210" }),
  drawing_revision: z.string().meta({ description: "Revision", example: "C" }),
  quality_level: z.enum(QUALITY_LEVELS).meta({ description: "Quality level, ISO 5817" }),
  model_seam: ModelSeam,
  scans: z.array(ScanRecord).meta({ description: "Scans, latest first" }),
  passes: z.array(PassRecord).meta({ description: "Passes, first first" }),
  inspections: z.array(Inspection).meta({ description: "Inspections, latest first" }),
  pass_lots: z.array(PassLot).meta({ description: "Consumables, derived from the mounts" }),
  pieces: z.array(SeamPiece).meta({ description: "Pieces of the part" }),
  ledger_seqs: z.array(z.int()).meta({ description: "Ledger entries that name this seam, latest first" }),
  state_reason: z
    .string()
    .meta({ description: "Why the seam is in its state", example: "Accepted by VT on 28 Nov" }),
}).meta({ id: "SeamPage" });
export type SeamPage = z.infer<typeof SeamPage>;
