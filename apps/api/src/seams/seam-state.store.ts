import type { InspectionFact } from "@beadroll/domain/quality/seam-state";
import { deriveSeamState, type SeamFacts, type StateWithReason } from "@beadroll/domain/quality/seam-state";
import type { Verdict } from "@beadroll/domain/schemas/scan-result";
import type { Knex } from "knex";
import type { ChangeTrx, Row } from "../ledger/change.ts";

/** The facts of a seam's attempt, from its records. */
export async function readSeamFacts(db: Knex, seamId: string, attempt: number): Promise<SeamFacts> {
  const scan: { verdict: Verdict; reason: string | null } | undefined = await db("scans")
    .where({ seam_id: seamId, attempt, stage: "fitup" })
    .orderBy("ledger_seq", "desc")
    .select("verdict")
    .jsonExtract("summary", "$.reasons[0].text", "reason")
    .first();
  const passes: { ledger_seq: number }[] = await db("passes")
    .where({ seam_id: seamId, attempt })
    .orderBy("ledger_seq")
    .select("ledger_seq");
  const inspections: InspectionFact[] = await db("inspections")
    .where({ seam_id: seamId, attempt })
    .orderBy("ledger_seq")
    .select("method", "result", "ledger_seq as seq");
  return {
    attempt,
    verdict: scan?.verdict ?? null,
    verdict_reason: scan?.reason ?? null,
    pass_seqs: passes.map((pass) => pass.ledger_seq),
    inspections,
  };
}

/** A seam's state with its reason, from the facts now. */
export async function readSeamState(db: Knex, seamId: string, attempt: number): Promise<StateWithReason> {
  return deriveSeamState(await readSeamFacts(db, seamId, attempt));
}

/** Works out a seam's state again after a fact was written, with what lists show beside it. */
export async function deriveSeam(
  trx: ChangeTrx,
  seam: { readonly id: string; readonly attempt: number },
  columns: Row = {},
): Promise<void> {
  const { state } = await readSeamState(trx.read, seam.id, seam.attempt);
  await trx.derive("seams", seam.id, { ...columns, state, changed_at: trx.at });
}
