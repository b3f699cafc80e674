import type { MeasuredSeam } from "../seam/measure-seam.ts";
import { gapOfButt, gapOfMeeting } from "./gap-series.ts";
import { type Series, scatterFactor } from "./scatter.ts";

/** The quantities that are followed along the seam, mm and radians. */
export const QUANTITIES = ["lateral", "normal", "gap", "mismatch", "angle", "turn_a", "turn_b"] as const;
export type Quantity = (typeof QUANTITIES)[number];

/** All quantities along the seam, each with the scatter from slice to slice in its uncertainty. */
export interface JointSeries {
  readonly series: Readonly<Record<Quantity, Series>>;
  /** By how much the plate that closes the gap's chain of sizes differs from the model, mm; 0 where nothing shows it. */
  readonly size_departure_mm: number;
}

const KEYS = {
  lateral: "lateral_mm",
  normal: "normal_mm",
  mismatch: "mismatch_mm",
  angle: "angle_rad",
  turn_a: "turn_a_rad",
  turn_b: "turn_b_rad",
} as const;

/** An edge is seen a little late or early where the laser line is cut by it, mm. Common practice, no source. */
const EDGE_BIAS_MM = 0.05;

/** The part of an edge's uncertainty that all slices share: it goes half into the root and whole into the gap. */
function edgeFloor({ joint, slices }: MeasuredSeam, share: number): Float64Array | null {
  const edges = joint.kind === "butt" ? joint.form.filter((form) => form === "edge").length : 0;
  return edges === 0 ? null : new Float64Array(slices.count).fill(share * EDGE_BIAS_MM * Math.sqrt(edges));
}

const withScatter = (series: Series): Series => {
  const factor = scatterFactor(series);
  return { ...series, u: series.u.map((u) => factor * u) };
};

/** Gathers what the slices say into series along the seam. */
export function jointSeries(seam: MeasuredSeam): JointSeries {
  const { joint, slices, outcomes } = seam;
  const { at_mm } = slices;
  const column = (key: (typeof KEYS)[keyof typeof KEYS]): Series =>
    withScatter({
      at_mm,
      values: Float64Array.from(outcomes, (one) => (one.found ? one.result.at[key] : Number.NaN)),
      u: Float64Array.from(outcomes, (one) => (one.found ? one.result.u[key] : Number.NaN)),
    });
  const gap = joint.kind === "butt" ? gapOfButt(outcomes) : gapOfMeeting(outcomes);
  return {
    series: {
      lateral: { ...column(KEYS.lateral), floor_u: edgeFloor(seam, 0.5) },
      normal: column(KEYS.normal),
      gap: withScatter({ at_mm, values: gap.values, u: gap.u, floor_u: gap.floor_u ?? edgeFloor(seam, 1) }),
      mismatch: column(KEYS.mismatch),
      angle: column(KEYS.angle),
      turn_a: column(KEYS.turn_a),
      turn_b: column(KEYS.turn_b),
    },
    size_departure_mm: gap.size_departure_mm,
  };
}
