import { describe, expect, test } from "vitest";
import { PARTS, type PartPlan } from "./part-plan.ts";

/** Seams among the first of a count, in welding sequence. */
const firstOf = ({ product }: PartPlan, count: number) =>
  product.seams.slice(0, count).map(({ number }) => number);

describe("the plan of the demo's parts", () => {
  test("goes forward: scanned, then welded, then inspected", () => {
    for (const { scanned, welded, inspected, product } of PARTS) {
      expect(scanned).toBeLessThanOrEqual(product.seams.length);
      expect(welded).toBeLessThanOrEqual(scanned);
      expect(inspected).toBeLessThanOrEqual(welded);
    }
  });

  test("tells its stories about seams that have come so far", () => {
    for (const part of PARTS) {
      const told = (story: object) => Object.keys(story);
      expect(firstOf(part, part.scanned), part.serial).toEqual(expect.arrayContaining(told(part.held)));
      expect(firstOf(part, part.welded), part.serial).toEqual(expect.arrayContaining(told(part.refitted)));
      expect(firstOf(part, part.welded), part.serial).toEqual(expect.arrayContaining(told(part.troubles)));
      expect(firstOf(part, part.inspected), part.serial).toEqual(expect.arrayContaining(told(part.rejected)));
    }
  });

  test("tells of a held seam nothing that only a welded one can have", () => {
    for (const { held, refitted, rejected, troubles } of PARTS) {
      const welded = new Set([refitted, rejected, troubles].flatMap((story) => Object.keys(story)));
      expect(Object.keys(held).filter((number) => welded.has(number))).toEqual([]);
    }
  });

  test("says what was seen at each rejection, with its number from ISO 6520-1", () => {
    const findings = PARTS.flatMap(({ rejected }) => Object.values(rejected));
    expect(findings).toHaveLength(8);
    for (const finding of findings) expect(finding).toMatch(/\(\d{3,4}\)/);
  });

  test("builds each bracket into a frame of the same order", () => {
    const brackets = PARTS.filter(({ parent }) => parent !== null);
    expect(brackets).toHaveLength(12);
    for (const { parent, order_no } of brackets) {
      expect(PARTS.find(({ ref }) => ref === parent)?.order_no).toBe(order_no);
    }
  });
});
