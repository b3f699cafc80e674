import { describe, expect, it } from "vitest";
import type { StationResult } from "../../schemas/scan-result.ts";
import { JUDGED, type JudgedQuantity } from "./judged-quantities.ts";
import { reasonFor } from "./reason.ts";

const quantity = (check: JudgedQuantity["check"]): JudgedQuantity => {
  const found = JUDGED.find((one) => one.check === check);
  if (!found) throw new Error(check);
  return found;
};
const [lateral, gap, angle] = [quantity("lateral"), quantity("gap"), quantity("angle")];

/** Stations a millimetre apart with lateral deviations and one uncertainty. */
const stations = (laterals: readonly (number | null)[], u_lateral_mm = 0.05): StationResult[] =>
  laterals.map((lateral_mm, station_mm) =>
    lateral_mm === null
      ? { station_mm, measured: false }
      : { station_mm, measured: true, lateral_mm, u_lateral_mm },
  );
const at = (limit: number, nominal = 0) => ({ level: "within" as const, limit, nominal });

describe("a reason", () => {
  it("is none where every station is proved inside, or none was measured", () => {
    expect(reasonFor(stations([0, 0.2, -0.4]), lateral, at(0.5))).toBeNull();
    expect(reasonFor(stations([null, null]), lateral, at(0.5))).toBeNull();
    expect(reasonFor([], lateral, at(0.5))).toBeNull();
  });

  it("says by how much and where, in the words of its proof", () => {
    const text = (laterals: number[], u?: number) => reasonFor(stations(laterals, u), lateral, at(0.5))?.text;
    expect(text([0, 0.8, 0.1])).toBe("Lateral deviation 0.80 mm at 1 mm: beyond 0.50 mm");
    expect(text([0, 0.1, -0.45])).toBe(
      "Lateral deviation -0.45 mm at 2 mm: too near -0.50 mm to say, uncertainty 0.10 mm",
    );
    expect(text([0.1, 0.2], 0.3)).toBe(
      "Lateral deviation 0.20 mm at 1 mm: the scan is too coarse to prove 0.50 mm, uncertainty 0.60 mm",
    );
  });

  it("says degrees for angles and places to a tenth of a millimetre", () => {
    const turned: StationResult[] = [
      { station_mm: 12.345, measured: true, angle_deg: -4.5, u_angle_deg: 0.2 },
    ];
    expect(reasonFor(turned, angle, at(3))?.text).toBe("Angle deviation -4.50° at 12.3 mm: beyond -3.00°");
  });

  it("names the side of the nominal size that was crossed, and the value as measured", () => {
    const gaps = (gap_mm: number): StationResult[] => [
      { station_mm: 0, measured: true, gap_mm, u_gap_mm: 0.02 },
    ];
    expect(reasonFor(gaps(2.8), gap, at(0.5, 2))).toMatchObject({ value: 2.8, limit: 2.5, proof: "outside" });
    expect(reasonFor(gaps(1.2), gap, at(0.5, 2))).toMatchObject({ value: 1.2, limit: 1.5, proof: "outside" });
    expect(reasonFor(gaps(2.3), gap, at(0.5, 2))).toBeNull();
  });

  it("is of the worst proof first, then of the largest departure", () => {
    // The largest is only not proven, a smaller one with its own small uncertainty is outside.
    const mixed: StationResult[] = [
      { station_mm: 0, measured: true, lateral_mm: 0.9, u_lateral_mm: 0.24 },
      { station_mm: 1, measured: true, lateral_mm: -0.7, u_lateral_mm: 0.02 },
      { station_mm: 2, measured: true, lateral_mm: 0.65, u_lateral_mm: 0.02 },
      { station_mm: 3, measured: true, lateral_mm: 0.1, u_lateral_mm: 0.3 },
    ];
    expect(reasonFor(mixed, lateral, at(0.5))).toMatchObject({
      station_mm: 1,
      proof: "outside",
      limit: -0.5,
    });
    expect(reasonFor([mixed[0]!, mixed[3]!], lateral, at(0.5))).toMatchObject({
      station_mm: 3,
      proof: "too_coarse",
    });
  });

  it("reaches over the unbroken stretch of stations that fail", () => {
    const bad = [0, 0.8, 0, 0.7, 0.9, 0.7, null, 0.7];
    expect(reasonFor(stations(bad), lateral, at(0.5))).toMatchObject({ station_mm: 4, from_mm: 3, to_mm: 5 });
    expect(reasonFor(stations([0.9, 0.9, 0.9]), lateral, at(0.5))).toMatchObject({ from_mm: 0, to_mm: 2 });
  });

  it("takes a station without a stated uncertainty as known exactly", () => {
    const bare: StationResult[] = [{ station_mm: 0, measured: true, lateral_mm: 0.5 }];
    expect(reasonFor(bare, lateral, at(0.5))).toBeNull();
    expect(reasonFor(bare, lateral, at(0.4))).toMatchObject({ proof: "outside", expanded_u: 0 });
  });

  it("is written with four decimals and no minus nought", () => {
    const found = reasonFor(stations([0.7777777], 0.0123456), lateral, at(0.5));
    expect([found?.value, found?.expanded_u]).toEqual([0.7778, 0.0247]);
    const open: StationResult[] = [{ station_mm: 0, measured: true, gap_mm: 0, u_gap_mm: 0.01 }];
    expect(Object.is(reasonFor(open, gap, at(0.5, 0.6))?.value, 0)).toBe(true);
  });
});

describe("judged quantities", () => {
  it("are every one with its own unit, limit and station's numbers", () => {
    const station: StationResult = {
      station_mm: 0,
      measured: true,
      lateral_mm: 1,
      normal_mm: 2,
      gap_mm: 3,
      mismatch_mm: 4,
      angle_deg: 5,
      u_lateral_mm: 0.1,
      u_normal_mm: 0.2,
      u_gap_mm: 0.3,
      u_mismatch_mm: 0.4,
      u_angle_deg: 0.5,
    };
    const limits = { lateral_mm: 10, normal_mm: 20, gap_mm: 30, mismatch_mm: 40, angle_deg: 50 };
    expect(
      JUDGED.map((one) => [one.check, one.unit, one.value(station), one.u(station), one.limitOf(limits)]),
    ).toEqual([
      ["lateral", "mm", 1, 0.1, 10],
      ["normal", "mm", 2, 0.2, 20],
      ["gap", "mm", 3, 0.3, 30],
      ["mismatch", "mm", 4, 0.4, 40],
      ["angle", "deg", 5, 0.5, 50],
    ]);
  });

  it("count gap and mismatch from the model's nominal sizes, nothing else", () => {
    const section = {
      plate_a: { thickness_mm: 5 },
      plate_b: { thickness_mm: 5 },
      gap_mm: 2,
      mismatch_mm: -1,
    };
    expect(JUDGED.map((one) => one.nominalOf(section))).toEqual([0, 0, 2, -1, 0]);
    expect(JUDGED.map((one) => one.nominalOf({ ...section, gap_mm: undefined, mismatch_mm: null }))).toEqual([
      0, 0, 0, 0, 0,
    ]);
  });
});
