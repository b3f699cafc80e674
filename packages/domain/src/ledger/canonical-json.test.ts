import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { canonicalJson, parseCanonicalJson } from "./canonical-json.ts";

describe("canonical JSON", () => {
  test("sorts members by UTF-16 code units, not by code points", () => {
    expect(canonicalJson({ "\ufb33": 1, "😀": 2, b: 3, a: 4, "10": 5, "1": 6 })).toBe(
      '{"1":6,"10":5,"a":4,"b":3,"😀":2,"\ufb33":1}',
    );
  });

  test("leaves out members that are undefined, and takes objects without a prototype", () => {
    expect(canonicalJson({ a: undefined, b: null })).toBe('{"b":null}');
    expect(canonicalJson(Object.assign(Object.create(null), { a: 1 }))).toBe('{"a":1}');
    expect(canonicalJson(JSON.parse('{"__proto__":1}'))).toBe('{"__proto__":1}');
  });

  test("refuses what JSON cannot say, naming the place", () => {
    expect(() => canonicalJson({ "a/b": [1, Number.NaN] })).toThrow(
      '"/a~1b/1": expected a finite number, got NaN',
    );
    expect(() => canonicalJson({ a: Number.POSITIVE_INFINITY })).toThrow(RangeError);
    expect(() => canonicalJson({ a: "\udead" })).toThrow('"/a": expected whole characters');
    expect(() => canonicalJson({ "\ud800": 1 })).toThrow(RangeError);
    expect(() => canonicalJson([undefined])).toThrow('"/0": expected JSON data, got undefined');
    expect(() => canonicalJson({ a: 1n })).toThrow("got bigint");
    expect(() => canonicalJson({ at: new Date(0) })).toThrow("got Date");
    expect(() => canonicalJson(new Map())).toThrow(TypeError);
  });

  test("refuses nesting without end", () => {
    const loop: { inner?: unknown } = {};
    loop.inner = loop;
    expect(() => canonicalJson(loop)).toThrow(/nesting up to 256/);
  });

  test.each([
    ['{"a":1,"a":2}', "duplicate members"],
    ['{"b":1,"a":2}', "another order"],
    ['{"a": 1}', "blanks"],
    ['{"a":1.0}', "a number written another way"],
    ['{"a":"\\u0041"}', "a needless escape"],
    ['{"a":1}\n', "a line end"],
    ["{", "no JSON"],
  ])("does not take %s for canonical (%s)", (text) => {
    const outcome = parseCanonicalJson(text);
    expect(outcome.ok ? outcome.value : outcome.faults[0]?.code).toBe("proof-invalid");
  });

  test("reads back what it wrote, and writes it the same again, whatever the order of members", () => {
    const shuffled = (value: unknown): unknown => {
      if (Array.isArray(value)) return value.map(shuffled);
      if (typeof value !== "object" || value === null) return value;
      return Object.fromEntries(
        Object.entries(value)
          .reverse()
          .map(([name, inner]) => [name, shuffled(inner)]),
      );
    };
    fc.assert(
      fc.property(fc.jsonValue({ stringUnit: "binary" }), (value) => {
        const text = canonicalJson(value);
        const read = parseCanonicalJson(text);
        expect(read.ok && canonicalJson(read.value)).toBe(text);
        expect(canonicalJson(shuffled(value))).toBe(text);
      }),
    );
  });
});
