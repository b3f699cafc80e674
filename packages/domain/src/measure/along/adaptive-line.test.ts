import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { noisySeries as series } from "../testing/series.ts";
import { adaptiveLine } from "./adaptive-line.ts";

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

  it("keep a step of any size well above the noise, wherever it is: each side within 3 u of its own", () => {
    let [beside, beyond] = [0, 0];
    fc.assert(
      fc.property(
        fc.double({ min: 0.4, max: 5, noNaN: true }),
        fc.integer({ min: 5, max: 95 }),
        fc.boolean(),
        fc.integer({ min: 1, max: 1e6 }),
        (size, at, up, seed) => {
          const truth = (x: number) => (x < at ? 0 : up ? size : -size);
          const stepped = series(100, truth, 0.02, seed);
          const off = Array.from({ length: 100 }, (_, i) => {
            const { value, u } = adaptiveLine(stepped, i, i, 1);
            return Math.abs(value - truth(i)) / u;
          });
          expect(Math.max(...off)).toBeLessThan(4.5);
          const near = off.slice(Math.max(0, at - 4), at + 4);
          beside += near.length;
          beyond += near.filter((z) => z > 3).length;
        },
      ),
      { numRuns: 100, seed: 17 },
    );
    // Three in a thousand lie beyond 3 u by chance alone.
    expect(beside).toBeGreaterThan(700);
    expect(beyond / beside).toBeLessThan(0.006);
  });

  it("keep the own value of a single slice that differs from both its sides, and do not spread it", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.5, max: 5, noNaN: true }),
        fc.integer({ min: 0, max: 59 }),
        fc.integer({ min: 1, max: 1e6 }),
        (size, at, seed) => {
          const lonely = series(60, () => 0, 0.02, seed);
          lonely.values[at]! += size;
          const own = adaptiveLine(lonely, at, at, 1);
          expect(own.value).toBeCloseTo(lonely.values[at] ?? 0, 12);
          expect(own.u).toBeGreaterThanOrEqual(0.02);
          for (const i of [at - 2, at - 1, at + 1, at + 2])
            if (i >= 0 && i < 60) expect(Math.abs(adaptiveLine(lonely, i, i, 1).value)).toBeLessThan(0.09);
        },
      ),
      { numRuns: 100, seed: 17 },
    );
  });

  it("lie between two slices where the place does", () => {
    const steep = series(60, (x) => 0.2 * x, 1e-4);
    expect(adaptiveLine(steep, 30, 30.4, 1).value).toBeCloseTo(0.2 * 30.4, 3);
  });

  it("are the slice's own where there is no other", () => {
    const alone = series(1, () => 0.7, 1e-6);
    expect(adaptiveLine(alone, 0, 0, 0).value).toBeCloseTo(0.7, 5);
    const amid = series(9, () => 0.7, 0.02);
    for (const i of [0, 1, 2, 3, 5, 6, 7, 8]) amid.values[i] = Number.NaN;
    expect(adaptiveLine(amid, 4, 4, 1).value).toBe(amid.values[4]);
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

  it("are on either side of a blind stretch what they would be without the other", () => {
    const torn = series(60, (x) => 0.01 * x, 0.02);
    for (let i = 25; i < 28; i++) torn.values[i] = Number.NaN;
    const [before, after] = [[0, 25] as const, [28, 60] as const].map(([from, to]) => ({
      at_mm: torn.at_mm.slice(from, to),
      values: torn.values.slice(from, to),
      u: torn.u.slice(from, to),
    }));
    if (!before || !after) throw new Error("no series");
    for (const i of [20, 24]) expect(adaptiveLine(torn, i, i, 1)).toEqual(adaptiveLine(before, i, i, 1));
    for (const i of [28, 32]) expect(adaptiveLine(torn, i, i, 1)).toEqual(adaptiveLine(after, i - 28, i, 1));
  });

  it("reach across one lost slice", () => {
    const whole = series(60, () => 0, 0.02);
    const holed = { ...whole, values: whole.values.map((value, i) => (i === 33 ? Number.NaN : value)) };
    expect(adaptiveLine(holed, 30, 30, 1).u).toBeLessThan(0.6 * 0.02);
  });

  it("keep what does not average out", () => {
    const floored = { ...series(100, () => 0, 0.02), floor_u: new Float64Array(100).fill(0.05) };
    expect(adaptiveLine(floored, 50, 50, 1).u).toBeGreaterThan(0.05);
  });
});
