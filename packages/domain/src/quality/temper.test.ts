import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { temperColour } from "./temper.ts";

describe("the temper scale", () => {
  test.each([
    [0, "#d6dbde"],
    [0.25, "#e9d9a3"],
    [0.5, "#d6a44c"],
    [0.72, "#9c5c36"],
    [0.88, "#683e7a"],
    [1, "#2e549c"],
  ])("shows a share of %s in the colour of its stop, %s", (share, colour) => {
    expect(temperColour(share)).toBe(colour);
  });

  test("turns ember as soon as the limit is passed", () => {
    expect(temperColour(1 + Number.EPSILON)).toBe("#c8341f");
    expect(temperColour(Number.POSITIVE_INFINITY)).toBe("#c8341f");
  });

  test("lies half way between two stops half way between their shares", () => {
    expect(temperColour(0.125)).toBe("#e0dac1");
    expect(temperColour(0.94)).toBe("#4b498b");
  });

  test("takes a share below nothing for nothing", () => {
    expect(temperColour(-0.5)).toBe(temperColour(0));
  });

  test("has no colour for what was not measured", () => {
    expect(() => temperColour(Number.NaN)).toThrow(RangeError);
  });

  test("never jumps inside the limit: a hundredth more moves no channel by more than eight", () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 0.99, noNaN: true }), (share) => {
        const channels = (colour: string): number[] =>
          [1, 3, 5].map((at) => Number.parseInt(colour.slice(at, at + 2), 16));
        const next = channels(temperColour(share + 0.01));
        for (const [i, value] of channels(temperColour(share)).entries()) {
          expect(Math.abs((next[i] ?? Number.NaN) - value)).toBeLessThanOrEqual(8);
        }
      }),
    );
  });
});
