import { describe, expect, test } from "vitest";
import { z } from "zod";
import { weldCheck, weldChecks } from "../../vectors/weld/checks.ts";
import {
  arcEfficiency,
  arcEnergyFromMeans,
  arcEnergyFromPower,
  heatInput,
  runAtSpeed,
} from "./heat-input.ts";
import type { PassLog } from "./pass-log.ts";
import { reducePass } from "./reduce-pass.ts";

const MM_PER_INCH = 25.4;

/** A steady pass of ten seconds, one sample each tenth of a second. */
function steadyLog(voltage_v: number, current_a: number, travel_mm_s: number): PassLog {
  const constant = (value: number): Float64Array => new Float64Array(101).fill(value);
  return {
    times_s: Float64Array.from({ length: 101 }, (_, i) => i / 10),
    readings: {
      current_a: constant(current_a),
      voltage_v: constant(voltage_v),
      wire_feed_m_min: null,
      travel_mm_s: constant(travel_mm_s),
      gas_l_min: null,
    },
    interpass_c: null,
  };
}

describe("heat input of steady arcs", () => {
  test.each(
    weldChecks("HI-05", "HI-06", "HI-07", "HI-08", "HI-09", "HI-10").map(
      (check) => [check.title, check] as const,
    ),
  )("%s", (_, check) => {
    const process = z.string().parse(check.value("process_iso4063"));
    const k = arcEfficiency(process);
    expect(k).toBe(check.input("k"));
    const run = runAtSpeed(check.input("travel_speed_mm_per_s"));
    const energy_kj_mm = arcEnergyFromMeans(check.input("voltage_V"), check.input("current_A"), run);
    expect(Math.abs(heatInput(energy_kj_mm, check.input("k")) - check.number())).toBeLessThanOrEqual(
      check.tolerance,
    );
    const log = steadyLog(
      check.input("voltage_V"),
      check.input("current_A"),
      check.input("travel_speed_mm_per_s"),
    );
    const reduced = reducePass(log, { process });
    const { heat_input_kj_mm, heat_input_instant_kj_mm } = reduced.ok ? reduced.value : {};
    expect(heat_input_kj_mm).toBeCloseTo(check.number(), 3);
    expect(heat_input_instant_kj_mm).toBeCloseTo(check.number(), 3);
  });

  test.each(weldChecks("HI-01", "HI-11").map((check) => [check.title, check] as const))("%s", (_, check) => {
    const run = runAtSpeed(check.input("travel_speed_mm_per_s"));
    const energy_kj_mm = arcEnergyFromMeans(check.input("voltage_V"), check.input("current_A"), run);
    expect(Math.abs(energy_kj_mm - check.number())).toBeLessThanOrEqual(check.tolerance);
  });

  test(weldCheck("HI-02").title, () => {
    const check = weldCheck("HI-02");
    const run = runAtSpeed((check.input("travel_speed_in_per_min") * MM_PER_INCH) / 60);
    const energy_kj_mm = arcEnergyFromMeans(check.input("voltage_V"), check.input("current_A"), run);
    expect(Math.abs(energy_kj_mm * MM_PER_INCH * 1000 - check.number())).toBeLessThanOrEqual(check.tolerance);
  });

  test.each([
    ["HI-03", 60, "arc_time_min"],
    ["HI-04", 1, "arc_time_s"],
  ] as const)("%s: energy per inch from length and time", (id, seconds, time) => {
    const check = weldCheck(id);
    const run = {
      arc_on_s: check.input(time) * seconds,
      length_mm: check.input("weld_length_in") * MM_PER_INCH,
    };
    const energy_kj_mm = arcEnergyFromMeans(check.input("voltage_V"), check.input("current_A"), run);
    expect(Math.abs(energy_kj_mm * MM_PER_INCH - check.number())).toBeLessThanOrEqual(check.tolerance);
  });
});

describe("heat input of pulsed arcs", () => {
  const pulsed = weldCheck("HI-12");
  const samples = z.array(z.number());
  const voltages_v = samples.parse(pulsed.value("samples_voltage_V"));
  const currents_a = samples.parse(pulsed.value("samples_current_A"));
  const mean = (values: readonly number[]): number =>
    values.reduce((sum, value) => sum + value, 0) / values.length;
  const run = runAtSpeed(pulsed.input("travel_speed_mm_per_s"));

  test(pulsed.title, () => {
    const power_w = mean(voltages_v.map((voltage, i) => voltage * (currents_a[i] ?? Number.NaN)));
    expect(Math.abs(arcEnergyFromPower(power_w, run) - pulsed.number())).toBeLessThanOrEqual(
      pulsed.tolerance,
    );
  });

  test(weldCheck("HI-13").title, () => {
    const energy_kj_mm = arcEnergyFromMeans(mean(voltages_v), mean(currents_a), run);
    expect(Math.abs(energy_kj_mm - weldCheck("HI-13").number())).toBeLessThanOrEqual(0.0005);
    expect(energy_kj_mm).not.toBeCloseTo(pulsed.number(), 2);
  });

  test("HI-12 and HI-13 as a log: the power of each sample gives 0.65, the means 0.5625 kJ/mm, before k", () => {
    // Two samples at one time make a square wave: each level lasts 0.01 s, both equally long.
    const levels = Array.from({ length: 400 }, (_, i) => Math.floor(i / 2) % 2);
    const log: PassLog = {
      times_s: Float64Array.from({ length: 400 }, (_, i) => Math.ceil(i / 2) * 0.01),
      readings: {
        current_a: Float64Array.from(levels, (level) => currents_a[level] ?? Number.NaN),
        voltage_v: Float64Array.from(levels, (level) => voltages_v[level] ?? Number.NaN),
        wire_feed_m_min: null,
        travel_mm_s: new Float64Array(400).fill(10),
        gas_l_min: null,
      },
      interpass_c: null,
    };
    const reduced = reducePass(log, { process: "135", arc_efficiency_k: 1 });
    const { heat_input_kj_mm, heat_input_instant_kj_mm } = reduced.ok ? reduced.value : {};
    expect(heat_input_instant_kj_mm).toBeCloseTo(0.65, 3);
    expect(heat_input_kj_mm).toBeCloseTo(0.5625, 3);
  });

  test("HI-15: 52 000 J over 4 in is 13 000 J/in", () => {
    const check = weldCheck("HI-15");
    const length_mm = check.input("weld_length_in") * MM_PER_INCH;
    const energy_kj_mm = arcEnergyFromPower(check.input("instantaneous_energy_J"), {
      arc_on_s: 1,
      length_mm,
    });
    expect(Math.abs(energy_kj_mm * 1000 * MM_PER_INCH - check.number())).toBeLessThanOrEqual(check.tolerance);
  });

  test("HI-16: 6500 W for 30 s over 300 mm is 650 J/mm", () => {
    const check = weldCheck("HI-16");
    const length = { arc_on_s: check.input("arc_time_s"), length_mm: check.input("weld_length_mm") };
    const energy_kj_mm = arcEnergyFromPower(check.input("instantaneous_power_W"), length);
    expect(Math.abs(energy_kj_mm * 1000 - check.number())).toBeLessThanOrEqual(check.tolerance);
  });
});

describe("what heat input is refused for", () => {
  test("knows no arc efficiency for laser or an unknown process", () => {
    expect(arcEfficiency("52")).toBeUndefined();
    expect(arcEfficiency("999")).toBeUndefined();
    expect(arcEfficiency("toString")).toBeUndefined();
  });

  test("needs time, length and an efficiency up to 1", () => {
    expect(() => runAtSpeed(0)).toThrow(RangeError);
    expect(() => arcEnergyFromPower(1000, { arc_on_s: 0, length_mm: 1 })).toThrow(/arc_on_s/);
    expect(() => arcEnergyFromPower(1000, { arc_on_s: 1, length_mm: Number.NaN })).toThrow(/length_mm/);
    expect(() => heatInput(1, 1.2)).toThrow(/arc_efficiency_k/);
    expect(() => heatInput(1, 0)).toThrow(RangeError);
  });
});
