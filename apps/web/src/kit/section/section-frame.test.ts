import { expect, it } from "vitest";
import { pixelOf } from "../plots/plot-frame.ts";
import { sectionFrame } from "./section-frame.ts";

const PLACE = { width: 420, height: 320, left: 44, right: 8, top: 8, bottom: 34 };

it("draws a millimetre as long across as it is up, whatever the joint's shape", () => {
  for (const points of [
    [
      [-30, 0],
      [30, 2],
    ],
    [
      [0, -1],
      [1, 60],
    ],
    [
      [-5, -5],
      [5, 5],
    ],
  ] as const) {
    const frame = sectionFrame(points, PLACE);
    if (frame === null) throw new TypeError("expected a frame");
    const across = pixelOf(frame.x, 1) - pixelOf(frame.x, 0);
    const up = pixelOf(frame.y, 0) - pixelOf(frame.y, 1);
    expect(across).toBeCloseTo(up, 9);
  }
});

it("shows every point inside its margins, normal upwards", () => {
  const points = [
    [-28, -0.4],
    [3.4, 19],
    [0, 0],
  ] as const;
  const frame = sectionFrame(points, PLACE);
  if (frame === null) throw new TypeError("expected a frame");
  for (const [lateral_mm, normal_mm] of points) {
    expect(pixelOf(frame.x, lateral_mm)).toBeGreaterThanOrEqual(44);
    expect(pixelOf(frame.x, lateral_mm)).toBeLessThanOrEqual(412);
    expect(pixelOf(frame.y, normal_mm)).toBeGreaterThanOrEqual(8);
    expect(pixelOf(frame.y, normal_mm)).toBeLessThanOrEqual(286);
  }
  expect(pixelOf(frame.y, 19)).toBeLessThan(pixelOf(frame.y, 0));
});

it("is nothing without points or without room", () => {
  expect(sectionFrame([], PLACE)).toBeNull();
  expect(sectionFrame([[0, 0]], { ...PLACE, width: 40 })).toBeNull();
});
