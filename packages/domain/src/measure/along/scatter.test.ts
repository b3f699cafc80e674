import { describe, expect, it } from "vitest";
import { noisySeries as series } from "../testing/series.ts";
import { scatterFactor } from "./scatter.ts";

describe("scatter from slice to slice", () => {
  it("is one where the uncertainties are honest, two where they are half of what they should be", () => {
    const honest = series(4000, (x) => 0.001 * x, 0.03);
    expect(scatterFactor(honest)).toBeGreaterThan(0.93);
    expect(scatterFactor(honest)).toBeLessThan(1.07);
    expect(scatterFactor({ ...honest, u: honest.u.map((u) => u / 2) })).toBeCloseTo(
      2 * scatterFactor(honest),
      5,
    );
  });

  it("is near one over a seam of usual length, whatever the noise", () => {
    for (let seed = 1; seed <= 40; seed++) {
      const factor = scatterFactor(series(200, (x) => 0.02 * x, 0.03, seed));
      expect(factor).toBeGreaterThan(0.8);
      expect(factor).toBeLessThan(1.25);
    }
  });

  it("is hardly moved by a step", () => {
    const stepped = series(400, (x) => (x > 200 ? 5 : 0), 0.03);
    expect(scatterFactor(stepped)).toBeLessThan(1.3);
  });

  it("is not moved by a slope or a slow bow", () => {
    const still = scatterFactor(series(300, () => 0, 0.03));
    expect(scatterFactor(series(300, (x) => 0.5 * x, 0.03))).toBeCloseTo(still, 6);
    const bowed = scatterFactor(series(300, (x) => 2 * Math.sin(x / 50), 0.03));
    expect(Math.abs(bowed - still)).toBeLessThan(0.05);
  });

  it("holds each slice against its neighbours' places, however unevenly they lie", () => {
    const even = series(300, (x) => 0.5 * x, 0.03);
    const at_mm = even.at_mm.map((x, i) => x + (i % 2 === 0 ? 0.3 : -0.3));
    const uneven = { ...even, at_mm, values: even.values.map((y, i) => y + 0.5 * (at_mm[i]! - i)) };
    expect(scatterFactor(uneven)).toBeGreaterThan(0.85);
    expect(scatterFactor(uneven)).toBeLessThan(1.15);
  });

  it("passes over slices that were not measured", () => {
    const torn = series(400, () => 0, 0.03);
    for (let i = 0; i < 400; i += 3) torn.values[i] = Number.NaN;
    expect(scatterFactor(torn)).toBeGreaterThan(0.85);
    expect(scatterFactor(torn)).toBeLessThan(1.15);
  });

  it("is the usual factor where fewer than eight slices can be compared, and stays in its bounds", () => {
    expect(scatterFactor(series(9, () => 0, 0.03))).toBe(1.6);
    expect(scatterFactor(series(10, () => 0, 0.03))).not.toBe(1.6);
    expect(scatterFactor({ ...series(100, () => 0, 0.03), u: new Float64Array(100).fill(1) })).toBe(0.7);
    expect(scatterFactor({ ...series(100, () => 0, 0.03), u: new Float64Array(100).fill(1e-4) })).toBe(20);
  });
});
