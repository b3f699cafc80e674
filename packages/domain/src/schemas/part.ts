import { z } from "zod";
import { id, instant, line, version } from "./quantities.ts";
import { SeamRow } from "./seam.ts";

const partFields = {
  serial: line("Serial number", "0418", 40),
  order_no: line("Order", "41-2207", 40).nullable(),
};

/** How many seams of a part are in which condition. */
export const SeamTally = z
  .object({
    total: z.int().meta({ description: "Seams of the part", example: 14 }),
    planned: z.int().meta({ description: "Nothing recorded yet" }),
    held: z.int().meta({ description: "Verdict hold, not decided" }),
    clear: z.int().meta({ description: "Scan within or adapt" }),
    welded: z.int().meta({ description: "Welded, not inspected" }),
    accepted: z.int().meta({ description: "Accepted or released" }),
    rejected: z.int().meta({ description: "Rejected or in repair" }),
  })
  .meta({ id: "SeamTally" });

/** One serialised piece of work made to a drawing. */
export const Part = z
  .object({
    id: id("Part"),
    tag: z.string().meta({ description: "Tag", example: "P-8K3F7Q2NA" }),
    ...partFields,
    name: z.string().meta({ description: "Title of the drawing and serial", example: "Skid frame 0418" }),
    drawing_id: id("Drawing"),
    drawing_number: z.string().meta({ description: "Drawing number", example: "FW-2210" }),
    drawing_revision: z.string().meta({ description: "Revision", example: "C" }),
    parent_tag: z.string().nullable().meta({ description: "Tag of the part it is built into" }),
    seams: SeamTally,
    created_at: instant("When recorded"),
    version,
  })
  .meta({ id: "Part" });
export type Part = z.infer<typeof Part>;

/** A new part; its seams are planned from the drawing's model seams. */
export const PartCreate = z
  .strictObject({
    drawing_id: id("Drawing"),
    serial: partFields.serial,
    order_no: partFields.order_no.optional(),
    parent_tag: z.string().optional().meta({ description: "Tag of the part it is built into" }),
  })
  .meta({ id: "PartCreate" });
export type PartCreate = z.infer<typeof PartCreate>;

/** A cut length or plate built into a part. */
export const Piece = z
  .object({
    id: id("Piece"),
    position: line("What it is in the part", "Web plate", 60),
    lot_tag: z.string().meta({ description: "Tag of its lot", example: "L-8K3F7Q2NN" }),
    lot_number: z.string().meta({ description: "Heat or lot number", example: "H48812" }),
    lot_kind: z.string().meta({ description: "Kind of the lot", example: "plate" }),
    grade: z.string().meta({ description: "Grade", example: "S355J2" }),
    from_at: instant("Built in"),
    to_at: instant("Replaced").nullable(),
  })
  .meta({ id: "Piece" });
export type Piece = z.infer<typeof Piece>;

/** Build a piece into a part. A piece at the same position is replaced; the old link stays visible. */
export const PieceCreate = z
  .strictObject({ position: Piece.shape.position, lot_tag: Piece.shape.lot_tag })
  .meta({ id: "PieceCreate" });
export type PieceCreate = z.infer<typeof PieceCreate>;

/** A line of "what went in": a role and the thing that filled it. */
export const WentIn = z
  .object({
    role: z.string().meta({ description: "What it served as", example: "Wire" }),
    name: z.string().meta({ description: "Number or name", example: "W-3391" }),
    detail: z
      .string()
      .nullable()
      .meta({ description: "Grade, validity or the like", example: "valid to 14 Mar 2027" }),
    tag: z.string().nullable().meta({ description: "Tag, when it has one" }),
    seam_count: z.int().meta({ description: "Seams of the part it served", example: 6 }),
  })
  .meta({ id: "WentIn" });
export type WentIn = z.infer<typeof WentIn>;

/** A part's page: its roll of seams and what went in. */
export const PartPage = Part.extend({
  roll: z.array(SeamRow).meta({ description: "Seams in welding sequence" }),
  pieces: z.array(Piece).meta({ description: "Pieces, those in force first" }),
  contents: z
    .array(z.object({ tag: z.string(), name: z.string() }))
    .meta({ description: "Parts built into this part" }),
  went_in: z.array(WentIn).meta({ description: "Pieces, consumables, procedures and operators in one list" }),
  ledger_seqs: z.array(z.int()).meta({ description: "Ledger entries that name this part, latest first" }),
}).meta({ id: "PartPage" });
export type PartPage = z.infer<typeof PartPage>;
