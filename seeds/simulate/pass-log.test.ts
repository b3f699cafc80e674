import { describe, expect, test } from "vitest";
import { Random } from "../random.ts";
import { procedureOf } from "../shop/procedures.ts";
import { longestWait, type PassPlan, type PassTrouble, passDuration, passLogCsv } from "./pass-log.ts";

const plan = (trouble: PassTrouble | null = null): PassPlan => ({
  settings: procedureOf("wps-fillet-a5").settings,
  length_mm: 380,
  trouble,
});

interface Row {
  readonly time_s: number;
  readonly current_a: number;
  readonly voltage_v: number;
  readonly travel_mm_s: number;
  readonly gas_l_min: number;
}

function rowsOf(of: PassPlan): Row[] {
  const [header, ...lines] = new TextDecoder()
    .decode(passLogCsv(of, new Random(2, "log")))
    .trimEnd()
    .split("\n");
  expect(header).toBe("time_s,current_a,voltage_v,wire_feed_m_min,travel_mm_s,gas_l_min");
  return lines.map((line) => {
    const [time_s = 0, current_a = 0, voltage_v = 0, , travel_mm_s = 0, gas_l_min = 0] = line
      .split(",")
      .map(Number);
    return { time_s, current_a, voltage_v, travel_mm_s, gas_l_min };
  });
}

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
const burning = (rows: readonly Row[]) => rows.filter(({ current_a }) => current_a > 30);

/** Heat input by EN 1011-1 with k = 0.8, from the means. */
const heat = (rows: readonly Row[]) => {
  const arc = burning(rows);
  const power_w = mean(arc.map(({ current_a }) => current_a)) * mean(arc.map(({ voltage_v }) => voltage_v));
  return (0.8 * power_w) / mean(arc.map(({ travel_mm_s }) => travel_mm_s)) / 1000;
};

describe("a simulated pass log", () => {
  test("is sampled twenty times a second and lasts as long as planned", () => {
    const rows = rowsOf(plan());
    expect(rows[1]?.time_s).toBe(0.05);
    expect(rows.at(-1)?.time_s).toBeCloseTo(passDuration(plan()), 0);
  });

  test("travels the seam's length while the arc burns", () => {
    const travelled_mm = rowsOf(plan()).reduce((sum, { travel_mm_s }) => sum + travel_mm_s / 20, 0);
    expect(Math.abs(travelled_mm - 380)).toBeLessThan(6);
  });

  test("lies inside its procedure, heat input included, when nothing goes wrong", () => {
    const rows = rowsOf(plan());
    expect(heat(rows)).toBeGreaterThan(0.9);
    expect(heat(rows)).toBeLessThan(1.25);
    const outside = burning(rows).filter(({ current_a }) => current_a < 220 || current_a > 280);
    expect(outside.length / burning(rows).length).toBeLessThan(0.03);
  });

  test("puts in too much heat when the robot runs slowly", () => {
    expect(heat(rowsOf(plan({ kind: "slow", factor: 0.66 })))).toBeGreaterThan(1.45);
  });

  test("loses its gas when the bundle runs empty", () => {
    const gas = burning(rowsOf(plan({ kind: "gas-low" }))).map(({ gas_l_min }) => gas_l_min);
    expect(mean(gas)).toBeLessThan(13);
    expect(gas.at(-1)).toBeLessThan(8);
  });

  test("has the arc out for as long as the restart says", () => {
    const rows = rowsOf(plan({ kind: "restart", at: 0.5, off_s: 1.8 }));
    const arc = burning(rows);
    const waits = arc.slice(1).map(({ time_s }, i) => time_s - (arc[i]?.time_s ?? time_s));
    expect(waits.filter((wait_s) => wait_s > 0.1)).toHaveLength(1);
    expect(Math.max(...waits)).toBeCloseTo(1.8, 0);
  });

  test("waits in the middle of a spool change with current and gas off", () => {
    const of = plan({ kind: "spool-change", at: 0.55, off_s: 166 });
    const wait_s = longestWait(of) ?? Number.NaN;
    const then = rowsOf(of).find(({ time_s }) => time_s >= wait_s);
    expect(then).toMatchObject({ current_a: 0, gas_l_min: 0 });
    expect(longestWait(plan())).toBeNull();
  });
});
