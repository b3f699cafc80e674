import { describe, expect, it } from "vitest";
import type { JointType } from "../../schemas/seam-model.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import { measureSeam } from "../seam/measure-seam.ts";
import { jointModel, pointsOn, SECTIONS, scanOf } from "../testing/joints.ts";
import { normalsFrom } from "../testing/noise.ts";
import { jointSeries, QUANTITIES } from "./joint-series.ts";

const LENGTH_MM = 60;

/** A seam whose profiles each jitter as a whole by so much, across and along the normal. */
function seamOf(type: JointType, jitter_mm = 0) {
  const model = jointModel(type, SECTIONS[type], { length_mm: LENGTH_MM, step_mm: 2 });
  const joint = jointFaces(model);
  const normal = normalsFrom(13);
  const scan = scanOf(LENGTH_MM, (_, index) => {
    const move = [jitter_mm * normal(), jitter_mm * normal(), 0] as const;
    return pointsOn(joint, { moves: { a: move, b: move }, seed: index + 1, spacing_mm: 0.1 });
  });
  return measureSeam(model, scan);
}

const middle = (values: Float64Array) => values[30] ?? Number.NaN;

describe("series along a seam", () => {
  it("have a value and its uncertainty a slice, or neither", () => {
    const seam = seamOf("fillet_t");
    const { series } = jointSeries(seam);
    for (const quantity of QUANTITIES) {
      const { values, u, at_mm } = series[quantity];
      expect([values.length, u.length, at_mm.length]).toEqual([61, 61, 61]);
      for (const [i, value] of values.entries())
        expect(Number.isFinite(value), `${quantity} ${i}`).toBe((u[i] ?? 0) > 0);
    }
    expect(series.mismatch.values.every(Number.isNaN)).toBe(true);
  });

  it("state jitter of whole profiles, which no slice can see in itself", () => {
    const [still, jittered] = [0, 0.05].map(
      (jitter) => jointSeries(seamOf("fillet_t", jitter)).series.lateral,
    );
    if (!still || !jittered) throw new Error("no series");
    expect(middle(still.u)).toBeLessThan(0.02);
    expect(middle(jittered.u)).toBeGreaterThan(0.035);
    expect(middle(jittered.u)).toBeLessThan(0.075);
  });

  it("keep what all edges share out of the averaging: half of it in the root, all of it in the gap", () => {
    const square = jointSeries(seamOf("butt_square")).series;
    expect(middle(square.gap.floor_u ?? new Float64Array(0))).toBeCloseTo(0.05 * Math.SQRT2, 9);
    expect(middle(square.lateral.floor_u ?? new Float64Array(0))).toBeCloseTo(0.025 * Math.SQRT2, 9);
    const half = jointSeries(seamOf("butt_half_v")).series;
    expect(middle(half.gap.floor_u ?? new Float64Array(0))).toBeCloseTo(0.05, 9);
    const bevels = jointSeries(seamOf("butt_v")).series;
    expect([bevels.gap.floor_u, bevels.lateral.floor_u]).toEqual([null, null]);
  });

  it("take a T's gap from its upright's top and a butt's from its edges", () => {
    expect(middle(jointSeries(seamOf("fillet_t")).series.gap.values)).toBeCloseTo(0, 1);
    expect(middle(jointSeries(seamOf("butt_v")).series.gap.values)).toBeCloseTo(2, 1);
    expect(jointSeries(seamOf("fillet_t")).size_departure_mm).toBe(0);
  });
});
