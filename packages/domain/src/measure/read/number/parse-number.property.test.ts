import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { parseNumber } from "./parse-number.ts";

const DOT = 0x2e;
const COMMA = 0x2c;
const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
const parse = (text: string, mark = DOT): number => parseNumber(bytesOf(text), 0, text.length, mark);

const digits = (min: number, max: number): fc.Arbitrary<string> =>
  fc.array(fc.integer({ min: 0, max: 9 }), { minLength: min, maxLength: max }).map((list) => list.join(""));
const sign = fc.constantFrom("", "-", "+");
const exponent = fc.oneof(
  fc.constant(""),
  fc.tuple(fc.constantFrom("e", "E"), sign, digits(1, 3)).map((parts) => parts.join("")),
);

/** Any decimal number: up to 25 digits before the mark and 25 behind it. */
const decimal = fc
  .tuple(sign, digits(0, 25), fc.boolean(), digits(0, 25), exponent)
  .filter(([, whole, , fraction]) => whole !== "" || fraction !== "")
  .map(([s, whole, mark, fraction, e]) =>
    mark || whole === "" || fraction !== "" ? `${s}${whole}.${fraction}${e}` : `${s}${whole}${e}`,
  );

/** Numbers as scans hold them: a few hundred millimetres, up to 19 digits. */
const coordinate = fc
  .tuple(fc.constantFrom("", "-"), digits(1, 4), digits(0, 19))
  .map(([s, whole, fraction]) => `${s}${whole}.${fraction}`);

describe("reading numbers from bytes", () => {
  test("gives what the language gives for every decimal number", () => {
    fc.assert(
      fc.property(decimal, (text) => {
        expect(parse(text), text).toBe(Number(text));
      }),
      { numRuns: 20_000 },
    );
  });

  test("gives what the language gives for coordinates of up to 23 digits", () => {
    fc.assert(
      fc.property(coordinate, (text) => {
        expect(parse(text), text).toBe(Number(text));
      }),
      { numRuns: 20_000 },
    );
  });

  test("reads every double back from its shortest, its fixed and its exponent form", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        for (const text of [String(value), value.toExponential(), value.toPrecision(17), value.toFixed(6)]) {
          expect(parse(text), text).toBe(Number(text));
        }
      }),
      { numRuns: 5_000 },
    );
  });

  test("rounds like the language next to the middle between two doubles", () => {
    // 2^53 + 1 lies exactly between two doubles; digits behind it decide.
    const middle = fc
      .integer({ min: 0, max: 2 ** 50 })
      .map((n) => (2n ** 53n + BigInt(2 * n) + 1n).toString());
    fc.assert(
      fc.property(middle, fc.integer({ min: 0, max: 16 }), digits(0, 5), (whole, decimals, tail) => {
        const at = whole.length - decimals;
        for (const end of ["", "0", "1", tail]) {
          const text = `${whole.slice(0, at) || "0"}.${whole.slice(at)}${end}`;
          expect(parse(text), text).toBe(Number(text));
        }
      }),
      { numRuns: 5_000 },
    );
  });

  test("reads a decimal comma as the dot, and never both", () => {
    fc.assert(
      fc.property(decimal, (text) => {
        expect(parse(text.replace(".", ","), COMMA), text).toBe(Number(text));
        if (text.includes(".")) expect(parse(text, COMMA)).toBeNaN();
      }),
    );
  });

  test("reads a part of the bytes and nothing around it", () => {
    fc.assert(
      fc.property(decimal, digits(0, 5), digits(0, 5), (text, before, after) => {
        const all = bytesOf(before + text + after);
        const value = parseNumber(all, before.length, before.length + text.length, DOT);
        expect(value).toBe(Number(text));
      }),
    );
  });

  test("takes nothing else for a number", () => {
    for (const text of [
      "",
      "-",
      "+",
      ".",
      "-.",
      "e5",
      "1e",
      "1e+",
      "1.2.3",
      "1,5",
      " 1",
      "1 ",
      "--1",
      "0x10",
      "1_000",
      "nan",
      "inf",
      "Infinity",
      "1e5.0",
      "−1",
      "1f",
    ]) {
      expect(parse(text), `"${text}"`).toBeNaN();
    }
  });
});
