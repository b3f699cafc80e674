import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { medianOf, selectKth } from "./median.ts";

const numbers = fc.array(fc.double({ noNaN: true, min: -1e6, max: 1e6 }), { minLength: 1, maxLength: 200 });

describe("selection", () => {
  it("gives what a sort would, at every place", () => {
    fc.assert(
      fc.property(numbers, fc.nat(), (values, pick) => {
        const k = pick % values.length;
        const sorted = Float64Array.from(values).sort();
        expect(selectKth(Float64Array.from(values), values.length, k)).toBe(sorted[k]);
      }),
    );
  });

  it("gives the median, 2.1, and the median absolute deviation, 0.1, of Hampel's example", () => {
    const values = [2.1, 2.3, 1.9, 2.0, 2.2, 2.1, 9.7, 2.05, 1.95, -3.0, 2.15];
    const median = medianOf(values);
    expect(median).toBe(2.1);
    expect(medianOf(values.map((value) => Math.abs(value - median)))).toBeCloseTo(0.1, 12);
  });

  it("is no number of nothing", () => expect(medianOf([])).toBeNaN());
});
