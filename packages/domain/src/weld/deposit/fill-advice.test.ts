import { describe, expect, it } from "vitest";
import { straightModel } from "../../measure/testing/models.ts";
import type { ProcedureRanges } from "../../schemas/procedure.ts";
import { type FillInput, fillAdvice } from "./fill-advice.ts";

const ranges: ProcedureRanges = {
  current_a: { min: 220, max: 280 },
  voltage_v: { min: 26, max: 30 },
  wire_feed_m_min: null,
  travel_mm_s: { min: 5, max: 8 },
  gas_l_min: null,
  heat_input_kj_mm: { min: 0.8, max: 1.4 },
  interpass_c: null,
};
const gaps = (...sizes: number[]) => sizes.map((gap_mm, i) => ({ station_mm: i, measured: true, gap_mm }));
const input = (fields: Partial<FillInput>): FillInput => ({
  model: straightModel(10, 1),
  weld_size_mm: 6 / Math.SQRT2,
  process: "135",
  ranges,
  stations: gaps(0, 1.5),
  ...fields,
});

describe("fill advice", () => {
  it("of a fillet grows both legs by the gap: leg 6, gap 1.5 takes 18 + 10.125 mm² (geometry)", () => {
    const advice = fillAdvice(input({}));
    if (!advice.ok) throw new Error("refused");
    expect(advice.value.nominal_area_mm2).toBeCloseTo(18, 6);
    expect(advice.value.stations.map(({ area_mm2 }) => area_mm2)).toEqual([18, 28.125]);
    // Wire feed kept: the speed falls as the area grows.
    expect(advice.value.stations[1]?.travel_mm_s).toBeCloseTo((6.5 * 18) / 28.125, 3);
  });

  it("gives the heat input at that speed, k U I / v, and says where it leaves the procedure", () => {
    const advice = fillAdvice(input({}));
    if (!advice.ok) throw new Error("refused");
    const [closed, open] = advice.value.stations;
    expect(closed?.heat_input_kj_mm).toBeCloseTo((0.8 * 28 * 250) / 6.5 / 1000, 3);
    expect(open?.heat_input_kj_mm).toBeCloseTo((0.8 * 28 * 250) / ((6.5 * 18) / 28.125) / 1000, 3);
    expect([closed?.inside, open?.inside, advice.value.all_inside]).toEqual([true, false, false]);
  });

  it("of a V: 15 mm, gap 3, 60°, root face 1 takes 158.2 mm² without the bead over the plate (geometry)", () => {
    const model = straightModel(10, 1, {
      joint_type: "butt_v",
      section: {
        plate_a: { thickness_mm: 15 },
        plate_b: { thickness_mm: 15 },
        gap_mm: 3,
        groove_angle_deg: 60,
        root_face_mm: 1,
      },
    });
    const advice = fillAdvice(input({ model, weld_size_mm: 15, stations: gaps(3, 4) }));
    if (!advice.ok) throw new Error("refused");
    expect(advice.value.nominal_area_mm2).toBeCloseTo(3 * 15 + 14 ** 2 * Math.tan(Math.PI / 6), 3);
    expect(advice.value.stations[1]?.area_mm2).toBeCloseTo(advice.value.nominal_area_mm2 + 15, 3);
  });

  it("leaves out stations without a gap, and wants a travel speed", () => {
    const advice = fillAdvice(input({ stations: [{ station_mm: 0, measured: false }, ...gaps(0.2)] }));
    expect(advice.ok && advice.value.stations).toHaveLength(1);
    const refused = fillAdvice(input({ ranges: { ...ranges, travel_mm_s: null } }));
    expect(refused.ok ? "" : refused.faults[0]?.code).toBe("procedure-incomplete");
  });
});
