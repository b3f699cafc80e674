import { good, type Outcome, refused } from "../faults/fault.ts";
import type { ScanResult } from "../schemas/scan-result.ts";
import type { SeamModel } from "../schemas/seam-model.ts";
import { jointSeries } from "./along/joint-series.ts";
import { MEASURE_ENGINE } from "./engine.ts";
import { judgeScan } from "./judge/judge-scan.ts";
import { type Registering, registerScan } from "./register/register-scan.ts";
import { endsOf } from "./result/ends.ts";
import { remainingPart } from "./result/remaining.ts";
import { rigidPart } from "./result/rigid.ts";
import { stationResults } from "./result/station-results.ts";
import { coverageOf, summaryOf } from "./result/summary.ts";
import { warningsOf } from "./result/warnings.ts";
import type { ScanCloud } from "./scan-cloud.ts";
import { type MeasuredSeam, measureSeam } from "./seam/measure-seam.ts";
import { stationFrames } from "./seam/seam-frames.ts";
import { unitMistake } from "./units-check.ts";

/** How a scan is to be evaluated. */
export interface EvaluateOptions {
  /** Distance between stations, mm, > 0; absent: the model's own stations. */
  readonly step_mm?: number;
  /** Half-width of the scanner's stated accuracy, mm, ≥ 0; absent: not known, and said so in the warnings. */
  readonly scanner_accuracy_mm?: number;
  /** How the scan is brought into the part frame; absent: it comes in it. */
  readonly registering?: Registering;
}

/** A scan is looked at for a mistaken unit only where less than this share of its stations was measured. */
const SUSPECT_SHARE = 0.5;

const NO_MOTION: ScanResult["rigid"] = {
  translation_mm: [0, 0, 0],
  rotation_deg: [0, 0, 0],
  unobservable: ["all"],
};

function pointsUsed({ outcomes }: MeasuredSeam): number {
  return outcomes.reduce(
    (sum, one) => sum + (one.found ? one.result.fits.reduce((n, fit) => n + (fit?.inliers ?? 0), 0) : 0),
    0,
  );
}

/**
 * Holds a scan against its model: deviation, gap, mismatch and angle at each station with their uncertainty, ends,
 * coverage, the rigid part, and the verdict with every reason. How each number is found stands in docs/measuring.md.
 * @param model from `parseSeamModel`
 * @param cloud from `readScan`, mm, part frame
 * @returns the result, or the fault `scan-units-implausible` where the scan fits only in another unit
 * @throws RangeError for a step that is not positive
 *
 * Pure and deterministic: the same model and scan give the same result on every machine.
 */
export function evaluateScan(
  model: SeamModel,
  cloud: ScanCloud,
  options: EvaluateOptions = {},
): Outcome<ScanResult> {
  const registered = options.registering && registerScan(model, cloud, options.registering);
  if (registered && !registered.ok) return registered;
  const placed = registered ? registered.value.cloud : cloud;
  const frames = stationFrames(model, options.step_mm);
  const seam = measureSeam(model, placed);
  const along = jointSeries(seam);
  const scanner_accuracy_mm = options.scanner_accuracy_mm ?? 0;
  const u_registration_mm = registered?.value.report.u_mm ?? 0;
  const stations = stationResults({ seam, along, frames, scanner_accuracy_mm, u_registration_mm });
  const coverage = coverageOf(stations);
  const mistake = coverage.share < SUSPECT_SHARE ? unitMistake(model, seam.joint, placed) : null;
  if (mistake) return refused({ code: "scan-units-implausible", detail: mistake });
  const rigid = rigidPart(stations, frames);
  return good({
    engine: MEASURE_ENGINE,
    model: model.case ?? "",
    joint_type: model.joint_type,
    points: cloud.count,
    points_used: pointsUsed(seam),
    points_lost: cloud.lost,
    ...judgeScan(model, stations, coverage),
    warnings: warningsOf({ seam, along, stations, cloud, options }),
    coverage,
    ends: endsOf(seam),
    rigid: rigid?.report ?? NO_MOTION,
    ...(rigid && { remaining: remainingPart(stations, frames, rigid.motion) }),
    ...(registered && { registration: registered.value.report }),
    summary: summaryOf(stations),
    stations,
  });
}
