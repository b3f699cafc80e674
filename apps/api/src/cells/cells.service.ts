import type { Cell, CellCreate, Mount, MountCreate } from "@beadroll/domain/schemas/cell";
import type { Knex } from "knex";
import type { Caller } from "../auth/caller.ts";
import { actorName } from "../auth/caller.ts";
import { type PageRequest, readPage } from "../db/keyset.ts";
import type { Page } from "../db/page.ts";
import { refusal } from "../http/refusal.ts";
import { type ChangeContext, change } from "../ledger/change.ts";
import { readLot } from "../lots/lots.read.ts";
import { idOfTag, tagOf } from "../tags/tag-lookup.ts";

const CELL_COLUMNS = [
  "cells.id",
  "cells.tag",
  "cells.name",
  "cells.robot",
  "cells.power_source",
  "cells.scanner",
  "cells.scanner_accuracy_mm",
  "cells.created_at",
  "cells.version",
];

/** A cell by its tag. @throws Refusal tag-invalid, not-found */
export async function readCell(db: Knex, tagText: string): Promise<Cell> {
  const tag = tagOf("C", tagText, "cell_tag");
  const row: Cell | undefined = await db("cells").where({ tag }).first(CELL_COLUMNS);
  if (row === undefined)
    throw refusal("not-found", `No cell here has the tag ${tag}.`, { field: "cell_tag" });
  return row;
}

/** Cells by name. */
export async function listCells(db: Knex, request: PageRequest): Promise<Page<Cell>> {
  const keyset = { columns: ["cells.name", "cells.id"], descending: false };
  const page = await readPage<Cell>(db("cells").select(CELL_COLUMNS), keyset, request);
  return { items: page.rows, next_cursor: page.next_cursor };
}

/** Records a cell. @throws Refusal conflict when the name is taken */
export function createCell(context: ChangeContext, create: CellCreate): Promise<Cell> {
  return change(context, "cell.create", async (trx) => {
    const twin: unknown = await trx.read("cells").where({ name: create.name }).first("id");
    if (twin !== undefined)
      throw refusal("conflict", `There is a cell named ${create.name}.`, { field: "name" });
    const tag = trx.newTag("C");
    await trx.insert("cells", { id: trx.newId(), tag, ...create, created_at: trx.at, version: 1 });
    return { value: await readCell(trx.read, tag), subjects: [tag] };
  });
}

/**
 * The cell a record comes from: the one a key stands in, or the one named. A key cannot speak for another cell.
 * @throws Refusal not-allowed, tag-invalid, not-found
 */
export async function cellOf(db: Knex, caller: Caller, cellTag: string | undefined): Promise<string | null> {
  const own = caller.kind === "machine" ? caller.cell_id : null;
  if (cellTag === undefined) return own;
  const named = await idOfTag(db, "C", cellTag, "cell_tag");
  if (own !== null && named !== own)
    throw refusal("not-allowed", "This key stands in another cell than the one named.", {
      field: "cell_tag",
    });
  return named;
}

const mountQuery = (db: Knex): Knex.QueryBuilder =>
  db("mounts")
    .join("cells", "cells.id", "mounts.cell_id")
    .join("lots", "lots.id", "mounts.lot_id")
    .select(
      "mounts.id",
      "mounts.cell_id",
      "cells.name as cell_name",
      "mounts.slot",
      "lots.tag as lot_tag",
      "lots.number as lot_number",
      "mounts.from_at",
      "mounts.to_at",
    );

/** Mounts, latest first. @throws Refusal tag-invalid, not-found */
export async function listMounts(
  db: Knex,
  filter: PageRequest & { readonly cell_tag?: string | undefined },
): Promise<Page<Mount>> {
  const query = mountQuery(db);
  if (filter.cell_tag !== undefined)
    query.where({ "mounts.cell_id": await idOfTag(db, "C", filter.cell_tag, "cell_tag") });
  const page = await readPage<Mount>(
    query,
    { columns: ["mounts.from_at", "mounts.id"], descending: true },
    filter,
  );
  return { items: page.rows, next_cursor: page.next_cursor };
}

/** What is mounted on cells now. */
export async function readMountsNow(db: Knex): Promise<Mount[]> {
  return mountQuery(db).whereNull("mounts.to_at").orderBy(["cells.name", "mounts.slot"]);
}

const SLOT_KINDS: Readonly<Record<string, string>> = { wire: "wire", gas: "gas", flux: "flux" };

/**
 * Mounts a lot; what was on the slot is taken off at that moment.
 * @throws Refusal state-conflict when the lot is not released, of another kind, or the moment lies before the last mount
 */
export function mountLot(context: ChangeContext, create: MountCreate): Promise<Mount> {
  return change(context, "mount.create", async (trx) => {
    const cellId = await cellOf(trx.read, context.caller, create.cell_tag);
    if (cellId === null) throw refusal("request-invalid", "cell_tag: name the cell.", { field: "cell_tag" });
    const lot = await readLot(trx.read, create.lot_tag);
    if (lot.kind !== SLOT_KINDS[create.slot])
      throw refusal(
        "state-conflict",
        `${lot.tag} is ${lot.kind}; it does not go on the ${create.slot} slot.`,
        { field: "lot_tag" },
      );
    if (lot.state !== "released")
      throw refusal(
        "state-conflict",
        `Lot ${lot.number} is ${lot.state.replace("_", " ")}; only released lots are mounted.`,
        {
          field: "lot_tag",
        },
      );
    const at = create.at ?? trx.at;
    const current: { id: string; from_at: string } | undefined = await trx
      .read("mounts")
      .where({ cell_id: cellId, slot: create.slot })
      .whereNull("to_at")
      .first("id", "from_at");
    if (current && current.from_at > at)
      throw refusal(
        "state-conflict",
        `Another lot was mounted on this slot at ${current.from_at}, after that.`,
        { field: "at" },
      );
    if (current) await trx.update("mounts", { id: current.id }, { to_at: at });
    const id = trx.newId();
    await trx.insert("mounts", {
      id,
      cell_id: cellId,
      slot: create.slot,
      lot_id: lot.id,
      from_at: at,
      to_at: null,
      created_by: actorName(context.caller),
    });
    const mount: Mount = await mountQuery(trx.read).where({ "mounts.id": id }).first();
    const cell: { tag: string } = await trx.read("cells").where({ id: cellId }).first("tag");
    return { value: mount, subjects: [cell.tag, lot.tag] };
  });
}
