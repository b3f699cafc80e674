import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { ScanResult } from "../schemas/scan-result.ts";
import { JOINT_TYPES, parseSeamModel, type SeamModel } from "../schemas/seam-model.ts";
import { evaluateScan } from "./evaluate.ts";
import { jointFaces } from "./joints/joint-faces.ts";
import { readScan } from "./read/read-scan.ts";
import { rotationOf, turned, type Vector } from "./result/rotation.ts";
import type { ScanCloud } from "./scan-cloud.ts";
import { measureSeam } from "./seam/measure-seam.ts";
import { jointModel, pointsOn, SECTIONS, scanOf } from "./testing/joints.ts";

const LENGTH_MM = 40;

/** A joint of each type with something to measure at every station: shifted, slanting, plate B off. */
const JOINTS = JOINT_TYPES.map((type) => {
  const model = jointModel(type, SECTIONS[type], { length_mm: LENGTH_MM, step_mm: 2 });
  const joint = jointFaces(model);
  const scan = scanOf(LENGTH_MM, (x, index) =>
    pointsOn(joint, {
      moves: { a: [0.6 + 0.01 * x, -0.3, 0.5], b: [0.7 + 0.01 * x, -0.2, 0.2] },
      seed: index + 1,
      reach_mm: 25,
    }),
  );
  return { type, model, scan };
});

function evaluated(model: SeamModel, cloud: ScanCloud): ScanResult {
  const outcome = evaluateScan(model, cloud);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value;
}

const pointOf = (cloud: ScanCloud, k: number): Vector => [
  cloud.xyz_mm[3 * k]!,
  cloud.xyz_mm[3 * k + 1]!,
  cloud.xyz_mm[3 * k + 2]!,
];

/** The points of a scan taken in another order. */
const inOrder = (cloud: ScanCloud, order: readonly number[]): ScanCloud => ({
  ...cloud,
  xyz_mm: Float64Array.from(order.flatMap((k) => [...pointOf(cloud, k)])),
  profiles: cloud.profiles && Int32Array.from(order, (k) => cloud.profiles?.[k] ?? 0),
  count: order.length,
});

const mapped = (cloud: ScanCloud, to: (p: Vector) => Vector): ScanCloud => ({
  ...cloud,
  xyz_mm: Float64Array.from(
    Array.from({ length: cloud.count }, (_, k) => to(pointOf(cloud, k))).flatMap((p) => [...p]),
  ),
});

function modelMapped(
  of: SeamModel,
  point: (p: Vector) => Vector,
  direction: (v: Vector) => Vector,
): SeamModel {
  const parsed = parseSeamModel({
    ...of,
    seam: {
      ...of.seam,
      vertices: of.seam.vertices.map((vertex) => ({
        ...vertex,
        point: point(vertex.point),
        tangent: direction(vertex.tangent),
        lateral: direction(vertex.lateral),
        normal: direction(vertex.normal),
      })),
    },
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

/** Everything that each section says, before it is settled and rounded; NaN where a section was not found. */
const rawOf = (model: SeamModel, cloud: ScanCloud): number[] =>
  measureSeam(model, cloud).outcomes.flatMap((one) =>
    one.found
      ? [...Object.values(one.result.at), ...Object.values(one.result.u)].map((value) =>
          Number.isFinite(value) ? value : -99,
        )
      : [Number.NaN],
  );

const angle = fc.double({ min: -3, max: 3, noNaN: true });
const place = fc.double({ min: -1000, max: 1000, noNaN: true });

describe.each(JOINTS)("a scan of a $type", ({ model, scan }) => {
  const still = evaluated(model, scan);
  const raw = rawOf(model, scan);

  it("is measured at every station, with every number finite and its uncertainty above nought", () => {
    expect(still.coverage.share).toBe(1);
    for (const station of still.stations) {
      const numbers = Object.values(station).filter((value) => typeof value === "number");
      expect(numbers.every(Number.isFinite)).toBe(true);
      for (const u of [station.u_lateral_mm, station.u_normal_mm, station.u_angle_deg])
        expect(u).toBeGreaterThan(0);
    }
  });

  it("says the same to a millionth of a millimetre wherever model and scan are moved together", () => {
    fc.assert(
      fc.property(angle, angle, angle, place, place, place, (rx, ry, rz, dx, dy, dz) => {
        const turn = rotationOf([rx, ry, rz]);
        const move = (p: Vector): Vector => {
          const [x, y, z] = turned(turn, p);
          return [x + dx, y + dy, z + dz];
        };
        const moved = rawOf(
          modelMapped(model, move, (v) => turned(turn, v)),
          mapped(scan, move),
        );
        expect(moved.length).toBe(raw.length);
        for (const [i, value] of moved.entries())
          expect(Math.abs(value - (raw[i] ?? Number.NaN))).toBeLessThan(1e-6);
      }),
      { numRuns: 6, seed: 3 },
    );
  });

  it("says the same, to the last digit, whichever order its profiles come in", () => {
    // Seventeen and forty-one have no common part: every profile has its own rank.
    const of = (k: number) => (17 * ((scan.profiles?.[k] ?? 0) + 5)) % (LENGTH_MM + 1);
    const order = Array.from({ length: scan.count }, (_, k) => k).sort((a, b) => of(a) - of(b) || a - b);
    expect(order.slice(0, 3)).not.toEqual([0, 1, 2]);
    expect(evaluated(model, inOrder(scan, order))).toEqual(still);
  });

  it("says the same with points that lie outside the section or past the ends", () => {
    const extra: Vector[] = Array.from(
      { length: 300 },
      (_, i): Vector => [i % 41, 75 + (i % 7), 3 * (i % 11)],
    );
    const past: Vector[] = Array.from({ length: 300 }, (_, i): Vector => [-30 - (i % 7), -0.1 * i, 0.02]);
    const more: ScanCloud = {
      ...scan,
      xyz_mm: Float64Array.from([...scan.xyz_mm, ...[...extra, ...past].flat()]),
      profiles: Int32Array.from([
        ...(scan.profiles ?? []),
        ...extra.map(([x]) => x),
        ...past.map(() => LENGTH_MM + 1),
      ]),
      count: scan.count + 600,
    };
    expect(evaluated(model, more)).toEqual({ ...still, points: scan.count + 600 });
  });

  it("says the same read from inches as from millimetres", () => {
    const text = (per: number, name: string) =>
      [
        `station_${name},x_${name},y_${name},z_${name}`,
        ...Array.from({ length: scan.count }, (_, k) =>
          [scan.profiles?.[k] ?? 0, ...pointOf(scan, k)].map((value) => String(value / per)).join(","),
        ),
      ].join("\n");
    const read = (per: number, units: "mm" | "in") => {
      const outcome = readScan({
        name: "scan.csv",
        bytes: new TextEncoder().encode(text(per, units)),
        units,
      });
      if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
      return outcome.value;
    };
    const [mm, inches] = [rawOf(model, read(1, "mm")), rawOf(model, read(25.4, "in"))];
    expect(mm.length).toBe(raw.length);
    for (const [i, value] of inches.entries())
      expect(Math.abs(value - (mm[i] ?? Number.NaN))).toBeLessThan(1e-6);
  });

  it("keeps its signs across and turns them along when the seam is walked from its other end", () => {
    const walked = modelMapped(
      {
        ...model,
        seam: {
          ...model.seam,
          vertices: [...model.seam.vertices]
            .reverse()
            .map((vertex, i) => ({ ...vertex, station_mm: model.seam.vertices[i]?.station_mm ?? 0 })),
        },
      },
      (p) => p,
      (v) => [-v[0], v[1], v[2]],
    );
    const back = evaluated(walked, scan);
    for (const [i, station] of back.stations.entries()) {
      const same = still.stations[still.stations.length - 1 - i];
      expect(Math.abs((station.lateral_mm ?? 99) - (same?.lateral_mm ?? -99))).toBeLessThan(2e-3);
      expect(Math.abs((station.normal_mm ?? 99) - (same?.normal_mm ?? -99))).toBeLessThan(2e-3);
      expect(Math.abs((station.plate_b_rot_deg ?? 99) - (same?.plate_b_rot_deg ?? -99))).toBeLessThan(0.02);
    }
  });
});

describe("any points whatever", () => {
  const model = jointModel("fillet_t", SECTIONS.fillet_t, { length_mm: LENGTH_MM, step_mm: 2 });

  it("give a result without NaN or a fault, and no number where nothing was measured", () => {
    const coordinate = fc.oneof(
      fc.double({ min: -70, max: 70, noNaN: true }),
      fc.constantFrom(0, -0, 1e9, -1e9, 1e-300, 40, 60),
    );
    const cloud = fc.array(fc.tuple(coordinate, coordinate, coordinate), { maxLength: 120 }).map(
      (points): ScanCloud => ({
        xyz_mm: Float64Array.from(points.flat()),
        count: points.length,
        profiles: null,
        lost: 0,
      }),
    );
    fc.assert(
      fc.property(cloud, (points) => {
        const outcome = evaluateScan(model, points);
        if (!outcome.ok) {
          expect(outcome.faults.map((fault) => fault.code)).toEqual(["scan-units-implausible"]);
          return;
        }
        // JSON has no NaN: it would come back as null.
        expect(JSON.parse(JSON.stringify(outcome.value))).toEqual(outcome.value);
        for (const station of outcome.value.stations)
          if (!station.measured)
            expect(Object.keys(station).sort()).toEqual(["measured", "station_mm", "why"]);
      }),
      { numRuns: 150 },
    );
  });
});
