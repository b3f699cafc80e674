import type { Procedure, ProcedureCreate, ProcedurePatch } from "@beadroll/domain/schemas/procedure";
import type { Knex } from "knex";
import { type PageRequest, readPage } from "../db/keyset.ts";
import { refusal } from "../http/refusal.ts";
import { type ChangeContext, change } from "../ledger/change.ts";

type ProcedureRow = Omit<Procedure, "ranges" | "used"> & { readonly ranges: string; readonly used: number };

const query = (db: Knex): Knex.QueryBuilder =>
  db("procedures").select(
    "procedures.id",
    "procedures.number",
    "procedures.revision",
    "procedures.title",
    "procedures.process",
    "procedures.position",
    "procedures.ranges",
    "procedures.status",
    "procedures.created_at",
    "procedures.version",
    db.raw("exists (select 1 from passes where passes.procedure_id = procedures.id) as used"),
  );

const toProcedure = (row: ProcedureRow): Procedure => ({
  id: row.id,
  number: row.number,
  revision: row.revision,
  title: row.title,
  process: row.process,
  position: row.position,
  ranges: JSON.parse(row.ranges),
  status: row.status,
  used: row.used === 1,
  created_at: row.created_at,
  version: row.version,
});

/** A procedure. @throws Refusal not-found */
export async function readProcedure(db: Knex, id: string): Promise<Procedure> {
  const row: ProcedureRow | undefined = await query(db).where({ "procedures.id": id }).first();
  if (row === undefined) throw refusal("not-found", "No procedure here has that id.");
  return toProcedure(row);
}

/** Procedures by number and revision. */
export async function listProcedures(
  db: Knex,
  filter: PageRequest & { readonly status?: Procedure["status"] | undefined },
): Promise<{ items: Procedure[]; next_cursor: string | null }> {
  const rows = query(db);
  if (filter.status) rows.where({ "procedures.status": filter.status });
  const keyset = {
    columns: ["procedures.number", "procedures.revision", "procedures.id"],
    descending: false,
  };
  const page = await readPage<ProcedureRow>(rows, keyset, filter);
  return { items: page.rows.map(toProcedure), next_cursor: page.next_cursor };
}

/** Records a procedure as a draft. @throws Refusal conflict when number and revision are taken */
export function createProcedure(context: ChangeContext, create: ProcedureCreate): Promise<Procedure> {
  return change(context, "procedure.create", async (trx) => {
    const { number, revision } = create;
    const twin: unknown = await trx.read("procedures").where({ number, revision }).first("id");
    if (twin !== undefined)
      throw refusal("conflict", `Procedure ${number} rev ${revision} is already recorded.`, {
        field: "revision",
      });
    const id = trx.newId();
    const { ranges, ...fields } = create;
    await trx.insert("procedures", {
      id,
      ...fields,
      ranges: JSON.stringify(ranges),
      status: "draft",
      created_at: trx.at,
      version: 1,
    });
    return { value: await readProcedure(trx.read, id), subjects: [id] };
  });
}

/** Changes a procedure. @throws Refusal not-found, version-stale, state-conflict when its ranges are frozen */
export function patchProcedure(
  context: ChangeContext,
  id: string,
  patch: ProcedurePatch,
  seenVersion: number,
): Promise<Procedure> {
  return change(context, "procedure.change", async (trx) => {
    const procedure = await readProcedure(trx.read, id);
    if (procedure.version !== seenVersion)
      throw refusal(
        "version-stale",
        `The procedure is at version ${procedure.version}; you saw ${seenVersion}.`,
      );
    if (patch.ranges && procedure.used)
      throw refusal(
        "state-conflict",
        "Seams were welded to this revision, so its ranges are frozen; make a new revision.",
        {
          field: "ranges",
        },
      );
    await trx.update(
      "procedures",
      { id },
      {
        version: procedure.version + 1,
        ...(patch.title !== undefined && { title: patch.title }),
        ...(patch.status !== undefined && { status: patch.status }),
        ...(patch.ranges !== undefined && { ranges: JSON.stringify(patch.ranges) }),
      },
    );
    return { value: await readProcedure(trx.read, id), subjects: [id] };
  });
}
