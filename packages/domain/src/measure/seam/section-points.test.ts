import { describe, expect, it } from "vitest";
import { arcModel, circleModel, cloudOf, straightModel } from "../testing/models.ts";
import { lineFrames, stationFrames } from "./seam-frames.ts";
import { sectionPoints } from "./section-points.ts";

type Vector = [number, number, number];

/** A point of the arc of radius 100, off it by (lateral, normal); the lateral points inward. */
const onArc = (s: number, l: number, n: number): Vector => {
  const [c, d] = [Math.cos(s / 100), Math.sin(s / 100)];
  return [(100 - l) * c, (100 - l) * d, n];
};

describe("points in the seam's own measure", () => {
  it("stand at their place along a straight line, with lateral and normal", () => {
    const model = straightModel(100, 10);
    const found = sectionPoints(lineFrames(model), cloudOf([[33.25, 1.5, -0.25]]));
    expect([found.s_mm[0], found.l_mm[0], found.n_mm[0]]).toEqual([33.25, 1.5, -0.25]);
  });

  it("stand at the arc's length and off it by their distance, though its stations are 10 mm apart", () => {
    const model = arcModel(100, 150, 10);
    for (const [s, l, n] of [
      [0, 0, 0],
      [7.3, 2, 1],
      [55, -3, 0.5],
      [148.9, 4, -2],
    ] as const) {
      const found = sectionPoints(lineFrames(model), cloudOf([onArc(s, l, n)]));
      expect(Math.abs((found.s_mm[0] ?? 0) - s)).toBeLessThan(0.05);
      expect(found.l_mm[0]).toBeCloseTo(l, 2);
      expect(found.n_mm[0]).toBeCloseTo(n, 3);
    }
  });

  it("go round a closed seam without a joint at its end", () => {
    const model = circleModel(100, 40);
    const length = model.seam.length_mm;
    for (const s of [1, length / 2, length - 7, length - 1]) {
      const found = sectionPoints(lineFrames(model), cloudOf([onArc(s, 1, 2)]));
      expect(Math.abs((found.s_mm[0] ?? 0) - s)).toBeLessThan(0.05);
      expect(found.l_mm[0]).toBeCloseTo(1, 2);
    }
  });

  it("are left out, and counted, where they are near no place of the seam", () => {
    const model = straightModel(100, 10);
    const far = sectionPoints(
      lineFrames(model),
      cloudOf([
        [50, 0, 0],
        [50, 61, 0],
        [-16, 0, 0],
        [116, 0, 0],
        [-14, 0, 0],
      ]),
    );
    expect([far.count, far.outside]).toEqual([2, 3]);
  });
});

describe("stations", () => {
  it("are the model's own, or every step from the first on", () => {
    const model = straightModel(100, 10);
    expect(stationFrames(model).count).toBe(11);
    expect([...stationFrames(model, 25).stations_mm]).toEqual([0, 25, 50, 75, 100]);
    expect([...stationFrames(model, 30).stations_mm]).toEqual([0, 30, 60, 90]);
    expect(() => stationFrames(model, 0)).toThrow(RangeError);
  });

  it("lie on the arc between the model's vertices, not on its chord", () => {
    const frames = stationFrames(arcModel(100, 150, 15), 7.5);
    for (let i = 0; i < frames.count; i++) {
      const [x = 0, y = 0] = frames.points_mm.subarray(3 * i, 3 * i + 2);
      expect(Math.hypot(x, y)).toBeCloseTo(100, 3);
    }
  });
});
