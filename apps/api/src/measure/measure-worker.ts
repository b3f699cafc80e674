import { readFile } from "node:fs/promises";
import { parentPort } from "node:worker_threads";
import { gunzipSync } from "node:zlib";
import { good, type Outcome } from "@beadroll/domain/faults/fault";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { readScan } from "@beadroll/domain/measure/read/read-scan";
import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import { type MeasuredSeam, measureSeam } from "@beadroll/domain/measure/seam/measure-seam";
import { sectionAt } from "@beadroll/domain/measure/section-at";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { readPassLog } from "@beadroll/domain/weld/read-pass-log";
import { reducePass } from "@beadroll/domain/weld/reduce-pass";
import type { MeasureTask, ScanFiles } from "./measure-task.ts";

/** Clouds kept, so that a cursor moved along a seam does not read the scan at each step. */
const CLOUDS_KEPT = 3;
const clouds = new Map<string, ScanCloud>();

/** Largest size a compressed file may unfold to. */
const UNFOLDED_MAX = 1024 * 1024 * 1024;

async function read(files: ScanFiles): Promise<Outcome<ScanCloud>> {
  const key = `${files.scan.path} ${files.poses?.path ?? ""} ${files.units}`;
  const kept = clouds.get(key);
  if (kept) return { ok: true, value: kept };
  const outcome = readScan({
    name: files.scan.name,
    bytes: await readFile(files.scan.path),
    units: files.units,
    gunzip: (bytes) => gunzipSync(bytes, { maxOutputLength: UNFOLDED_MAX }),
    ...(files.poses && { poses: { name: files.poses.name, bytes: await readFile(files.poses.path) } }),
  });
  if (outcome.ok) {
    clouds.set(key, outcome.value);
    const [oldest] = clouds.keys();
    if (clouds.size > CLOUDS_KEPT && oldest !== undefined) clouds.delete(oldest);
  }
  return outcome;
}

/** The seam last measured in each cloud, so that a cursor moved along it measures once. */
const seams = new WeakMap<ScanCloud, { readonly model: string; readonly seam: MeasuredSeam }>();

function seamIn(cloud: ScanCloud, model: SeamModel): MeasuredSeam {
  const key = JSON.stringify(model);
  const kept = seams.get(cloud);
  if (kept?.model === key) return kept.seam;
  const seam = measureSeam(model, cloud);
  seams.set(cloud, { model: key, seam });
  return seam;
}

async function reduce(task: Extract<MeasureTask, { kind: "pass" }>): Promise<Outcome<unknown>> {
  const log = readPassLog({ name: task.log.name, bytes: await readFile(task.log.path) });
  if (!log.ok) return log;
  const { process, seam_length_mm } = task;
  return reducePass(log.value, { process, seam_length_mm, ...(task.ranges && { ranges: task.ranges }) });
}

async function work(task: MeasureTask): Promise<Outcome<unknown>> {
  if (task.kind === "pass") return reduce(task);
  const cloud = await read(task.files);
  if (!cloud.ok) return cloud;
  if (task.kind === "section") return good(sectionAt(seamIn(cloud.value, task.model), task.station_mm));
  const accuracy = task.scanner_accuracy_mm;
  return evaluateScan(task.model, cloud.value, accuracy === null ? {} : { scanner_accuracy_mm: accuracy });
}

parentPort?.on("message", (task: MeasureTask) => {
  work(task).then(
    (outcome) => parentPort?.postMessage(outcome),
    (error: unknown) => {
      // Ends this worker: the pool refuses the task and starts another.
      throw error;
    },
  );
});
