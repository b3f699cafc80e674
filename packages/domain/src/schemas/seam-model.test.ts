import { describe, expect, it } from "vitest";
import { DEFAULT_LIMITS, parseSeamModel, resolveLimits } from "./seam-model.ts";

const aVertex = (station_mm: number) => ({
  station_mm,
  point: [station_mm, 127, 0],
  tangent: [1, 0, 0],
  lateral: [0, 1, 0],
  normal: [0, 0, 1],
});

const aModel = () => ({
  case: "T-1",
  joint_type: "fillet_t",
  seam: { length_mm: 10, closed: false, vertices: [aVertex(0), aVertex(5), aVertex(10)] },
  section: { plate_a: { thickness_mm: 12 }, plate_b: { thickness_mm: 6 } },
});

const pointers = (json: unknown) => {
  const outcome = parseSeamModel(json);
  return outcome.ok ? [] : outcome.faults.map((fault) => fault.pointer);
};

const withVertex = (index: number, change: object) => {
  const model = aModel();
  Object.assign(model.seam.vertices[index] ?? {}, change);
  return model;
};

describe("a seam model", () => {
  it("is taken with keys that are not known, and keeps them", () => {
    const outcome = parseSeamModel({ ...aModel(), scanner: { points_per_profile: 320 } });
    expect(outcome.ok && outcome.value["scanner"]).toEqual({ points_per_profile: 320 });
  });

  it.each([
    ["a normal of length zero", { normal: [0, 0, 0] }, "/seam/vertices/1/normal"],
    ["a tangent that is no unit vector", { tangent: [2, 0, 0] }, "/seam/vertices/1/tangent"],
    ["a lateral that is not square to the tangent", { lateral: [0.6, 0.8, 0] }, "/seam/vertices/1/lateral"],
    ["a station before the one before it", { station_mm: -1 }, "/seam/vertices/1/station_mm"],
    ["a point far from its station", { point: [50, 127, 0] }, "/seam/vertices/1/point"],
    ["a normal that is not a number", { normal: [Number.NaN, 0, 1] }, "/seam/vertices/1/normal/0"],
    ["a point of two numbers", { point: [5, 127] }, "/seam/vertices/1/point"],
  ])("is refused with %s, naming the field", (_what, change, pointer) => {
    expect(pointers(withVertex(1, change))).toContain(pointer);
  });

  it("is refused with a single station, an unknown joint and inches, all named at once", () => {
    const model = aModel();
    model.seam.vertices.length = 1;
    expect(pointers({ ...model, joint_type: "tee", units: { length: "in", angle: "deg" } })).toEqual([
      "/units/length",
      "/joint_type",
      "/seam/vertices",
    ]);
  });

  it("is refused when it is no object at all", () => {
    expect(pointers(null)).toEqual([""]);
    expect(pointers("model")).toEqual([""]);
  });

  it("is refused with a limit that does not exist, naming it", () => {
    expect(pointers({ ...aModel(), limits: { within: { width_mm: 1 } } })).toEqual([
      "/limits/within/width_mm",
    ]);
  });

  it("names fifty faults at most", () => {
    const model = aModel();
    model.seam.vertices = Array.from({ length: 500 }, (_, index) => ({
      ...aVertex(index),
      normal: [0, 0, 0],
    }));
    expect(pointers(model)).toHaveLength(50);
  });

  it("may be a mirrored one, with left-handed frames", () => {
    const model = aModel();
    for (const vertex of model.seam.vertices) vertex.lateral = [0, -1, 0];
    expect(parseSeamModel(model).ok).toBe(true);
  });
});

describe("limits", () => {
  it("take the default where the model is silent", () => {
    const limits = resolveLimits({ within: { gap_mm: 0.2 }, longest_blind_mm: 4 });
    expect(limits.within).toEqual({ ...DEFAULT_LIMITS.within, gap_mm: 0.2 });
    expect(limits.adapt).toEqual(DEFAULT_LIMITS.adapt);
    expect(limits.longest_blind_mm).toBe(4);
    expect(limits.coverage_share).toBe(DEFAULT_LIMITS.coverage_share);
  });
});
