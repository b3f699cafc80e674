import { describe, expect, it } from "vitest";
import { cloudOf, straightModel } from "../testing/models.ts";
import { lineFrames } from "./seam-frames.ts";
import { sectionPoints } from "./section-points.ts";
import { slicesOf } from "./slices.ts";

type Vector = [number, number, number];

const frames = lineFrames(straightModel(60, 2));
const profile = (x: number): Vector[] => Array.from({ length: 30 }, (_, i) => [x + 0.002 * i, i - 15, 0]);
const cut = (points: Vector[], profiles: number[] | null = null) =>
  slicesOf(sectionPoints(frames, cloudOf(points, profiles)));

describe("slices", () => {
  it("are the profiles, in order along the seam, however the file has them", () => {
    const places = [20, 0, 10, 30];
    const slices = cut(
      places.flatMap(profile),
      places.flatMap((_, k) => Array.from({ length: 30 }, () => k)),
    );
    expect(Array.from(slices.at_mm, Math.round)).toEqual([0, 10, 20, 30]);
    expect([...slices.starts]).toEqual([0, 30, 60, 90, 120]);
    expect(slices.pitch_mm).toBeCloseTo(10, 6);
  });

  it("join profiles closer than half a millimetre", () => {
    const places = Array.from({ length: 40 }, (_, i) => i / 5);
    const slices = cut(
      places.flatMap(profile),
      places.flatMap((_, k) => Array.from({ length: 30 }, () => k)),
    );
    expect(slices.count).toBeLessThan(20);
    expect(slices.pitch_mm).toBeGreaterThanOrEqual(0.5);
  });

  it("are found again in a cloud that was taken as profiles", () => {
    const slices = cut([0, 2.1, 3.9, 6, 8.2].flatMap(profile));
    expect(slices.count).toBe(5);
    expect([...slices.starts]).toEqual([0, 30, 60, 90, 120, 150]);
  });

  it("are a millimetre wide in a cloud that shows no profiles", () => {
    const slices = cut(Array.from({ length: 8000 }, (_, i): Vector => [i / 200, (i % 37) - 18, 0]));
    expect(slices.count).toBe(40);
    expect(slices.pitch_mm).toBeCloseTo(1, 1);
  });

  it("are none of no points", () => expect(cut([[0, 900, 0]]).count).toBe(0));
});
