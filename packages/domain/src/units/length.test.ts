import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { weldCheck } from "../../vectors/weld/checks.ts";
import { kjInFromKjMm, kjMmFromKjCm } from "./heat-input-units.ts";
import { formatLength, inchesFromMm, mmFromInches } from "./length.ts";
import { parseLengthField } from "./length-field.ts";

const typed = (text: string, unit: "mm" | "in" = "mm"): number | string => {
  const outcome = parseLengthField(text, unit);
  return outcome.ok ? outcome.value : (outcome.faults[0]?.detail ?? "");
};

describe("showing a length", () => {
  test.each([
    [1.5, { unit: "mm" }, "1.50 mm"],
    [1.5, { unit: "in" }, "0.059 in"],
    [-3.2, { unit: "mm" }, "−3.20 mm"],
    [0.4, { unit: "mm", signed: true, digits: 1 }, "+0.4 mm"],
    [-0.0004, { unit: "mm", signed: true }, "0.00 mm"],
    [0, { unit: "mm", signed: true }, "0.00 mm"],
    [25.4, { unit: "in", digits: 0 }, "1 in"],
    [null, { unit: "mm" }, "–"],
    [Number.NaN, { unit: "mm" }, "–"],
  ] as const)("%s mm shows as %j: %s", (length_mm, format, text) => {
    expect(formatLength(length_mm, format)).toBe(text);
  });
});

describe("reading a length field", () => {
  test.each([
    ["1.5", "mm", 1.5],
    ["1,5", "mm", 1.5],
    [" 1,5 mm ", "mm", 1.5],
    ["1.5mm", "in", 1.5],
    [".5", "mm", 0.5],
    ["12.", "mm", 12],
    ["-0,25", "mm", -0.25],
    ["−0.25", "mm", -0.25],
    ["+2", "mm", 2],
    ["0.06 in", "mm", 1.524],
    ["1.5", "in", 38.1],
    ['1"', "mm", 25.4],
    ["2 INCH", "mm", 50.8],
    ["1/16", "in", 1.5875],
    ["1/16 in", "mm", 1.5875],
    ["1 1/2 in", "mm", 38.1],
    ["-1-1/2″", "mm", -38.1],
  ] as const)("reads %j in a field of %s as %s mm", (text, unit, length_mm) => {
    expect(typed(text, unit)).toBe(length_mm);
  });

  test("never gives minus zero", () => {
    expect(Object.is(typed("-0"), 0)).toBe(true);
  });

  test.each([
    ["", "Nothing is typed here"],
    ["abc", "no unit known here"],
    ["1.5 kg", '"kg" is no unit known here'],
    ["1.234,5", '"1.234,5" is no length'],
    ["1/16", '"1/16" is no length'],
    ["1/0 in", '"1/0 in" is no length'],
    ["1e3", '"1e3" is no length'],
    ["- 1", '"- 1" is no length'],
    ["mm", '"mm" is no length'],
    ["1.5 mm mm", '"1.5 mm mm" is no length'],
    ["1.5 toString", '"toString" is no unit known here'],
  ])("refuses %j, saying why", (text, detail) => {
    expect(typed(text)).toContain(detail);
  });

  test("reads back what was shown, to the digits shown", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -5000, max: 5000, noNaN: true }),
        fc.constantFrom("mm", "in"),
        (length_mm, unit) => {
          const read = typed(formatLength(length_mm, { unit, digits: 6 }));
          expect(Math.abs(Number(read) - length_mm)).toBeLessThanOrEqual(0.00002);
        },
      ),
    );
  });

  test("any text is read or refused, nothing else", () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 20 }), (text) => {
        const outcome = parseLengthField(text, "mm");
        expect(
          outcome.ok ? Number.isFinite(outcome.value) : outcome.faults[0]?.code === "request-invalid",
        ).toBe(true);
      }),
      { numRuns: 1000 },
    );
  });
});

describe("converting units", () => {
  test("an inch is 25.4 mm, there and back", () => {
    expect(mmFromInches(1.5)).toBe(38.1);
    expect(inchesFromMm(38.1)).toBe(1.5);
    fc.assert(
      fc.property(fc.double({ min: -1e5, max: 1e5, noNaN: true }), (length_mm) => {
        expect(mmFromInches(inchesFromMm(length_mm))).toBeCloseTo(length_mm, 5);
      }),
    );
  });

  test(weldCheck("HI-17").title, () => {
    expect(kjInFromKjMm(weldCheck("HI-17").input("heat_input_kJ_per_mm"))).toBeCloseTo(
      weldCheck("HI-17").number(),
      9,
    );
  });

  test(weldCheck("HI-18").title, () => {
    expect(kjMmFromKjCm(weldCheck("HI-18").input("heat_input_kJ_per_cm"))).toBeCloseTo(
      weldCheck("HI-18").number(),
      9,
    );
  });
});
