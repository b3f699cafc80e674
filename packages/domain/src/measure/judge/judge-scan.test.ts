import { describe, expect, it } from "vitest";
import type { StationResult } from "../../schemas/scan-result.ts";
import { coverageOf, summaryOf } from "../result/summary.ts";
import { straightModel } from "../testing/models.ts";
import { judgeScan } from "./judge-scan.ts";

const model = straightModel(100, 10, {
  limits: {
    within: { lateral_mm: 0.5, gap_mm: 0.5 },
    adapt: { lateral_mm: 2, gap_mm: 1 },
    coverage_share: 0.9,
    longest_blind_mm: 15,
  },
});

const station = (station_mm: number, lateral_mm = 0, more: Partial<StationResult> = {}): StationResult => ({
  station_mm,
  measured: true,
  lateral_mm,
  normal_mm: 0,
  angle_deg: 0,
  u_lateral_mm: 0.05,
  u_normal_mm: 0.05,
  u_angle_deg: 0.1,
  ...more,
});
const blind = (station_mm: number): StationResult => ({ station_mm, measured: false, why: "few_points_b" });
const places = Array.from({ length: 11 }, (_, i) => i * 10);
const judge = (stations: StationResult[]) => judgeScan(model, stations, coverageOf(stations));

describe("verdict", () => {
  it("is within where every deviation is proved inside the inner limits", () => {
    expect(judge(places.map((s) => station(s, 0.3)))).toEqual({ verdict: "within", reasons: [] });
  });

  it("is adapt beyond the inner limits, with the worst station and its stretch", () => {
    const { verdict, reasons } = judge(
      places.map((s) => station(s, s >= 40 && s <= 60 ? 0.8 + s / 1000 : 0)),
    );
    expect(verdict).toBe("adapt");
    expect(reasons).toEqual([
      {
        check: "lateral",
        station_mm: 60,
        value: 0.86,
        limit: 0.5,
        unit: "mm",
        level: "within",
        proof: "outside",
        expanded_u: 0.1,
        from_mm: 40,
        to_mm: 60,
        text: "Lateral deviation 0.86 mm at 60 mm: beyond 0.50 mm",
      },
    ]);
  });

  it("is hold beyond the outer limits, on either side", () => {
    const { verdict, reasons } = judge(places.map((s) => station(s, s === 30 ? -2.4 : 0)));
    expect([verdict, reasons[0]?.limit, reasons[0]?.value]).toEqual(["hold", -2, -2.4]);
  });

  it("is hold where the outer limit is too near to say", () => {
    const { verdict, reasons } = judge(places.map((s) => station(s, s === 30 ? 1.95 : 0)));
    expect([verdict, reasons[0]?.proof, reasons[0]?.level]).toEqual(["hold", "not_proven", "adapt"]);
  });

  it("says that a scan is too coarse, not that the joint is bad", () => {
    const { reasons } = judge(places.map((s) => station(s, 0, { u_lateral_mm: 0.3 })));
    expect(reasons[0]?.proof).toBe("too_coarse");
  });

  it("judges a gap by its departure from the nominal one", () => {
    const wide = straightModel(100, 10, {
      section: { plate_a: { thickness_mm: 10 }, plate_b: { thickness_mm: 6 }, gap_mm: 2 },
      limits: { within: { gap_mm: 0.5 }, adapt: { gap_mm: 1 } },
    });
    const stations = places.map((s) => station(s, 0, { gap_mm: s === 50 ? 0.7 : 2.1, u_gap_mm: 0.02 }));
    const { verdict, reasons } = judgeScan(wide, stations, coverageOf(stations));
    expect([verdict, reasons[0]?.value, reasons[0]?.limit]).toEqual(["hold", 0.7, 1]);
  });

  it("is hold where too little was measured, saying what and why", () => {
    const { verdict, reasons } = judge(places.map((s) => (s >= 30 && s <= 50 ? blind(s) : station(s))));
    expect(verdict).toBe("hold");
    expect(reasons.map(({ unit, value }) => [unit, value])).toEqual([
      ["share", 0.7273],
      ["mm", 40],
    ]);
    expect(reasons[1]?.text).toMatch(/from 20 mm to 60 mm.*too few points lie on plate B/);
  });

  it("names what holds before what only adapts", () => {
    const { reasons } = judge(
      places.map((s) => station(s, 0.9, { gap_mm: s === 0 ? 1.4 : 0, u_gap_mm: 0.02 })),
    );
    expect(reasons.map(({ check, level }) => [check, level])).toEqual([
      ["gap", "adapt"],
      ["lateral", "within"],
    ]);
  });
});

describe("coverage", () => {
  it("counts blind stretches to the measured stations on both sides, and to the ends", () => {
    expect(coverageOf(places.map((s) => station(s)))).toEqual({ share: 1, longest_blind_mm: 0 });
    const torn = coverageOf([blind(0), blind(10), station(20), blind(30), station(40)]);
    expect(torn).toEqual({ share: 0.4, longest_blind_mm: 20, blind_from_mm: 0, blind_to_mm: 20 });
    expect(coverageOf([blind(0), blind(50)])).toMatchObject({ share: 0, longest_blind_mm: 50 });
    expect(coverageOf([station(0), blind(30)])).toMatchObject({ longest_blind_mm: 30, blind_from_mm: 0 });
  });
});

describe("summary", () => {
  it("gives the largest with its station, the root mean square and the 95th percentile by nearest rank", () => {
    const stations = Array.from({ length: 20 }, (_, i) => station(i, i === 7 ? -4 : 1));
    expect(summaryOf(stations).lateral_mm).toEqual({ max_abs: 4, at_mm: 7, rms: 1.3229, p95_abs: 1 });
    expect(summaryOf(stations).gap_mm).toBeUndefined();
    expect(summaryOf([blind(0)])).toEqual({});
  });
});
