import type { PassCreate, PassRecord } from "@beadroll/domain/schemas/pass";
import type { PassResult } from "@beadroll/domain/schemas/pass-result";
import type { ProcedureRanges } from "@beadroll/domain/schemas/procedure";
import type { Knex } from "knex";
import { actorName } from "../auth/caller.ts";
import { cellOf } from "../cells/cells.service.ts";
import type { Deps } from "../deps.ts";
import { recordFile } from "../files/files.store.ts";
import type { ReceivedFile } from "../http/multipart.ts";
import { accepted, refusal } from "../http/refusal.ts";
import { type ChangeContext, type ChangeTrx, change, type Row } from "../ledger/change.ts";
import { attemptFor, readSeamHandle, refuseOtherPart, type SeamHandle } from "../seams/seam-lookup.ts";
import { deriveSeam } from "../seams/seam-state.store.ts";
import { idOfTag } from "../tags/tag-lookup.ts";
import { readPass } from "./passes.read.ts";

/** A weld run that was pushed: what came with it and its log, already in the store. */
export interface PushedPass {
  readonly seam_tag: string;
  readonly fields: PassCreate;
  readonly log: ReceivedFile;
}

/** The process is read from the procedure; without one it is MAG, the only arc a scan-guided cell burns by default. */
const PROCESS_WITHOUT_PROCEDURE = "135";

interface PlannedRow {
  readonly procedure_id: string | null;
  readonly length_mm: number;
  readonly process: string | null;
  readonly ranges: string | null;
}

async function readPlan(db: Knex, modelSeamId: string): Promise<PlannedRow> {
  const plan: PlannedRow | undefined = await db("model_seams")
    .leftJoin("procedures", "procedures.id", "model_seams.procedure_id")
    .where({ "model_seams.id": modelSeamId })
    .first("model_seams.procedure_id", "model_seams.length_mm", "procedures.process", "procedures.ranges");
  if (plan === undefined) throw new Error(`model seam ${modelSeamId} of a seam is missing`);
  return plan;
}

/** A pass that cannot be dropped: a known one with the same log. */
async function samePass(db: Knex, seam: SeamHandle, digest: string): Promise<string | null> {
  const found: { id: string } | undefined = await db("passes")
    .where({ seam_id: seam.id, attempt: seam.attempt, file_digest: digest })
    .first("id");
  return found?.id ?? null;
}

async function passNumber(db: Knex, seam: SeamHandle, asked: number | undefined): Promise<number> {
  if (asked === undefined) {
    const [last] = await db("passes")
      .where({ seam_id: seam.id, attempt: seam.attempt })
      .max<{ n: number | null }[]>("pass_number as n");
    return (last?.n ?? 0) + 1;
  }
  const twin: unknown = await db("passes")
    .where({ seam_id: seam.id, attempt: seam.attempt, pass_number: asked })
    .first("id");
  if (twin !== undefined)
    throw refusal("conflict", `Pass ${asked} of seam ${seam.tag} is already recorded with another log.`, {
      field: "pass_number",
    });
  return asked;
}

const shifted = (at: string, seconds: number): string =>
  new Date(Date.parse(at) + seconds * 1000).toISOString();

/** When the log and the arc began and ended, by the cell's clock. Without one, the log ended when it came. */
function instants(result: PassResult, startedAt: string | undefined, receivedAt: string): Row {
  const start = startedAt ?? shifted(receivedAt, -result.duration_s);
  return {
    started_at: shifted(start, 0),
    ended_at: shifted(start, result.duration_s),
    arc_from_at: shifted(start, result.intervals[0]?.start_s ?? 0),
    arc_to_at: shifted(start, result.intervals.at(-1)?.end_s ?? result.duration_s),
  };
}

interface Reduced {
  readonly result: PassResult;
  readonly procedure_id: string | null;
  readonly operator_id: string | null;
  readonly cell_id: string | null;
}

async function reduce(
  deps: Deps,
  context: ChangeContext,
  pushed: PushedPass,
  seam: SeamHandle,
): Promise<Reduced> {
  const { reader } = deps.db;
  const { fields } = pushed;
  const cell_id = await cellOf(reader, context.caller, fields.cell_tag);
  const operator_id = fields.operator_tag
    ? await idOfTag(reader, "W", fields.operator_tag, "operator_tag")
    : null;
  const plan = await readPlan(reader, seam.model_seam_id);
  const ranges: ProcedureRanges | null = plan.ranges === null ? null : JSON.parse(plan.ranges);
  const outcome = await deps.measure.run({
    kind: "pass",
    log: { name: pushed.log.name, path: deps.store.pathOf(pushed.log.digest) },
    process: plan.process ?? PROCESS_WITHOUT_PROCEDURE,
    ranges,
    seam_length_mm: plan.length_mm,
  });
  return { result: accepted(outcome), procedure_id: plan.procedure_id, operator_id, cell_id };
}

async function insertPass(
  trx: ChangeTrx,
  context: ChangeContext,
  seam: SeamHandle,
  { pushed, reduced }: { pushed: PushedPass; reduced: Reduced },
): Promise<string> {
  const id = trx.newId();
  const { result } = reduced;
  await recordFile(trx, context.caller, pushed.log);
  await trx.insert("passes", {
    id,
    seam_id: seam.id,
    attempt: seam.attempt,
    pass_number: await passNumber(trx.read, seam, pushed.fields.pass_number),
    procedure_id: reduced.procedure_id,
    operator_id: reduced.operator_id,
    cell_id: reduced.cell_id,
    program: pushed.fields.program ?? null,
    file_name: pushed.log.name,
    file_digest: pushed.log.digest,
    ...instants(result, pushed.fields.started_at, trx.at),
    heat_input_kj_mm: result.heat_input_kj_mm,
    result: JSON.stringify(result),
    received_at: trx.at,
    received_from: actorName(context.caller),
    ledger_seq: trx.seq,
  });
  await deriveSeam(trx, seam, { heat_input_kj_mm: result.heat_input_kj_mm });
  return id;
}

async function knownPass(db: Knex, id: string): Promise<PassRecord> {
  const pass = await readPass(db, id);
  if (!pass) throw new Error(`pass ${id} cannot be read`);
  return pass;
}

/**
 * Records a weld run: reduces its log, holds it against the procedure and links it. The same log again gives the
 * first record back.
 * @throws Refusal naming the tag, field or line at fault; nothing is written then
 */
export async function recordPass(
  deps: Deps,
  context: ChangeContext,
  pushed: PushedPass,
): Promise<PassRecord> {
  const { reader } = deps.db;
  const seam = await readSeamHandle(reader, pushed.seam_tag);
  refuseOtherPart(seam, pushed.fields.part_tag);
  const earlier = await samePass(reader, seam, pushed.log.digest);
  if (earlier) return knownPass(reader, earlier);
  const reduced = await reduce(deps, context, pushed, seam);
  return change(context, "pass.record", async (trx) => {
    const handle = await readSeamHandle(trx.read, seam.tag);
    const now = { ...handle, attempt: await attemptFor(trx, handle) };
    const twin = await samePass(trx.read, now, pushed.log.digest);
    const id = twin ?? (await insertPass(trx, context, now, { pushed, reduced }));
    const pass = await knownPass(trx.read, id);
    const { pass_number, attempt } = pass;
    return {
      value: pass,
      remember: { pass_id: id },
      subjects: [now.tag, now.part_tag, id, ...(pass.operator_tag ? [pass.operator_tag] : [])],
      facts: {
        seam: now.tag,
        attempt,
        pass_number,
        heat_input_kj_mm: pass.result.heat_input_kj_mm,
        file: pushed.log.digest,
      },
    };
  });
}
