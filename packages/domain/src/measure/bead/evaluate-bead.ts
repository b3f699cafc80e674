import { good, type Outcome, refused } from "../../faults/fault.ts";
import { THINNEST_MM } from "../../quality/iso-5817/limit-of.ts";
import type { BeadRequirement } from "../../schemas/bead-requirement.ts";
import type { BeadResult, BeadStation } from "../../schemas/bead-result.ts";
import { resolveLimits, type SeamModel } from "../../schemas/seam-model.ts";
import { MEASURE_ENGINE } from "../engine.ts";
import { coverageReasons } from "../judge/coverage-reasons.ts";
import { coverageOf } from "../result/summary.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import { stationFrames } from "../seam/seam-frames.ts";
import { unitMistake } from "../units-check.ts";
import { beadStations, beadSummary } from "./bead-stations.ts";
import { judgeBead } from "./judge-bead.ts";
import { measureBead } from "./measure-bead.ts";

/** How a scan of a finished weld is evaluated. */
export interface BeadOptions {
  readonly requirement: BeadRequirement;
  /** Distance between stations, mm, > 0; absent: the model's own stations. */
  readonly step_mm?: number;
  /** Half-width of the scanner's stated accuracy, mm, ≥ 0; absent: not known, and said so in the warnings. */
  readonly scanner_accuracy_mm?: number;
}

/** A scan is looked at for a mistaken unit only where less than this share of its stations was measured. */
const SUSPECT_SHARE = 0.5;

const UNSEEN =
  "A scan does not show cracks, pores, lack of fusion, penetration or stray arcs: a person looks for them.";

function warningsOf(options: BeadOptions, cloud: ScanCloud): string[] {
  return [
    UNSEEN,
    ...(options.scanner_accuracy_mm === undefined
      ? ["The scanner's accuracy is not known; the uncertainties leave it out."]
      : []),
    ...(cloud.lost > 0 ? [`${cloud.lost} returns carry no usable number.`] : []),
  ];
}

/** Coverage as the fit-up's: what matters is only whether a station was measured. */
const seen = (stations: readonly BeadStation[]) =>
  stations.map(({ station_mm, measured }) => ({ station_mm, measured }));

/**
 * Measures a scan of the finished weld against its model: legs, throat, convexity, toe angles, undercut, excess at
 * each station, and judges them by ISO 5817. How each number is found stands in docs/measuring.md.
 * @param model from `parseSeamModel`
 * @param cloud from `readScan`, mm, part frame
 * @returns `within` where everything is proved to keep the level, else `hold` with every reason; the fault
 * `scan-units-implausible` where the scan fits only in another unit, `model-invalid` for plates under 0.5 mm
 * @throws RangeError for a step that is not positive
 */
export function evaluateBead(model: SeamModel, cloud: ScanCloud, options: BeadOptions): Outcome<BeadResult> {
  const { requirement } = options;
  const { plate_a, plate_b } = model.section;
  if (Math.min(plate_a.thickness_mm, plate_b.thickness_mm) < THINNEST_MM)
    return refused({
      code: "model-invalid",
      detail: `ISO 5817 begins at plates of ${THINNEST_MM} mm; the model's are thinner.`,
      pointer: "/section",
    });
  const measured = measureBead(model, cloud, requirement.weld_size_mm);
  // A stated accuracy is a bound (rectangular, JCGM 100 4.3.7).
  const common_mm = (options.scanner_accuracy_mm ?? 0) / Math.sqrt(3);
  const frames = stationFrames(model, options.step_mm);
  const stations = beadStations(measured, frames, common_mm);
  const coverage = coverageOf(seen(stations));
  const mistake = coverage.share < SUSPECT_SHARE ? unitMistake(model, measured.bead.visible, cloud) : null;
  if (mistake) return refused({ code: "scan-units-implausible", detail: mistake });
  const findings = judgeBead(measured, requirement, common_mm);
  const reasons = [
    ...coverageReasons(seen(stations), coverage, resolveLimits(model.limits)).map(({ text }) => text),
    ...findings.filter(({ state }) => state !== "met").map(({ text }) => text),
  ];
  return good({
    engine: MEASURE_ENGINE,
    stage: "bead",
    model: model.case ?? "",
    joint_type: model.joint_type,
    points: cloud.count,
    points_lost: cloud.lost,
    requirement,
    verdict: reasons.length === 0 ? "within" : "hold",
    reasons,
    findings,
    warnings: warningsOf(options, cloud),
    coverage: { share: coverage.share, longest_blind_mm: coverage.longest_blind_mm },
    summary: beadSummary(stations),
    stations,
  });
}
