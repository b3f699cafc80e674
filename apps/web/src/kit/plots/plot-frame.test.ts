import { describe, expect, it } from "vitest";
import { extentOf, linearScale, padded, pixelOf, roundTicks, tickDecimals, valueAt } from "./plot-frame.ts";

describe("a scale", () => {
  it("leads from a value to its pixel and back", () => {
    const scale = linearScale([-3, 3], [84, 4]);
    expect(pixelOf(scale, -3)).toBe(84);
    expect(pixelOf(scale, 3)).toBe(4);
    for (const value of [-3, -1.7, 0, 0.01, 2.99])
      expect(valueAt(scale, pixelOf(scale, value))).toBeCloseTo(value, 12);
  });

  it("has room for a quantity that is the same everywhere", () => {
    const scale = linearScale([1.2, 1.2], [100, 0]);
    expect(pixelOf(scale, 1.2)).toBe(50);
  });

  it("refuses a range that is no range", () => {
    expect(() => linearScale([Number.NaN, 1], [0, 1])).toThrow(RangeError);
  });
});

describe("round ticks", () => {
  it("stand at values that people count by", () => {
    expect(roundTicks(0, 320, 6)).toEqual([0, 50, 100, 150, 200, 250, 300]);
    expect(roundTicks(-3.4, 3.4, 4)).toEqual([-2, 0, 2]);
    expect(roundTicks(0.93, 1.21, 3)).toEqual([1, 1.1, 1.2]);
  });

  it("lie inside the range, are few, rise evenly and keep an exact zero", () => {
    for (let power = -5; power <= 5; power++) {
      for (const [low, high] of [
        [-1, 1],
        [-0.3, 7.7],
        [2.01, 2.09],
        [0, 9.99],
      ] as const) {
        for (const count of [1, 2, 3, 4, 6, 10]) {
          const [from, until] = [low * 10 ** power, high * 10 ** power];
          const ticks = roundTicks(from, until, count);
          const slack = (until - from) * 1e-6;
          expect(ticks.length).toBeLessThanOrEqual(count / 0.8 + 1);
          for (const tick of ticks) {
            expect(tick).toBeGreaterThanOrEqual(from - slack);
            expect(tick).toBeLessThanOrEqual(until + slack);
          }
          for (const tick of ticks) if (Math.abs(tick) < slack) expect(tick === 0).toBe(true);
        }
      }
    }
  });

  it("are none for a range that is no range", () => {
    expect(roundTicks(2, 2, 4)).toEqual([]);
    expect(roundTicks(3, 2, 4)).toEqual([]);
  });

  it("are written with the decimals their step needs", () => {
    expect(tickDecimals(50)).toBe(0);
    expect(tickDecimals(2.5)).toBe(1);
    expect(tickDecimals(0.025)).toBe(3);
  });
});

describe("an extent", () => {
  it("passes over what was not measured", () => {
    expect(extentOf([null, 2, Number.NaN], [undefined, -1])).toEqual([-1, 2]);
    expect(extentOf([null], [])).toBeNull();
  });

  it("gets a margin, also where it has no width", () => {
    expect(padded([0, 10], 0.1)).toEqual([-1, 11]);
    expect(padded([5, 5], 0.1)).toEqual([4.5, 5.5]);
  });
});
