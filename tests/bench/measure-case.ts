// One timed case in a process of its own: prints a line of JSON. Arguments: what to do, the folder, the scan's name.
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { readScan } from "@beadroll/domain/measure/read/read-scan";
import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import { parseSeamModel, type SeamModel } from "@beadroll/domain/schemas/seam-model";

const WARM_RUNS = 12;
const [what = "empty", folder = ".", name = "cloud.csv"] = process.argv.slice(2);

function timed<T>(step: () => T): { readonly ms: number; readonly value: T } {
  const start = performance.now();
  const value = step();
  return { ms: performance.now() - start, value };
}

const fileOf = (file: string) => ({ name: file, bytes: readFileSync(join(folder, file)) });

function cloudOf(): ScanCloud {
  const poses = name === "profiles.csv" ? { poses: fileOf("poses.csv") } : {};
  const outcome = readScan({ ...fileOf(name), units: "mm", ...poses });
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value;
}

function modelOf(): SeamModel {
  const parsed = parseSeamModel(JSON.parse(readFileSync(join(folder, "model.json"), "utf8")));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

/** Stations measured, so that a run that measured nothing is not taken for a fast one. */
function evaluated(model: SeamModel, cloud: ScanCloud): number {
  const outcome = evaluateScan(model, cloud);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value.stations.filter((station) => station.measured).length;
}

/** The first time in this process, and the times after it. */
function again<T>(step: () => T) {
  const first = timed(step);
  const warm = Array.from({ length: WARM_RUNS }, () => timed(step).ms);
  return { cold_ms: first.ms, warm_ms: warm, value: first.value };
}

function run(): object {
  switch (what) {
    case "empty":
      return { cold_ms: 0 };
    case "bare":
      return again(() => readFileSync(join(folder, name)).length);
    case "read":
      return { cold_ms: timed(cloudOf).ms };
    case "read-warm":
      return again(() => cloudOf().count);
    case "evaluate": {
      const model = modelOf();
      const read = timed(cloudOf);
      const { ms, value } = timed(() => evaluated(model, read.value));
      return { read_ms: read.ms, cold_ms: ms, points: read.value.count, stations: value };
    }
    case "evaluate-warm": {
      const [model, cloud] = [modelOf(), cloudOf()];
      return again(() => evaluated(model, cloud));
    }
    default:
      throw new RangeError(`no case ${what}`);
  }
}

const result = run();
const { userCPUTime, systemCPUTime, maxRSS } = process.resourceUsage();
process.stdout.write(
  `${JSON.stringify({ ...result, cpu_ms: (userCPUTime + systemCPUTime) / 1e3, peak_mb: maxRSS / 1024 })}\n`,
);
