import { expect, it } from "vitest";
import { placeMarks } from "./mark-places.ts";

it("lets marks share a line where their words have room, and gives another where they do not", () => {
  expect(placeMarks([100, 400, 410], 900).map((place) => place.line)).toEqual([0, 0, 1]);
});

it("writes to the left where the plot ends, without running into a neighbour", () => {
  const places = placeMarks([700, 860], 900);
  expect(places.map((place) => place.isLate)).toEqual([false, true]);
  expect(places.map((place) => place.line)).toEqual([0, 1]);
});
