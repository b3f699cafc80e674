import { describe, expect, it } from "vitest";
import type { JointAt } from "../joints/construct-root.ts";
import type { SliceOutcome } from "../section/measure-slice.ts";
import type { SeenGap } from "../section/seen-gap.ts";
import { gapOfButt, gapOfMeeting } from "./gap-series.ts";

const zero: JointAt = {
  lateral_mm: 0,
  normal_mm: 0,
  gap_mm: Number.NaN,
  mismatch_mm: Number.NaN,
  angle_rad: 0,
  turn_a_rad: 0,
  turn_b_rad: 0,
};

/** A slice whose gap is `chain` by the plate's size and `seen` by its edge. */
const slice = (chain: number, seen: SeenGap | null = null): SliceOutcome => ({
  found: true,
  result: {
    fits: [],
    at: { ...zero, gap_mm: chain },
    u: { ...zero, gap_mm: 0.02 },
    seen_gap: seen,
    tack: seen === null,
  },
});
const open = (gap_mm: number): SeenGap => ({ gap_mm, u_mm: 0.03, is_open: true, begins_mm: gap_mm + 0.05 });
const closed = (begins_mm: number): SeenGap => ({
  gap_mm: begins_mm / 2,
  u_mm: begins_mm / Math.sqrt(12),
  is_open: false,
  begins_mm,
});
const blind: SliceOutcome = { found: false, why: "few_points_a" };

/** Small even scatter: -0.02, 0, 0.02 by turns. */
const ripple = (i: number) => 0.02 * ((i % 3) - 1);
const times = (count: number, make: (i: number) => SliceOutcome) =>
  Array.from({ length: count }, (_, i) => make(i));

describe("gap by a plate's far corner", () => {
  it("is the chain's, where the seen edge bears it out", () => {
    const found = gapOfMeeting(times(20, (i) => slice(0.5 + ripple(i), open(0.55))));
    expect(found.size_departure_mm).toBe(0);
    expect(found.values[3]).toBeCloseTo(0.48, 12);
    expect(found.u[3]).toBe(0.02);
    expect(found.floor_u).toBeNull();
  });

  it("is the edge's, where all slices together show the plate thicker than the model says", () => {
    const found = gapOfMeeting(times(20, (i) => slice(1.2 + ripple(i), open(0.5 + ripple(i)))));
    expect(found.size_departure_mm).toBeCloseTo(0.7, 9);
    for (const [i, value] of found.values.entries()) expect(value).toBeCloseTo(0.5 + ripple(i), 9);
  });

  it("is the edge's, where they show it thinner", () => {
    const found = gapOfMeeting(times(20, (i) => slice(ripple(i) - 0.2, open(0.5))));
    expect(found.size_departure_mm).toBeCloseTo(-0.7, 1);
    expect(found.values[1]).toBeCloseTo(0.5, 1);
  });

  it("trusts the size to 0.3 mm, and against fewer than eight slices", () => {
    expect(gapOfMeeting(times(20, () => slice(0.5, open(0.78)))).size_departure_mm).toBe(0);
    expect(gapOfMeeting(times(20, () => slice(0.5, open(0.82)))).size_departure_mm).toBeCloseTo(-0.32, 9);
    const few = times(20, (i) => slice(1.2, i < 7 ? open(0.5) : null));
    expect(gapOfMeeting(few).size_departure_mm).toBe(0);
    const enough = times(20, (i) => slice(1.2, i < 8 ? open(0.5) : null));
    expect(gapOfMeeting(enough).size_departure_mm).toBeCloseTo(0.7, 9);
  });

  it("trusts the size against edges that scatter too widely to say", () => {
    const wild = times(9, (i) => slice(0.5, open(1 + 1.2 * ((i % 3) - 1))));
    expect(gapOfMeeting(wild).size_departure_mm).toBe(0);
  });

  it("takes the edge of a closed joint as an upper bound only", () => {
    const below = gapOfMeeting(times(20, () => slice(0.1, closed(0.6))));
    expect(below.size_departure_mm).toBe(0);
    const above = gapOfMeeting(times(20, () => slice(0.9, closed(0.2))));
    expect(above.size_departure_mm).toBeCloseTo(0.7, 9);
    expect(above.values[0]).toBeCloseTo(0.2, 9);
  });

  it("stays where the edge is covered: under a tack the corner is still seen", () => {
    const found = gapOfMeeting(times(20, (i) => slice(0.5, i > 5 && i < 12 ? null : open(0.5))));
    expect(found.values[8]).toBeCloseTo(0.5, 12);
  });

  it("is none of a slice that was not found", () => {
    const found = gapOfMeeting(times(20, (i) => (i === 4 ? blind : slice(0.5, open(0.5)))));
    expect(found.values[4]).toBeNaN();
    expect(found.values[5]).toBeCloseTo(0.5, 12);
  });
});

describe("gap by its edge, where no far corner is seen", () => {
  it("is what the edge shows, with a part that does not average out", () => {
    const found = gapOfMeeting(times(20, () => slice(Number.NaN, open(0.4))));
    expect(found.values[3]).toBe(0.4);
    expect(found.u[3]).toBe(0.03);
    expect(found.floor_u?.[3]).toBeCloseTo(0.05, 12);
    expect(found.size_departure_mm).toBe(0);
  });

  it("of a closed joint is as unsure however many slices show it", () => {
    const found = gapOfMeeting(times(20, () => slice(Number.NaN, closed(0.3))));
    expect(found.values[3]).toBeCloseTo(0.15, 12);
    expect(found.floor_u?.[3]).toBeCloseTo(Math.hypot(0.05, 0.3 / Math.sqrt(12)), 12);
  });

  it("is none where it is seen much later than on both sides, but stays where it is seen earlier", () => {
    const at = (gap: number) =>
      gapOfMeeting(times(20, (i) => slice(Number.NaN, open(i === 10 ? gap : 0.4)))).values[10];
    expect(at(0.9)).toBeNaN();
    expect(at(0.1)).toBe(0.1);
    expect(at(0.5)).toBe(0.5);
  });

  it("keeps a step", () => {
    const found = gapOfMeeting(times(20, (i) => slice(Number.NaN, open(i < 10 ? 0.1 : 1.4))));
    expect(Array.from(found.values)).not.toContain(Number.NaN);
  });

  it("is none under a tack", () => {
    const found = gapOfMeeting(times(20, (i) => slice(Number.NaN, i === 10 ? null : open(0.4))));
    expect(found.values[10]).toBeNaN();
  });

  it("serves where less than half of the slices show a corner", () => {
    const found = gapOfMeeting(times(20, (i) => slice(i < 9 ? 0.9 : Number.NaN, open(0.4))));
    expect(found.values[0]).toBe(0.4);
  });
});

describe("gap of a butt joint", () => {
  it("is the distance of its root edges, as each slice constructs it", () => {
    const found = gapOfButt([slice(1.6), blind, slice(2.1)]);
    expect(Array.from(found.values)).toEqual([1.6, Number.NaN, 2.1]);
    expect(found.floor_u).toBeNull();
  });

  it("is none of no slices", () => {
    expect(gapOfButt([]).values.length).toBe(0);
    expect(gapOfMeeting([])).toMatchObject({ size_departure_mm: 0 });
  });
});
