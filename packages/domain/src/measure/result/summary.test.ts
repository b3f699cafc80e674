import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { StationResult } from "../../schemas/scan-result.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import type { MeasuredSeam } from "../seam/measure-seam.ts";
import type { SliceOutcome } from "../section/measure-slice.ts";
import { jointModel, SECTIONS } from "../testing/joints.ts";
import { endsOf } from "./ends.ts";
import { coverageOf, summaryOf } from "./summary.ts";

const seen = (station_mm: number, more: Partial<StationResult> = {}): StationResult => ({
  station_mm,
  measured: true,
  ...more,
});
const blind = (station_mm: number): StationResult => ({ station_mm, measured: false, why: "no_points" });

/** `x` measured, `.` blind, ten millimetres apart. */
const seam = (shown: string) => [...shown].map((one, i) => (one === "x" ? seen(10 * i) : blind(10 * i)));

describe("coverage", () => {
  it.each([
    ["xxxxx", 0],
    ["x.xxx", 20],
    ["x..x.x", 30],
    [".xxxx", 10],
    ["..xxx", 20],
    ["xxxx.", 10],
    ["xxx..", 20],
    ["..x..", 20],
    [".....", 40],
    ["x...x", 40],
    ["x", 0],
  ])("of %s: %d mm without a measured station", (shown, longest_blind_mm) => {
    expect(coverageOf(seam(shown)).longest_blind_mm).toBe(longest_blind_mm);
  });

  it("takes no long way between two measured stations for a blind one", () => {
    const uneven = [seen(0), blind(5), seen(10), seen(95), seen(100)];
    expect(coverageOf(uneven)).toEqual({
      share: 0.8,
      longest_blind_mm: 10,
      blind_from_mm: 0,
      blind_to_mm: 10,
    });
  });

  it("names the first of two stretches as long", () => {
    expect(coverageOf(seam("x.x.x"))).toMatchObject({ blind_from_mm: 0, blind_to_mm: 20 });
  });

  it("is nothing of no stations, and of one blind one has no length", () => {
    expect(coverageOf([])).toEqual({ share: 0, longest_blind_mm: 0 });
    expect(coverageOf([blind(5)])).toMatchObject({ share: 0, longest_blind_mm: 0 });
  });

  it("is the longest way between neighbours of which not both were measured, taken as runs", () => {
    fc.assert(
      fc.property(fc.array(fc.boolean(), { minLength: 1, maxLength: 60 }), (marks) => {
        const stations = marks.map((mark, i) => (mark ? seen(i) : blind(i)));
        const ends = [0, ...marks.flatMap((mark, i) => (mark ? [i] : [])), marks.length - 1];
        const longest = Math.max(
          0,
          ...ends.slice(1).map((to, k) => {
            const from = ends[k] ?? 0;
            const isBlind = marks.slice(from, to + 1).some((mark) => !mark);
            return isBlind ? to - from : 0;
          }),
        );
        expect(coverageOf(stations).longest_blind_mm).toBe(longest);
        expect(coverageOf(stations).share).toBeCloseTo(marks.filter(Boolean).length / marks.length, 12);
      }),
    );
  });
});

describe("summary", () => {
  it("takes each quantity from the stations that have it", () => {
    const summary = summaryOf([
      seen(0, { lateral_mm: 3, gap_mm: 0.5 }),
      blind(10),
      seen(20, { lateral_mm: -4 }),
      seen(30, { lateral_mm: 0, angle_deg: -2 }),
    ]);
    expect(summary).toEqual({
      lateral_mm: { max_abs: 4, at_mm: 20, rms: 2.8868, p95_abs: 4 },
      gap_mm: { max_abs: 0.5, at_mm: 0, rms: 0.5, p95_abs: 0.5 },
      angle_deg: { max_abs: 2, at_mm: 30, rms: 2, p95_abs: 2 },
    });
  });

  it("names the first of two as large", () => {
    expect(summaryOf([seen(0, { lateral_mm: 1 }), seen(10, { lateral_mm: -1 })]).lateral_mm?.at_mm).toBe(0);
  });

  it("gives the 95th percentile by nearest rank: the 95th of a hundred", () => {
    const hundred = Array.from({ length: 100 }, (_, i) => seen(i, { lateral_mm: (i * 37) % 100 }));
    expect(summaryOf(hundred).lateral_mm).toMatchObject({ p95_abs: 94, max_abs: 99 });
    expect(summaryOf(hundred.slice(0, 1)).lateral_mm?.p95_abs).toBe(0);
  });
});

const joint = jointFaces(jointModel("fillet_t", SECTIONS.fillet_t));
const nought = {
  lateral_mm: 0,
  normal_mm: 0,
  gap_mm: 0,
  mismatch_mm: 0,
  angle_rad: 0,
  turn_a_rad: 0,
  turn_b_rad: 0,
};
const found: SliceOutcome = {
  found: true,
  result: { fits: [], at: nought, u: nought, seen_gap: null, tack: false },
};
const unseen: SliceOutcome = { found: false, why: "few_points_b" };

/** Slices two millimetres apart from -6 mm on: `x` shows the joint, `.` does not. */
const sliced = (shown: string): MeasuredSeam => ({
  joint,
  outside: 0,
  outcomes: [...shown].map((one) => (one === "x" ? found : unseen)),
  slices: {
    count: shown.length,
    at_mm: Float64Array.from(shown, (_, i) => 2 * i - 6),
    starts: new Int32Array(shown.length + 1),
    l_mm: new Float64Array(0),
    n_mm: new Float64Array(0),
    pitch_mm: 2,
  },
});

describe("ends along the seam", () => {
  it("are seen where the scan runs on past them, half a pitch before the first slice that shows the joint", () => {
    expect(endsOf(sliced("...xxxxxxx...."))).toEqual({
      start_mm: -1,
      end_mm: 13,
      start_seen: true,
      end_seen: true,
    });
  });

  it("are the scan's own where it stops with the joint", () => {
    expect(endsOf(sliced("xxxxxxx"))).toEqual({
      start_mm: -6,
      end_mm: 6,
      start_seen: false,
      end_seen: false,
    });
  });

  it("are not believed of a single slice without the joint", () => {
    expect(endsOf(sliced(".xxxxxx."))).toMatchObject({
      start_mm: -4,
      end_mm: 6,
      start_seen: false,
      end_seen: false,
    });
    expect(endsOf(sliced("..xxxxxx.."))).toMatchObject({ start_seen: true, end_seen: true });
  });

  it("take a find alone beyond an end for chance", () => {
    expect(endsOf(sliced("x...xxxxxx..x"))).toMatchObject({ start_mm: 1, end_mm: 13 });
  });

  it("are not found inside: a blind stretch is no end", () => {
    expect(endsOf(sliced("xxx....xxx"))).toMatchObject({ start_mm: -6, end_mm: 12, start_seen: false });
  });

  it("are none where the joint is seen nowhere, or never twice running", () => {
    const none = { start_mm: null, end_mm: null, start_seen: false, end_seen: false };
    for (const shown of ["", ".", ".....", "x.x.x"]) expect(endsOf(sliced(shown))).toEqual(none);
  });

  it("are both at the one slice there is", () => {
    expect(endsOf({ ...sliced("x") })).toMatchObject({ start_mm: -6, end_mm: -6, start_seen: false });
  });
});
