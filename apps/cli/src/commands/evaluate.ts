import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { EXIT } from "../exit-codes.ts";
import { readModel } from "../input/read-model.ts";
import { readPoints, readScanFiles, type ScanOptions } from "../input/scan-files.ts";
import { evaluationText } from "../output/evaluation-text.ts";
import { stopOnFaults } from "../output/fault-text.ts";
import type { Look } from "../output/look.ts";
import type { CommandOutcome } from "../output/outcome.ts";

/** Options of `evaluate`, as parsed. */
export interface EvaluateOptions extends ScanOptions {
  readonly model: string;
  readonly step?: number;
  readonly accuracy?: number;
}

/** Measures a scan against its model, without a server. */
export async function evaluate(options: EvaluateOptions, look: Look): Promise<CommandOutcome> {
  const model = await readModel(options.model);
  const { scan, poses, talk } = await readScanFiles(options);
  const paths = poses === null ? [scan.path] : [scan.path, poses.path];
  const cloud = readPoints(scan, poses, options.units);
  if (!cloud.ok) return stopOnFaults(cloud.faults, paths);
  const outcome = evaluateScan(model, cloud.value, {
    ...(options.step !== undefined && { step_mm: options.step }),
    ...(options.accuracy !== undefined && { scanner_accuracy_mm: options.accuracy }),
  });
  if (!outcome.ok) return stopOnFaults(outcome.faults, paths);
  const result = outcome.value;
  return {
    exit: result.verdict === "hold" ? EXIT.hold : EXIT.done,
    json: result,
    text: evaluationText(result, model, look),
    talk,
  };
}
