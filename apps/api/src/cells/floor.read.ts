import type { Cell } from "@beadroll/domain/schemas/cell";
import type { Floor, FloorCell } from "@beadroll/domain/schemas/floor";
import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { Knex } from "knex";
import { type SeamRecord, seamRowQuery, toSeamRow } from "../seams/seam-rows.read.ts";
import { listCells, readMountsNow } from "./cells.service.ts";

const WAITING_MAX = 50;
const LATEST_PER_CELL = 6;

async function waiting(db: Knex, state: SeamRow["state"]): Promise<{ rows: SeamRow[]; count: number }> {
  const records: SeamRecord[] = await seamRowQuery(db)
    .where({ "seams.state": state })
    .orderBy(["seams.changed_at", "seams.id"])
    .limit(WAITING_MAX);
  const [counted] = await db("seams").where({ state }).count<{ n: number }[]>("* as n");
  return { rows: records.map(toSeamRow), count: counted?.n ?? 0 };
}

/** Seams that a cell worked on last: by its scans and passes, through their indexes on the cell. */
async function latestOf(db: Knex, cell: Cell): Promise<SeamRow[]> {
  const recent = db
    .unionAll(
      [
        db
          .select("*")
          .from(
            db("scans")
              .where({ cell_id: cell.id })
              .orderBy("received_at", "desc")
              .limit(40)
              .select("seam_id", "received_at as at")
              .as("s"),
          ),
        db
          .select("*")
          .from(
            db("passes")
              .where({ cell_id: cell.id })
              .orderBy("arc_from_at", "desc")
              .limit(40)
              .select("seam_id", "received_at as at")
              .as("p"),
          ),
      ],
      false,
    )
    .as("recent");
  const latest = db
    .from(recent)
    .select("seam_id")
    .groupBy("seam_id")
    .orderByRaw("max(at) desc")
    .limit(LATEST_PER_CELL);
  const records: SeamRecord[] = await seamRowQuery(db)
    .whereIn("seams.id", latest)
    .orderBy("seams.changed_at", "desc");
  return records.map(toSeamRow);
}

interface Today {
  readonly scans: number;
  readonly passes: number;
  readonly holds: number;
  readonly last_event_at: string | null;
}

async function todayOf(db: Knex, cell: Cell, midnight: string): Promise<Today> {
  const rows: Today[] = await db.raw(
    `select
       (select count(*) from scans where scans.cell_id = :cell and scans.received_at >= :midnight) as scans,
       (select count(*) from passes where passes.cell_id = :cell and passes.arc_from_at >= :midnight) as passes,
       (select count(*) from scans where scans.cell_id = :cell and scans.received_at >= :midnight and scans.verdict = 'hold') as holds,
       max(
         coalesce((select max(received_at) from scans where scans.cell_id = :cell), ''),
         coalesce((select max(arc_to_at) from passes where passes.cell_id = :cell), '')
       ) as last_event_at`,
    { cell: cell.id, midnight },
  );
  const [today] = rows;
  if (!today) throw new Error("a query without tables gives one row");
  return { ...today, last_event_at: today.last_event_at || null };
}

/** The floor: every cell now, and the seams that wait for somebody. */
export async function readFloor(db: Knex, now: Date): Promise<Floor> {
  const midnight = `${now.toISOString().slice(0, 10)}T00:00:00.000Z`;
  const { items } = await listCells(db, { limit: 200 });
  const mounts = await readMountsNow(db);
  const cells: FloorCell[] = [];
  for (const cell of items) {
    const { last_event_at, ...today } = await todayOf(db, cell, midnight);
    cells.push({
      cell,
      mounts: mounts.filter((mount) => mount.cell_id === cell.id),
      last_event_at,
      latest: await latestOf(db, cell),
      today,
    });
  }
  const held = await waiting(db, "held");
  const toInspect = await waiting(db, "welded");
  return {
    cells,
    held: held.rows,
    held_count: held.count,
    to_inspect: toInspect.rows,
    to_inspect_count: toInspect.count,
  };
}
