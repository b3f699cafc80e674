import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { type Circle, geometricCircle, robustCircle, taubinCircle } from "./circle-fit.ts";

const Golden = z.object({
  points: z.array(z.tuple([z.number(), z.number()])),
  expected: z.object({
    taubin: z.tuple([z.number(), z.number(), z.number()]),
    geometric: z.tuple([z.number(), z.number(), z.number()]),
  }),
});
const file = new URL("../../../vectors/geometry/fits.json", import.meta.url);
const golden = z
  .object({ circle_gander_golub_strebel: Golden, circle_short_arc: Golden })
  .parse(JSON.parse(readFileSync(file, "utf8")));

const triple = (circle: Circle | null) => (circle ? [circle.x_mm, circle.y_mm, circle.radius_mm] : []);
const columns = (points: readonly (readonly [number, number])[]) => ({
  x: Float64Array.from(points, ([x]) => x),
  y: Float64Array.from(points, ([, y]) => y),
});

describe("circles", () => {
  it.each([
    ["Gander, Golub, Strebel 1994, six points", golden.circle_gander_golub_strebel],
    ["an arc of 50 degrees", golden.circle_short_arc],
  ])("%s: Taubin's and the geometric circle", (_, { points, expected }) => {
    const { x, y } = columns(points);
    const taubin = taubinCircle(x, y);
    if (!taubin) throw new Error("no circle");
    triple(taubin).forEach((value, i) => void expect(value).toBeCloseTo(expected.taubin[i] ?? Number.NaN, 6));
    triple(geometricCircle(x, y, taubin)).forEach(
      (value, i) => void expect(value).toBeCloseTo(expected.geometric[i] ?? Number.NaN, 6),
    );
  });

  it("are found among as many outliers as good points", () => {
    const mm = (least: number, most: number) => fc.double({ min: least, max: most, noNaN: true });
    fc.assert(
      fc.property(
        mm(-50, 50),
        mm(-50, 50),
        mm(8, 60),
        mm(0, 6),
        fc.integer({ min: 1, max: 999 }),
        (cx, cy, r, from, seed) => {
          const good = Array.from({ length: 120 }, (_, i): [number, number] => {
            const angle = from + (i / 120) * 1.6;
            return [cx + r * Math.cos(angle), cy + r * Math.sin(angle)];
          });
          const bad = Array.from({ length: 120 }, (_, i): [number, number] => [
            cx + 3 * r * Math.sin(12.9898 * i + seed),
            cy + 3 * r * Math.sin(78.233 * i + 2 * seed),
          ]);
          const { x, y } = columns([...good, ...bad]);
          const found = robustCircle(x, y, { band_mm: 0.3, trials: 300, seed, radii_mm: [5, 100] });
          return found !== null && Math.abs(found.radius_mm - r) < 0.05 && Math.abs(found.x_mm - cx) < 0.05;
        },
      ),
      { numRuns: 60, seed: 5 },
    );
  });

  it("have none where the points lie on a line or are too few", () => {
    const line = columns([0, 1, 2, 3, 4].map((t): [number, number] => [t, 2 * t]));
    expect(
      robustCircle(line.x, line.y, { band_mm: 0.1, trials: 50, seed: 1, radii_mm: [1, 100] }),
    ).toBeNull();
    expect(taubinCircle(Float64Array.of(1, 2), Float64Array.of(1, 2))).toBeNull();
  });
});
