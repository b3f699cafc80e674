import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { expectedFromNeighbours } from "./odd-slices.ts";

const of = (values: readonly number[], index: number, u = 0.02, odd_u?: number) =>
  expectedFromNeighbours(
    Float64Array.from(values),
    new Float64Array(values.length).fill(u),
    index,
    ...(odd_u === undefined ? [] : [odd_u]),
  );

describe("a slice against its neighbours", () => {
  it("stands alone where neither side leads to it", () => {
    expect(of([0, 0, 0, 0, 1, 0, 0, 0, 0], 4)).toEqual({ value: 0, odd: true });
    expect(of([0, 0, 0, 0, -1, 0, 0, 0, 0], 4)).toEqual({ value: 0, odd: true });
  });

  it("does not stand alone at a step: one side agrees", () => {
    const step = [0, 0, 0, 0, 0, 3, 3, 3, 3, 3];
    for (let i = 2; i < 8; i++) expect(of(step, i)?.odd).toBe(false);
  });

  it("does not stand alone on a slope, between what lies before and after", () => {
    const slope = Array.from({ length: 20 }, (_, i) => 0.1 * i);
    for (let i = 4; i < 16; i++) expect(of(slope, i)?.odd).toBe(false);
  });

  it("is allowed six of its own standard uncertainties, and 0.15 mm however sure it is", () => {
    const off = (by: number, u: number) => of([0, 0, 0, by, 0, 0, 0], 3, u)?.odd;
    expect([off(0.14, 0.001), off(0.16, 0.001)]).toEqual([false, true]);
    expect([off(0.59, 0.1), off(0.61, 0.1)]).toEqual([false, true]);
  });

  it("is allowed as many as are asked for", () => {
    expect(of([0, 0, 0, 0.35, 0, 0, 0], 3, 0.1, 3)?.odd).toBe(true);
    expect(of([0, 0, 0, 0.25, 0, 0, 0], 3, 0.1, 3)?.odd).toBe(false);
  });

  it("is asked of found slices only, up to four a side", () => {
    const holes = [9, 0, 0, 0, 0, Number.NaN, 1, Number.NaN, 0, 0, 0, 0, 9];
    expect(of(holes, 6)).toEqual({ value: 0, odd: true });
  });

  it("cannot be said at an end, where there are fewer than two on a side", () => {
    expect(of([0, 5, 0, 0, 0], 1)).toBeNull();
    expect(of([0, 0, 0, 5, 0], 3)).toBeNull();
    expect(of([0, 0, 5, Number.NaN, 0], 2)).toBeNull();
    expect(of([0, 0, 5, 0, 0], 2)?.odd).toBe(true);
  });

  it("says the same of the series read backwards, and of one that is shifted", () => {
    const value = fc.integer({ min: -300, max: 300 }).map((n) => n / 128);
    fc.assert(
      fc.property(fc.array(value, { minLength: 5, maxLength: 25 }), fc.nat(), (values, pick) => {
        const i = pick % values.length;
        const straight = of(values, i);
        expect(of([...values].reverse(), values.length - 1 - i)?.odd).toBe(straight?.odd);
        expect(
          of(
            values.map((one) => one + 8),
            i,
          )?.odd,
        ).toBe(straight?.odd);
      }),
    );
  });
});
