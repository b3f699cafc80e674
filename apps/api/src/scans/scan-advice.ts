import { correctedPath } from "@beadroll/domain/measure/path/corrected-path";
import type { CorrectedPath } from "@beadroll/domain/schemas/corrected-path";
import type { FillAdvice } from "@beadroll/domain/schemas/fill-advice";
import { ProcedureRanges } from "@beadroll/domain/schemas/procedure";
import { fillAdvice } from "@beadroll/domain/weld/deposit/fill-advice";
import type { Knex } from "knex";
import { readSeamModel } from "../drawings/drawings.read.ts";
import { accepted, refusal } from "../http/refusal.ts";
import { readFitUpPage, readScanSource } from "./scans.read.ts";

/** The corrected path of a stored scan. @throws Refusal not-found, scan-not-fitup */
export async function readCorrectedPath(db: Knex, scanId: string): Promise<CorrectedPath> {
  const { result } = await readFitUpPage(db, scanId);
  const { model_seam_id } = await readScanSource(db, scanId);
  return correctedPath(await readSeamModel(db, model_seam_id), result);
}

/** What the fill is worked out from. */
interface Welded {
  readonly weld_size_mm: number;
  readonly process: string | null;
  readonly ranges: string | null;
}

/** The fill that a stored scan asks for, under its model seam's procedure. @throws Refusal not-found, procedure-incomplete */
export async function readFillAdvice(db: Knex, scanId: string): Promise<FillAdvice> {
  const { result } = await readFitUpPage(db, scanId);
  const { model_seam_id } = await readScanSource(db, scanId);
  const welded: Welded | undefined = await db("model_seams")
    .leftJoin("procedures", "procedures.id", "model_seams.procedure_id")
    .where({ "model_seams.id": model_seam_id })
    .first("model_seams.weld_size_mm", "procedures.process", "procedures.ranges");
  if (!welded?.process || !welded.ranges)
    throw refusal("procedure-incomplete", "The model seam names no procedure.");
  const { weld_size_mm, process } = welded;
  return accepted(
    fillAdvice({
      model: await readSeamModel(db, model_seam_id),
      weld_size_mm,
      process,
      ranges: ProcedureRanges.parse(JSON.parse(welded.ranges)),
      stations: result.stations,
    }),
  );
}
