import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { add, lineAtZero, noSums, parabolaAtZero } from "./local-fit.ts";

const numbers = z.array(z.number());
const Golden = z.object({
  savitzky_golay: z.object({
    weights: z.array(
      z.object({
        window: z.int(),
        degree: z.string(),
        derivative: z.int(),
        weights_times_norm: numbers,
        norm: z.number(),
      }),
    ),
    edge_weights_polynomial: z.array(
      z.object({
        window: z.int(),
        degree: z.int(),
        offset: z.int(),
        weights_times_norm: numbers,
        norm: z.number(),
      }),
    ),
  }),
});
const Loess = z.object({
  loess: z.object({
    uneven_stations_R: z.object({
      s: numbers,
      d: numbers,
      "loess_span0.4_deg1": numbers,
      "loess_span0.4_deg2": numbers,
    }),
  }),
});
const file = new URL("../../../vectors/geometry/smoothing.json", import.meta.url);
const golden: unknown = JSON.parse(readFileSync(file, "utf8"));
const { savitzky_golay } = Golden.parse(golden);
const uneven = Loess.parse(golden).loess.uneven_stations_R;

/** Weights that a local parabola gives to the points of an even window, `offset` from its middle. */
function weightsOf(window: number, offset: number): number[] {
  const half = (window - 1) / 2;
  return Array.from({ length: window }, (_, k) => {
    const sums = noSums();
    for (let i = 0; i < window; i++) add(sums, i - half - offset, i === k ? 1 : 0, 1);
    return parabolaAtZero(sums)?.value ?? Number.NaN;
  });
}

describe("the local parabola on even stations is Savitzky-Golay's (1964, table I; misprints mended)", () => {
  const own = savitzky_golay.weights.filter(
    ({ degree, derivative }) => degree === "2 or 3" && derivative === 0,
  );
  it.each(own.map((one) => [one.window, one] as const))(
    "window %i",
    (window, { weights_times_norm, norm }) => {
      weightsOf(window, 0).forEach(
        (weight, i) => void expect(weight * norm).toBeCloseTo(weights_times_norm[i] ?? Number.NaN, 6),
      );
    },
  );

  const edges = savitzky_golay.edge_weights_polynomial.filter(({ degree }) => degree === 2);
  it.each(edges.map((one) => [one.window, one.offset, one] as const))(
    "window %i, %i from its middle, as at the end of a seam",
    (window, offset, { weights_times_norm, norm }) => {
      weightsOf(window, offset).forEach(
        (weight, i) => void expect(weight * norm).toBeCloseTo(weights_times_norm[i] ?? Number.NaN, 6),
      );
    },
  );

  it("covers the tables it was given", () => {
    expect([own.length, edges.length]).toEqual([11, 5]);
  });
});

describe("on uneven stations", () => {
  it.each([
    ["degree 1", uneven["loess_span0.4_deg1"], 1],
    ["degree 2", uneven["loess_span0.4_deg2"], 2],
  ] as const)("with tricube weights it is R's loess (span 0.4, direct), %s", (_, fitted, degree) => {
    const { s, d } = uneven;
    const nearest = Math.floor(0.4 * s.length);
    s.forEach((at, i) => {
      const reach = s.map((x) => Math.abs(x - at)).sort((a, b) => a - b)[nearest - 1] ?? 0;
      const sums = noSums();
      s.forEach((x, k) => {
        const weight = (1 - Math.min(1, Math.abs(x - at) / reach) ** 3) ** 3;
        if (weight > 0) add(sums, x - at, d[k] ?? Number.NaN, 1 / Math.sqrt(weight));
      });
      const found = degree === 1 ? lineAtZero(sums) : parabolaAtZero(sums);
      expect(found?.value).toBeCloseTo(fitted[i] ?? Number.NaN, 9);
    });
  });

  it("a line and a parabola are given back exactly, whatever the weights", () => {
    const places = [-7.3, -4.1, -0.4, 1.9, 2.2, 6.8];
    const [line, parabola] = [noSums(), noSums()];
    places.forEach((x, i) => {
      add(line, x, 3 + 0.7 * x, 0.1 + 0.03 * i);
      add(parabola, x, 3 + 0.7 * x - 0.2 * x * x, 0.1 + 0.03 * i);
    });
    expect(lineAtZero(line).value).toBeCloseTo(3, 10);
    expect(parabolaAtZero(parabola)?.value).toBeCloseTo(3, 10);
  });

  it("its uncertainty is that of weighted least squares: the root of the first diagonal of the inverse", () => {
    const sums = noSums();
    for (const x of [-1, 0, 1]) add(sums, x, 0, 0.3);
    // Three points carry the parabola exactly: the value in the middle is that point's own.
    expect(parabolaAtZero(sums)?.u).toBeCloseTo(0.3, 10);
    expect(lineAtZero(sums).u).toBeCloseTo(0.3 / Math.sqrt(3), 10);
  });
});
