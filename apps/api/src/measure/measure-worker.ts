import { readFile } from "node:fs/promises";
import { parentPort } from "node:worker_threads";
import { gunzipSync } from "node:zlib";
import { good, type Outcome } from "@beadroll/domain/faults/fault";
import { beadSectionAt } from "@beadroll/domain/measure/bead/bead-section-at";
import { evaluateBead } from "@beadroll/domain/measure/bead/evaluate-bead";
import { measureBead } from "@beadroll/domain/measure/bead/measure-bead";
import { encodeCloud } from "@beadroll/domain/measure/cloud/cloud-codec";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { readScan } from "@beadroll/domain/measure/read/read-scan";
import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import { measureSeam } from "@beadroll/domain/measure/seam/measure-seam";
import { sectionAt } from "@beadroll/domain/measure/section-at";
import type { BeadRequirement } from "@beadroll/domain/schemas/bead-requirement";
import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { SectionView } from "@beadroll/domain/schemas/section-view";
import { readPassLog } from "@beadroll/domain/weld/read-pass-log";
import { reducePass } from "@beadroll/domain/weld/reduce-pass";
import type { MeasureTask, ScanFiles } from "./measure-task.ts";

type Task<Kind extends MeasureTask["kind"]> = Extract<MeasureTask, { kind: Kind }>;

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

/** The seam or weld last measured in each cloud, so that a cursor moved along it measures once. */
const cuts = new WeakMap<
  ScanCloud,
  { readonly key: string; readonly at: (station_mm: number) => SectionView }
>();

function sectionIn(cloud: ScanCloud, { stage, model, station_mm }: Task<"section">): SectionView {
  const key = `${stage} ${JSON.stringify(model)}`;
  let kept = cuts.get(cloud);
  if (kept?.key !== key) {
    kept = { key, at: cutting(cloud, stage, model) };
    cuts.set(cloud, kept);
  }
  return kept.at(station_mm);
}

function cutting(cloud: ScanCloud, stage: Task<"section">["stage"], model: SeamModel) {
  if (stage === "bead") {
    const bead = measureBead(model, cloud, requirementOf(model).weld_size_mm);
    return (station_mm: number) => beadSectionAt(bead, station_mm);
  }
  const seam = measureSeam(model, cloud);
  return (station_mm: number) => sectionAt(seam, station_mm);
}

/** What the server's models always say of the weld. */
function requirementOf(model: SeamModel): BeadRequirement {
  if (!model.weld) throw new RangeError("the model says nothing of the weld");
  return model.weld;
}

function evaluate(cloud: ScanCloud, task: Task<"evaluate">): Outcome<ScanResult | BeadResult> {
  const accuracy = task.scanner_accuracy_mm;
  const options = accuracy === null ? {} : { scanner_accuracy_mm: accuracy };
  return task.stage === "bead"
    ? evaluateBead(task.model, cloud, { ...options, requirement: requirementOf(task.model) })
    : evaluateScan(task.model, cloud, options);
}

async function reduce(task: Task<"pass">): Promise<Outcome<unknown>> {
  const log = readPassLog({ name: task.log.name, bytes: await readFile(task.log.path) });
  if (!log.ok) return log;
  const { process, seam_length_mm } = task;
  return reducePass(log.value, { process, seam_length_mm, ...(task.ranges && { ranges: task.ranges }) });
}

async function work(task: MeasureTask): Promise<Outcome<unknown>> {
  if (task.kind === "pass") return reduce(task);
  const cloud = await read(task.files);
  if (!cloud.ok) return cloud;
  if (task.kind === "cloud") return good(encodeCloud(cloud.value, task.most));
  return task.kind === "section" ? good(sectionIn(cloud.value, task)) : evaluate(cloud.value, task);
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
