import { describe, expect, test } from "vitest";
import { z } from "zod";
import { type WeldCheck, weldCheck, weldChecks } from "../../../vectors/weld/checks.ts";
import {
  type Chemistry,
  carbonEquivalentCen,
  carbonEquivalentCet,
  carbonEquivalentIiw,
  carbonEquivalentPcm,
} from "./carbon-equivalent.ts";
import {
  coolingTime,
  coolingTime2d,
  coolingTime3d,
  SHAPE_FACTORS,
  transitionThickness,
} from "./cooling-time.ts";
import { combinedThickness, preheatByCet } from "./preheat.ts";

const ELEMENTS = ["C", "Si", "Mn", "Cr", "Mo", "Ni", "Cu", "V", "Nb", "B"];
const chemistryOf = (check: WeldCheck): Chemistry =>
  Object.fromEntries(ELEMENTS.map((element) => [element, check.input(`${element}_wt_pct`)]));

function expectClose(value: number | null | undefined, check: WeldCheck): void {
  expect(Math.abs((value ?? Number.NaN) - check.number()), check.title).toBeLessThanOrEqual(check.tolerance);
}

describe("carbon equivalents", () => {
  const formulas = {
    IIW: carbonEquivalentIiw,
    CET: carbonEquivalentCet,
    PCM: carbonEquivalentPcm,
    CEN: carbonEquivalentCen,
  };
  for (const [name, formula] of Object.entries(formulas)) {
    test.each(["S355J2", "S690QL", "S690QL+B"])(`${name} of the %s heat`, (heat) => {
      const check = weldCheck(`CE-${heat}-${name}`);
      expectClose(formula(chemistryOf(check)).value_pct, check);
    });
  }

  test(weldCheck("CE-CSA-tanh").title, () => {
    const check = weldCheck("CE-CSA-tanh");
    expectClose(carbonEquivalentCen(chemistryOf(check)).value_pct, check);
  });

  test("CSA Z662 worked example: with A of 1 the same sum is 0.507783", () => {
    // The printed example takes f(C) as 1; ours is 0.99726 there, so the alloy part scales by that.
    const check = weldCheck("CE-CSA-f1");
    const chemistry = chemistryOf(check);
    const carbon_pct = check.input("C_wt_pct");
    const weight = 0.75 + 0.25 * Math.tanh(20 * (carbon_pct - 0.12));
    const ours_pct = carbonEquivalentCen(chemistry).value_pct ?? Number.NaN;
    expectClose(carbon_pct + (ours_pct - carbon_pct) / weight, check);
  });

  test("CEN does not use (Cu+Ni)/15, as some sheets print", () => {
    const check = weldCheck("CE-S690-CEN15");
    expect(carbonEquivalentCen(chemistryOf(check)).value_pct).not.toBeCloseTo(check.number(), 3);
  });

  test("CET is flagged outside its range of composition", () => {
    expect(carbonEquivalentCet(chemistryOf(weldCheck("CE-range-CET"))).outside).toEqual([]);
    expect(carbonEquivalentCet(chemistryOf(weldCheck("CE-range-CET-out"))).outside).toEqual([
      { element: "Mn", value_pct: 2, min_pct: 0.5, max_pct: 1.9 },
    ]);
  });

  test("an element that was not reported leaves no value, only a lower bound", () => {
    const result = carbonEquivalentIiw({ C: 0.16, Mn: 1.42, Si: 0.21 });
    expect(result.value_pct).toBeNull();
    expect(result.at_least_pct).toBeCloseTo(0.16 + 1.42 / 6, 12);
    expect(result.missing).toEqual(["Cr", "Mo", "V", "Ni", "Cu"]);
  });

  test("what is no percentage is refused", () => {
    expect(() => carbonEquivalentCet({ C: -0.1 })).toThrow(RangeError);
    expect(() => carbonEquivalentCet({ C: Number.NaN })).toThrow(/chemistry.C/);
  });
});

describe("preheat by CET", () => {
  const inputOf = (check: WeldCheck) => ({
    cet_pct: check.input("CET_wt_pct"),
    thickness_mm: check.input("thickness_mm"),
    hydrogen_ml_100g: check.input("HD_ml_per_100g"),
    heat_input_kj_mm: check.input("heat_input_kJ_per_mm"),
  });

  test.each(
    weldChecks("TP-01", "TP-02", "TP-03", "TP-04", "TP-05", "TP-06").map(
      (check) => [check.title, check] as const,
    ),
  )("%s", (_, check) => {
    expectClose(preheatByCet(inputOf(check)).preheat_c, check);
  });

  test("shows what each input contributes, as EN 1011-2 sums it", () => {
    const { parts_k, preheat_c } = preheatByCet(inputOf(weldCheck("TP-04")));
    expectClose(parts_k.cet_pct, weldCheck("TP-part-CET"));
    expectClose(parts_k.thickness_mm, weldCheck("TP-part-d"));
    expectClose(parts_k.hydrogen_ml_100g, weldCheck("TP-part-HD"));
    expectClose(parts_k.heat_input_kj_mm, weldCheck("TP-part-Q"));
    const {
      cet_pct: cet,
      thickness_mm: d,
      hydrogen_ml_100g: hd,
      heat_input_kj_mm: q,
    } = inputOf(weldCheck("TP-04"));
    const whole = 697 * cet + 160 * Math.tanh(d / 35) + 62 * hd ** 0.35 + (53 * cet - 32) * q - 328;
    expect(preheat_c).toBeCloseTo(whole, 9);
  });

  test.each(weldChecks("TP-trap", "TP-SEW").map((check) => [check.title, check] as const))(
    "not so: %s",
    (_, check) => {
      expect(Math.abs(preheatByCet(inputOf(check)).preheat_c - check.number())).toBeGreaterThan(0.5);
    },
  );

  test.each(weldChecks("TP-range").map((check) => [check.id, check] as const))(
    "%s: flags what is out of range",
    (_, check) => {
      const names = {
        cet_pct: "CET",
        thickness_mm: "thickness",
        hydrogen_ml_100g: "HD",
        heat_input_kj_mm: "heat_input",
      };
      expect(preheatByCet(inputOf(check)).outside.map(({ input }) => names[input])).toEqual(
        z.array(z.string()).parse(check.expected),
      );
    },
  );

  test("refuses what cannot be: no thickness, no hydrogen figure", () => {
    const good = inputOf(weldCheck("TP-01"));
    expect(() => preheatByCet({ ...good, thickness_mm: 0 })).toThrow(/thickness_mm/);
    expect(() => preheatByCet({ ...good, hydrogen_ml_100g: Number.NaN })).toThrow(/hydrogen_ml_100g/);
  });

  test("combined thickness counts two paths of a butt weld and three of a T fillet", () => {
    expect(combinedThickness({ kind: "butt", plates_mm: [20, 20] })).toBe(weldCheck("TP-CT-butt").number());
    expect(combinedThickness({ kind: "fillet_t", through_mm: 15, upright_mm: 15 })).toBe(
      weldCheck("TP-CT-tee").number(),
    );
    expect(combinedThickness({ kind: "fillet_t", through_mm: 20, upright_mm: 10 })).toBe(50);
    expect(() => combinedThickness({ kind: "butt", plates_mm: [20, 0] })).toThrow(RangeError);
  });
});

describe("cooling time t8/5", () => {
  const inputOf = (check: WeldCheck) => ({
    heat_input_kj_mm: check.input("heat_input_kJ_per_mm"),
    preheat_c: check.input("T0_degC"),
  });

  test.each(weldChecks("T85-01", "T85-05").map((check) => [check.title, check] as const))(
    "%s",
    (_, check) => {
      expectClose(coolingTime3d(inputOf(check), check.input("F3")), check);
    },
  );

  test.each(weldChecks("T85-02", "T85-03").map((check) => [check.title, check] as const))(
    "%s",
    (_, check) => {
      expectClose(coolingTime2d(inputOf(check), check.input("thickness_mm"), check.input("F2")), check);
    },
  );

  test.each(weldChecks("T85-04", "T85-07").map((check) => [check.title, check] as const))(
    "%s",
    (_, check) => {
      const factor = check.input("F2_over_F3");
      expectClose(transitionThickness(inputOf(check), { f2: factor, f3: 1 }), check);
    },
  );

  test.each(weldChecks("T85-06", "T85-08", "T85-09").map((check) => [check.title, check] as const))(
    "%s",
    (_, check) => {
      const factors = { f2: check.input("F2"), f3: check.input("F3") };
      expectClose(coolingTime(inputOf(check), check.input("thickness_mm"), factors).t85_s, check);
    },
  );

  test("tells thin from thick plate, and both agree at the transition", () => {
    const input = { heat_input_kj_mm: 1.2, preheat_c: 125 };
    const factors = SHAPE_FACTORS.butt_between_runs;
    const { transition_mm } = coolingTime(input, 30, factors);
    expect(coolingTime(input, transition_mm * 0.99, factors).flow).toBe("2d");
    expect(coolingTime(input, transition_mm * 1.01, factors).flow).toBe("3d");
    expect(coolingTime2d(input, transition_mm, factors.f2)).toBeCloseTo(coolingTime3d(input, factors.f3), 9);
  });

  test("T85-10: is refused at 500 °C and above", () => {
    const check = weldCheck("T85-10");
    expect(check.expected).toBeNull();
    expect(() => coolingTime3d(inputOf(check), check.input("F3"))).toThrow(/preheat_c: expected below 500/);
    expect(() => coolingTime(inputOf(check), 10, SHAPE_FACTORS.run_on_plate)).toThrow(RangeError);
  });

  test("is refused without heat, thickness or a sensible factor", () => {
    const input = { heat_input_kj_mm: 1, preheat_c: 20 };
    expect(() => coolingTime({ ...input, heat_input_kj_mm: 0 }, 10, SHAPE_FACTORS.fillet_t)).toThrow(
      RangeError,
    );
    expect(() => coolingTime(input, 0, SHAPE_FACTORS.fillet_t)).toThrow(/thickness_mm/);
    expect(() => coolingTime(input, Number.NaN, SHAPE_FACTORS.fillet_corner)).toThrow(/thickness_mm/);
    expect(() => coolingTime3d(input, 1.1)).toThrow(/shape factor/);
  });
});
