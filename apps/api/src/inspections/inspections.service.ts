import type { Inspection, InspectionCreate } from "@beadroll/domain/schemas/inspection";
import type { Knex } from "knex";
import { refusal } from "../http/refusal.ts";
import { type ChangeContext, change } from "../ledger/change.ts";
import { readSeamHandle } from "../seams/seam-lookup.ts";
import { deriveSeam } from "../seams/seam-state.store.ts";

const query = (db: Knex): Knex.QueryBuilder =>
  db("inspections")
    .join("seams", "seams.id", "inspections.seam_id")
    .select(
      "inspections.id",
      "seams.tag as seam_tag",
      "inspections.attempt",
      "inspections.method",
      "inspections.result",
      "inspections.note",
      "inspections.inspector_name",
      "inspections.performed_at",
      "inspections.received_at",
      "inspections.ledger_seq",
    );

/** Inspections of a seam, latest first. */
export async function readInspectionsOfSeam(db: Knex, seamId: string): Promise<Inspection[]> {
  return query(db).where({ "inspections.seam_id": seamId }).orderBy("inspections.ledger_seq", "desc");
}

/**
 * Records an inspection of a seam's current attempt.
 * @throws Refusal not-found; state-conflict for a seam that is not welded; request-invalid for a time to come
 */
export function recordInspection(
  context: ChangeContext,
  tag: string,
  create: InspectionCreate,
): Promise<Inspection> {
  return change(context, "inspection.record", async (trx) => {
    const seam = await readSeamHandle(trx.read, tag);
    const pass: unknown = await trx
      .read("passes")
      .where({ seam_id: seam.id, attempt: seam.attempt })
      .first("id");
    if (pass === undefined)
      throw refusal("state-conflict", `Seam ${seam.tag} is ${seam.state}: there is no pass to inspect yet.`);
    const performed_at = create.performed_at ?? trx.at;
    if (performed_at > trx.at)
      throw refusal("request-invalid", "performed_at: it lies in the future.", {
        pointer: "/performed_at",
        field: "performed_at",
      });
    const id = trx.newId();
    const { caller } = context;
    await trx.insert("inspections", {
      id,
      seam_id: seam.id,
      attempt: seam.attempt,
      method: create.method,
      result: create.result,
      note: create.note,
      inspector_name: caller.kind === "nobody" ? "nobody" : caller.name,
      inspector_user_id: caller.kind === "person" ? caller.user_id : null,
      performed_at,
      received_at: trx.at,
      ledger_seq: trx.seq,
    });
    await deriveSeam(trx, seam);
    const value: Inspection = await query(trx.read).where({ "inspections.id": id }).first();
    const facts = { seam: seam.tag, attempt: seam.attempt, method: create.method, result: create.result };
    return { value, subjects: [seam.tag, seam.part_tag], facts };
  });
}
