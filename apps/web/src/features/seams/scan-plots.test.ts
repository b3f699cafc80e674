import type { ScanResult, StationResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { describe, expect, it } from "vitest";
import { scanPlots, scanRipples } from "./scan-plots.ts";

const model = {
  joint_type: "fillet_t",
  seam: { length_mm: 4, vertices: [] },
  section: { plate_a: { thickness_mm: 10 }, plate_b: { thickness_mm: 6 }, gap_mm: 0.5 },
  limits: { within: { lateral_mm: 0.8, gap_mm: 0.6 }, adapt: { lateral_mm: 3, gap_mm: 1.5 } },
} satisfies SeamModel;

const stations: StationResult[] = [
  { station_mm: 0, measured: true, lateral_mm: -1.5, normal_mm: 0.1, gap_mm: 0.4, u_lateral_mm: 0.02 },
  { station_mm: 2, measured: false, why: "no_points" },
  { station_mm: 4, measured: true, lateral_mm: 0.3, normal_mm: 0, gap_mm: 1.9 },
];
// Only the stations are read.
const result = { stations } as ScanResult;

describe("the plots of a scan", () => {
  it("leave out a quantity that the joint does not have", () => {
    expect(scanPlots(result, model).map((plot) => plot.id)).toEqual(["lateral_mm", "normal_mm", "gap_mm"]);
  });

  it("have a gap where a station was not measured, and twice the standard uncertainty", () => {
    const [lateral] = scanPlots(result, model);
    expect(lateral?.values).toEqual([-1.5, null, 0.3]);
    expect(lateral?.expanded_u).toEqual([0.04, null, null]);
  });

  it("stand between the limits the scan was judged by, a gap's around its nominal and never below nothing", () => {
    const plots = scanPlots(result, model);
    expect(plots[0]?.bands?.map(({ kind, low, high }) => [kind, low, high])).toEqual([
      ["adapt", -3, 3],
      ["within", -0.8, 0.8],
    ]);
    expect(plots[2]?.bands?.map(({ low, high }) => [low, high])).toEqual([
      [0, 2],
      [0, 1.1],
    ]);
  });
});

describe("the ripples of a scan", () => {
  it("are as large as the worst quantity's share of the adapt limit, and lean as the lateral deviation", () => {
    const ripples = scanRipples(result, model);
    expect(ripples[0]).toMatchObject({ measured: true, share: 0.5, deviation: -1.5 });
    expect(ripples[1]).toEqual({ station_mm: 2, measured: false });
    expect(ripples[2]?.share).toBeCloseTo(1.4 / 1.5, 10);
  });
});
