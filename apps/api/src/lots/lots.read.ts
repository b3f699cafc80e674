import type { Certificate, Lot, LotPage } from "@beadroll/domain/schemas/lot";
import type { Knex } from "knex";
import { type PageRequest, readPage } from "../db/keyset.ts";
import type { Page } from "../db/page.ts";
import { refusal } from "../http/refusal.ts";
import { tagOf } from "../tags/tag-lookup.ts";

const USES_MAX = 500;

const COLUMNS = [
  "lots.id",
  "lots.tag",
  "lots.kind",
  "lots.number",
  "lots.supplier",
  "lots.grade",
  "lots.dimension",
  "lots.thickness_mm",
  "lots.quantity",
  "lots.unit",
  "lots.received_on",
  "lots.state",
  "lots.note",
  "lots.created_at",
  "lots.version",
];

/** A lot by its tag. @throws Refusal tag-invalid, not-found */
export async function readLot(db: Knex, tagText: string): Promise<Lot> {
  const tag = tagOf("L", tagText);
  const row: Lot | undefined = await db("lots").where({ tag }).first(COLUMNS);
  if (row === undefined) throw refusal("not-found", `No lot here has the tag ${tag}.`);
  return row;
}

/** Lots, newest first. */
export async function listLots(
  db: Knex,
  filter: PageRequest & {
    readonly kind?: string | undefined;
    readonly state?: string | undefined;
    readonly number?: string | undefined;
  },
): Promise<Page<Lot>> {
  const query = db("lots").select(COLUMNS);
  if (filter.kind) query.where({ "lots.kind": filter.kind });
  if (filter.state) query.where({ "lots.state": filter.state });
  // A half-open range uses the index; a pattern would not.
  if (filter.number)
    query.where("lots.number", ">=", filter.number).where("lots.number", "<", `${filter.number}\uffff`);
  const page = await readPage<Lot>(
    query,
    { columns: ["lots.created_at", "lots.id"], descending: true },
    filter,
  );
  return { items: page.rows, next_cursor: page.next_cursor };
}

type CertificateRow = Omit<Certificate, "chemistry" | "mechanical"> & {
  chemistry: string;
  mechanical: string;
};

const toCertificate = (row: CertificateRow): Certificate => ({
  ...row,
  chemistry: JSON.parse(row.chemistry),
  mechanical: JSON.parse(row.mechanical),
});

/** The certificates of a lot, latest first. */
export async function readCertificates(db: Knex, lotId: string): Promise<Certificate[]> {
  const rows: CertificateRow[] = await db("certificates")
    .where({ lot_id: lotId })
    .orderBy("created_at", "desc")
    .select(
      "id",
      "lot_id",
      "type",
      "number",
      "issuer",
      "issued_on",
      "chemistry",
      "mechanical",
      "file_digest",
      "created_at",
    );
  return rows.map(toCertificate);
}

/** Where a lot went: built in as pieces, or mounted on cells. */
async function readUses(db: Knex, lotId: string): Promise<LotPage["uses"]> {
  return db
    .unionAll([
      db("pieces")
        .join("parts", "parts.id", "pieces.part_id")
        .join("drawings", "drawings.id", "parts.drawing_id")
        .where({ "pieces.lot_id": lotId })
        .select(
          db.raw("'piece' as kind"),
          "pieces.position as what",
          "parts.tag",
          db.raw("drawings.title || ' ' || parts.serial as name"),
          "pieces.from_at",
          "pieces.to_at",
        ),
      db("mounts")
        .join("cells", "cells.id", "mounts.cell_id")
        .where({ "mounts.lot_id": lotId })
        .select(
          db.raw("'mount' as kind"),
          "mounts.slot as what",
          "cells.tag",
          "cells.name",
          "mounts.from_at",
          "mounts.to_at",
        ),
    ])
    .orderBy("from_at", "desc")
    .limit(USES_MAX);
}

/**
 * Seams a lot is in: all seams of the parts it is built into, and the seams of passes whose arc burned while it was
 * mounted on their cell.
 */
async function countSeams(db: Knex, lotId: string): Promise<number> {
  const rows: { n: number }[] = await db.raw(
    `select count(*) as n from (
       select seams.id from pieces join seams on seams.part_id = pieces.part_id where pieces.lot_id = ?
       union
       select passes.seam_id from mounts
         join passes on passes.cell_id = mounts.cell_id
           and passes.arc_to_at > mounts.from_at and passes.arc_from_at < coalesce(mounts.to_at, '9999')
         where mounts.lot_id = ?
     )`,
    [lotId, lotId],
  );
  return rows[0]?.n ?? 0;
}

/** A lot with its certificates and where it went. @throws Refusal tag-invalid, not-found */
export async function readLotPage(db: Knex, tag: string): Promise<LotPage> {
  const lot = await readLot(db, tag);
  const certificates = await readCertificates(db, lot.id);
  const uses = await readUses(db, lot.id);
  return { ...lot, certificates, uses, seam_count: await countSeams(db, lot.id) };
}
