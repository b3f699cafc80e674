import type { PassRecord } from "@beadroll/domain/schemas/pass";
import { describe, expect, it } from "vitest";
import { passPlots } from "./pass-plots.ts";

const pass = (station_mm: number[] | null) =>
  ({
    result: {
      series: {
        time_s: [0, 1],
        station_mm,
        current_a: { min: [240, 244], max: [250, null] },
        voltage_v: null,
        wire_feed_m_min: null,
        travel_mm_s: null,
        gas_l_min: null,
      },
      statistics: { current_a: { range: { min: 220, max: 280 } } },
    },
  }) as unknown as PassRecord;

describe("the plots of a pass", () => {
  it("stand at the torch's place, between the procedure's limits, with the spread around them", () => {
    const [current, ...others] = passPlots(pass([0, 6]));
    expect(others).toEqual([]);
    expect(current).toMatchObject({
      title: "Current",
      stations_mm: [0, 6],
      values: [245, null],
      bands: [{ low: 220, high: 280, word: "procedure" }],
    });
  });

  it("are none when nobody knows where along the seam the torch was", () => {
    expect(passPlots(pass(null))).toEqual([]);
  });
});
