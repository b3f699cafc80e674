import { describe, expect, test } from "vitest";
import { type WeldCheck, weldCheck, weldChecks } from "../../../vectors/weld/checks.ts";
import {
  filletArea,
  filletLeg,
  filletThroat,
  gapExtraArea,
  throatDespiteGap,
  throatOfArea,
} from "./fillet.ts";
import { vGrooveFill } from "./groove.ts";
import {
  DEPOSITION_SHARES,
  depositedArea,
  depositionRate,
  massPerLength,
  travelForArea,
  wireLengthPerMass,
} from "./wire.ts";

const MM_PER_INCH = 25.4;
const KG_PER_LB = 0.453_592_37;
const G_CM3_PER_LB_IN3 = (KG_PER_LB * 1000) / (MM_PER_INCH / 10) ** 3;

function expectClose(value: number, check: WeldCheck): void {
  expect(Math.abs(value - check.number()), `${check.title}: got ${value}`).toBeLessThanOrEqual(
    check.tolerance,
  );
}
const titled = (...prefixes: string[]) =>
  weldChecks(...prefixes).map((check) => [check.title, check] as const);
const square = { gap_mm: 0, included_angle_deg: 0, root_face_mm: 0, reinforcement_mm: 0 };

describe("fillet welds", () => {
  test.each(titled("F-z-"))("%s", (_, check) => {
    expectClose(filletLeg(check.input("throat_a_mm")), check);
    expect(filletThroat(check.number(), check.number())).toBeCloseTo(check.input("throat_a_mm"), 5);
  });

  test.each(titled("F-kgm-"))("%s", (_, check) => {
    const area_mm2 = filletArea(check.input("leg_mm"), check.input("leg_mm"));
    expectClose(massPerLength(area_mm2, check.input("density_g_per_cm3")), check);
  });

  test(weldCheck("F-lbft").title, () => {
    const check = weldCheck("F-lbft");
    const leg_mm = check.input("leg_in") * MM_PER_INCH;
    const kg_m = massPerLength(
      filletArea(leg_mm, leg_mm),
      check.input("density_lb_per_in3") * G_CM3_PER_LB_IN3,
    );
    expectClose((kg_m / KG_PER_LB) * (12 * MM_PER_INCH) * 1e-3, check);
  });

  test("F-gap: a gap asks for more metal, or leaves less throat", () => {
    expectClose(gapExtraArea(6, 1.5), weldCheck("F-gap-extra"));
    expectClose(throatDespiteGap(6, 1.5), weldCheck("F-gap-throat"));
    expect(filletArea(7.5, 7.5) - filletArea(6, 6)).toBeCloseTo(gapExtraArea(6, 1.5), 12);
    expect(throatDespiteGap(6, 7)).toBe(0);
  });

  test("unequal legs: the throat is the height of the triangle over its face", () => {
    expect(filletThroat(3, 4)).toBeCloseTo(2.4, 12);
    expect(filletArea(3, 4)).toBe(6);
    expect(filletThroat(0, 0)).toBe(0);
  });

  test("a negative size is refused", () => {
    expect(() => filletThroat(-1, 4)).toThrow(/leg1_mm/);
    expect(() => filletLeg(Number.NaN)).toThrow(RangeError);
    expect(() => gapExtraArea(6, -0.1)).toThrow(/gap_mm/);
  });
});

describe("grooves", () => {
  test.each(titled("F-tri-"))("%s", (_, check) => {
    // One bevel is half of a V whose included angle is twice the bevel's.
    const thickness_mm = check.input("thickness_mm");
    const fill = vGrooveFill({
      ...square,
      thickness_mm,
      included_angle_deg: 2 * check.input("bevel_angle_deg"),
    });
    expectClose(massPerLength(fill.bevels_mm2 / 2, check.input("density_g_per_cm3")), check);
  });

  test.each(titled("F-rect-"))("%s", (_, check) => {
    const fill = vGrooveFill({
      ...square,
      thickness_mm: check.input("thickness_mm"),
      gap_mm: check.input("gap_mm"),
    });
    expectClose(massPerLength(fill.gap_mm2, check.input("density_g_per_cm3")), check);
  });

  test.each(titled("F-reinf-"))("%s", (_, check) => {
    const reinforcement_mm = check.input("height_mm");
    const fill = vGrooveFill({
      ...square,
      thickness_mm: 10,
      gap_mm: check.input("width_mm"),
      reinforcement_mm,
    });
    expectClose(massPerLength(fill.reinforcement_mm2, check.input("density_g_per_cm3")), check);
  });

  test.each(titled("F-V-sum", "F-V-15"))("%s", (_, check) => {
    const fill = vGrooveFill({
      thickness_mm: check.input("thickness_mm"),
      gap_mm: check.input("gap_mm"),
      included_angle_deg: check.input("included_angle_deg"),
      root_face_mm: check.input("root_face_mm"),
      reinforcement_mm: check.id === "F-V-15" ? check.input("reinforcement_mm") : 0,
    });
    expectClose(check.id === "F-V-15" ? fill.area_mm2 : massPerLength(fill.area_mm2, 7.833), check);
  });

  test("F-V-15: the groove is 19.166 mm wide at the surface", () => {
    const groove = {
      thickness_mm: 15,
      gap_mm: 3,
      included_angle_deg: 60,
      root_face_mm: 1,
      reinforcement_mm: 2,
    };
    expect(vGrooveFill(groove).width_mm).toBeCloseTo(19.166, 3);
  });

  test("an impossible groove is refused", () => {
    expect(() => vGrooveFill({ ...square, thickness_mm: 0 })).toThrow(/thickness_mm/);
    expect(() => vGrooveFill({ ...square, thickness_mm: 10, root_face_mm: 11 })).toThrow(/root_face_mm/);
    expect(() => vGrooveFill({ ...square, thickness_mm: 10, included_angle_deg: 180 })).toThrow(
      /included_angle_deg/,
    );
    expect(() => vGrooveFill({ ...square, thickness_mm: 10, gap_mm: -1 })).toThrow(/gap_mm/);
  });
});

describe("what a wire deposits", () => {
  const feed = { wire_diameter_mm: 1.2, wire_feed_m_min: 9, deposition_share: 0.96 };

  test("F-dep: area, throat and rate of 1.2 mm wire at 9 m/min", () => {
    const area_mm2 = depositedArea(feed, 500 / 60);
    expectClose(area_mm2, weldCheck("F-dep-area"));
    expectClose(throatOfArea(area_mm2), weldCheck("F-dep-throat"));
    expectClose(depositionRate(feed), weldCheck("F-dep-rate"));
    expect(travelForArea(feed, area_mm2)).toBeCloseTo(500 / 60, 9);
  });

  test("F-dep-exact: 0.052 in wire at 320 in/min in pounds an hour, and within 2 % of the shop formula", () => {
    const check = weldCheck("F-dep-exact");
    const inches = {
      wire_diameter_mm: check.input("wire_diameter_in") * MM_PER_INCH,
      wire_feed_m_min: (check.input("wire_feed_in_per_min") * MM_PER_INCH) / 1000,
      deposition_share: check.input("efficiency"),
    };
    const kg_h = depositionRate(inches, check.input("density_lb_per_in3") * G_CM3_PER_LB_IN3);
    expectClose(kg_h / KG_PER_LB, check);
    expect(Math.abs(kg_h / KG_PER_LB / weldCheck("F-dep-131").number() - 1)).toBeLessThan(0.02);
  });

  test.each(titled("F-wire-"))("%s", (_, check) => {
    expectClose(wireLengthPerMass(check.input("wire_diameter_mm"), check.input("density_g_per_cm3")), check);
  });

  test("F-eff: typical shares are those of the handbook", () => {
    const keys = {
      "121 SAW": "121",
      "135 Ar+2%O2": "135, argon with 2 % oxygen",
      "135 Ar+25%CO2": "135, argon with 25 % carbon dioxide",
      "135 CO2/short-circuit": "135, carbon dioxide or short circuit",
      "138 metal-cored": "138",
      "136 flux-cored gas-shielded": "136",
      "114 flux-cored self-shielded": "114",
    } as const;
    const checks = weldChecks("F-eff-");
    expect(checks.map((check) => check.value("process"))).toEqual(Object.keys(keys));
    expect(Object.values(keys).map((key) => DEPOSITION_SHARES[key])).toEqual(
      checks.map((check) => check.number()),
    );
  });

  test("an impossible feed is refused", () => {
    expect(() => depositedArea(feed, 0)).toThrow(/travel_mm_s/);
    expect(() => depositionRate({ ...feed, deposition_share: 1.1 })).toThrow(/deposition_share/);
    expect(() => travelForArea(feed, Number.POSITIVE_INFINITY)).toThrow(/area_mm2/);
    expect(() => wireLengthPerMass(0)).toThrow(/wire_diameter_mm/);
    expect(() => massPerLength(-1)).toThrow(/area_mm2/);
  });
});
