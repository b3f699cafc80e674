import { writeFile } from "node:fs/promises";
import { evaluateBead } from "@beadroll/domain/measure/bead/evaluate-bead";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { correctedPath, pathCsv } from "@beadroll/domain/measure/path/corrected-path";
import type { Registering } from "@beadroll/domain/measure/register/register-scan";
import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import {
  ISO_5817_CURRENT,
  type Iso5817Edition,
  type QualityLevel,
} from "@beadroll/domain/quality/iso-5817/limit";
import type { BeadRequirement } from "@beadroll/domain/schemas/bead-requirement";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { EXIT } from "../exit-codes.ts";
import { readDatums } from "../input/read-datums.ts";
import { readModel } from "../input/read-model.ts";
import { readPoints, readScanFiles, type ScanOptions } from "../input/scan-files.ts";
import { beadText } from "../output/bead-text.ts";
import { evaluationText } from "../output/evaluation-text.ts";
import { stopOnFaults } from "../output/fault-text.ts";
import type { Look } from "../output/look.ts";
import { type CommandOutcome, stop } from "../output/outcome.ts";

/** Options of `evaluate`, as parsed. */
export interface EvaluateOptions extends ScanOptions {
  readonly model: string;
  readonly step?: number;
  readonly accuracy?: number;
  readonly datum?: string;
  readonly byPlates?: boolean;
  readonly path?: string;
  readonly stage?: "fitup" | "bead";
  readonly size?: number;
  readonly level?: QualityLevel;
  readonly edition?: Iso5817Edition;
}

/** How the scan is brought into the part frame, if it must be. */
async function registeringOf({ datum, byPlates }: EvaluateOptions): Promise<Registering | null> {
  if (datum !== undefined && byPlates === true)
    return stop(EXIT.usage, { error: "usage", detail: "--datum and --by-plates: give one of them" });
  if (datum !== undefined) return { by: "datums", datums: await readDatums(datum) };
  return byPlates === true ? { by: "plates" } : null;
}

/** Writes the corrected path as the name's ending says. */
async function writePath(file: string, model: SeamModel, result: ScanResult, step?: number): Promise<string> {
  const path = correctedPath(model, result, step);
  const isCsv = /\.csv$/i.test(file);
  await writeFile(file, isCsv ? pathCsv(path) : `${JSON.stringify(path, null, 2)}\n`);
  const gaps = path.complete ? "" : ", with gaps where nothing was measured";
  return `Corrected path of ${path.points.length} points written to ${file}${gaps}`;
}

/** What the weld is judged by: the options, or what the model says under `weld`. */
function requirementOf(options: EvaluateOptions, model: SeamModel): BeadRequirement {
  const weld_size_mm = options.size ?? model.weld?.weld_size_mm;
  const quality_level = options.level ?? model.weld?.quality_level;
  const edition = options.edition ?? model.weld?.edition ?? ISO_5817_CURRENT;
  if (weld_size_mm === undefined || quality_level === undefined)
    return stop(EXIT.usage, {
      error: "usage",
      detail: "--stage bead needs --size and --level: the model says nothing under weld",
    });
  return { weld_size_mm, quality_level, edition };
}

/** Measures a scan of the finished weld and judges it. */
function evaluateFinished(
  options: EvaluateOptions,
  model: SeamModel,
  cloud: ScanCloud,
  paths: readonly string[],
  look: Look,
): CommandOutcome {
  if (options.path !== undefined || options.datum !== undefined || options.byPlates === true)
    return stop(EXIT.usage, {
      error: "usage",
      detail: "--path, --datum and --by-plates are for scans of the fit-up",
    });
  const outcome = evaluateBead(model, cloud, {
    requirement: requirementOf(options, model),
    ...(options.step !== undefined && { step_mm: options.step }),
    ...(options.accuracy !== undefined && { scanner_accuracy_mm: options.accuracy }),
  });
  if (!outcome.ok) return stopOnFaults(outcome.faults, paths);
  const { verdict } = outcome.value;
  return {
    exit: verdict === "hold" ? EXIT.hold : EXIT.done,
    json: outcome.value,
    text: beadText(outcome.value, model, look),
  };
}

/** Measures a scan against its model, without a server. */
export async function evaluate(options: EvaluateOptions, look: Look): Promise<CommandOutcome> {
  const model = await readModel(options.model);
  const { scan, poses, talk } = await readScanFiles(options);
  const paths = poses === null ? [scan.path] : [scan.path, poses.path];
  const cloud = readPoints(scan, poses, options.units);
  if (!cloud.ok) return stopOnFaults(cloud.faults, paths);
  if (options.stage === "bead")
    return { ...evaluateFinished(options, model, cloud.value, paths, look), talk };
  const registering = await registeringOf(options);
  const outcome = evaluateScan(model, cloud.value, {
    ...(registering && { registering }),
    ...(options.step !== undefined && { step_mm: options.step }),
    ...(options.accuracy !== undefined && { scanner_accuracy_mm: options.accuracy }),
  });
  if (!outcome.ok) return stopOnFaults(outcome.faults, paths);
  const result = outcome.value;
  const written =
    options.path === undefined ? [] : [await writePath(options.path, model, result, options.step)];
  return {
    exit: result.verdict === "hold" ? EXIT.hold : EXIT.done,
    json: result,
    text: evaluationText(result, model, look),
    talk: [talk, ...written].filter(Boolean).join("\n"),
  };
}
