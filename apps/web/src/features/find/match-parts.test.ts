import { expect, it } from "vitest";
import { matchParts } from "./match-parts.ts";

it("cuts a text at what was searched for, whatever the case", () => {
  expect(matchParts("Skid frame 0418", "FRAME")).toEqual(["Skid ", "frame", " 0418"]);
  expect(matchParts("FW-2210 rev C, order 41-2207", "41-2")).toEqual([
    "FW-2210 rev C, order ",
    "41-2",
    "207",
  ]);
});

it("leaves a text whole that does not hold it, and where nothing was searched for", () => {
  expect(matchParts("Cell 2", "x")).toEqual(["Cell 2", "", ""]);
  expect(matchParts("Cell 2", "")).toEqual(["Cell 2", "", ""]);
});
