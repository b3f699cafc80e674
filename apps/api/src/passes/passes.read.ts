import type { PassRecord } from "@beadroll/domain/schemas/pass";
import type { PassLot } from "@beadroll/domain/schemas/seam";
import type { Knex } from "knex";

type PassRow = Omit<PassRecord, "result"> & { readonly result: string };

const query = (db: Knex): Knex.QueryBuilder =>
  db("passes")
    .join("seams", "seams.id", "passes.seam_id")
    .leftJoin("procedures", "procedures.id", "passes.procedure_id")
    .leftJoin("people", "people.id", "passes.operator_id")
    .leftJoin("cells", "cells.id", "passes.cell_id")
    .select(
      "passes.id",
      "seams.tag as seam_tag",
      "passes.attempt",
      "passes.pass_number",
      db.raw("procedures.number || ' rev ' || procedures.revision as procedure_name"),
      "people.tag as operator_tag",
      "people.name as operator_name",
      // The qualification for the process that held on the day the arc burned; the longest if several did.
      db.raw(
        `(select max(qualifications.valid_until) from qualifications
           where qualifications.person_id = passes.operator_id and qualifications.process = procedures.process
             and qualifications.issued_on <= substr(passes.arc_to_at, 1, 10)
             and qualifications.valid_until >= substr(passes.arc_to_at, 1, 10)) as operator_valid_until`,
      ),
      "cells.tag as cell_tag",
      "cells.name as cell_name",
      "passes.program",
      "passes.file_name",
      "passes.file_digest",
      "passes.started_at",
      "passes.ended_at",
      "passes.received_at",
      "passes.received_from",
      "passes.ledger_seq",
      "passes.result",
    );

const toPass = (row: PassRow): PassRecord => ({ ...row, result: JSON.parse(row.result) });

/** Passes of a seam, first first. */
export async function readPassesOfSeam(db: Knex, seamId: string): Promise<PassRecord[]> {
  const rows: PassRow[] = await query(db)
    .where({ "passes.seam_id": seamId })
    .orderBy(["passes.attempt", "passes.pass_number"]);
  return rows.map(toPass);
}

/** A pass by its id; undefined when there is none. */
export async function readPass(db: Knex, id: string): Promise<PassRecord | undefined> {
  const row: PassRow | undefined = await query(db).where({ "passes.id": id }).first();
  return row && toPass(row);
}

/**
 * The consumables of a seam's passes: what was mounted on the pass's cell while its arc burned. A spool changed in
 * mid-pass gives both.
 */
export async function readPassLots(db: Knex, seamId: string): Promise<PassLot[]> {
  return db("passes")
    .join("mounts", "mounts.cell_id", "passes.cell_id")
    .join("lots", "lots.id", "mounts.lot_id")
    .where({ "passes.seam_id": seamId })
    .whereRaw("mounts.from_at < passes.arc_to_at and coalesce(mounts.to_at, '9999') > passes.arc_from_at")
    .orderBy(["passes.attempt", "passes.pass_number", "mounts.slot", "mounts.from_at"])
    .select(
      "passes.id as pass_id",
      "mounts.slot",
      "lots.tag as lot_tag",
      "lots.number as lot_number",
      "lots.grade",
      db.raw("max(mounts.from_at, passes.arc_from_at) as from_at"),
      db.raw("min(coalesce(mounts.to_at, '9999'), passes.arc_to_at) as to_at"),
    );
}
