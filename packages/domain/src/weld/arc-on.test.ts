import { describe, expect, test } from "vitest";
import { DEFAULT_ARC_ON, findArcOn } from "./arc-on.ts";

/** Burns as "from-to" in sample indices, one sample each tenth of a second. */
function burns(...currents_a: number[]): string[] {
  const times_s = Float64Array.from(currents_a, (_, i) => i / 10);
  return findArcOn(times_s, Float64Array.from(currents_a)).map(({ first, last }) => `${first}-${last}`);
}

describe("finding when the arc burned", () => {
  test("takes one burn from its first to its last sample", () => {
    expect(burns(0, 0, 200, 210, 205, 0, 0)).toEqual(["2-4"]);
    expect(burns(200, 210, 205)).toEqual(["0-2"]);
  });

  test("does not end at a current between the two levels, nor begin there", () => {
    expect(burns(0, 10, 10, 200, 10, 10, 200, 0)).toEqual(["3-6"]);
    expect(burns(0, 10, 10, 10, 10)).toEqual([]);
  });

  test("passes over a gap of two tenths and ends the burn at one of three", () => {
    expect(burns(200, 200, 0, 200, 200)).toEqual(["0-4"]);
    expect(burns(200, 200, 0, 0, 200, 200)).toEqual(["0-1", "4-5"]);
  });

  test("takes no failed strike for a burn", () => {
    expect(burns(0, 180, 0, 0, 0, 0, 200, 200, 200)).toEqual(["6-8"]);
    expect(burns(0, 180, 0, 0, 0)).toEqual([]);
  });

  test("finds nothing in a log without current", () => {
    expect(burns(0, 0, 3, 2, 0)).toEqual([]);
    expect(burns()).toEqual([]);
  });

  test("refuses a rule that contradicts itself, and arrays of unlike length", () => {
    const [times_s, currents_a] = [Float64Array.of(0, 1), Float64Array.of(0, 1)];
    expect(() => findArcOn(times_s, currents_a, { ...DEFAULT_ARC_ON, off_a: 20 })).toThrow(RangeError);
    expect(() => findArcOn(times_s, currents_a, { ...DEFAULT_ARC_ON, shortest_burn_s: 0 })).toThrow(
      RangeError,
    );
    expect(() => findArcOn(times_s, Float64Array.of(0))).toThrow(/expected 2 values, got 1/);
  });
});
