import type { Part, PartPage, Piece } from "@beadroll/domain/schemas/part";
import type { Knex } from "knex";
import { type PageRequest, readPage } from "../db/keyset.ts";
import { type Page, pageOf } from "../db/page.ts";
import { refusal } from "../http/refusal.ts";
import { readSeqsOf } from "../ledger/ledger.read.ts";
import { readRoll } from "../seams/seams.read.ts";
import { tagOf } from "../tags/tag-lookup.ts";
import { readWentIn } from "./went-in.read.ts";

type PartRow = Omit<Part, "seams"> & { readonly tally: string };

const CONDITIONS = {
  held: ["held"],
  rejected: ["rejected", "repair"],
  welded: ["welded"],
  planned: ["planned"],
} as const;

/** Tally of a part's seams as JSON, counted through the index on (part, state). */
const TALLY = `(select json_object(
    'total', count(*),
    'planned', sum(seams.state = 'planned'),
    'held', sum(seams.state = 'held'),
    'clear', sum(seams.state = 'clear'),
    'welded', sum(seams.state = 'welded'),
    'accepted', sum(seams.state in ('accepted', 'released')),
    'rejected', sum(seams.state in ('rejected', 'repair')))
  from seams where seams.part_id = parts.id) as tally`;

const partQuery = (db: Knex): Knex.QueryBuilder =>
  db("parts")
    .join("drawings", "drawings.id", "parts.drawing_id")
    .leftJoin("parts as parents", "parents.id", "parts.parent_part_id")
    .select(
      "parts.id",
      "parts.tag",
      "parts.serial",
      "parts.order_no",
      db.raw("drawings.title || ' ' || parts.serial as name"),
      "parts.drawing_id",
      "drawings.number as drawing_number",
      "drawings.revision as drawing_revision",
      "parents.tag as parent_tag",
      db.raw(TALLY),
      "parts.created_at",
      "parts.version",
    );

function toPart({ tally, ...row }: PartRow): Part {
  const counted: Record<string, number | null> = JSON.parse(tally);
  const count = (name: string): number => counted[name] ?? 0;
  return {
    ...row,
    seams: {
      total: count("total"),
      planned: count("planned"),
      held: count("held"),
      clear: count("clear"),
      welded: count("welded"),
      accepted: count("accepted"),
      rejected: count("rejected"),
    },
  };
}

/** Which parts a list is asked for. */
export interface PartFilter extends PageRequest {
  readonly drawing_id?: string | undefined;
  readonly order_no?: string | undefined;
  readonly serial?: string | undefined;
  readonly with?: keyof typeof CONDITIONS | undefined;
  readonly sort: "serial" | "-serial" | "created_at" | "-created_at";
}

/** Parts as filtered and sorted. */
export async function listParts(db: Knex, filter: PartFilter): Promise<Page<Part>> {
  const query = partQuery(db);
  if (filter.drawing_id) query.where({ "parts.drawing_id": filter.drawing_id });
  if (filter.order_no) query.where({ "parts.order_no": filter.order_no });
  if (filter.serial)
    query.where("parts.serial", ">=", filter.serial).where("parts.serial", "<", `${filter.serial}\uffff`);
  if (filter.with) {
    const states = CONDITIONS[filter.with];
    query.whereExists(
      db("seams")
        .select(db.raw("1"))
        .whereRaw("seams.part_id = parts.id")
        .whereIn("seams.state", [...states]),
    );
  }
  const column = filter.sort.endsWith("serial") ? "parts.serial" : "parts.created_at";
  const keyset = { columns: [column, "parts.id"], descending: filter.sort.startsWith("-") };
  return pageOf(await readPage<PartRow>(query, keyset, filter), toPart);
}

/** A part by its tag. @throws Refusal tag-invalid, not-found */
export async function readPart(db: Knex, tagText: string): Promise<Part> {
  const tag = tagOf("P", tagText);
  const row: PartRow | undefined = await partQuery(db).where({ "parts.tag": tag }).first();
  if (row === undefined) throw refusal("not-found", `No part here has the tag ${tag}.`);
  return toPart(row);
}

/** Pieces of a part, those in force first. */
export async function readPieces(db: Knex, partId: string): Promise<Piece[]> {
  return db("pieces")
    .join("lots", "lots.id", "pieces.lot_id")
    .where({ "pieces.part_id": partId })
    .orderByRaw("pieces.to_at is not null, pieces.position, pieces.from_at desc")
    .select(
      "pieces.id",
      "pieces.position",
      "lots.tag as lot_tag",
      "lots.number as lot_number",
      "lots.kind as lot_kind",
      "lots.grade",
      "pieces.from_at",
      "pieces.to_at",
    );
}

async function readContents(db: Knex, partId: string): Promise<PartPage["contents"]> {
  return db("parts")
    .join("drawings", "drawings.id", "parts.drawing_id")
    .where({ "parts.parent_part_id": partId })
    .orderBy("parts.serial")
    .select("parts.tag", db.raw("drawings.title || ' ' || parts.serial as name"));
}

/** A part with its roll and what went in. @throws Refusal tag-invalid, not-found */
export async function readPartPage(db: Knex, tag: string): Promise<PartPage> {
  const part = await readPart(db, tag);
  const pieces = await readPieces(db, part.id);
  return {
    ...part,
    roll: await readRoll(db, part.id),
    pieces,
    contents: await readContents(db, part.id),
    went_in: await readWentIn(db, part.id, { pieces, seam_count: part.seams.total }),
    ledger_seqs: await readSeqsOf(db, part.tag),
  };
}
