import { expect, test } from "vitest";
import { weldCheck } from "../../vectors/weld/checks.ts";
import { heatInputWindow } from "./heat-input-window.ts";

const tested = { level: 2, tested_kj_mm: 1.2, impact_required: true, hardness_required: true } as const;

test(weldCheck("HI-19").title, () => {
  const { min, max } = heatInputWindow(tested);
  expect([min, max].map((end) => Number(end?.toFixed(9)))).toEqual(weldCheck("HI-19").expected);
});

test(weldCheck("HI-20").title, () => {
  const { min, max } = heatInputWindow({ ...tested, impact_required: false, hardness_required: false });
  expect([min, max]).toEqual(weldCheck("HI-20").expected);
});

test(weldCheck("HI-21").title, () => {
  const { min, max } = heatInputWindow({ ...tested, level: 1, hardness_required: false });
  expect([min, max]).toEqual(weldCheck("HI-21").expected);
});

test("a test without heat input qualifies nothing", () => {
  expect(() => heatInputWindow({ ...tested, tested_kj_mm: 0 })).toThrow(RangeError);
});
