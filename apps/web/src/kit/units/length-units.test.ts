import { expect, it } from "vitest";
import { formatFigure, formatLength, formatSigned, fromMm } from "./length-units.ts";

it("shows a length in mm or in inches, as finely in either", () => {
  expect(formatLength(3.41, "mm")).toBe("3.41 mm");
  expect(formatLength(3.41, "in")).toBe("0.134 in");
  expect(formatLength(320, "mm", 0)).toBe("320 mm");
});

it("gives every deviation its sign, and zero none", () => {
  expect(formatSigned(0.368, 2)).toBe("+0.37");
  expect(formatSigned(-1.2, 2)).toBe("−1.20");
  expect(formatSigned(0.001, 2)).toBe("0.00");
  expect(formatSigned(-0.004, 2)).toBe("0.00");
  expect(formatFigure(-0, 1)).toBe("0.0");
});

it("knows the inch", () => {
  expect(fromMm(25.4, "in")).toBe(1);
  expect(fromMm(25.4, "mm")).toBe(25.4);
});
