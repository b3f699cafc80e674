import { z } from "zod";
import { BeadResult } from "./bead-result.ts";
import { digest, id, instant, line } from "./quantities.ts";
import { ScanResult, Verdict } from "./scan-result.ts";

export const SCAN_STAGES = ["fitup", "bead"] as const;
export const LENGTH_UNITS = ["mm", "in", "m"] as const;

/** What comes with a scan's files when it is pushed. */
export const ScanCreate = z
  .strictObject({
    stage: z
      .enum(SCAN_STAGES)
      .default("fitup")
      .meta({ description: "Fit-up before welding, or the finished bead" }),
    units: z.enum(LENGTH_UNITS).default("mm").meta({ description: "Unit the scan is written in" }),
    taken_at: instant("When the cell took it, by its clock").optional(),
    part_tag: z.string().optional().meta({
      description: "The part the cell believes it scans; refused if the seam is on another",
      example: "P-8K3F7Q2NA",
    }),
    cell_tag: z.string().optional().meta({ description: "The cell; a machine's key may leave it out" }),
  })
  .meta({ id: "ScanCreate" });
export type ScanCreate = z.infer<typeof ScanCreate>;

/** A scan as the record keeps it, without its stations. */
export const ScanRecord = z
  .object({
    id: id("Scan"),
    seam_tag: z.string().meta({ description: "Tag of the seam" }),
    attempt: z.int().meta({ description: "Attempt it belongs to", example: 1 }),
    stage: z.enum(SCAN_STAGES).meta({ description: "Fit-up or finished bead" }),
    verdict: Verdict,
    points: z.int().meta({ description: "Points read", example: 61440 }),
    file_name: line("Name of the file pushed", "profiles.csv", 255),
    file_digest: digest("The scan's file"),
    poses_digest: digest("The poses' file").nullable(),
    units: z.enum(LENGTH_UNITS).meta({ description: "Unit declared" }),
    engine: z.string().meta({ description: "What measured it", example: "beadroll-measure 0.1.0" }),
    cell_name: z.string().nullable().meta({ description: "Cell that took it" }),
    taken_at: instant("When the cell took it, by its clock"),
    received_at: instant("When it was recorded"),
    received_from: z.string().meta({ description: "User or key that pushed it" }),
    ledger_seq: z.int().meta({ description: "Ledger entry that recorded it", example: 412 }),
  })
  .meta({ id: "ScanRecord" });
export type ScanRecord = z.infer<typeof ScanRecord>;

/** A scan of the fit-up with everything measured. */
export const FitUpScanPage = ScanRecord.extend({
  stage: z.literal("fitup").meta({ description: "A scan of the fit-up" }),
  result: ScanResult,
}).meta({ id: "FitUpScanPage" });
export type FitUpScanPage = z.infer<typeof FitUpScanPage>;

/** A scan of the finished weld with everything measured. */
export const BeadScanPage = ScanRecord.extend({
  stage: z.literal("bead").meta({ description: "A scan of the finished bead" }),
  result: BeadResult,
}).meta({ id: "BeadScanPage" });
export type BeadScanPage = z.infer<typeof BeadScanPage>;

/** A scan with everything measured, by its stage. */
export const ScanPage = z.discriminatedUnion("stage", [FitUpScanPage, BeadScanPage]).meta({ id: "ScanPage" });
export type ScanPage = z.infer<typeof ScanPage>;
