import { z } from "zod";
import { PassResult } from "./pass-result.ts";
import { digest, id, instant, line } from "./quantities.ts";

/** What comes with a weld log when it is pushed. */
export const PassCreate = z
  .strictObject({
    pass_number: z.coerce.number().int().min(1).max(200).optional().meta({
      description: "Number of the run in the seam; the next one if absent",
      example: 1,
    }),
    started_at: instant("When the log begins, by the cell's clock").optional(),
    operator_tag: z
      .string()
      .optional()
      .meta({ description: "Badge of the operator", example: "W-8K3F7Q2NF" }),
    program: line("Robot program and version", "SKID-S4 v12", 80).optional(),
    part_tag: z.string().optional().meta({
      description: "The part the cell believes it welds; refused if the seam is on another",
    }),
    cell_tag: z.string().optional().meta({ description: "The cell; a machine's key may leave it out" }),
  })
  .meta({ id: "PassCreate" });
export type PassCreate = z.infer<typeof PassCreate>;

/** A pass as the record keeps it, its log reduced. */
export const PassRecord = z
  .object({
    id: id("Pass"),
    seam_tag: z.string().meta({ description: "Tag of the seam" }),
    attempt: z.int().meta({ description: "Attempt it belongs to", example: 1 }),
    pass_number: z.int().meta({ description: "Number of the run in the seam", example: 1 }),
    procedure_name: z
      .string()
      .nullable()
      .meta({ description: "Procedure welded to", example: "PB-135-07 rev 2" }),
    operator_tag: z.string().nullable().meta({ description: "Badge of the operator" }),
    operator_name: z.string().nullable().meta({ description: "Operator", example: "Ilka Varga" }),
    operator_valid_until: z.string().nullable().meta({
      description:
        "Last day of the operator's qualification for the process at that time; null if there was none",
      example: "2027-03-14",
    }),
    cell_tag: z.string().nullable().meta({ description: "Tag of the cell" }),
    cell_name: z.string().nullable().meta({ description: "Cell" }),
    program: z.string().nullable().meta({ description: "Robot program and version" }),
    file_name: line("Name of the log's file", "pass-1.csv", 255),
    file_digest: digest("The log's file"),
    started_at: instant("Start of the log, by the cell's clock"),
    ended_at: instant("End of the log"),
    received_at: instant("When it was recorded"),
    received_from: z.string().meta({ description: "User or key that pushed it" }),
    ledger_seq: z.int().meta({ description: "Ledger entry that recorded it", example: 413 }),
    result: PassResult,
  })
  .meta({ id: "PassRecord" });
export type PassRecord = z.infer<typeof PassRecord>;
