import { describe, expect, it } from "vitest";
import { bandPath, blindStretches, linePath } from "./plot-paths.ts";
import { bandOf, inUnits, type PlotSpec, plotExtent, valueText } from "./plot-spec.ts";

const LATERAL: PlotSpec = {
  id: "lateral_mm",
  title: "Lateral",
  unit: "mm",
  stations_mm: [0, 10, 20, 30, 40],
  values: [0.1, 0.9, null, -3.2, 0.5],
  expanded_u: [0.05, 0.05, null, 0.05, null],
  signed: true,
  bands: [
    { kind: "within", low: -0.5, high: 0.5, word: "within" },
    { kind: "adapt", low: -3, high: 3, word: "adapt" },
  ],
};
const SCALES = { x: { from: [0, 40], to: [0, 400] }, y: { from: [-4, 4], to: [80, 0] } } as const;

describe("a plot", () => {
  it("shows every value with its uncertainty, every limit, and zero", () => {
    const [low, high] = plotExtent(LATERAL);
    expect(low).toBeLessThan(-3.25);
    expect(high).toBeGreaterThan(3);
    const [from] = plotExtent({ ...LATERAL, values: [5, 6, 7, 8, 9], bands: [] });
    expect(from).toBeLessThan(0);
  });

  it("writes a value with its sign and uncertainty, and says what was not measured", () => {
    expect([0, 1, 2, 3, 4].map((index) => valueText(LATERAL, index))).toEqual([
      "+0.10 ± 0.05",
      "+0.90 ± 0.05",
      "not measured",
      "−3.20 ± 0.05",
      "+0.50",
    ]);
  });

  it("knows which limits a value keeps", () => {
    expect([0, 1, 2, 3, 4].map((index) => bandOf(LATERAL, index))).toEqual([
      "within",
      "adapt",
      null,
      "beyond",
      "within",
    ]);
  });

  it("turns values, uncertainty and limits into inches together, and leaves other units alone", () => {
    const inches = inUnits(LATERAL, "in");
    expect(inches.unit).toBe("in");
    expect(inches.values[1]).toBeCloseTo(0.9 / 25.4, 12);
    expect(inches.bands?.[1]?.high).toBeCloseTo(3 / 25.4, 12);
    expect(valueText(inches, 1)).toBe("+0.035 ± 0.002");
    const amperes = { ...LATERAL, unit: "A" };
    expect(inUnits(amperes, "in")).toBe(amperes);
  });
});

describe("a plot's line", () => {
  it("breaks where nothing was measured, and a lone station stays visible", () => {
    expect(linePath([0, 10, 20, 30, 40], [1, 2, null, 3, null], SCALES)).toBe("M0 30L100 20M300 10h0.01");
  });

  it("is nothing where nothing was measured", () => {
    expect(linePath([0, 10], [null, null], SCALES)).toBe("");
  });

  it("names the stretches without data", () => {
    expect(blindStretches([null, 1, null, null, 2, null])).toEqual([
      { first: 0, last: 0 },
      { first: 2, last: 3 },
      { first: 5, last: 5 },
    ]);
  });

  it("has a band only where both its edges are known", () => {
    expect(bandPath([0, 10, 20, 30], [0, 0, null, 0], [1, 1, 1, null], SCALES)).toBe(
      "M0 30L100 30L100 40L0 40z",
    );
  });
});
