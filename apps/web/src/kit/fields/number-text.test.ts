import { describe, expect, it } from "vitest";
import { numberText, readLength, readNumber } from "./number-text.ts";

describe("a number as somebody types it", () => {
  it.each([
    ["3.2", 3.2],
    ["3,2", 3.2],
    [" 12 ", 12],
    [",5", 0.5],
    ["5.", 5],
    ["-0,4", -0.4],
    ["−0.4", -0.4],
    ["+7", 7],
    ["12 000", 12000],
    ["1 234 567,5", 1234567.5],
    ["1\u202F200", 1200],
  ])("%j is %d", (text, value) => {
    expect(readNumber(text)).toEqual({ ok: true, value });
  });

  it("is nothing where nothing was typed", () => {
    expect(readNumber("  ")).toEqual({ ok: true, value: null });
  });

  it.each(["1,234.5", "1.234,5"])("%j is refused, as it can be read in two ways", (text) => {
    expect(readNumber(text)).toEqual({ ok: false, words: "Use one decimal sign only, a comma or a point." });
  });

  it.each(["abc", "3 mm", "1.2.3", "1,2,3", "--1", "1e5", ".", "-", "1 2", "0x10", "Infinity"])(
    "%j is no number",
    (text) => {
      expect(readNumber(text).ok).toBe(false);
    },
  );
});

describe("a length as somebody types it", () => {
  it.each([
    ["12,5", "mm", 12.5],
    ["12.5 mm", "in", 12.5],
    ["0.5 in", "mm", 12.7],
    ['1/2"', "mm", 12.7],
    ["1 3/8 in", "mm", 34.925],
    ["1-3/8", "in", 34.925],
    ["-1/4", "in", -6.35],
    ["2 inches", "mm", 50.8],
    ["0,25", "in", 6.35],
  ] as const)("%j on a screen in %s is %d mm", (text, units, length_mm) => {
    const reading = readLength(text, units);
    expect(reading.ok && reading.value).toBeCloseTo(length_mm, 9);
  });

  it("takes no fraction where lengths are in mm, and none of zero", () => {
    expect(readLength("1/2", "mm").ok).toBe(false);
    expect(readLength("1/0", "in").ok).toBe(false);
    expect(readLength("5 kg", "mm").ok).toBe(false);
  });

  it("is nothing where nothing was typed", () => {
    expect(readLength("", "in")).toEqual({ ok: true, value: null });
  });
});

it("shows a number without needless zeros, and reads back what it shows", () => {
  expect(numberText(3.2)).toBe("3.2");
  expect(numberText(0.1 + 0.2)).toBe("0.3");
  expect(numberText(null)).toBe("");
  for (const value of [0, -4, 0.001, 12345.678, 1e-6])
    expect(readNumber(numberText(value))).toEqual({ ok: true, value });
});
