import { encodeStations } from "@beadroll/domain/measure/station-codec";
import { encodeStrip, stripOf } from "@beadroll/domain/measure/strip";
import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { ScanCreate, ScanPage } from "@beadroll/domain/schemas/scan";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import { resolveLimits, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { SectionView } from "@beadroll/domain/schemas/section-view";
import { actorName, type Caller } from "../auth/caller.ts";
import { cellOf } from "../cells/cells.service.ts";
import type { Deps } from "../deps.ts";
import { readSeamModel } from "../drawings/drawings.read.ts";
import { recordFile } from "../files/files.store.ts";
import type { ReceivedFile } from "../http/multipart.ts";
import { accepted } from "../http/refusal.ts";
import { type ChangeContext, type ChangeTrx, change, type Row } from "../ledger/change.ts";
import type { MeasureTask, ScanFiles } from "../measure/measure-task.ts";
import { attemptFor, readSeamHandle, refuseOtherPart, type SeamHandle } from "../seams/seam-lookup.ts";
import { deriveSeam } from "../seams/seam-state.store.ts";
import { readScanPage, readScanSource, type ScanSource } from "./scans.read.ts";

/** A scan that was pushed: what came with it and its files, already in the store. */
export interface PushedScan {
  readonly seam_tag: string;
  readonly fields: ScanCreate;
  readonly scan: ReceivedFile;
  readonly poses: ReceivedFile | null;
}

interface Measured {
  readonly result: ScanResult | BeadResult;
  readonly model: SeamModel;
  readonly cell_id: string | null;
}

const filesOf = (deps: Deps, pushed: PushedScan): ScanFiles => ({
  scan: { name: pushed.scan.name, path: deps.store.pathOf(pushed.scan.digest) },
  poses: pushed.poses && { name: pushed.poses.name, path: deps.store.pathOf(pushed.poses.digest) },
  units: pushed.fields.units,
});

async function scannerAccuracy(deps: Deps, cellId: string | null): Promise<number | null> {
  if (cellId === null) return null;
  const cell: { scanner_accuracy_mm: number } | undefined = await deps.db
    .reader("cells")
    .where({ id: cellId })
    .first("scanner_accuracy_mm");
  return cell?.scanner_accuracy_mm ?? null;
}

type EvaluateTask = Extract<MeasureTask, { kind: "evaluate" }>;

/** What a worker needs to measure a pushed scan: its files, its seam's model, its cell's scanner. */
export async function evaluationOf(
  deps: Deps,
  caller: Caller,
  pushed: PushedScan,
): Promise<{ readonly task: EvaluateTask; readonly cell_id: string | null }> {
  const { reader } = deps.db;
  const seam = await readSeamHandle(reader, pushed.seam_tag);
  const cell_id = await cellOf(reader, caller, pushed.fields.cell_tag);
  const task: EvaluateTask = {
    kind: "evaluate",
    stage: pushed.fields.stage,
    files: filesOf(deps, pushed),
    model: await readSeamModel(reader, seam.model_seam_id),
    scanner_accuracy_mm: await scannerAccuracy(deps, cell_id),
  };
  return { task, cell_id };
}

/** Measures before the transaction begins, which must be short. */
async function measure(deps: Deps, context: ChangeContext, pushed: PushedScan): Promise<Measured> {
  const { task, cell_id } = await evaluationOf(deps, context.caller, pushed);
  return { result: accepted(await deps.measure.run(task)), model: task.model, cell_id };
}

/** What lists show of a seam's latest fit-up scan; a scan of the bead changes nothing there. */
function listColumns({ result, model }: Measured): Row {
  if ("stage" in result) return {};
  const { stations } = result;
  const limits = resolveLimits(model.limits).adapt;
  const scale = { section: model.section, limits, length_mm: model.seam.length_mm };
  const largest = Math.max(
    ...stations.map((s) =>
      s.measured ? Math.hypot(s.lateral_mm ?? 0, s.normal_mm ?? 0) : Number.NEGATIVE_INFINITY,
    ),
  );
  return {
    verdict: result.verdict,
    largest_mm: Number.isFinite(largest) ? largest : null,
    strip: Buffer.from(encodeStrip(stripOf(stations, scale))),
  };
}

function scanRow(trx: ChangeTrx, context: ChangeContext, pushed: PushedScan, measured: Measured): Row {
  const { stations, ...summary } = measured.result;
  return {
    stage: pushed.fields.stage,
    verdict: measured.result.verdict,
    points: measured.result.points,
    file_name: pushed.scan.name,
    file_digest: pushed.scan.digest,
    poses_digest: pushed.poses?.digest ?? null,
    units: pushed.fields.units,
    limits: JSON.stringify(measured.model.limits),
    engine: measured.result.engine,
    summary: JSON.stringify(summary),
    stations: Buffer.from(encodeStations(stations)),
    cell_id: measured.cell_id,
    taken_at: pushed.fields.taken_at ?? trx.at,
    received_at: trx.at,
    received_from: actorName(context.caller),
    ledger_seq: trx.seq,
  };
}

/** The scan of the same files in the same attempt, if it is recorded: a repeat is no second scan. */
async function sameScan(
  trx: ChangeTrx | Deps["db"]["reader"],
  seam: SeamHandle,
  pushed: PushedScan,
): Promise<string | null> {
  const db = "read" in trx ? trx.read : trx;
  const found: { id: string } | undefined = await db("scans")
    .where({
      seam_id: seam.id,
      attempt: seam.attempt,
      stage: pushed.fields.stage,
      file_digest: pushed.scan.digest,
    })
    .whereRaw("coalesce(poses_digest, '') = ?", [pushed.poses?.digest ?? ""])
    .first("id");
  return found?.id ?? null;
}

/**
 * Records a scan: measures it against its seam's model, judges it and links it. The same files again give the first
 * record back.
 * @throws Refusal naming the tag, field, line or byte at fault; nothing is written then
 */
export async function recordScan(deps: Deps, context: ChangeContext, pushed: PushedScan): Promise<ScanPage> {
  const { reader } = deps.db;
  const seam = await readSeamHandle(reader, pushed.seam_tag);
  refuseOtherPart(seam, pushed.fields.part_tag);
  const earlier = await sameScan(reader, seam, pushed);
  if (earlier) return readScanPage(reader, earlier);
  const measured = await measure(deps, context, pushed);
  return change(context, "scan.record", async (trx) => {
    // Read again: another push may have come between.
    const now = await readSeamHandle(trx.read, seam.tag);
    const attempt = await attemptFor(trx, now);
    const twin = await sameScan(trx, { ...now, attempt }, pushed);
    const id = twin ?? trx.newId();
    if (!twin) {
      await recordFile(trx, context.caller, pushed.scan);
      if (pushed.poses) await recordFile(trx, context.caller, pushed.poses);
      await trx.insert("scans", { id, seam_id: now.id, attempt, ...scanRow(trx, context, pushed, measured) });
      await deriveSeam(trx, { id: now.id, attempt }, listColumns(measured));
    }
    const { verdict } = measured.result;
    return {
      value: await readScanPage(trx.read, id),
      remember: { scan_id: id },
      subjects: [now.tag, now.part_tag, id],
      facts: { seam: now.tag, attempt, stage: pushed.fields.stage, verdict, file: pushed.scan.digest },
    };
  });
}

/** Where a stored scan's files lie. */
const storedFiles = (deps: Deps, source: ScanSource): ScanFiles => ({
  scan: { name: source.file_name, path: deps.store.pathOf(source.file_digest) },
  poses:
    source.poses_digest === null ? null : { name: "poses.csv", path: deps.store.pathOf(source.poses_digest) },
  units: source.units,
});

/** Points drawn at most: more cannot be told apart on a screen. */
const DRAWN_MAX = 200_000;

/** The points of a stored scan, thinned, as `encodeCloud` writes them. @throws Refusal not-found */
export async function readScanCloud(deps: Deps, scanId: string): Promise<Uint8Array> {
  const files = storedFiles(deps, await readScanSource(deps.db.reader, scanId));
  return accepted(await deps.measure.run({ kind: "cloud", files, most: DRAWN_MAX }));
}

/** The cross-section of a stored scan at a station. @throws Refusal not-found */
export async function readSection(deps: Deps, scanId: string, station_mm: number): Promise<SectionView> {
  const { reader } = deps.db;
  const source = await readScanSource(reader, scanId);
  const model = await readSeamModel(reader, source.model_seam_id);
  const outcome = await deps.measure.run({
    kind: "section",
    stage: source.stage,
    model: { ...model, limits: JSON.parse(source.limits) },
    station_mm,
    files: storedFiles(deps, source),
  });
  return accepted(outcome);
}
