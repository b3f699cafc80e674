import type { SeamPage, SeamRow, SeamState } from "@beadroll/domain/schemas/seam";
import type { Knex } from "knex";
import { type PageRequest, readPage } from "../db/keyset.ts";
import { type Page, pageOf } from "../db/page.ts";
import { readModelSeam } from "../drawings/drawings.read.ts";
import { refusal } from "../http/refusal.ts";
import { readInspectionsOfSeam } from "../inspections/inspections.service.ts";
import { readSeqsOf } from "../ledger/ledger.read.ts";
import { readPassesOfSeam, readPassLots } from "../passes/passes.read.ts";
import { readScansOfSeam } from "../scans/scans.read.ts";
import { tagOf } from "../tags/tag-lookup.ts";
import { type SeamRecord, seamRowQuery, toSeamRow } from "./seam-rows.read.ts";
import { readSeamState } from "./seam-state.store.ts";

/** Which seams a list is asked for. */
export interface SeamFilter extends PageRequest {
  readonly state?: SeamState | undefined;
  readonly verdict?: string | undefined;
  readonly drawing_id?: string | undefined;
  readonly model_seam_id?: string | undefined;
}

/** Seams over all parts, last changed first. */
export async function listSeams(db: Knex, filter: SeamFilter): Promise<Page<SeamRow>> {
  const query = seamRowQuery(db);
  if (filter.state) query.where({ "seams.state": filter.state });
  if (filter.verdict) query.where({ "seams.verdict": filter.verdict });
  if (filter.drawing_id) query.where({ "parts.drawing_id": filter.drawing_id });
  if (filter.model_seam_id) query.where({ "seams.model_seam_id": filter.model_seam_id });
  const keyset = { columns: ["seams.changed_at", "seams.id"], descending: true };
  return pageOf(await readPage<SeamRecord>(query, keyset, filter), toSeamRow);
}

/** The roll of a part: its seams in welding sequence. */
export async function readRoll(db: Knex, partId: string): Promise<SeamRow[]> {
  const records: SeamRecord[] = await seamRowQuery(db)
    .where({ "seams.part_id": partId })
    .orderBy(["model_seams.sequence", "model_seams.number"]);
  return records.map(toSeamRow);
}

interface SeamHead {
  readonly part_id: string;
  readonly model_seam_id: string;
  readonly drawing_number: string;
  readonly drawing_revision: string;
}

async function readPieces(db: Knex, partId: string): Promise<SeamPage["pieces"]> {
  return db("pieces")
    .join("lots", "lots.id", "pieces.lot_id")
    .where({ "pieces.part_id": partId })
    .whereNull("pieces.to_at")
    .orderBy("pieces.position")
    .select("pieces.position", "lots.tag as lot_tag", "lots.number as lot_number", "lots.grade");
}

/** A seam's whole record. @throws Refusal tag-invalid, not-found */
export async function readSeamPage(db: Knex, tagText: string): Promise<SeamPage> {
  const tag = tagOf("S", tagText);
  const record: (SeamRecord & SeamHead) | undefined = await seamRowQuery(db)
    .where({ "seams.tag": tag })
    .first(
      "seams.part_id",
      "seams.model_seam_id",
      "drawings.number as drawing_number",
      "drawings.revision as drawing_revision",
    );
  if (record === undefined) throw refusal("not-found", `No seam here has the tag ${tag}.`);
  const model_seam = await readModelSeam(db, record.model_seam_id);
  const { reason } = await readSeamState(db, record.id, record.attempt);
  return {
    ...toSeamRow(record),
    drawing_number: record.drawing_number,
    drawing_revision: record.drawing_revision,
    quality_level: model_seam.quality_level,
    model_seam,
    scans: await readScansOfSeam(db, record.id),
    passes: await readPassesOfSeam(db, record.id),
    inspections: await readInspectionsOfSeam(db, record.id),
    pass_lots: await readPassLots(db, record.id),
    pieces: await readPieces(db, record.part_id),
    ledger_seqs: await readSeqsOf(db, tag),
    state_reason: reason,
  };
}
