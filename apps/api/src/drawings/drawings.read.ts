import { ISO_5817_CURRENT, type QualityLevel } from "@beadroll/domain/quality/iso-5817/limit";
import type { Drawing, DrawingPage, ModelSeam } from "@beadroll/domain/schemas/drawing";
import { resolveLimits, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { Knex } from "knex";
import { type PageRequest, readPage } from "../db/keyset.ts";
import type { Page } from "../db/page.ts";
import { refusal } from "../http/refusal.ts";

const drawingQuery = (db: Knex): Knex.QueryBuilder =>
  db("drawings").select(
    "drawings.id",
    "drawings.number",
    "drawings.revision",
    "drawings.title",
    "drawings.status",
    db.raw(
      "(select count(*) from model_seams where model_seams.drawing_id = drawings.id) as model_seam_count",
    ),
    db.raw("(select count(*) from parts where parts.drawing_id = drawings.id) as part_count"),
    "drawings.created_at",
    "drawings.version",
  );

type ModelSeamRow = Omit<ModelSeam, "limits"> & { readonly limits: string };

const modelSeamQuery = (db: Knex): Knex.QueryBuilder =>
  db("model_seams")
    .leftJoin("procedures", "procedures.id", "model_seams.procedure_id")
    .select(
      "model_seams.id",
      "model_seams.drawing_id",
      "model_seams.number",
      "model_seams.sequence",
      "model_seams.joint_type",
      "model_seams.length_mm",
      "model_seams.weld_size_mm",
      "model_seams.quality_level",
      "model_seams.procedure_id",
      "model_seams.scan_rule",
      "model_seams.limits",
      db.raw("procedures.number || ' rev ' || procedures.revision as procedure_name"),
      db.raw("(select count(*) from seams where seams.model_seam_id = model_seams.id) as seam_count"),
      "model_seams.created_at",
      "model_seams.version",
    );

const toModelSeam = (row: ModelSeamRow): ModelSeam => ({
  ...row,
  limits: resolveLimits(JSON.parse(row.limits)),
});

/** A drawing. @throws Refusal not-found */
export async function readDrawing(db: Knex, id: string): Promise<Drawing> {
  const row: Drawing | undefined = await drawingQuery(db).where({ "drawings.id": id }).first();
  if (row === undefined) throw refusal("not-found", "No drawing here has that id.");
  return row;
}

/** A drawing with its model seams in welding sequence. @throws Refusal not-found */
export async function readDrawingPage(db: Knex, id: string): Promise<DrawingPage> {
  const drawing = await readDrawing(db, id);
  const rows: ModelSeamRow[] = await modelSeamQuery(db)
    .where({ "model_seams.drawing_id": id })
    .orderBy(["model_seams.sequence", "model_seams.number"]);
  return { ...drawing, model_seams: rows.map(toModelSeam) };
}

/** Drawings by number and revision. */
export async function listDrawings(
  db: Knex,
  filter: PageRequest & { readonly status?: Drawing["status"] | undefined },
): Promise<Page<Drawing>> {
  const query = drawingQuery(db);
  if (filter.status) query.where({ "drawings.status": filter.status });
  const keyset = { columns: ["drawings.number", "drawings.revision", "drawings.id"], descending: false };
  const page = await readPage<Drawing>(query, keyset, filter);
  return { items: page.rows, next_cursor: page.next_cursor };
}

/** A model seam. @throws Refusal not-found */
export async function readModelSeam(db: Knex, id: string): Promise<ModelSeam> {
  const row: ModelSeamRow | undefined = await modelSeamQuery(db).where({ "model_seams.id": id }).first();
  if (row === undefined) throw refusal("not-found", "No model seam here has that id.");
  return toModelSeam(row);
}

/** The model of a model seam with the limits in force. @throws Refusal not-found */
export async function readSeamModel(db: Knex, id: string): Promise<SeamModel> {
  const row:
    | { model: string; limits: string; weld_size_mm: number; quality_level: QualityLevel }
    | undefined = await db("model_seams")
    .where({ id })
    .first("model", "limits", "weld_size_mm", "quality_level");
  if (row === undefined) throw refusal("not-found", "No model seam here has that id.");
  const { weld_size_mm, quality_level } = row;
  const weld = { weld_size_mm, quality_level, edition: ISO_5817_CURRENT };
  return { ...JSON.parse(row.model), limits: JSON.parse(row.limits), weld };
}
