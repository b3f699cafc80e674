import { describe, expect, test } from "vitest";
import { PassResult } from "../schemas/pass-result.ts";
import type { ProcedureRanges } from "../schemas/procedure.ts";
import type { PassLog } from "./pass-log.ts";
import { type PassContext, reducePass } from "./reduce-pass.ts";

interface Row {
  readonly current_a: number;
  readonly voltage_v?: number;
  readonly travel_mm_s?: number;
  readonly gas_l_min?: number;
  readonly interpass_c?: number;
}

/** A log with one sample each tenth of a second from 100 s on; a quantity that no row has is not in it. */
function aLog(rows: readonly Row[]): PassLog {
  const column = (of: (row: Row) => number | undefined): Float64Array | null =>
    rows.some((row) => of(row) !== undefined)
      ? Float64Array.from(rows, (row) => of(row) ?? Number.NaN)
      : null;
  return {
    times_s: Float64Array.from(rows, (_, i) => 100 + i / 10),
    readings: {
      current_a: Float64Array.from(rows, (row) => row.current_a),
      voltage_v: Float64Array.from(rows, (row) => row.voltage_v ?? 25),
      wire_feed_m_min: null,
      travel_mm_s: column((row) => row.travel_mm_s),
      gas_l_min: column((row) => row.gas_l_min),
    },
    interpass_c: column((row) => row.interpass_c),
  };
}

const off = (count: number): Row[] =>
  Array.from({ length: count }, () => ({ current_a: 0, voltage_v: 0, travel_mm_s: 5 }));
const burn = (count: number, changes: Partial<Row> = {}): Row[] =>
  Array.from({ length: count }, () => ({ current_a: 200, voltage_v: 25, travel_mm_s: 5, ...changes }));

function reduced(log: PassLog, context: Partial<PassContext> = {}): PassResult {
  const outcome = reducePass(log, { process: "135", ...context });
  if (!outcome.ok) throw new Error(outcome.faults[0]?.detail);
  return outcome.value;
}

const ranges = (changes: Partial<ProcedureRanges> = {}): ProcedureRanges => ({
  current_a: null,
  voltage_v: null,
  wire_feed_m_min: null,
  travel_mm_s: null,
  gas_l_min: null,
  heat_input_kj_mm: null,
  interpass_c: null,
  ...changes,
});

describe("reducing a weld log", () => {
  const log = aLog([...off(5), ...burn(11), ...off(10), ...burn(21), ...off(3)]);
  const result = reduced(log);

  test("counts times from the log's first sample", () => {
    expect(result.duration_s).toBeCloseTo(4.9, 9);
    expect(result.samples).toBe(50);
    expect(result.sample_interval_s).toBeCloseTo(0.1, 9);
    expect(result.intervals).toHaveLength(2);
    expect(result.intervals[0]?.start_s).toBeCloseTo(0.5, 9);
    expect(result.intervals[0]?.end_s).toBeCloseTo(1.5, 9);
    expect(result.arc_on_s).toBeCloseTo(3, 9);
  });

  test("names each restart with how long the arc was out and where", () => {
    expect(result.restarts).toHaveLength(1);
    const [restart] = result.restarts;
    expect(restart?.at_s).toBeCloseTo(2.6, 9);
    expect(restart?.off_s).toBeCloseTo(1.1, 9);
    expect(restart?.station_mm).toBeCloseTo(5, 9);
  });

  test("takes means and length over the arc time only", () => {
    expect(result.statistics.current_a?.mean).toBeCloseTo(200, 9);
    expect(result.statistics.current_a?.sd).toBeCloseTo(0, 9);
    expect(result.length_mm).toBeCloseTo(15, 9);
    expect(result.length_source).toBe("travel");
    expect(result.heat_input_kj_mm).toBeCloseTo((0.8 * 200 * 25) / 5 / 1000, 9);
    expect(result.statistics.gas_l_min).toBeNull();
  });

  test("fits its schema, also without travel, ranges or a known process", () => {
    expect(PassResult.safeParse(result).error).toBeUndefined();
    const bare = reduced(aLog([{ current_a: 200 }, { current_a: 201 }, { current_a: 199 }]), {
      process: "52",
    });
    expect(PassResult.safeParse(bare).error).toBeUndefined();
    expect(bare).toMatchObject({
      length_mm: null,
      heat_input_kj_mm: null,
      arc_efficiency_k: null,
      judgement: null,
    });
  });

  test("keeps stations level while the arc is out", () => {
    const stations_mm = result.series.station_mm ?? [];
    expect(stations_mm[0]).toBe(0);
    expect(stations_mm[20]).toBe(5);
    expect(stations_mm.at(-1)).toBe(15);
  });

  test("uses the seam's length where the log has no travel speed", () => {
    const rows = Array.from({ length: 101 }, () => ({ current_a: 250, voltage_v: 28 }));
    const result = reduced(aLog(rows), { seam_length_mm: 60 });
    expect(result.length_source).toBe("seam");
    expect(result.heat_input_kj_mm).toBeCloseTo((0.8 * 250 * 28 * 10) / 60 / 1000, 9);
    expect(result.restarts).toEqual([]);
  });

  test("gives no heat input when the torch did not move", () => {
    expect(reduced(aLog(burn(20, { travel_mm_s: 0 }))).heat_input_kj_mm).toBeNull();
  });

  test("takes the workpiece temperature last read before the arc", () => {
    const rows = [...off(3), ...burn(20, { interpass_c: 300 })];
    rows[1] = { ...rows[1]!, interpass_c: 118 };
    rows[3] = { ...rows[3]!, interpass_c: Number.NaN };
    expect(reduced(aLog(rows)).interpass_c).toBe(118);
  });

  test("weighs time, not samples", () => {
    const log: PassLog = {
      times_s: Float64Array.of(0, 0.01, 0.02, 0.03, 1.03),
      readings: {
        current_a: Float64Array.of(100, 100, 100, 100, 300),
        voltage_v: new Float64Array(5).fill(20),
        wire_feed_m_min: null,
        travel_mm_s: null,
        gas_l_min: null,
      },
      interpass_c: null,
    };
    expect(reduced(log).statistics.current_a?.mean).toBeCloseTo((0.03 * 100 + 1 * 200) / 1.03, 9);
  });

  test("refuses a log in which no arc burned, saying how far the current went", () => {
    const outcome = reducePass(aLog(off(20)), { process: "135" });
    expect(outcome.ok ? undefined : outcome.faults).toEqual([
      {
        code: "log-no-arc",
        detail: "The current never stayed at 15 A or more for 0.1 s; its highest value is 0 A.",
        field: "current_a",
      },
    ]);
  });

  test("refuses a seam of no length as a mistake of the caller", () => {
    expect(() => reducePass(aLog(burn(20)), { process: "135", seam_length_mm: 0 })).toThrow(RangeError);
  });
});

describe("judging a pass", () => {
  test("is inside when every mean is inside and little time is outside", () => {
    const log = aLog([...burn(100), ...burn(1, { current_a: 300 }), ...burn(100)]);
    const { judgement, statistics } = reduced(log, { ranges: ranges({ current_a: { min: 180, max: 220 } }) });
    expect(judgement).toEqual({ verdict: "inside", reasons: [] });
    // One sample above: up from 200 to 300 and down again, above 220 for four fifths of 0.2 s of 20 s.
    expect(statistics.current_a?.share_outside).toBeCloseTo((0.8 * 0.2) / 20, 9);
  });

  test("takes the ends of a range as allowed", () => {
    const limits = ranges({ current_a: { min: 200, max: 200 }, voltage_v: { min: 25, max: 30 } });
    const { judgement, statistics } = reduced(aLog(burn(50)), { ranges: limits });
    expect(judgement?.verdict).toBe("inside");
    expect(statistics.current_a?.share_outside).toBe(0);
  });

  test("is outside when a mean is, with the reason in words", () => {
    const limits = ranges({ current_a: { min: 220, max: 280 }, heat_input_kj_mm: { min: 1, max: 1.4 } });
    const { judgement } = reduced(aLog(burn(50)), { ranges: limits });
    expect(judgement?.verdict).toBe("outside");
    expect(judgement?.reasons.map((reason) => reason.detail)).toEqual([
      "Current was on average 200 A, outside 220 to 280 A.",
      "Heat input was 0.8 kJ/mm, outside 1 to 1.4 kJ/mm.",
    ]);
  });

  test("is doubtful when the mean is inside but much of the time is not", () => {
    const log = aLog([...burn(50, { voltage_v: 24 }), ...burn(50, { voltage_v: 28 })]);
    const { judgement } = reduced(log, { ranges: ranges({ voltage_v: { min: 25, max: 27 } }) });
    expect(judgement?.verdict).toBe("doubtful");
    expect(judgement?.reasons[0]).toMatchObject({ quantity: "voltage_v", kind: "time-outside" });
    expect(judgement?.reasons[0]?.detail).toContain("% of the arc time");
  });

  test("is doubtful when the procedure limits what the log does not say", () => {
    const limits = ranges({ gas_l_min: { min: 15, max: 20 }, interpass_c: { min: 20, max: 250 } });
    const { judgement } = reduced(aLog(burn(50)), { ranges: limits });
    expect(judgement?.verdict).toBe("doubtful");
    expect(judgement?.reasons.map((reason) => reason.quantity)).toEqual(["gas_l_min", "interpass_c"]);
    expect(judgement?.reasons[0]).toMatchObject({ kind: "not-measured", value: null });
  });

  test("is doubtful when only the power of each sample puts the heat input outside", () => {
    const rows = Array.from({ length: 200 }, (_, i) =>
      i % 2 === 0
        ? { current_a: 400, voltage_v: 30, travel_mm_s: 10 }
        : { current_a: 50, voltage_v: 20, travel_mm_s: 10 },
    );
    const { judgement } = reduced(aLog(rows), {
      ranges: ranges({ heat_input_kj_mm: { min: 0.3, max: 0.5 } }),
    });
    expect(judgement?.verdict).toBe("doubtful");
    expect(judgement?.reasons[0]?.kind).toBe("methods-disagree");
  });
});

describe("the series for plotting", () => {
  test("stays at 600 buckets and loses no spike", () => {
    const rows = burn(20_000);
    rows[12_345] = { ...rows[12_345]!, current_a: 431 };
    rows[12_346] = { ...rows[12_346]!, current_a: 12 };
    const { series } = reduced(aLog(rows));
    expect(series.time_s).toHaveLength(600);
    expect(series.current_a?.max).toHaveLength(600);
    expect(Math.max(...(series.current_a?.max ?? []).map(Number))).toBe(431);
    expect(Math.min(...(series.current_a?.min ?? []).map(Number))).toBe(12);
    expect(series.wire_feed_m_min).toBeNull();
    expect(JSON.stringify(series).length).toBeLessThan(60_000);
  });

  test("has null where a quantity was not read", () => {
    const rows = burn(20);
    rows[3] = { ...rows[3]!, gas_l_min: 17 };
    const { series } = reduced(aLog(rows));
    expect(series.gas_l_min?.min.filter((value) => value !== null)).toEqual([17]);
    expect(series.gas_l_min?.max[0]).toBeNull();
  });
});
