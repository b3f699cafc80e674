import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { StationResult } from "../../schemas/scan-result.ts";
import type { SeamModel } from "../../schemas/seam-model.ts";
import { stationFrames } from "../seam/seam-frames.ts";
import { arcModel, straightModel } from "../testing/models.ts";
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

it("is none of a single station", () => {
  const model = straightModel(100, 2);
  expect(
    rigidPart(moved(model, [0, 0, 0], [0, 0, 0], [0, 0, 0]).slice(0, 1), stationFrames(model)),
  ).toBeNull();
});
