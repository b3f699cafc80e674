import type { Found, TagAnswer } from "@beadroll/domain/schemas/find";
import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { type TagKind, tagKind } from "@beadroll/domain/tags/tag";
import type { Knex } from "knex";
import { accepted, refusal } from "../http/refusal.ts";

const FOUND_MAX = 50;
const PER_KIND = 12;

const NAMED_PART = "drawings.title || ' ' || parts.serial";

/** One query a kind; each gives kind, tag, id, title and detail. */
const SOURCES = {
  part: (db: Knex) =>
    db("parts")
      .join("drawings", "drawings.id", "parts.drawing_id")
      .select(
        db.raw("'part' as kind"),
        "parts.tag",
        "parts.id",
        db.raw(`${NAMED_PART} as title`),
        db.raw(
          "drawings.number || ' rev ' || drawings.revision || coalesce(', order ' || parts.order_no, '') as detail",
        ),
      ),
  seam: (db: Knex) =>
    db("seams")
      .join("parts", "parts.id", "seams.part_id")
      .join("drawings", "drawings.id", "parts.drawing_id")
      .join("model_seams", "model_seams.id", "seams.model_seam_id")
      .select(
        db.raw("'seam' as kind"),
        "seams.tag",
        "seams.id",
        db.raw(`'Seam ' || model_seams.number || ' of ' || ${NAMED_PART} as title`),
        db.raw("seams.state || ', ' || drawings.number || ' rev ' || drawings.revision as detail"),
      ),
  lot: (db: Knex) =>
    db("lots").select(
      db.raw("'lot' as kind"),
      "lots.tag",
      "lots.id",
      "lots.number as title",
      db.raw(
        "lots.kind || ' ' || lots.grade || ', ' || lots.supplier || ', ' || replace(lots.state, '_', ' ') as detail",
      ),
    ),
  cell: (db: Knex) =>
    db("cells").select(
      db.raw("'cell' as kind"),
      "cells.tag",
      "cells.id",
      "cells.name as title",
      "cells.robot as detail",
    ),
  person: (db: Knex) =>
    db("people").select(
      db.raw("'person' as kind"),
      "people.tag",
      "people.id",
      "people.name as title",
      "people.job as detail",
    ),
  drawing: (db: Knex) =>
    db("drawings").select(
      db.raw("'drawing' as kind"),
      db.raw("null as tag"),
      "drawings.id",
      db.raw("drawings.number || ' rev ' || drawings.revision as title"),
      db.raw("drawings.title || ', ' || drawings.status as detail"),
    ),
  procedure: (db: Knex) =>
    db("procedures").select(
      db.raw("'procedure' as kind"),
      db.raw("null as tag"),
      "procedures.id",
      db.raw("procedures.number || ' rev ' || procedures.revision as title"),
      db.raw("procedures.title || ', ' || procedures.status as detail"),
    ),
} as const satisfies Record<Found["kind"], (db: Knex) => Knex.QueryBuilder>;

const KIND_OF_TAG: Partial<Record<TagKind, Exclude<Found["kind"], "drawing" | "procedure">>> = {
  P: "part",
  S: "seam",
  L: "lot",
  C: "cell",
  W: "person",
};

const TABLE_OF_KIND = { part: "parts", seam: "seams", lot: "lots", cell: "cells", person: "people" } as const;

const PAGES: Record<Found["kind"], (found: Found) => string> = {
  part: ({ tag }) => `/parts/${tag}`,
  seam: ({ tag }) => `/seams/${tag}`,
  lot: ({ tag }) => `/lots/${tag}`,
  cell: () => "/",
  person: ({ tag }) => `/people/${tag}`,
  drawing: ({ id }) => `/drawings/${id}`,
  procedure: ({ id }) => `/procedures/${id}`,
};

async function byTag(db: Knex, tag: string, kind: keyof typeof TABLE_OF_KIND): Promise<Found | undefined> {
  return SOURCES[kind](db)
    .where({ [`${TABLE_OF_KIND[kind]}.tag`]: tag })
    .first();
}

/** What a tag is of. @throws Refusal tag-invalid before any look-up, not-found */
export async function resolveTag(db: Knex, text: string): Promise<TagAnswer> {
  const tag = accepted(parseTag(text));
  const kind = KIND_OF_TAG[tagKind(tag)];
  const found = kind === undefined ? undefined : await byTag(db, tag, kind);
  if (found === undefined) throw refusal("not-found", `Nothing here has the tag ${tag}.`, { field: "tag" });
  return { ...found, page: PAGES[found.kind](found) };
}

/** Codes: begin so, through an index. Names: hold it anywhere; those tables are small. */
async function byText(db: Knex, text: string): Promise<Found[]> {
  const code = text.toUpperCase();
  const begins = (query: Knex.QueryBuilder, column: string, value: string) =>
    query.where(column, ">=", value).where(column, "<", `${value}\uffff`);
  const holds = (query: Knex.QueryBuilder, expression: string) =>
    query.whereRaw(`instr(lower(${expression}), ?) > 0`, [text.toLowerCase()]);
  const queries: Knex.QueryBuilder[] = [
    begins(SOURCES.part(db), "parts.serial", code),
    begins(SOURCES.part(db), "parts.order_no", code),
    begins(SOURCES.lot(db), "lots.number", code),
    holds(SOURCES.drawing(db), "drawings.number || ' rev ' || drawings.revision || ' ' || drawings.title"),
    holds(SOURCES.procedure(db), "procedures.number || ' ' || procedures.title"),
    holds(SOURCES.cell(db), "cells.name"),
    holds(SOURCES.person(db), "people.name"),
  ];
  const found: Found[] = [];
  for (const query of queries) found.push(...(await query.limit(PER_KIND)));
  return found;
}

/** "Skid frame 0418": the words before the last name a drawing, the last begins a serial. */
async function byNamedPart(db: Knex, text: string): Promise<Found[]> {
  const match = /^(.+?)\s+(\S+)$/.exec(text);
  const [, title, serial] = match ?? [];
  if (title === undefined || serial === undefined) return [];
  return SOURCES.part(db)
    .whereRaw("instr(lower(drawings.title), ?) > 0", [title.toLowerCase()])
    .where("parts.serial", ">=", serial.toUpperCase())
    .where("parts.serial", "<", `${serial.toUpperCase()}\uffff`)
    .limit(PER_KIND);
}

/** Exact titles and tags first, then those that begin so, then the rest in the order found. */
function rank(found: readonly Found[], text: string): Found[] {
  const lower = text.toLowerCase();
  const score = ({ title, tag }: Found) => {
    if (tag?.toLowerCase() === lower || title.toLowerCase() === lower) return 0;
    return title.toLowerCase().startsWith(lower) || title.toLowerCase().endsWith(` ${lower}`) ? 1 : 2;
  };
  const unique = [...new Map(found.map((item) => [item.id, item])).values()];
  return unique
    .map((item, index) => ({ item, index, score: score(item) }))
    .sort((a, b) => a.score - b.score || a.index - b.index)
    .map(({ item }) => item)
    .slice(0, FOUND_MAX);
}

/** What a search finds, best first. A whole tag finds the one thing it is of. */
export async function find(db: Knex, text: string): Promise<Found[]> {
  const tag = parseTag(text);
  const kind = tag.ok ? KIND_OF_TAG[tagKind(tag.value)] : undefined;
  if (tag.ok && kind !== undefined) {
    const found = await byTag(db, tag.value, kind);
    if (found) return [found];
  }
  return rank([...(await byNamedPart(db, text)), ...(await byText(db, text))], text);
}
