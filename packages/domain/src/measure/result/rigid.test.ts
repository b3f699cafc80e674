import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { StationResult } from "../../schemas/scan-result.ts";
import { parseSeamModel, type SeamModel } from "../../schemas/seam-model.ts";
import { stationFrames } from "../seam/seam-frames.ts";
import { arcModel, circleModel, straightModel } from "../testing/models.ts";
import { remainingPart } from "./remaining.ts";
import { rigidPart } from "./rigid.ts";
import { minus, plus, rotationOf, times, turned, type Vector } from "./rotation.ts";

const RAD = Math.PI / 180;

/** Stations whose roots are the nominal ones moved by a rigid motion about a centre. */
function moved(model: SeamModel, centre: Vector, rotation_deg: Vector, translation: Vector): StationResult[] {
  const turn = rotationOf(times(rotation_deg, RAD));
  return model.seam.vertices.map((vertex) => ({
    station_mm: vertex.station_mm,
    measured: true,
    lateral_mm: 0,
    normal_mm: 0,
    root_mm: [...plus(plus(turned(turn, minus(vertex.point, centre)), centre), translation)],
    plate_a_rot_deg: 0,
    plate_b_rot_deg: 0,
  }));
}

const found = (model: SeamModel, stations: StationResult[]) => {
  const rigid = rigidPart(stations, stationFrames(model));
  if (!rigid) throw new Error("no rigid part");
  return { ...rigid, remaining: remainingPart(stations, stationFrames(model), rigid.motion) };
};

describe("rigid part of a straight seam", () => {
  const model = straightModel(100, 2);
  const centre: Vector = [50, 0, 0];

  it("is the shift and turn it was moved by; a slide along the seam cannot be seen", () => {
    const { report, remaining } = found(model, moved(model, centre, [0, 0.4, -2.3], [0, 5.05, -0.3]));
    expect(report.translation_mm[1]).toBeCloseTo(5.05, 4);
    expect(report.translation_mm[2]).toBeCloseTo(-0.3, 4);
    expect(report.rotation_deg[1]).toBeCloseTo(0.4, 3);
    expect(report.rotation_deg[2]).toBeCloseTo(-2.3, 3);
    expect(report.unobservable).toEqual(["along_seam"]);
    expect(remaining.rms_mm).toBeLessThan(1e-4);
  });

  it("is any small motion, to the reported digits, but for slide and turn along the seam", () => {
    const turn = fc.double({ min: -3, max: 3, noNaN: true });
    const shift = fc.double({ min: -8, max: 8, noNaN: true });
    fc.assert(
      fc.property(turn, turn, shift, shift, (ry, rz, dy, dz) => {
        const { report, motion, remaining } = found(model, moved(model, centre, [0, ry, rz], [0, dy, dz]));
        expect(remaining.max_abs_mm).toBeLessThan(1e-4);
        // A rotation vector across the seam and the least-norm one differ by what cannot be seen: compare directions.
        const wanted = turned(rotationOf([0, ry * RAD, rz * RAD]), [1, 0, 0]);
        expect(Math.hypot(...minus(turned(motion.rotation, [1, 0, 0]), wanted))).toBeLessThan(1e-8);
        expect(report.unobservable).toEqual(["along_seam"]);
      }),
      { numRuns: 60 },
    );
  });

  it("does not tell a slide along itself from none", () => {
    const slid = found(model, moved(model, centre, [0, 0, 0], [3, 1, 0]));
    expect(slid.report.translation_mm[0]).toBeCloseTo(0, 6);
    expect(slid.report.translation_mm[1]).toBeCloseTo(1, 6);
    expect(slid.remaining.max_abs_mm).toBeLessThan(1e-4);
  });

  it("is the same from some of the stations", () => {
    const some = moved(model, centre, [0, 0.4, -2.3], [0, 5.05, -0.3]).map(
      (station, i): StationResult =>
        i % 3 === 0 || i < 5
          ? station
          : { station_mm: station.station_mm, measured: false, why: "few_points_a" },
    );
    const { report } = found(model, some);
    expect(report.translation_mm[1]).toBeCloseTo(5.05, 4);
    expect(report.rotation_deg[2]).toBeCloseTo(-2.3, 3);
  });

  it("cannot tell the turn about itself where no plate shows it", () => {
    const bare = moved(model, centre, [0, 0, 0], [0, 1, 0]).map(
      ({ plate_a_rot_deg, plate_b_rot_deg, ...rest }): StationResult => rest,
    );
    const { report } = found(model, bare);
    expect(report.unobservable).toEqual(["along_seam", "turn_about_seam"]);
    expect(report.rotation_deg[0]).toBe(0);
  });

  it("turns the other way about in a left-handed frame, where lateral to normal is the other way about", () => {
    const parsed = parseSeamModel({
      ...model,
      seam: {
        ...model.seam,
        vertices: model.seam.vertices.map((vertex) => ({ ...vertex, lateral: [0, -1, 0] })),
      },
    });
    if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
    const stations = moved(parsed.value, centre, [0, 0, 0], [0, 0, 0]).map((station) => ({
      ...station,
      plate_a_rot_deg: 1,
      plate_b_rot_deg: 1,
    }));
    expect(found(parsed.value, stations).report.rotation_deg[0]).toBeCloseTo(-1, 4);
  });

  it("turns about the seam as the plates do", () => {
    const stations = moved(model, centre, [0, 0, 0], [0, 0, 0]).map((station) => ({
      ...station,
      plate_a_rot_deg: 0.8,
      plate_b_rot_deg: 1.2,
    }));
    expect(found(model, stations).report.rotation_deg[0]).toBeCloseTo(1, 4);
  });

  it("leaves a bow, which no motion takes out", () => {
    const stations = moved(model, centre, [0, 0, 0], [0, 1, 0]).map((station): StationResult => {
      const [x, y, z] = station.root_mm ?? [0, 0, 0];
      return { ...station, root_mm: [x, y + 0.4 * (1 - ((x - 50) / 50) ** 2), z] };
    });
    expect(found(model, stations).remaining.bend_lateral_mm).toBeCloseTo(0.4, 3);
  });
});

describe("rigid part of an arc", () => {
  const model = arcModel(150, 220, 2);
  const middle = model.seam.vertices[Math.round((model.seam.vertices.length - 1) / 2)]?.point ?? [0, 0, 0];

  it("is found whole for any small motion but the turn about the circle's own axis", () => {
    const turn = fc.double({ min: -2, max: 2, noNaN: true });
    fc.assert(
      fc.property(turn, turn, fc.double({ min: -5, max: 5, noNaN: true }), (rx, ry, dz) => {
        const stations = moved(model, middle, [rx, ry, 0], [0, 0, dz]);
        const { motion, remaining } = found(model, stations);
        expect(remaining.max_abs_mm).toBeLessThan(2e-4);
        // The motion is held by what it does to the line, since a slide along the circle is free.
        const normal = turned(motion.rotation, [0, 0, 1]);
        const wanted = turned(rotationOf([rx * RAD, ry * RAD, 0]), [0, 0, 1]);
        expect(Math.hypot(...minus(normal, wanted))).toBeLessThan(1e-5);
      }),
      { numRuns: 40 },
    );
  });
});

describe("rigid part of a closed seam", () => {
  const model = circleModel(100, 40);

  it("is found about its middle, but for the turn about its own axis", () => {
    const turn = fc.double({ min: -2, max: 2, noNaN: true });
    const shift = fc.double({ min: -5, max: 5, noNaN: true });
    fc.assert(
      fc.property(turn, turn, shift, shift, shift, (rx, ry, dx, dy, dz) => {
        const stations = moved(model, [0, 0, 0], [rx, ry, 0], [dx, dy, dz]);
        const { motion, remaining } = found(model, stations);
        expect(remaining.max_abs_mm).toBeLessThan(2e-4);
        expect(Math.hypot(...minus(motion.translation_mm, [dx, dy, dz]))).toBeLessThan(1e-6);
        const wanted = turned(rotationOf([rx * RAD, ry * RAD, 0]), [0, 0, 1]);
        expect(Math.hypot(...minus(turned(motion.rotation, [0, 0, 1]), wanted))).toBeLessThan(1e-7);
      }),
      { numRuns: 40 },
    );
  });
});

describe("what remains", () => {
  const model = straightModel(100, 2);
  const still = moved(model, [50, 0, 0], [0, 0, 0], [0, 0, 0]);
  const left = (bend: (x: number) => readonly [number, number], turn_deg = (_x: number) => 0) =>
    found(
      model,
      still.map((station): StationResult => {
        const [x, y, z] = station.root_mm ?? [0, 0, 0];
        const [dy, dz] = bend(x);
        return { ...station, root_mm: [x, y + dy, z + dz], plate_a_rot_deg: turn_deg(x) };
      }),
    ).remaining;

  it("is the largest with its place, square to the seam", () => {
    const { max_abs_mm, at_mm, rms_mm } = left((x) => (x === 60 ? [0.3, 0.4] : [0, 0]));
    expect(at_mm).toBe(60);
    // The fit of 51 stations takes a fiftieth of a single one.
    expect(max_abs_mm).toBeGreaterThan(0.47);
    expect(max_abs_mm).toBeLessThan(0.5);
    expect(rms_mm).toBeCloseTo(0.5 / Math.sqrt(51), 2);
  });

  it("tells a bow across from one along the normal, each with its sign", () => {
    const arch = (x: number) => 1 - ((x - 50) / 50) ** 2;
    const across = left((x) => [-0.4 * arch(x), 0]);
    expect(across.bend_lateral_mm).toBeCloseTo(-0.4, 3);
    expect(across.bend_normal_mm).toBeCloseTo(0, 3);
    expect(left((x) => [0, 0.3 * arch(x)]).bend_normal_mm).toBeCloseTo(0.3, 3);
  });

  it("takes no S for a bow: its middle lies on the chord of its ends", () => {
    const swung = left((x) => [0.5 * ((x - 50) / 50) ** 3, 0]);
    expect(swung.bend_lateral_mm).toBeCloseTo(0, 3);
    expect(swung.max_abs_mm).toBeGreaterThan(0.1);
  });

  it("takes no slope for a bow", () => {
    const sloped = left((x) => [0.01 * x, -0.02 * x]);
    expect([sloped.bend_lateral_mm, sloped.bend_normal_mm, sloped.max_abs_mm]).toEqual([0, 0, 0]);
  });

  it("tells plate A's twist from start to end", () => {
    expect(
      left(
        () => [0, 0],
        (x) => 0.5 + 0.01 * x,
      ).twist_deg,
    ).toBeCloseTo(1, 9);
  });
});

it("is none of a single station", () => {
  const model = straightModel(100, 2);
  expect(
    rigidPart(moved(model, [0, 0, 0], [0, 0, 0], [0, 0, 0]).slice(0, 1), stationFrames(model)),
  ).toBeNull();
});
