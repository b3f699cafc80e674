import type { StationResult } from "../../schemas/scan-result.ts";
import { adaptiveLine } from "../along/adaptive-line.ts";
import type { JointSeries, Quantity } from "../along/joint-series.ts";
import type { Estimate } from "../along/local-fit.ts";
import type { MeasuredSeam } from "../seam/measure-seam.ts";
import { nearestSlice, nearMm } from "../seam/nearest-slice.ts";
import { type SeamFrames, toPart } from "../seam/seam-frames.ts";
import type { SliceResult } from "../section/measure-slice.ts";

const DEG = 180 / Math.PI;

/** Uncertainty of a fit to points without any noise, and of the frames' rounding, mm: nothing is known better. */
const LEAST_U_MM = 0.001;

/** What stations are made from. */
export interface StationInput {
  readonly seam: MeasuredSeam;
  readonly along: JointSeries;
  readonly frames: SeamFrames;
  /** Half-width of the scanner's stated accuracy, mm; 0 where none is stated. */
  readonly scanner_accuracy_mm: number;
  /** Standard uncertainty that registration leaves at the seam, each axis, mm; 0 where there was none. */
  readonly u_registration_mm: number;
}

const round = (value: number, digits: number) => {
  const by = 10 ** digits;
  return Math.round(value * by) / by + 0;
};
const mm = (value: number) => round(value, 4);

/** Numbers of one station, as estimated along the seam. */
type Estimates = (quantity: Quantity) => Estimate;

function gapFields(gap: Estimate): Partial<StationResult> {
  if (!Number.isFinite(gap.value)) return {};
  return { gap_mm: mm(Math.max(0, gap.value)), u_gap_mm: mm(Math.max(LEAST_U_MM, gap.u)) };
}

function mismatchFields(mismatch: Estimate): Partial<StationResult> {
  if (!Number.isFinite(mismatch.value)) return {};
  return { mismatch_mm: mm(mismatch.value), u_mismatch_mm: mm(Math.max(LEAST_U_MM, mismatch.u)) };
}

function pointFields(
  { joint, ...rest }: MeasuredSeam,
  result: SliceResult,
  slice: number,
): Partial<StationResult> {
  const size = rest.slices.starts[slice + 1]! - rest.slices.starts[slice]!;
  let [points_a, points_b, square] = [0, 0, 0];
  result.fits.forEach((fit, i) => {
    if (!fit) return;
    if (joint.faces[i]?.plate === "a") points_a += fit.inliers;
    else points_b += fit.inliers;
    square += fit.inliers * fit.scale_mm ** 2;
  });
  return {
    points_a,
    points_b,
    rejected: Math.max(0, size - points_a - points_b),
    residual_mm: mm(Math.sqrt(square / Math.max(1, points_a + points_b))),
    ...(result.tack && { tack: true }),
  };
}

function measuredStation(input: StationInput, j: number, slice: number, result: SliceResult): StationResult {
  const { frames, along, seam } = input;
  const s_mm = frames.stations_mm[j]!;
  const estimate: Estimates = (quantity) =>
    Number.isFinite(along.series[quantity].values[slice])
      ? adaptiveLine(along.series[quantity], slice, s_mm, seam.slices.pitch_mm)
      : { value: Number.NaN, u: Number.NaN };
  // A stated accuracy is a bound (rectangular, JCGM 100 4.3.7) and the same all along one scan: it never averages out.
  const common_mm = Math.hypot(input.scanner_accuracy_mm / Math.sqrt(3), input.u_registration_mm, LEAST_U_MM);
  const [lateral, normal, angle] = [estimate("lateral"), estimate("normal"), estimate("angle")];
  const root = toPart(frames, j, lateral.value, normal.value);
  return {
    station_mm: s_mm,
    measured: true,
    lateral_mm: mm(lateral.value),
    normal_mm: mm(normal.value),
    ...gapFields(estimate("gap")),
    ...mismatchFields(estimate("mismatch")),
    angle_deg: mm(angle.value * DEG),
    u_lateral_mm: mm(Math.hypot(lateral.u, common_mm)),
    u_normal_mm: mm(Math.hypot(normal.u, common_mm)),
    u_angle_deg: mm(angle.u * DEG),
    root_mm: [mm(root[0]), mm(root[1]), mm(root[2])],
    plate_a_rot_deg: mm(estimate("turn_a").value * DEG),
    plate_b_rot_deg: mm(estimate("turn_b").value * DEG),
    ...pointFields(seam, result, slice),
  };
}

/** The joint at each station; where no slice lies near, or its joint was not found, it is not measured, with why. */
export function stationResults(input: StationInput): StationResult[] {
  const { seam, frames } = input;
  const { at_mm, pitch_mm, count } = seam.slices;
  const near_mm = nearMm(pitch_mm);
  return Array.from(frames.stations_mm, (s_mm, j): StationResult => {
    const slice = nearestSlice(at_mm, s_mm);
    if (slice < 0) return { station_mm: s_mm, measured: false, why: "no_points" };
    if (Math.abs(at_mm[slice]! - s_mm) > near_mm) {
      const beyond = s_mm < at_mm[0]! || s_mm > at_mm[count - 1]!;
      return { station_mm: s_mm, measured: false, why: beyond ? "beyond_end" : "no_points" };
    }
    const outcome = seam.outcomes[slice];
    if (!outcome?.found) return { station_mm: s_mm, measured: false, why: outcome?.why ?? "no_points" };
    return measuredStation(input, j, slice, outcome.result);
  });
}
