import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { JOINT_TYPES } from "../../schemas/seam-model.ts";
import { distanceFrom, type FittedLine, orthogonalLine } from "../fit/line-fit.ts";
import { jointModel, SECTIONS } from "../testing/joints.ts";
import { normalsFrom, rmsOf } from "../testing/noise.ts";
import { constructRoot, type JointAt } from "./construct-root.ts";
import { type Face, jointFaces } from "./joint-faces.ts";
import { constructWithU } from "./joint-uncertainty.ts";

const DEG = 180 / Math.PI;

const NO_EDGES = [Number.NaN, Number.NaN] as const;

const tJoint = jointFaces(jointModel("fillet_t", SECTIONS.fillet_t));

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

/** Orthogonal regression with sigma² = Σr² / (n - 2). */
function fittedTo(ts: Float64Array, ds: Float64Array): FittedLine {
  const line = orthogonalLine(ts, ds, ts.length);
  if (!line) throw new Error("no line");
  const square = ts.reduce((sum, t, i) => sum + distanceFrom(line, t, ds[i] ?? 0) ** 2, 0);
  return { ...line, scale_mm: Math.sqrt(square / (ts.length - 2)), inliers: ts.length };
}

/** Points of the part's plane in a face's own axes. */
function inAxesOf(face: Face, points: readonly (readonly [number, number])[]) {
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  const [l0, n0] = face.near;
  return fittedTo(
    Float64Array.from(points, ([l, n]) => (l - l0) * c + (n - n0) * s),
    Float64Array.from(points, ([l, n]) => (n - n0) * c - (l - l0) * s),
  );
}

describe("uncertainty of a root", () => {
  /** u of a line at a distance from its window's centre; Monte Carlo of 20000 runs (numpy): 0.01303, 0.02161, 0.03194. */
  it.each([
    { sigma: 0.05, points: 100, window: 10, distance: 7, u: 0.013003426814147534 },
    { sigma: 0.05, points: 40, window: 8, distance: 6, u: 0.021535917247874934 },
    { sigma: 0.1, points: 60, window: 12, distance: 8, u: 0.032037659988819384 },
  ])("is that of the faces extrapolated to it: $u", ({ sigma, points, window, distance, u }) => {
    const face = fitted(sigma, points, window, distance - window / 2);
    // The upright's top edge plays no part in the root.
    const found = constructWithU(tJoint, [face, face, null], NO_EDGES, [0, 0]);
    // The faces stand square: each fixes one coordinate.
    expect(found?.u.normal_mm).toBeCloseTo(u, 8);
    expect(found?.u.lateral_mm).toBeCloseTo(u, 8);
    const u_face = sigma / Math.sqrt(face.spread_mm2);
    expect(found?.u.angle_rad).toBeCloseTo(Math.SQRT2 * u_face, 8);
  });

  it("is that of two noisy lines, far off the model and turned against it (numpy, JCGM 100)", () => {
    const fits: { lines_2d: { cases: { id: string; points: [number, number][] }[] } } = JSON.parse(
      readFileSync(new URL("../../../vectors/geometry/fits.json", import.meta.url), "utf8"),
    );
    const points = (id: string) => fits.lines_2d.cases.find((one) => one.id === id)?.points ?? [];
    const [a, b] = tJoint.faces;
    if (!a || !b) throw new Error("no faces");
    const lines = [inAxesOf(a, points("horizontal")), inAxesOf(b, points("steep-89.5")), null];
    const found = constructWithU(tJoint, lines, NO_EDGES, [0, 0]);
    // fits.json, intersection; confirmed there by a Monte Carlo of 20000 runs: u 0.00802, 0.00452.
    expect(found?.at.lateral_mm).toBeCloseTo(3.0573316923023444, 7);
    expect(found?.at.normal_mm).toBeCloseTo(4.995926505995784, 7);
    expect(found?.u.lateral_mm).toBeCloseTo(0.007981129605157034, 6);
    expect(found?.u.normal_mm).toBeCloseTo(0.004484576507050545, 6);
    expect((found?.u.angle_rad ?? 0) * DEG).toBeCloseTo(0.06308365253672839, 6);
    // The lines cross at 89.5526°; plate A is drawn from the root leftward, so the open angle is the rest of 180°.
    expect(90 + (found?.at.angle_rad ?? 0) * DEG).toBeCloseTo(180 - 89.55258549535883, 6);
  });
});

const NOISE_MM = 0.04;
const RUNS = 1500;

/** Faces fitted to points with noise, from 1 mm off the root end to 1 mm off a corner or 12 mm. */
function drawn(face: Face, normal: () => number): FittedLine {
  const to_mm = Math.min(12, face.length_mm - 1);
  const count = 40;
  const ts = Float64Array.from({ length: count }, (_, i) => 1 + ((to_mm - 1) * i) / (count - 1));
  const line = fittedTo(
    ts,
    ts.map(() => NOISE_MM * normal()),
  );
  return { ...line, scale_mm: NOISE_MM };
}

const KEYS = ["lateral_mm", "normal_mm", "gap_mm", "mismatch_mm", "angle_rad", "turn_a_rad"] as const;

describe.each(JOINT_TYPES)("stated uncertainty of a %s", (type) => {
  it("is the scatter of roots constructed from as many noisy scans", () => {
    const joint = jointFaces(jointModel(type, SECTIONS[type]));
    const normal = normalsFrom(29);
    const u_edges: [number, number] = [0.05, 0.07];
    const found: JointAt[] = [];
    for (let run = 0; run < RUNS; run++) {
      const at = constructRoot(joint, {
        lines: joint.faces.map((face) => drawn(face, normal)),
        edges_mm: [u_edges[0] * normal(), u_edges[1] * normal()],
      });
      if (at) found.push(at);
    }
    expect(found.length).toBe(RUNS);
    const exact = joint.faces.map((face) => ({ ...drawn(face, () => 0), scale_mm: NOISE_MM }));
    const stated = constructWithU(joint, exact, [0, 0], u_edges);
    for (const key of KEYS) {
      if (!stated || Number.isNaN(stated.at[key])) continue;
      const scatter = rmsOf(found.map((one) => one[key] - stated.at[key]));
      // The scatter of 1500 draws is known to 1.8 %; four of that.
      expect(stated.u[key] / scatter, key).toBeGreaterThan(0.928);
      expect(stated.u[key] / scatter, key).toBeLessThan(1.072);
    }
    const told = KEYS.filter((key) => Number.isFinite(stated?.u[key] ?? Number.NaN));
    expect(told).toContain("lateral_mm");
    expect(told).toContain(joint.kind === "butt" ? "mismatch_mm" : "gap_mm");
  });
});
