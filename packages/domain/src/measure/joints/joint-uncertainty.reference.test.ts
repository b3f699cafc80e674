import { describe, expect, it } from "vitest";
import { parseSeamModel } from "../../schemas/seam-model.ts";
import type { FittedLine } from "../fit/line-fit.ts";
import { jointFaces } from "./joint-faces.ts";
import { constructWithU } from "./joint-uncertainty.ts";

const frame = { tangent: [1, 0, 0], lateral: [0, 1, 0], normal: [0, 0, 1] };
const model = parseSeamModel({
  joint_type: "fillet_t",
  seam: {
    length_mm: 1,
    vertices: [
      { station_mm: 0, point: [0, 0, 0], ...frame },
      { station_mm: 1, point: [1, 0, 0], ...frame },
    ],
  },
  section: { plate_a: { thickness_mm: 10 }, plate_b: { thickness_mm: 6 } },
});

/** A fit of n even points over a window that ends at the face's root end. */
function fitted(sigma_mm: number, points: number, window_mm: number, from_mm: number): FittedLine {
  const step = window_mm / (points - 1);
  const spread_mm2 = Array.from({ length: points }, (_, i) => (i * step - window_mm / 2) ** 2).reduce(
    (a, b) => a + b,
    0,
  );
  return {
    t_mm: from_mm + window_mm / 2,
    d_mm: 0,
    angle_rad: 0,
    scale_mm: sigma_mm,
    inliers: points,
    weight: points,
    spread_mm2,
  };
}

describe("uncertainty of a root", () => {
  /** u of a line at a distance from its window's centre; Monte Carlo of 20000 runs (numpy): 0.01303, 0.02161, 0.03194. */
  it.each([
    { sigma: 0.05, points: 100, window: 10, distance: 7, u: 0.013003426814147534 },
    { sigma: 0.05, points: 40, window: 8, distance: 6, u: 0.021535917247874934 },
    { sigma: 0.1, points: 60, window: 12, distance: 8, u: 0.032037659988819384 },
  ])("is that of the faces extrapolated to it: $u", ({ sigma, points, window, distance, u }) => {
    if (!model.ok) throw new Error("model");
    const face = fitted(sigma, points, window, distance - window / 2);
    const found = constructWithU(jointFaces(model.value), [face, face], [Number.NaN, Number.NaN], [0, 0]);
    // The faces stand square: each fixes one coordinate.
    expect(found?.u.normal_mm).toBeCloseTo(u, 8);
    expect(found?.u.lateral_mm).toBeCloseTo(u, 8);
    const u_face = sigma / Math.sqrt(face.spread_mm2);
    expect(found?.u.angle_rad).toBeCloseTo(Math.SQRT2 * u_face, 8);
  });
});
