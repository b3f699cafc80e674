import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { openingsIn } from "./groove.ts";

type Point = readonly [number, number];

/** Points every 0.06 mm along a polyline, with a little even noise. */
function profile(corners: readonly Point[], turn_deg = 0, [mx, mz]: Point = [0, 0]) {
  const points = corners.slice(1).flatMap((to, i) => {
    const from = corners[i]!;
    const count = Math.round(Math.hypot(to[0] - from[0], to[1] - from[1]) / 0.06);
    return Array.from({ length: count }, (_, k): Point => {
      const share = k / count;
      const noise = 0.01 * Math.sin(12.9898 * (k + 97 * i));
      return [from[0] + share * (to[0] - from[0]), from[1] + share * (to[1] - from[1]) + noise];
    });
  });
  const [c, s] = [Math.cos((turn_deg * Math.PI) / 180), Math.sin((turn_deg * Math.PI) / 180)];
  const placed = points.map(([x, z]): Point => [mx + x * c - z * s, mz + x * s + z * c]);
  return { x: Float64Array.from(placed, ([x]) => x), z: Float64Array.from(placed, ([, z]) => z) };
}

/** A groove with walls of 45 degrees, 10 mm floor and 4 mm deep; the right surface stands `step` proud. */
const groove = (step = 0): Point[] => [
  [-30, 0],
  [-9, 0],
  [-5, -4],
  [5, -4],
  [9 + step, step],
  [30, step],
];

describe("openings across a profile", () => {
  it("finds a groove's sizes as drawn", () => {
    const { x, z } = profile(groove(0.5));
    const [found] = openingsIn(x, z);
    expect(found?.groove?.floor_width_mm).toBeCloseTo(10, 1);
    expect(found?.groove?.opening_mm).toBeCloseTo(Math.hypot(18.5, 0.5), 1);
    expect(found?.groove?.included_angle_deg).toBeCloseTo(90, 0);
    expect(found?.hi_lo_mm).toBeCloseTo(0.5, 1);
    expect(found?.depth_mm).toBeCloseTo(4.25, 1);
  });

  it("finds a slot's width where a wall and part of the floor lie in the shadow", () => {
    const { x, z } = profile([
      [-20, 0],
      [-4, 0],
      [-4, -12],
      [4, -12],
      [4, 0],
      [20, 0],
    ]);
    const seen = (i: number) => !(x[i]! < -1 && z[i]! < -0.5);
    const [found] = openingsIn(
      x.filter((_, i) => seen(i)),
      z.filter((_, i) => seen(i)),
    );
    expect(found?.width_mm).toBeCloseTo(8, 1);
    expect(found?.depth_mm).toBeCloseTo(12, 1);
    expect(found?.groove).toBeNull();
  });

  it("finds two beside each other, from left to right, and none on a flat plate", () => {
    const right = groove().map(([x, z]): Point => [x + 50, z]);
    const both = profile([...groove().slice(0, -1), ...right.slice(1)]);
    expect(openingsIn(both.x, both.z).map(({ left_edge }) => Math.round(left_edge[0]))).toEqual([-9, 41]);
    const flat = profile([
      [-30, 0],
      [30, 0],
    ]);
    expect(openingsIn(flat.x, flat.z)).toEqual([]);
    expect(openingsIn(Float64Array.of(1, 2), Float64Array.of(1, 2))).toEqual([]);
  });

  it("is not bent by lost returns and spikes", () => {
    const { x, z } = profile(groove());
    const dirty = z.map((value, i) => (i % 17 === 0 ? Number.NaN : i % 41 === 0 ? value + 5 : value));
    const [clean] = openingsIn(x, z);
    const [found] = openingsIn(x, dirty);
    expect(found?.groove?.floor_width_mm).toBeCloseTo(clean?.groove?.floor_width_mm ?? 0, 1);
    expect(Math.abs((found?.depth_mm ?? 0) - (clean?.depth_mm ?? 9))).toBeLessThan(0.02);
  });

  it("does not change when the profile is turned or moved, and mirrors its hi-lo", () => {
    const mm = (least: number, most: number) => fc.double({ min: least, max: most, noNaN: true });
    fc.assert(
      fc.property(mm(-8, 8), mm(-40, 40), mm(-200, 200), mm(-0.8, 0.8), (turn, mx, mz, step) => {
        const still = profile(groove(step));
        const moved = profile(groove(step), turn, [mx, mz]);
        const mirrored = { x: still.x.map((x) => -x), z: still.z };
        const [a] = openingsIn(still.x, still.z);
        const [b] = openingsIn(moved.x, moved.z);
        const [c] = openingsIn(mirrored.x, mirrored.z);
        if (!a?.groove || !b?.groove || !c) return false;
        return (
          Math.abs(a.groove.opening_mm - b.groove.opening_mm) < 0.03 &&
          Math.abs(a.hi_lo_mm - b.hi_lo_mm) < 0.02 &&
          Math.abs(a.hi_lo_mm + c.hi_lo_mm) < 0.02 &&
          Math.abs(a.groove.included_angle_deg - b.groove.included_angle_deg) < 0.4
        );
      }),
      { numRuns: 60, seed: 2 },
    );
  });
});
