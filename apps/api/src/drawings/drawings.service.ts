import type {
  Drawing,
  DrawingCreate,
  DrawingPatch,
  ModelSeam,
  ModelSeamCreate,
  ModelSeamPatch,
} from "@beadroll/domain/schemas/drawing";
import { parseSeamModel, resolveLimits } from "@beadroll/domain/schemas/seam-model";
import type { Knex } from "knex";
import { refuseStale } from "../db/version.ts";
import { accepted, Refusal, refusal } from "../http/refusal.ts";
import { type ChangeContext, change, type Row } from "../ledger/change.ts";
import { readDrawing, readModelSeam } from "./drawings.read.ts";

/** Records a drawing. @throws Refusal conflict when number and revision are taken */
export function createDrawing(context: ChangeContext, create: DrawingCreate): Promise<Drawing> {
  return change(context, "drawing.create", async (trx) => {
    const { number, revision } = create;
    const twin: unknown = await trx.read("drawings").where({ number, revision }).first("id");
    if (twin !== undefined)
      throw refusal("conflict", `Drawing ${number} rev ${revision} is already recorded.`, {
        field: "revision",
      });
    const id = trx.newId();
    await trx.insert("drawings", { id, ...create, created_at: trx.at, version: 1 });
    return { value: await readDrawing(trx.read, id), subjects: [id] };
  });
}

/** Changes a drawing. @throws Refusal not-found, version-stale */
export function patchDrawing(
  context: ChangeContext,
  id: string,
  patch: DrawingPatch,
  seenVersion: number,
): Promise<Drawing> {
  return change(context, "drawing.change", async (trx) => {
    const drawing = await readDrawing(trx.read, id);
    refuseStale(drawing, seenVersion);
    await trx.update("drawings", { id }, { version: drawing.version + 1, ...present(patch) });
    return { value: await readDrawing(trx.read, id), subjects: [id] };
  });
}

async function refuseUnknownProcedure(db: Knex, id: string | null | undefined): Promise<void> {
  if (!id) return;
  const known: unknown = await db("procedures").where({ id }).first("id");
  if (known === undefined)
    throw refusal("not-found", "No procedure here has that id.", { field: "procedure_id" });
}

/** Adds a model seam. @throws Refusal model-invalid naming each place, not-found, conflict when the number is taken */
export async function createModelSeam(
  context: ChangeContext,
  drawingId: string,
  create: ModelSeamCreate,
): Promise<ModelSeam> {
  const parsed = parseSeamModel(create.model);
  if (!parsed.ok)
    throw new Refusal(parsed.faults.map((fault) => ({ ...fault, pointer: `/model${fault.pointer ?? ""}` })));
  const model = accepted(parsed);
  return change(context, "model-seam.create", async (trx) => {
    const drawing = await readDrawing(trx.read, drawingId);
    await refuseUnknownProcedure(trx.read, create.procedure_id);
    const twin: unknown = await trx
      .read("model_seams")
      .where({ drawing_id: drawingId, number: create.number })
      .first("id");
    if (twin !== undefined)
      throw refusal("conflict", `Drawing ${drawing.number} already has a seam ${create.number}.`, {
        field: "number",
      });
    const id = trx.newId();
    const { limits, ...rest } = model;
    await trx.insert("model_seams", {
      id,
      drawing_id: drawingId,
      number: create.number,
      sequence: create.sequence,
      joint_type: model.joint_type,
      length_mm: model.seam.length_mm,
      weld_size_mm: create.weld_size_mm,
      quality_level: create.quality_level,
      procedure_id: create.procedure_id ?? null,
      scan_rule: create.scan_rule,
      model: JSON.stringify(rest),
      limits: JSON.stringify(resolveLimits(limits)),
      created_at: trx.at,
      version: 1,
    });
    return { value: await readModelSeam(trx.read, id), subjects: [drawingId, id] };
  });
}

/** Changes a model seam. @throws Refusal not-found, version-stale */
export function patchModelSeam(
  context: ChangeContext,
  id: string,
  patch: ModelSeamPatch,
  seenVersion: number,
): Promise<ModelSeam> {
  return change(context, "model-seam.change", async (trx) => {
    const seam = await readModelSeam(trx.read, id);
    refuseStale(seam, seenVersion);
    await refuseUnknownProcedure(trx.read, patch.procedure_id);
    const { limits, ...fields } = patch;
    await trx.update(
      "model_seams",
      { id },
      {
        version: seam.version + 1,
        ...present(fields),
        ...(limits && { limits: JSON.stringify(resolveLimits(limits)) }),
      },
    );
    return { value: await readModelSeam(trx.read, id), subjects: [seam.drawing_id, id] };
  });
}

/** The fields of a patch that were given: absent leaves, null clears. */
function present(patch: Readonly<Record<string, string | number | null | undefined>>): Row {
  return Object.fromEntries(
    Object.entries(patch).flatMap(([name, value]) => (value === undefined ? [] : [[name, value]])),
  );
}
