import { describe, expect, it } from "vitest";
import { StationResult } from "../schemas/scan-result.ts";
import { DEFAULT_LIMITS } from "../schemas/seam-model.ts";
import { decodeStations, encodeStations } from "./station-codec.ts";
import { decodeStrip, encodeStrip, stripOf } from "./strip.ts";

const scale = {
  section: { plate_a: { thickness_mm: 10 }, plate_b: { thickness_mm: 10 }, gap_mm: 1 },
  limits: { ...DEFAULT_LIMITS.adapt, lateral_mm: 2, gap_mm: 1 },
  length_mm: 100,
};
const at = (station_mm: number, lateral_mm: number, more: Partial<StationResult> = {}): StationResult => ({
  station_mm,
  measured: true,
  lateral_mm,
  ...more,
});

describe("a bead strip", () => {
  it("shows in each bin the worst share of the limit, signed as the lateral deviation", () => {
    expect(stripOf([at(5, 0.2), at(15, -1), at(60, 0.4), at(70, -0.1)], scale, 2)).toEqual([-0.5, 0.2]);
  });

  it("counts a gap by its departure from the nominal gap", () => {
    expect(stripOf([at(5, 0.1, { gap_mm: 1.9 })], scale, 1)).toEqual([0.9]);
  });

  it("leaves a bin empty when one of its stations was not measured", () => {
    const blind: StationResult = { station_mm: 20, measured: false, why: "no_points" };
    expect(stripOf([at(5, 0.2), blind, at(70, 0.2)], scale, 2)).toEqual([null, 0.1]);
  });

  it("comes back from its bytes", () => {
    const strip = [0.1, -0.5, null, 1.3, 9];
    expect(decodeStrip(encodeStrip(strip))).toEqual([0.1, -0.5, null, 1.3, 2.54]);
  });
});

describe("stored stations", () => {
  it("come back as they were, to four decimals", () => {
    const stations: StationResult[] = [
      at(0, 0.12345678, { u_lateral_mm: 0.0123, root_mm: [1.5, -2.25, 0.1], tack: true, points_a: 120 }),
      { station_mm: 2, measured: false, why: "few_points_b" },
    ];
    expect(decodeStations(encodeStations(stations), StationResult)).toEqual([
      { ...stations[0], lateral_mm: 0.1235 },
      stations[1],
    ]);
  });

  it("are refused when their version is another", () => {
    const bytes = encodeStations([at(0, 1)]);
    const changed = Uint8Array.from(bytes);
    changed[changed.indexOf("1".charCodeAt(0), 4)] = "7".charCodeAt(0);
    expect(() => decodeStations(changed, StationResult)).toThrow(/version/);
  });
});
