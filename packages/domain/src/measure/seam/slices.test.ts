import { describe, expect, it } from "vitest";
import { circleModel, cloudOf, straightModel } from "../testing/models.ts";
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

  it("keep the points of each profile together, in their order", () => {
    const slices = cut(
      [20, 0].flatMap((x) => profile(x).map(([px, l, n]): Vector => [px, l, x + n])),
      [20, 0].flatMap((_, k) => Array.from({ length: 30 }, () => k)),
    );
    expect([...slices.l_mm.subarray(0, 30)]).toEqual(profile(0).map(([, l]) => l));
    expect(new Set(slices.n_mm.subarray(30))).toEqual(new Set([20]));
  });

  it("cut a dense cloud so that no point is lost and each slice holds its own stretch", () => {
    const points = Array.from(
      { length: 20_000 },
      (_, i): Vector => [((i * 7919) % 20_000) / 400, (i % 37) - 18, 0],
    );
    const slices = cut(points);
    expect(slices.starts.at(-1)).toBe(20_000);
    expect(slices.count).toBe(50);
    expect(slices.at_mm.every((at, i) => Math.abs(at - i - 0.5) < 0.2)).toBe(true);
  });

  it("cut a cloud of slanting profiles, each wider than the way to the next, as a dense one", () => {
    // Each line of points runs 6 mm along the seam while the next begins after 2 mm.
    const slanting = Array.from({ length: 20 }, (_, k) =>
      Array.from({ length: 120 }, (__, i): Vector => [2 * k + i / 20, i / 4 - 15, 0]),
    ).flat();
    const slices = cut(slanting);
    expect(slices.pitch_mm).toBeCloseTo(1, 1);
    expect(slices.starts.at(-1)).toBe(slanting.length);
  });

  it("cut the dense stretches of a torn cloud every millimetre: three stretches are no profiles", () => {
    const stretch = (from: number) =>
      Array.from({ length: 4000 }, (_, i): Vector => [from + i / 400, (i % 37) - 18, 0]);
    const slices = cut([0, 15, 30, 45].flatMap(stretch));
    expect(slices.pitch_mm).toBeCloseTo(1, 1);
    expect(slices.starts.at(-1)).toBe(16_000);
  });

  it("go round a closed seam: the profile over its end is one slice, not two", () => {
    const round = circleModel(100, 40);
    const length = round.seam.length_mm;
    const at = (s: number, l: number): Vector => [
      (100 - l) * Math.cos(s / 100),
      (100 - l) * Math.sin(s / 100),
      0,
    ];
    const places = [length - 0.02, 10, 20, 30];
    const points = places.flatMap((s) => Array.from({ length: 31 }, (_, i) => at(s + 0.002 * i, i - 15)));
    const profiles = places.flatMap((_, k) => Array.from({ length: 31 }, () => k));
    const slices = slicesOf(sectionPoints(lineFrames(round), cloudOf(points, profiles)));
    expect(slices.count).toBe(4);
    expect(Array.from(slices.starts)).toEqual([0, 31, 62, 93, 124]);
    expect(Array.from(slices.at_mm, (s) => Math.round(s % length))).toEqual([0, 10, 20, 30]);
  });

  it("of one profile have no pitch", () => {
    const one = cut(profile(10));
    expect([one.count, one.pitch_mm]).toEqual([1, 0]);
  });

  it("are none of no points", () => expect(cut([[0, 900, 0]]).count).toBe(0));
});
