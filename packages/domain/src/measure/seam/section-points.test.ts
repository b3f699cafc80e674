import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseSeamModel } from "../../schemas/seam-model.ts";
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

  it("that lie on the nominal root line are at (s, 0, 0), all along an arc and all round a circle", () => {
    const place = fc.double({ min: 0, max: 1, noNaN: true });
    for (const model of [arcModel(100, 150, 10), circleModel(100, 40)]) {
      const frames = lineFrames(model);
      fc.assert(
        fc.property(place, (share) => {
          const s = share * model.seam.length_mm;
          const found = sectionPoints(frames, cloudOf([onArc(s, 0, 0)]));
          const off = Math.abs((found.s_mm[0] ?? 0) - s);
          // On a circle the end is the start.
          expect(Math.min(off, model.seam.closed ? Math.abs(off - model.seam.length_mm) : off)).toBeLessThan(
            0.05,
          );
          expect(Math.abs(found.l_mm[0] ?? 9)).toBeLessThan(0.002);
          expect(Math.abs(found.n_mm[0] ?? 9)).toBeLessThan(1e-9);
        }),
        { numRuns: 60 },
      );
    }
  });

  it("are the same one by one as in a whole scan, whichever way it runs", () => {
    const model = circleModel(100, 40);
    const cloud = Array.from({ length: 200 }, (_, i) =>
      onArc(((i * 77) % 628) + 0.1, (i % 9) - 4, (i % 5) - 2),
    );
    const together = sectionPoints(lineFrames(model), cloudOf(cloud));
    expect(together.count).toBe(200);
    for (const [k, point] of cloud.entries()) {
      const alone = sectionPoints(lineFrames(model), cloudOf([point]));
      expect(together.s_mm[k]).toBeCloseTo(alone.s_mm[0] ?? Number.NaN, 9);
      expect(together.l_mm[k]).toBeCloseTo(alone.l_mm[0] ?? Number.NaN, 9);
    }
  });

  it("keep their profile, those left out taking none with them", () => {
    const found = sectionPoints(
      lineFrames(straightModel(100, 10)),
      cloudOf(
        [
          [1, 0, 0],
          [2, 90, 0],
          [3, 0, 0],
        ],
        [4, 5, 6],
      ),
    );
    expect([...(found.profiles ?? [])]).toEqual([4, 6]);
    expect([...found.s_mm]).toEqual([1, 3]);
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

  it("have unit frames, square and of the model's hand, between its vertices too", () => {
    const frames = stationFrames(arcModel(100, 150, 15), 4);
    const at = (flat: Float64Array, i: number) => [...flat.subarray(3 * i, 3 * i + 3)] as Vector;
    for (let i = 0; i < frames.count; i++) {
      const [t, l, n] = [at(frames.tangents, i), at(frames.laterals, i), at(frames.normals, i)];
      const dot = (a: Vector, b: Vector) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
      for (const v of [t, l, n]) expect(dot(v, v)).toBeCloseTo(1, 12);
      for (const [a, b] of [
        [t, l],
        [l, n],
        [n, t],
      ] as const)
        expect(dot(a, b)).toBeCloseTo(0, 12);
      // l = n x t, as the model has it.
      expect(n[0] * t[1] - n[1] * t[0]).toBeCloseTo(l[2], 9);
      expect(n[1] * t[2] - n[2] * t[1]).toBeCloseTo(l[0], 9);
      const s = frames.stations_mm[i] ?? 0;
      expect(l[0]).toBeCloseTo(-Math.cos(s / 100), 3);
    }
  });

  it("begin where the model begins, and end at its last vertex however the step falls", () => {
    const model = arcModel(100, 150, 15);
    const frames = stationFrames(model, 50);
    expect([...frames.stations_mm]).toEqual([0, 50, 100, 150]);
    expect([...frames.points_mm.subarray(0, 2)]).toEqual([100, 0]);
    expect(stationFrames(model, 1000).count).toBe(1);
  });

  it("of a closed seam whose last vertex repeats its first: points are placed by each place once", () => {
    const open = circleModel(100, 40);
    const [first] = open.seam.vertices;
    const repeated = parseSeamModel({
      ...open,
      seam: {
        ...open.seam,
        vertices: [...open.seam.vertices, { ...first, station_mm: open.seam.length_mm }],
      },
    });
    if (!repeated.ok) throw new Error(JSON.stringify(repeated.faults));
    expect(lineFrames(repeated.value).count).toBe(40);
    expect(stationFrames(repeated.value).count).toBe(41);
  });

  it("know a straight line from a bent one", () => {
    expect(lineFrames(straightModel(100, 10)).straight).toBe(true);
    expect(lineFrames(arcModel(1000, 100, 10)).straight).toBe(false);
    expect(lineFrames(circleModel(100, 40)).straight).toBe(false);
  });

  it("lie on the arc between the model's vertices, not on its chord", () => {
    const frames = stationFrames(arcModel(100, 150, 15), 7.5);
    for (let i = 0; i < frames.count; i++) {
      const [x = 0, y = 0] = frames.points_mm.subarray(3 * i, 3 * i + 2);
      expect(Math.hypot(x, y)).toBeCloseTo(100, 3);
    }
  });
});
