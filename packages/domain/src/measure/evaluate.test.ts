import { describe, expect, it } from "vitest";
import type { ScanResult } from "../schemas/scan-result.ts";
import { JOINT_TYPES, parseSeamModel, type SeamModel } from "../schemas/seam-model.ts";
import { evaluateScan } from "./evaluate.ts";
import { drawsFrom } from "./fit/consensus-line.ts";
import { jointFaces } from "./joints/joint-faces.ts";
import type { SectionPoint } from "./joints/nominal-profile.ts";
import { rotationOf, turned, type Vector } from "./result/rotation.ts";
import type { ScanCloud } from "./scan-cloud.ts";
import { jointModel, pointsOn, SECTIONS, scanOf } from "./testing/joints.ts";
import { cloudOf, scanOfT, straightModel } from "./testing/models.ts";

const model = straightModel(60, 2);

function evaluated(of: SeamModel, cloud: ScanCloud): ScanResult {
  const outcome = evaluateScan(of, cloud);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value;
}

const points = (cloud: ScanCloud): Vector[] =>
  Array.from({ length: cloud.count }, (_, k) => [
    cloud.xyz_mm[3 * k] ?? 0,
    cloud.xyz_mm[3 * k + 1] ?? 0,
    cloud.xyz_mm[3 * k + 2] ?? 0,
  ]);

const mapped = (cloud: ScanCloud, to: (p: Vector) => Vector): ScanCloud => ({
  ...cloud,
  xyz_mm: Float64Array.from(points(cloud).flatMap((p) => [...to(p)])),
});

/** A model moved as a whole, or mirrored. */
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

const laterals = (result: ScanResult) => result.stations.map((station) => station.lateral_mm ?? Number.NaN);

function expectSame(one: readonly number[], other: readonly number[], within: number): void {
  expect(one.length).toBe(other.length);
  for (const [i, value] of one.entries())
    expect(Math.abs(value - (other[i] ?? Number.NaN))).toBeLessThan(within);
}

describe("a clean scan", () => {
  const scan = scanOfT(60, { lateral_mm: (x) => 0.8 + 0.01 * x });
  const result = evaluated(model, scan);

  it("gives the deviation at every station, to hundredths of a millimetre", () => {
    expect(result.coverage.share).toBe(1);
    expectSame(
      laterals(result),
      model.seam.vertices.map(({ station_mm }) => 0.8 + 0.01 * station_mm),
      0.02,
    );
    expect(result.verdict).toBe("adapt");
  });

  it("mirrors its signs when scan and model are mirrored", () => {
    const mirror = ([x, y, z]: Vector): Vector => [x, -y, z];
    // The lateral axis is left as it was: the upright now stands on its other side.
    const mirrored = modelMapped(model, mirror, mirror);
    expectSame(laterals(evaluated(mirrored, mapped(scan, mirror))), laterals(result), 2e-3);
    const worldY = evaluated(mirrored, mapped(scan, mirror)).stations.map(
      (s) => s.root_mm?.[1] ?? Number.NaN,
    );
    expectSame(
      worldY,
      result.stations.map((s) => -(s.root_mm?.[1] ?? Number.NaN)),
      2e-3,
    );
  });

  it("states more uncertainty for a noisier scan", () => {
    const noisier = mapped(scan, ([x, y, z]) => [
      x,
      y + 0.05 * Math.sin(91 * z + x),
      z + 0.05 * Math.sin(77 * y + x),
    ]);
    const u = (of: ScanResult) => Math.max(...of.stations.map((station) => station.u_lateral_mm ?? 0));
    expect(u(evaluated(model, noisier))).toBeGreaterThan(u(result));
  });
});

describe("a scan in another frame", () => {
  const scan = scanOfT(60);
  const turn = rotationOf([0.01, -0.006, 0.02]);
  const away = (p: Vector): Vector => {
    const [x, y, z] = turned(turn, p);
    return [x + 1.2, y - 0.8, z + 0.5];
  };
  const off = mapped(scan, away);

  it("is brought back by datum points, their error told", () => {
    const places: Vector[] = [
      [0, -40, 0],
      [80, -40, 0],
      [80, 60, 10],
      [0, 60, 30],
    ];
    const datums = places.map((nominal) => ({ nominal, measured: away(nominal) }));
    const outcome = evaluateScan(model, off, { registering: { by: "datums", datums } });
    if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
    expectSame(laterals(outcome.value), laterals(evaluated(model, scan)), 2e-3);
    expect(outcome.value.registration).toMatchObject({ by: "datums", free: [] });
    expect(outcome.value.registration?.rms_mm).toBeLessThan(1e-9);
  });

  it("is brought back by its own plates, but for the slide along the seam", () => {
    const outcome = evaluateScan(model, off, { registering: { by: "plates" } });
    if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
    expect(outcome.value.registration).toMatchObject({ by: "plates", free: ["along_seam"] });
    for (const station of outcome.value.stations)
      if (station.measured) expect(Math.abs(station.lateral_mm ?? 9)).toBeLessThan(0.03);
  });

  it("is refused with datum points on one line", () => {
    const datums = [0, 1, 2].map((i) => ({ nominal: [i, 0, 0] as const, measured: [i, 0, 0] as const }));
    const outcome = evaluateScan(model, off, { registering: { by: "datums", datums } });
    expect(outcome.ok ? "" : outcome.faults[0]?.code).toBe("registration-undetermined");
  });
});

describe("a step of the joint", () => {
  it("stays a step: the smoothing ends at it on both sides", () => {
    const result = evaluated(model, scanOfT(60, { lateral_mm: (x) => (x < 30.5 ? 0 : 0.5) }));
    for (const { station_mm, lateral_mm, measured } of result.stations)
      if (measured) expect(lateral_mm).toBeCloseTo(station_mm < 30.5 ? 0 : 0.5, 1);
  });
});

describe("bad geometry never gives a number", () => {
  const scattered = cloudOf(
    Array.from(
      { length: 4000 },
      (_, i): Vector => [
        60 * Math.abs(Math.sin(i * 12.9898)),
        30 * Math.sin(i * 78.233),
        30 * Math.sin(i * 37.719),
      ],
    ),
  );
  it.each([
    ["no point near the seam", cloudOf(Array.from({ length: 500 }, (_, i): Vector => [i / 10, 500, 500]))],
    ["plate B missing", scanOfT(60, { only: "a" })],
    ["plate A missing", scanOfT(60, { only: "b" })],
    ["all points on one line", cloudOf(Array.from({ length: 900 }, (_, i): Vector => [i / 15, -3, 0]))],
    ["points without order", scattered],
    ["one point", cloudOf([[1, 0, 0]])],
  ])("%s: hold, with the reason, and no station measured", (_name, cloud) => {
    const result = evaluated(model, cloud);
    expect(result.verdict).toBe("hold");
    expect(result.reasons.some((reason) => reason.check === "coverage")).toBe(true);
    for (const station of result.stations) {
      expect(station.measured).toBe(false);
      expect(station.lateral_mm).toBeUndefined();
      expect(station.why).toBeDefined();
    }
    expect(result.summary.lateral_mm).toBeUndefined();
    expect(result.rigid.unobservable).toEqual(["all"]);
  });

  it("half a scan: the other half is blind, not guessed", () => {
    const all = points(scanOfT(60));
    const half = cloudOf(all.filter(([x]) => x <= 30));
    const result = evaluated(model, half);
    expect(result.verdict).toBe("hold");
    expect(
      result.stations.filter((station) => station.station_mm > 32).every((station) => !station.measured),
    ).toBe(true);
    expect(result.coverage.longest_blind_mm).toBeGreaterThanOrEqual(28);
  });

  it.each([
    ["inches", 1 / 25.4],
    ["metres", 1 / 1000],
  ])("a scan in %s that was declared as mm is refused", (_name, factor) => {
    const outcome = evaluateScan(
      model,
      mapped(scanOfT(60), ([x, y, z]) => [x * factor, y * factor, z * factor]),
    );
    expect(outcome.ok ? [] : outcome.faults.map((fault) => fault.code)).toEqual(["scan-units-implausible"]);
  });
});

describe.each(JOINT_TYPES)("a %s is never read out of what is none", (type) => {
  const joint_model = jointModel(type, SECTIONS[type], { length_mm: 40, step_mm: 2 });
  const joint = jointFaces(joint_model);
  const draw = drawsFrom(9);
  const row = (at: (t: number) => SectionPoint) => Array.from({ length: 200 }, (_, i) => at(i / 5 - 20));
  const onPlate = (plate: "a" | "b") => (_: number, index: number) =>
    pointsOn({ ...joint, faces: joint.faces.filter((face) => face.plate === plate) }, { seed: index + 1 });

  it.each<[string, (x: number, index: number) => readonly SectionPoint[]]>([
    ["plate A alone", onPlate("a")],
    ["plate B alone", onPlate("b")],
    ["a flat table", () => row((t) => [t, 0.3 + 0.02 * draw()])],
    ["a flat plate as high as the surface", () => row((t) => [t, 8 + 0.02 * draw()])],
    ["a wall", () => row((t) => [0.3 + 0.02 * draw(), t])],
    ["points without order", () => row(() => [60 * draw() - 30, 60 * draw() - 30])],
    [
      "many points without order",
      () => Array.from({ length: 2000 }, (): SectionPoint => [40 * draw() - 20, 40 * draw() - 20]),
    ],
    ["one point in each profile", () => [[-3, 0.01]]],
    ["one place all over", () => row(() => [-3, 0])],
  ])("%s", (_name, section) => {
    const result = evaluated(joint_model, scanOf(40, section));
    expect(result.stations.filter((station) => station.measured)).toEqual([]);
    expect(result.verdict).toBe("hold");
    expect(result.reasons.map((reason) => reason.check)).toContain("coverage");
  });
});
