import { describe, expect, it } from "vitest";
import { type JointType, parseSeamModel, type SeamModel } from "../../schemas/seam-model.ts";
import type { Line } from "../fit/line-fit.ts";
import { constructRoot } from "./construct-root.ts";
import { type JointFaces, jointFaces } from "./joint-faces.ts";

const RAD = Math.PI / 180;

function modelOf(joint_type: JointType, section: object): SeamModel {
  const frame = { tangent: [1, 0, 0], lateral: [0, 1, 0], normal: [0, 0, 1] };
  const parsed = parseSeamModel({
    joint_type,
    seam: {
      length_mm: 10,
      vertices: [
        { station_mm: 0, point: [0, 0, 0], ...frame },
        { station_mm: 10, point: [10, 0, 0], ...frame },
      ],
    },
    section,
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

const plates = (a: number, b: number) => ({ plate_a: { thickness_mm: a }, plate_b: { thickness_mm: b } });

const MODELS: Record<JointType, SeamModel> = {
  fillet_t: modelOf("fillet_t", {
    plate_a: { thickness_mm: 12 },
    plate_b: { thickness_mm: 6, height_mm: 20 },
  }),
  corner_closed: modelOf("corner_closed", {
    plate_a: { thickness_mm: 8 },
    plate_b: { thickness_mm: 8, height_mm: 15 },
  }),
  lap: modelOf("lap", plates(5, 6)),
  corner_open: modelOf("corner_open", plates(8, 10)),
  butt_v: modelOf("butt_v", { ...plates(10, 10), gap_mm: 2, groove_angle_deg: 60, root_face_mm: 2 }),
  butt_half_v: modelOf("butt_half_v", {
    ...plates(10, 10),
    gap_mm: 2,
    groove_angle_deg: 45,
    root_face_mm: 2,
  }),
  butt_square: modelOf("butt_square", { ...plates(4, 4), gap_mm: 2 }),
};

/** Each plate moved as a whole: shift in (lateral, normal), then turn about the nominal root. */
interface Moves {
  readonly a?: readonly [l: number, n: number, turn_deg: number];
  readonly b?: readonly [l: number, n: number, turn_deg: number];
}

/** The faces of moved plates, exactly, as lines in their own nominal axes. */
function exactLines(joint: JointFaces, moves: Moves) {
  const edges: [number, number] = [Number.NaN, Number.NaN];
  const lines = joint.faces.map((face, index): Line => {
    const [dl, dn, turn] = moves[face.plate] ?? [0, 0, 0];
    const [c, s] = [Math.cos(turn * RAD), Math.sin(turn * RAD)];
    const [l, n] = face.near;
    const moved = [l * c - n * s + dl - l, l * s + n * c + dn - n] as const;
    const [fc, fs] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
    const line = {
      t_mm: moved[0] * fc + moved[1] * fs,
      d_mm: moved[1] * fc - moved[0] * fs,
      angle_rad: turn * RAD,
    };
    if (index < 2) edges[index as 0 | 1] = line.t_mm;
    return line;
  });
  return { lines, edges_mm: edges };
}

const at = (type: JointType, moves: Moves) => {
  const joint = jointFaces(MODELS[type]);
  const found = constructRoot(joint, exactLines(joint, moves));
  if (!found) throw new Error("no root");
  return found;
};

describe.each(Object.keys(MODELS) as JointType[])("%s", (type) => {
  it("stands at the model's root with the model's sizes when nothing is moved", () => {
    const found = at(type, {});
    expect(found.lateral_mm).toBeCloseTo(0, 12);
    expect(found.normal_mm).toBeCloseTo(0, 12);
    expect(found.angle_rad).toBeCloseTo(0, 12);
    const nominal = MODELS[type].section.gap_mm ?? 0;
    if (Number.isFinite(found.gap_mm)) expect(found.gap_mm).toBeCloseTo(nominal, 10);
    if (type.startsWith("butt")) expect(found.mismatch_mm).toBeCloseTo(0, 12);
    else expect(found.mismatch_mm).toBeNaN();
  });

  it("follows a joint that is moved as a whole", () => {
    const found = at(type, { a: [1.5, -0.7, 0], b: [1.5, -0.7, 0] });
    expect(found.lateral_mm).toBeCloseTo(1.5, 10);
    expect(found.normal_mm).toBeCloseTo(-0.7, 10);
    expect(found.angle_rad).toBeCloseTo(0, 12);
  });

  it("turns with the joint about the root and keeps its sizes", () => {
    const [still, turned] = [at(type, {}), at(type, { a: [0, 0, 2], b: [0, 0, 2] })];
    expect(turned.lateral_mm).toBeCloseTo(0, 10);
    expect(turned.normal_mm).toBeCloseTo(0, 10);
    expect(turned.turn_a_rad).toBeCloseTo(2 * RAD, 12);
    expect(turned.turn_b_rad).toBeCloseTo(2 * RAD, 12);
    expect(turned.angle_rad).toBeCloseTo(0, 12);
    if (Number.isFinite(still.gap_mm)) expect(turned.gap_mm).toBeCloseTo(still.gap_mm, 10);
  });

  it("opens less when plate B turns from lateral toward normal, more when plate A does", () => {
    expect(at(type, { b: [0, 0, 1.5] }).angle_rad).toBeCloseTo(-1.5 * RAD, 12);
    expect(at(type, { a: [0, 0, 1.5] }).angle_rad).toBeCloseTo(1.5 * RAD, 12);
  });
});

describe("the gap", () => {
  it("of a T or lap joint is how far plate B stands off, from its far corner and its size", () => {
    expect(at("fillet_t", { b: [0, 0.6, 0] }).gap_mm).toBeCloseTo(0.6, 10);
    expect(at("lap", { b: [0, 0.9, 0] }).gap_mm).toBeCloseTo(0.9, 10);
    expect(at("lap", { b: [0, 0.9, 0] }).normal_mm).toBeCloseTo(0, 12);
  });

  it("of a corner is how far plate A stands off", () => {
    expect(at("corner_open", { a: [0, 0.8, 0] }).gap_mm).toBeCloseTo(0.8, 10);
    expect(at("corner_open", { a: [0, 0.8, 0] }).normal_mm).toBeCloseTo(0, 12);
  });

  it.each(["butt_v", "butt_half_v", "butt_square"] as const)(
    "of a %s opens with plate B moved away",
    (type) => {
      const found = at(type, { b: [0.5, 0, 0] });
      expect(found.gap_mm).toBeCloseTo(2.5, 10);
      expect(found.lateral_mm).toBeCloseTo(0.25, 10);
    },
  );
});

describe("the mismatch", () => {
  it.each(["butt_v", "butt_half_v", "butt_square"] as const)(
    "of a %s is positive where B stands proud",
    (type) => {
      const found = at(type, { b: [0, 0.8, 0] });
      expect(found.mismatch_mm).toBeCloseTo(0.8, 10);
      expect(found.normal_mm).toBeCloseTo(0.4, 10);
    },
  );
});

it("is no root when faces that should meet are parallel, or one is missing", () => {
  const joint = jointFaces(MODELS.fillet_t);
  const exact = exactLines(joint, {});
  const parallel = exact.lines.map((line, i) => (i === 1 ? { ...line, angle_rad: Math.PI / 2 } : line));
  expect(constructRoot(joint, { ...exact, lines: parallel })).toBeNull();
  expect(
    constructRoot(joint, { ...exact, lines: exact.lines.map((line, i) => (i === 0 ? null : line)) }),
  ).toBeNull();
});
