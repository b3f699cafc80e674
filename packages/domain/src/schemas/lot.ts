import { z } from "zod";
import { day, digest, id, instant, lengthMm, line, note, version } from "./quantities.ts";

export const LOT_KINDS = ["plate", "section", "tube", "wire", "gas", "flux"] as const;
export const LOT_STATES = ["received", "released", "quarantined", "used_up"] as const;

const lotFields = {
  kind: z.enum(LOT_KINDS).meta({ description: "What the lot is of" }),
  number: line("Heat number of plate, section or tube; lot number of wire, gas or flux", "H48812", 60),
  supplier: line("Supplier", "Nordhall Steel"),
  grade: line("Grade or designation", "S355J2"),
  dimension: line("Size as delivered", "12 x 2000 x 6000", 60).nullable(),
  thickness_mm: lengthMm("Thickness", 12).positive().nullable(),
  quantity: z.number().positive().meta({ description: "Amount received", example: 4 }),
  unit: z.enum(["pcs", "kg", "m", "m3", "l"]).meta({ description: "Unit of the amount" }),
  received_on: day("Day it came in"),
};

/** A traceable batch of material. */
export const Lot = z
  .object({
    id: id("Lot"),
    tag: z.string().meta({ description: "Tag", example: "L-8K3F7Q2NN" }),
    ...lotFields,
    state: z.enum(LOT_STATES).meta({ description: "Whether it may be used" }),
    note: note("Remarks", "Edge damage on sheet 2"),
    created_at: instant("When recorded"),
    version,
  })
  .meta({ id: "Lot" });
export type Lot = z.infer<typeof Lot>;

/** A lot as it comes in. */
export const LotCreate = z
  .strictObject({
    ...lotFields,
    dimension: lotFields.dimension.optional(),
    thickness_mm: lotFields.thickness_mm.optional(),
    note: Lot.shape.note.optional(),
  })
  .meta({ id: "LotCreate" });
export type LotCreate = z.infer<typeof LotCreate>;

/** A change of a lot. */
export const LotPatch = z
  .strictObject({ state: Lot.shape.state.optional(), note: Lot.shape.note.optional() })
  .meta({ id: "LotPatch" });
export type LotPatch = z.infer<typeof LotPatch>;

const analysis = (description: string, example: Record<string, number>) =>
  z.record(z.string().min(1).max(20), z.number()).meta({ description, example });

/** The inspection document of a lot (EN 10204). */
export const Certificate = z
  .object({
    id: id("Certificate"),
    lot_id: id("Lot"),
    type: z.enum(["2.1", "2.2", "3.1", "3.2"]).meta({ description: "Type of document, EN 10204" }),
    number: line("Certificate number", "A-77120"),
    issuer: line("Issued by", "Nordhall Steel, works laboratory"),
    issued_on: day("Date of issue"),
    chemistry: analysis("Elements in percent by mass", { C: 0.16, Mn: 1.42, Si: 0.21 }),
    mechanical: analysis("Mechanical values, unit in the name", {
      yield_mpa: 389,
      tensile_mpa: 528,
      elongation_pct: 27,
    }),
    file_digest: digest("The document's file").nullable(),
    created_at: instant("When recorded"),
  })
  .meta({ id: "Certificate" });
export type Certificate = z.infer<typeof Certificate>;

/** A new certificate of a lot; its file goes to /files first. */
export const CertificateCreate = z
  .strictObject({
    ...Certificate.omit({ id: true, lot_id: true, created_at: true }).shape,
    chemistry: Certificate.shape.chemistry.optional(),
    mechanical: Certificate.shape.mechanical.optional(),
    file_digest: Certificate.shape.file_digest.optional(),
  })
  .meta({ id: "CertificateCreate" });
export type CertificateCreate = z.infer<typeof CertificateCreate>;

/** Where a lot went: one part or one stay on a cell. */
export const LotUse = z
  .object({
    kind: z.enum(["piece", "mount"]).meta({ description: "Built in as a piece, or mounted on a cell" }),
    what: z.string().meta({ description: "Position in the part, or slot of the cell", example: "Web plate" }),
    tag: z.string().meta({ description: "Tag of the part or cell" }),
    name: z.string().meta({ description: "Name of the part or cell" }),
    from_at: instant("From when"),
    to_at: instant("Until when").nullable(),
  })
  .meta({ id: "LotUse" });

/** A lot's page: the lot, its certificates and where it went. */
export const LotPage = Lot.extend({
  certificates: z.array(Certificate).meta({ description: "Latest first" }),
  uses: z.array(LotUse).meta({ description: "Where it went, latest first, 500 at most" }),
  seam_count: z.int().meta({ description: "Seams this lot is in", example: 142 }),
}).meta({ id: "LotPage" });
export type LotPage = z.infer<typeof LotPage>;
