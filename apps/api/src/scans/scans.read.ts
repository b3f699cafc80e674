import { decodeStations } from "@beadroll/domain/measure/station-codec";
import { type BeadResult, BeadStation } from "@beadroll/domain/schemas/bead-result";
import type { FitUpScanPage, ScanPage, ScanRecord } from "@beadroll/domain/schemas/scan";
import { type ScanResult, StationResult } from "@beadroll/domain/schemas/scan-result";
import type { Knex } from "knex";
import { refusal } from "../http/refusal.ts";

const COLUMNS = [
  "scans.id",
  "seams.tag as seam_tag",
  "scans.attempt",
  "scans.stage",
  "scans.verdict",
  "scans.points",
  "scans.file_name",
  "scans.file_digest",
  "scans.poses_digest",
  "scans.units",
  "scans.engine",
  "cells.name as cell_name",
  "scans.taken_at",
  "scans.received_at",
  "scans.received_from",
  "scans.ledger_seq",
];

const query = (db: Knex): Knex.QueryBuilder =>
  db("scans")
    .join("seams", "seams.id", "scans.seam_id")
    .leftJoin("cells", "cells.id", "scans.cell_id")
    .select(COLUMNS);

/** What the summary column keeps: the result without its stations. */
type KeptSummary = Omit<ScanResult, "stations"> | Omit<BeadResult, "stations">;

const isBead = (kept: KeptSummary): kept is Omit<BeadResult, "stations"> => "stage" in kept;

/** Scans of a seam, latest first, without their stations. */
export async function readScansOfSeam(db: Knex, seamId: string): Promise<ScanRecord[]> {
  return query(db).where({ "scans.seam_id": seamId }).orderBy("scans.ledger_seq", "desc");
}

/** A scan with everything measured. @throws Refusal not-found */
export async function readScanPage(db: Knex, id: string): Promise<ScanPage> {
  const row: (ScanRecord & { summary: string; stations: Buffer }) | undefined = await query(db)
    .where({ "scans.id": id })
    .first("scans.summary", "scans.stations");
  if (row === undefined) throw refusal("not-found", "No scan here has that id.");
  const { summary, stations, ...record } = row;
  const kept: KeptSummary = JSON.parse(summary);
  return isBead(kept)
    ? { ...record, stage: "bead", result: { ...kept, stations: decodeStations(stations, BeadStation) } }
    : { ...record, stage: "fitup", result: { ...kept, stations: decodeStations(stations, StationResult) } };
}

/** A scan of the fit-up with everything measured. @throws Refusal not-found, scan-not-fitup */
export async function readFitUpPage(db: Knex, id: string): Promise<FitUpScanPage> {
  const page = await readScanPage(db, id);
  if (page.stage === "bead")
    throw refusal(
      "scan-not-fitup",
      "This scan is of the finished bead; the fit-up's scan has the path and the fill.",
    );
  return page;
}

/** What measuring a stored scan again needs. */
export interface ScanSource {
  readonly stage: ScanRecord["stage"];
  readonly model_seam_id: string;
  readonly limits: string;
  readonly file_name: string;
  readonly file_digest: string;
  readonly poses_digest: string | null;
  readonly units: ScanRecord["units"];
}

/** The files and model of a stored scan. @throws Refusal not-found */
export async function readScanSource(db: Knex, id: string): Promise<ScanSource> {
  const source: ScanSource | undefined = await db("scans")
    .join("seams", "seams.id", "scans.seam_id")
    .where({ "scans.id": id })
    .first(
      "seams.model_seam_id",
      "scans.stage",
      "scans.limits",
      "scans.file_name",
      "scans.file_digest",
      "scans.poses_digest",
      "scans.units",
    );
  if (source === undefined) throw refusal("not-found", "No scan here has that id.");
  return source;
}
