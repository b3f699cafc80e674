import { describe, expect, it } from "vitest";
import { parseSeamModel } from "../schemas/seam-model.ts";
import { drawsFrom } from "./fit/consensus-line.ts";
import { jointFaces } from "./joints/joint-faces.ts";
import type { ScanCloud } from "./scan-cloud.ts";
import { jointModel, type Moves, pointsOn, SECTIONS, scanOf } from "./testing/joints.ts";
import { cloudOf } from "./testing/models.ts";
import { unitMistake } from "./units-check.ts";

const LENGTH_MM = 120;
const model = jointModel("fillet_t", SECTIONS.fillet_t, { length_mm: LENGTH_MM, step_mm: 2 });
const joint = jointFaces(model);

const scan = (moves: Moves = {}, to_mm = LENGTH_MM) =>
  scanOf(to_mm, (_, index) => pointsOn(joint, { moves, seed: index + 1, spacing_mm: 0.3 }));

const scaled = (cloud: ScanCloud, by: number): ScanCloud => ({
  ...cloud,
  xyz_mm: cloud.xyz_mm.map((x) => by * x),
});

const mistake = (cloud: ScanCloud) => unitMistake(model, joint, cloud);

/** The same seam elsewhere on the part: a wrong unit moves it away from itself. */
const AWAY = [300, 200, 100] as const;
const away = parseSeamModel({
  ...model,
  seam: {
    ...model.seam,
    vertices: model.seam.vertices.map((vertex) => ({
      ...vertex,
      point: vertex.point.map((x, k) => x + (AWAY[k] ?? 0)),
    })),
  },
});

describe("a mistaken unit", () => {
  it.each([
    ["inches declared as mm", 1 / 25.4, "in"],
    ["metres declared as mm", 1 / 1000, "m"],
    ["mm declared as inches", 25.4, "mm (it was declared as in)"],
    ["mm declared as metres", 1000, "mm (it was declared as m)"],
  ])("%s is told, with the unit in which the scan fits", (_name, by, unit) => {
    if (!away.ok) throw new Error("model");
    const moved = scan();
    const there = { ...moved, xyz_mm: moved.xyz_mm.map((x, i) => x + (AWAY[i % 3] ?? 0)) };
    expect(unitMistake(away.value, joint, there)).toBeNull();
    const told = unitMistake(away.value, joint, scaled(there, by));
    expect(told).toContain(`read as ${unit} it fits the model along 100 % of it`);
  });

  it("says how far along the seam the scan reaches as declared", () => {
    expect(mistake(scaled(scan(), 1 / 25.4))).toMatch(
      /^as declared the scan reaches along 4 % of the seam; /,
    );
  });

  it("is told of a joint that is some millimetres off, too", () => {
    const off: Moves = { a: [2, -1, 1], b: [2, -1, 1] };
    expect(mistake(scaled(scan(off), 1 / 25.4))).not.toBeNull();
  });

  it.each([
    ["a scan that fits", scan()],
    ["a scan of a joint far off its model", scan({ a: [30, 10, 0], b: [30, 10, 0] })],
    ["a scan of a third of the seam", scan({}, 40)],
    ["a scan of a tenth of the seam", scan({}, 12)],
    ["another part", scaled(scan(), 3)],
    ["a scan of nothing", cloudOf([])],
    ["one point", cloudOf([[0, 0, 0]])],
    ["all points in one place", cloudOf(Array.from({ length: 50 }, () => [3, 0, 0] as const))],
  ])("is not seen in %s", (_name, cloud) => {
    expect(mistake(cloud)).toBeNull();
  });

  it("is not seen in points that would lie about the seam in another unit, but not on its plates", () => {
    const draw = drawsFrom(4);
    const heap = scanOf(LENGTH_MM, () =>
      Array.from({ length: 40 }, () => [80 * draw() - 40, 80 * draw() - 40] as const),
    );
    expect(mistake(scaled(heap, 1 / 25.4))).toBeNull();
  });

  it("is not guessed from a scan that would fit along too little of the seam in another unit", () => {
    expect(mistake(scaled(scan({}, 60), 1 / 25.4))).toBeNull();
    expect(mistake(scaled(scan({}, 80), 1 / 25.4))).not.toBeNull();
  });

  it("is found from some of a great many points as from all", () => {
    const many = scaled(scan(), 1 / 1000);
    expect(many.count).toBeGreaterThan(9000);
    const thinned = cloudOf(
      Array.from({ length: Math.floor(many.count / 10) }, (_, k) => [
        many.xyz_mm[30 * k]!,
        many.xyz_mm[30 * k + 1]!,
        many.xyz_mm[30 * k + 2]!,
      ]),
    );
    expect(mistake(thinned)?.split(";")[1]).toBe(mistake(many)?.split(";")[1]);
  });
});
