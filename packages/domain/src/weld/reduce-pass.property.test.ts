import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { accumulated, arcTime, fillGaps, shareOutside, statisticsOver } from "./arc-integral.ts";
import type { PassLog } from "./pass-log.ts";
import { readPassLog } from "./read-pass-log.ts";
import { reducePass } from "./reduce-pass.ts";

const steps_s = fc.array(fc.double({ min: 0.001, max: 1, noNaN: true }), { minLength: 3, maxLength: 60 });
const amount = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** A tenth is the finest step, so that crossings of a limit are never a matter of rounding. */
const tenths = (min: number, max: number) =>
  fc.integer({ min: min * 10, max: max * 10 }).map((value) => value / 10);

/** Times and values at uneven steps. */
const course = steps_s.chain((steps) =>
  fc.record({
    times_s: fc.constant(
      Float64Array.from([
        0,
        ...steps.map(
          (
            (sum) => (step: number) =>
              (sum += step)
          )(0),
        ),
      ]),
    ),
    values: fc
      .array(tenths(-50, 50), { minLength: steps.length + 1, maxLength: steps.length + 1 })
      .map((values) => Float64Array.from(values)),
  }),
);

/** Each step cut in three, the values in between on the straight line. */
function refined({ times_s, values }: { times_s: Float64Array; values: Float64Array }) {
  const [times, finer]: [number[], number[]] = [[times_s[0]!], [values[0]!]];
  for (let i = 1; i < times_s.length; i++) {
    for (const share of [1 / 3, 2 / 3, 1]) {
      times.push(share === 1 ? times_s[i]! : times_s[i - 1]! + share * (times_s[i]! - times_s[i - 1]!));
      finer.push(share === 1 ? values[i]! : values[i - 1]! + share * (values[i]! - values[i - 1]!));
    }
  }
  return { times_s: Float64Array.from(times), values: Float64Array.from(finer) };
}

const whole = (values: Float64Array) => [{ first: 0, last: values.length - 1 }];

describe("laws of time-weighted statistics", () => {
  test("sampling the same straight lines more finely changes nothing", () => {
    fc.assert(
      fc.property(course, tenths(-50, 0), tenths(0, 50), (given, min, max) => {
        const finer = refined(given);
        const [a, b] = [given, finer].map(({ times_s, values }) =>
          statisticsOver(times_s, values, whole(values)),
        );
        expect(b!.mean).toBeCloseTo(a!.mean, 6);
        expect(b!.sd).toBeCloseTo(a!.sd, 6);
        expect(b!.min).toBe(a!.min);
        expect(b!.max).toBe(a!.max);
        const range = { min, max };
        expect(shareOutside(finer, whole(finer.values), range)).toBeCloseTo(
          shareOutside(given, whole(given.values), range),
          6,
        );
      }),
    );
  });

  test("what is split at a sample adds up again", () => {
    fc.assert(
      fc.property(course, fc.nat(100), ({ times_s, values }, at) => {
        const last = values.length - 1;
        const cut = 1 + (at % (last - 1));
        const parts = [
          { first: 0, last: cut },
          { first: cut, last },
        ];
        expect(arcTime(times_s, parts)).toBeCloseTo(times_s[last]! - times_s[0]!, 9);
        expect(accumulated(times_s, values, parts)[last]).toBeCloseTo(
          accumulated(times_s, values, whole(values))[last]!,
          6,
        );
        const joined = statisticsOver(times_s, values, parts);
        expect(joined.mean).toBeCloseTo(statisticsOver(times_s, values, whole(values)).mean, 6);
        expect(joined.sd).toBeCloseTo(statisticsOver(times_s, values, whole(values)).sd, 6);
      }),
    );
  });

  test("the share outside a range and the share inside are one whole", () => {
    fc.assert(
      fc.property(course, tenths(-40, 40), ({ times_s, values }, limit) => {
        const burns = whole(values);
        const above = shareOutside({ times_s, values }, burns, { min: Number.NEGATIVE_INFINITY, max: limit });
        const below = shareOutside({ times_s, values }, burns, { min: limit, max: Number.POSITIVE_INFINITY });
        fc.pre(!values.some((value) => value === limit));
        expect(above + below).toBeCloseTo(1, 9);
      }),
    );
  });

  test("filling gaps keeps every reading and lies between its neighbours", () => {
    fc.assert(
      fc.property(
        course,
        fc.array(fc.boolean(), { minLength: 61, maxLength: 61 }),
        ({ times_s, values }, read) => {
          const gappy = values.map((value, i) => (read[i] ? value : Number.NaN));
          const filled = fillGaps(times_s, gappy);
          if (gappy.every(Number.isNaN)) {
            expect(filled).toBeNull();
            return;
          }
          const known = gappy.filter((value) => !Number.isNaN(value));
          for (const [i, value] of (filled ?? []).entries()) {
            if (read[i]) expect(value).toBe(values[i]);
            expect(value).toBeGreaterThanOrEqual(Math.min(...known) - 1e-9);
            expect(value).toBeLessThanOrEqual(Math.max(...known) + 1e-9);
          }
        },
      ),
    );
  });
});

describe("laws of reducing a pass", () => {
  const steady = fc.record({
    current_a: amount(50, 400),
    voltage_v: amount(10, 40),
    travel_mm_s: amount(1, 20),
    steps: fc.array(amount(0.01, 0.2), { minLength: 10, maxLength: 80 }),
  });

  test("a steady log gives the same whatever its sampling, by both methods", () => {
    fc.assert(
      fc.property(steady, ({ current_a, voltage_v, travel_mm_s, steps }) => {
        fc.pre(steps.reduce((sum, step) => sum + step, 0) >= 0.2);
        let time_s = 3;
        const times_s = Float64Array.from([time_s, ...steps.map((step) => (time_s += step))]);
        const constant = (value: number): Float64Array => new Float64Array(times_s.length).fill(value);
        const log: PassLog = {
          times_s,
          readings: {
            current_a: constant(current_a),
            voltage_v: constant(voltage_v),
            wire_feed_m_min: null,
            travel_mm_s: constant(travel_mm_s),
            gas_l_min: null,
          },
          interpass_c: null,
        };
        const outcome = reducePass(log, { process: "135" });
        const expected = (0.8 * current_a * voltage_v) / travel_mm_s / 1000;
        expect(outcome.ok && outcome.value.heat_input_kj_mm).toBeCloseTo(expected, 6);
        expect(outcome.ok && outcome.value.heat_input_instant_kj_mm).toBeCloseTo(expected, 6);
        expect(outcome.ok && outcome.value.length_mm).toBeCloseTo(travel_mm_s * (time_s - 3), 6);
      }),
    );
  });

  test("the unit a log was written in does not change what it reduces to", () => {
    const rows = fc.array(fc.tuple(amount(100, 300), amount(20, 30), amount(3, 9), amount(5, 12)), {
      minLength: 5,
      maxLength: 30,
    });
    const reducedFrom = (header: string, lines: number[][]) => {
      const text = `${header}\n${lines.map((line) => line.join(",")).join("\n")}\n`;
      const log = readPassLog({ name: "pass-1.csv", bytes: new TextEncoder().encode(text) });
      const outcome = log.ok ? reducePass(log.value, { process: "135" }) : log;
      if (!outcome.ok) throw new Error(outcome.faults[0]?.detail);
      return outcome.value;
    };
    fc.assert(
      fc.property(rows, (samples) => {
        const metric = reducedFrom(
          "time_s,current_a,voltage_v,travel_mm_s,wire_feed_m_min",
          samples.map(([a, v, travel, wire], i) => [i / 10, a, v, travel, wire]),
        );
        const other = reducedFrom(
          "time_ms,current_a,voltage_v,travel_cm_min,wire_feed_mm_s",
          samples.map(([a, v, travel, wire], i) => [i * 100, a, v, travel * 6, (wire * 1000) / 60]),
        );
        expect(other.heat_input_kj_mm).toBeCloseTo(metric.heat_input_kj_mm ?? Number.NaN, 9);
        expect(other.length_mm).toBeCloseTo(metric.length_mm ?? Number.NaN, 9);
        expect(other.statistics.wire_feed_m_min?.mean).toBeCloseTo(
          metric.statistics.wire_feed_m_min?.mean ?? Number.NaN,
          9,
        );
      }),
    );
  });
});
