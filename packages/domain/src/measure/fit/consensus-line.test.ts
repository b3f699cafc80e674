import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { normalsFrom } from "../testing/noise.ts";
import { consensusLine, drawsFrom } from "./consensus-line.ts";
import { distanceFrom } from "./line-fit.ts";

const RAD = Math.PI / 180;
const SEARCH = { turn_rad: 14 * RAD, band_mm: 0.15, trials: 48, seed: 7 };

interface Drawn {
  readonly slope: number;
  /** How many of 100 points lie anywhere. */
  readonly stray: number;
  readonly seed: number;
}

/** A line through (5, 1) with noise, and points anywhere about it. */
function points({ slope, stray, seed }: Drawn) {
  const draw = drawsFrom(seed);
  const normal = normalsFrom(seed);
  const ts = Float64Array.from({ length: 100 }, (_, i) => i / 10);
  const ds = ts.map((t, i) =>
    (i * 37) % 100 < stray ? 8 * draw() - 3 : 1 + slope * (t - 5) + 0.03 * normal(),
  );
  return { ts, ds };
}

describe("consensus line", () => {
  it("is found whatever its direction in the window, among four strays in ten", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -12, max: 12, noNaN: true }),
        fc.integer({ min: 0, max: 40 }),
        fc.integer({ min: 1, max: 1e6 }),
        (turn_deg, stray, seed) => {
          const slope = Math.tan(turn_deg * RAD);
          const { ts, ds } = points({ slope, stray, seed });
          const found = consensusLine(ts, ds, 100, { ...SEARCH, seed });
          if (!found) throw new Error("no line");
          // A start for the fit that follows: within its band of half a millimetre along the whole face.
          for (const t of [0, 10])
            expect(Math.abs(distanceFrom(found.line, t, 1 + slope * (t - 5)))).toBeLessThan(0.3);
        },
      ),
      { seed: 5 },
    );
  });

  it("says which share of the points it explains", () => {
    const share = (stray: number) => {
      const { ts, ds } = points({ slope: 0.1, stray, seed: 3 });
      return consensusLine(ts, ds, 100, SEARCH)?.share ?? 0;
    };
    expect(share(0)).toBeGreaterThan(0.85);
    // A point counts by how near it lies, not only by whether: noise of a fifth of the band costs a twenty-fifth.
    expect(share(0)).toBeLessThan(0.985);
    expect(share(40)).toBeLessThan(0.72);
    expect(share(40)).toBeGreaterThan(0.45);
  });

  it("is the same for the same seed", () => {
    const { ts, ds } = points({ slope: 0.1, stray: 30, seed: 3 });
    expect(consensusLine(ts, ds, 100, SEARCH)).toEqual(consensusLine(ts, ds, 100, SEARCH));
  });

  it("is none outside its window: a face seen nearly on edge is another face", () => {
    const { ts, ds } = points({ slope: Math.tan(25 * RAD), stray: 0, seed: 3 });
    expect(consensusLine(ts, ds, 100, { ...SEARCH, turn_rad: 20 * RAD })).toBeNull();
    expect(consensusLine(ts, ds, 100, { ...SEARCH, turn_rad: 30 * RAD })?.share).toBeGreaterThan(0.8);
  });

  it("is none of a heap of points, which has no direction", () => {
    const normal = normalsFrom(1);
    const heap = () => Float64Array.from({ length: 50 }, () => 0.05 * normal());
    expect(consensusLine(heap(), heap(), 50, SEARCH)).toBeNull();
  });

  it("is none of two points", () => {
    expect(consensusLine(Float64Array.of(0, 1), Float64Array.of(0, 0), 2, SEARCH)).toBeNull();
  });
});

describe("draws", () => {
  it("fill the unit interval evenly, a seed of nought included", () => {
    for (const seed of [0, 1, 7919, -5]) {
      const draw = drawsFrom(seed);
      const bins = new Int32Array(10);
      for (let i = 0; i < 10_000; i++) bins[Math.floor(10 * draw())]! += 1;
      // Chi square of nine degrees of freedom is below 27.9 in 999 of 1000.
      expect(bins.reduce((sum, n) => sum + (n - 1000) ** 2 / 1000, 0)).toBeLessThan(27.9);
    }
  });
});
