import { decodeStrip } from "@beadroll/domain/measure/strip";
import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { Knex } from "knex";

/** A seam as it is joined for lists. */
export type SeamRecord = Omit<SeamRow, "strip"> & { readonly strip: Buffer | null };

const COLUMNS = [
  "seams.id",
  "seams.tag",
  "model_seams.number",
  "seams.attempt",
  "model_seams.joint_type",
  "model_seams.weld_size_mm",
  "model_seams.length_mm",
  "seams.state",
  "seams.verdict",
  "seams.largest_mm",
  "seams.heat_input_kj_mm",
  "seams.strip",
  "parts.tag as part_tag",
  "seams.changed_at",
];

/** Seams joined with their model, part and drawing: one query, whatever the list. */
export function seamRowQuery(db: Knex): Knex.QueryBuilder {
  return db("seams")
    .join("model_seams", "model_seams.id", "seams.model_seam_id")
    .join("parts", "parts.id", "seams.part_id")
    .join("drawings", "drawings.id", "parts.drawing_id")
    .select(COLUMNS)
    .select(db.raw("drawings.title || ' ' || parts.serial as part_name"));
}

/** A joined row as the API shows it. */
export function toSeamRow(record: SeamRecord): SeamRow {
  return {
    id: record.id,
    tag: record.tag,
    number: record.number,
    attempt: record.attempt,
    joint_type: record.joint_type,
    weld_size_mm: record.weld_size_mm,
    length_mm: record.length_mm,
    state: record.state,
    verdict: record.verdict,
    largest_mm: record.largest_mm,
    heat_input_kj_mm: record.heat_input_kj_mm,
    strip: record.strip === null ? null : decodeStrip(record.strip),
    part_tag: record.part_tag,
    part_name: record.part_name,
    changed_at: record.changed_at,
  };
}
