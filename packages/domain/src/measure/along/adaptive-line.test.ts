import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { drawsFrom } from "../fit/consensus-line.ts";
import { adaptiveLine } from "./adaptive-line.ts";
import { type Series, scatterFactor } from "./scatter.ts";

/** A series of one value a millimetre with normal noise, seeded. */
function series(count: number, truth: (x: number) => number, noise: number, seed = 3): Series {
  const draw = drawsFrom(seed);
  const normal = () => Math.sqrt(-2 * Math.log(1 - draw())) * Math.cos(2 * Math.PI * draw());
  return {
    at_mm: Float64Array.from({ length: count }, (_, i) => i),
    values: Float64Array.from({ length: count }, (_, i) => truth(i) + noise * normal()),
    u: new Float64Array(count).fill(noise),
  };
}

describe("values settled along the seam", () => {
  it("lose most of their noise on an even stretch, and say so", () => {
    const even = series(200, (x) => 0.01 * x, 0.03);
    const inner = Array.from({ length: 160 }, (_, i) => i + 20);
    const errors = inner.map((i) => adaptiveLine(even, i, i, 1).value - 0.01 * i);
    const rms = Math.sqrt(errors.reduce((sum, e) => sum + e * e, 0) / errors.length);
    expect(rms).toBeLessThan(0.015);
    const u = inner.map((i) => adaptiveLine(even, i, i, 1).u);
    expect(Math.max(...u)).toBeLessThan(0.03);
    expect(rms).toBeLessThan(1.5 * (u[80] ?? 0));
  });

  it("keep a step of any size well above the noise, wherever it is", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.4, max: 5, noNaN: true }),
        fc.integer({ min: 20, max: 80 }),
        fc.boolean(),
        (size, at, up) => {
          const jump = up ? size : -size;
          const stepped = series(100, (x) => (x >= at ? jump : 0), 0.02, at);
          for (const i of [at - 2, at - 1, at, at + 1]) {
            const { value } = adaptiveLine(stepped, i, i, 1);
            expect(Math.abs(value - (i >= at ? jump : 0))).toBeLessThan(0.12);
          }
        },
      ),
      { numRuns: 60 },
    );
  });

  it("follow a bend", () => {
    const bent = series(120, (x) => 0.8 * Math.cos((Math.PI * (x - 60)) / 50) ** 2, 0.02);
    const worst = Math.max(
      ...Array.from({ length: 80 }, (_, k) => {
        const i = k + 20;
        return Math.abs(adaptiveLine(bent, i, i, 1).value - 0.8 * Math.cos((Math.PI * (i - 60)) / 50) ** 2);
      }),
    );
    expect(worst).toBeLessThan(0.06);
  });

  it("lean on nothing across a blind stretch", () => {
    const torn = series(60, (x) => (x < 30 ? 0 : 1), 0.01);
    for (let i = 25; i < 35; i++) torn.values[i] = Number.NaN;
    expect(adaptiveLine(torn, 24, 24, 1).value).toBeCloseTo(0, 1);
    expect(adaptiveLine(torn, 35, 35, 1).value).toBeCloseTo(1, 1);
  });

  it("keep what does not average out", () => {
    const floored = { ...series(100, () => 0, 0.02), floor_u: new Float64Array(100).fill(0.05) };
    expect(adaptiveLine(floored, 50, 50, 1).u).toBeGreaterThan(0.05);
  });
});

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

  it("is hardly moved by a step", () => {
    const stepped = series(400, (x) => (x > 200 ? 5 : 0), 0.03);
    expect(scatterFactor(stepped)).toBeLessThan(1.3);
  });
});
