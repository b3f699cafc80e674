import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { weldChecks } from "../../../vectors/weld/checks.ts";
import { IMPERFECTIONS } from "./imperfections.ts";
import { ISO_5817_EDITIONS, type Limit, QUALITY_LEVELS } from "./limit.ts";
import { limitOf } from "./limit-of.ts";

const checks = ["5011", "502", "503", "504", "505", "506", "509", "512", "515", "5013", "5071", "5072"]
  .concat(["5213", "5214", "617", "2017", "2025", "4021"])
  .flatMap((code) => weldChecks(`Q-${code}-`));

/** A limit as the check values write it. */
function written(limit: Limit): number | string {
  switch (limit.kind) {
    case "at_most":
      return limit.value_mm;
    case "at_least":
      return limit.value_deg;
    case "not_permitted":
      return "not permitted";
    case "permitted":
      return "permitted";
    case "by_application":
      return "by application";
  }
}

describe("limits of ISO 5817 Table 1", () => {
  it.each(checks.map((check) => [check.title, check] as const))("%s", (title, check) => {
    const size = (name: string) => (check.value(name) === undefined ? {} : { [name]: check.input(name) });
    const [code = ""] = String(check.value("imperfection")).split("/");
    const level = QUALITY_LEVELS.find((one) => one === check.value("level"));
    const edition = ISO_5817_EDITIONS.find((one) => one === check.value("edition"));
    if (!level) throw new Error(`${title}: no level`);
    const sizes = Object.assign({}, ...["t_mm", "a_mm", "s_mm", "b_mm"].map(size));
    const question = { ...sizes, code, level, ...(edition && { edition }) };
    if (Array.isArray(check.expected)) {
      const angles = [false, true].map((is_fillet) => written(limitOf({ ...question, is_fillet }).limit));
      expect(angles).toEqual(check.expected);
      return;
    }
    const { limit } = limitOf(question);
    const found = written(limit);
    if (typeof found === "number") expect(found).toBeCloseTo(check.number(), 9);
    else expect(found).toBe(check.expected);
    if (limit.kind === "at_most") expect(limit.short_only).toBe(/short/.test(title));
  });

  it("never allows more at a stricter level", () => {
    const size = fc.double({ min: 0.5, max: 60, noNaN: true });
    const allowed = (limit: Limit): number => {
      switch (limit.kind) {
        case "at_most":
          return limit.value_mm;
        case "at_least":
          return -limit.value_deg;
        case "not_permitted":
          return 0;
        default:
          return Number.POSITIVE_INFINITY;
      }
    };
    fc.assert(
      fc.property(
        fc.constantFrom(...IMPERFECTIONS),
        size,
        size,
        size,
        fc.boolean(),
        (one, t, a, b, fillet) => {
          const [B, C, D] = QUALITY_LEVELS.map((level) =>
            allowed(
              limitOf({ code: one.code, level, t_mm: t, a_mm: a, s_mm: a, b_mm: b, is_fillet: fillet }).limit,
            ),
          );
          return (B ?? 0) <= (C ?? 0) && (C ?? 0) <= (D ?? 0);
        },
      ),
    );
  });

  it("refuses what the table does not hold", () => {
    expect(() => limitOf({ code: "999", level: "C" })).toThrow(/not in ISO 5817/);
    expect(() => limitOf({ code: "5011", level: "C" })).toThrow(/t_mm: needed/);
    expect(() => limitOf({ code: "5011", level: "C", t_mm: 0.4 })).toThrow(/begins at 0.5 mm/);
    expect(() => limitOf({ code: "503", level: "C", b_mm: -1 })).toThrow(/b_mm: expected > 0/);
  });

  it("says where a limit stands and whether it was remembered", () => {
    expect(limitOf({ code: "504", level: "C", t_mm: 8, b_mm: 4, edition: "2014" }).source).toBe(
      "ISO 5817:2014 Table 1, 1.11",
    );
    expect(limitOf({ code: "5071", level: "B", t_mm: 10 }).from_memory).toBe(true);
  });
});
