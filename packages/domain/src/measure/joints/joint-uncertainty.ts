import type { FittedLine, Line } from "../fit/line-fit.ts";
import { constructRoot, type JointAt, type JointLines } from "./construct-root.ts";
import type { JointFaces } from "./joint-faces.ts";

/** Step of the numerical derivatives, mm and radians: the construction is smooth, half of the digits are kept. */
const STEP = 1e-5;

/** What a section says, and the standard uncertainty of each number from the scatter of the points about the faces. */
export interface JointWithU {
  readonly at: JointAt;
  readonly u: JointAt;
}

const KEYS = [
  "lateral_mm",
  "normal_mm",
  "gap_mm",
  "mismatch_mm",
  "angle_rad",
  "turn_a_rad",
  "turn_b_rad",
] as const satisfies readonly (keyof JointAt)[];

type Squares = Record<(typeof KEYS)[number], number>;

function addSquares(sum: Squares, at: JointAt, moved: JointAt | null, u: number): void {
  for (const key of KEYS) {
    const slope = moved ? (moved[key] - at[key]) / STEP : Number.NaN;
    sum[key] += (slope * u) ** 2;
  }
}

/**
 * The construction with its uncertainty: each line's offset and direction about its centroid are uncorrelated, so
 * u² is the sum of (derivative × u)² over them (JCGM 100, 5.1.2), the derivatives taken numerically.
 * @param fits the fitted faces; u(offset) = s / √Σw, u(direction) = s / √Σwt²
 * @param u_edge_mm uncertainty of a surface's end that is seen as an edge only
 */
export function constructWithU(
  joint: JointFaces,
  fits: readonly (FittedLine | null)[],
  edges_mm: readonly [number, number],
  u_edge_mm: readonly [number, number],
): JointWithU | null {
  const given: JointLines = { lines: fits, edges_mm };
  const at = constructRoot(joint, given);
  if (!at) return null;
  const sum: Squares = {
    lateral_mm: 0,
    normal_mm: 0,
    gap_mm: 0,
    mismatch_mm: 0,
    angle_rad: 0,
    turn_a_rad: 0,
    turn_b_rad: 0,
  };
  const withLine = (index: number, line: Line) =>
    constructRoot(joint, { ...given, lines: fits.map((one, i) => (i === index ? line : one)) });
  fits.forEach((fit, index) => {
    if (!fit) return;
    const u_d = fit.scale_mm / Math.sqrt(fit.weight);
    const u_angle = fit.scale_mm / Math.sqrt(Math.max(1e-9, fit.spread_mm2));
    const face = { ...fit, d_mm: fit.d_mm + STEP };
    addSquares(sum, at, withLine(index, face), u_d);
    addSquares(sum, at, withLine(index, { ...fit, angle_rad: fit.angle_rad + STEP }), u_angle);
  });
  for (const side of [0, 1] as const) {
    if (joint.form[side] !== "edge" || joint.kind !== "butt") continue;
    const moved: [number, number] = [edges_mm[0], edges_mm[1]];
    moved[side] += STEP;
    addSquares(sum, at, constructRoot(joint, { ...given, edges_mm: moved }), u_edge_mm[side]);
  }
  return { at, u: rooted(sum) };
}

function rooted(sum: Squares): JointAt {
  return {
    lateral_mm: Math.sqrt(sum.lateral_mm),
    normal_mm: Math.sqrt(sum.normal_mm),
    gap_mm: Math.sqrt(sum.gap_mm),
    mismatch_mm: Math.sqrt(sum.mismatch_mm),
    angle_rad: Math.sqrt(sum.angle_rad),
    turn_a_rad: Math.sqrt(sum.turn_a_rad),
    turn_b_rad: Math.sqrt(sum.turn_b_rad),
  };
}
