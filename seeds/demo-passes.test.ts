import { readPassLog } from "@beadroll/domain/weld/read-pass-log";
import { reducePass } from "@beadroll/domain/weld/reduce-pass";
import { describe, expect, test } from "vitest";
import { demoEvents } from "./demo-scenario.ts";
import { PARTS } from "./production/part-plan.ts";
import { procedureOf } from "./shop/procedures.ts";

/** Every pass of the demo as the API will reduce and judge it. */
const PASSES = [...demoEvents({ seed: 1, ends_at: "2026-12-01T14:00:00.000Z" })].flatMap((event) => {
  if (event.kind !== "pass") return [];
  const { part, number } = event.seam;
  const product = PARTS.find(({ ref }) => ref === part)?.product;
  const seam = product?.seams.find((each) => each.number === number);
  const { process, ranges } = procedureOf(seam?.procedure ?? "").fields;
  const log = readPassLog(event.file);
  const pass = log.ok ? reducePass(log.value, { process, ranges }) : log;
  return [{ name: event.file.name, pass, length_mm: seam?.line.length_mm ?? 0 }];
});

const outcomes = PASSES.flatMap(({ name, pass }) => (pass.ok ? [{ name, ...pass.value }] : []));
const named = (verdict: string) =>
  outcomes.filter(({ judgement }) => judgement?.verdict === verdict).map(({ name }) => name);

describe("passes of the demo, reduced and held against their procedures", () => {
  test("can all be read", () => {
    expect(PASSES.filter(({ pass }) => !pass.ok)).toEqual([]);
    expect(PASSES.length).toBeGreaterThan(500);
  });

  test("cover their seam's length to two hundredths", () => {
    for (const { name, pass, length_mm } of PASSES) {
      const welded_mm = pass.ok ? (pass.value.length_mm ?? 0) : 0;
      expect(Math.abs(welded_mm / length_mm - 1), name).toBeLessThan(0.02);
    }
  });

  test("are inside but for those that a story is told about", () => {
    expect(named("outside").toSorted()).toEqual([
      "0413-S7-pass-1.csv",
      "0414-S17-pass-1.csv",
      "0414-S18-pass-1.csv",
      "0421-S10-pass-1.csv",
      "0706-S14-pass-1.csv",
      "0709-S4-pass-1.csv",
      "0711-S9-pass-1.csv",
    ]);
    expect(named("doubtful").toSorted()).toEqual([
      "0412-S4-pass-1.csv",
      "0422-S12-pass-1.csv",
      "0708-S11-pass-1.csv",
    ]);
  });

  test("have the arc struck again in seven of them", () => {
    expect(outcomes.filter(({ restarts }) => restarts.length === 1)).toHaveLength(7);
    expect(outcomes.filter(({ restarts }) => restarts.length > 1)).toEqual([]);
  });
});
