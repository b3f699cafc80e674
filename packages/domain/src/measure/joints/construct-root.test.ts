import { describe, expect, it } from "vitest";
import { JOINT_TYPES, type JointType } from "../../schemas/seam-model.ts";
import { jointModel, type Moves, movedLine, SECTIONS } from "../testing/joints.ts";
import { constructRoot } from "./construct-root.ts";
import { type JointFaces, jointFaces } from "./joint-faces.ts";

const RAD = Math.PI / 180;

/** The faces of moved plates, exactly, as lines in their own nominal axes. */
function exactLines(joint: JointFaces, moves: Moves) {
  const lines = joint.faces.map((face) => movedLine(face, moves));
  return { lines, edges_mm: [lines[0]?.t_mm ?? Number.NaN, lines[1]?.t_mm ?? Number.NaN] as const };
}

const modelOf = (type: JointType) => jointModel(type, SECTIONS[type]);

const at = (type: JointType, moves: Moves) => {
  const joint = jointFaces(modelOf(type));
  const found = constructRoot(joint, exactLines(joint, moves));
  if (!found) throw new Error("no root");
  return found;
};

describe.each(JOINT_TYPES)("%s", (type) => {
  it("stands at the model's root with the model's sizes when nothing is moved", () => {
    const found = at(type, {});
    expect(found.lateral_mm).toBeCloseTo(0, 12);
    expect(found.normal_mm).toBeCloseTo(0, 12);
    expect(found.angle_rad).toBeCloseTo(0, 12);
    const nominal = modelOf(type).section.gap_mm ?? 0;
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

  it.each(["butt_v", "butt_half_v", "butt_square"] as const)(
    "of a %s is measured along plate A's own normal, however the joint is turned",
    (type) => {
      const [s, c] = [Math.sin(6 * RAD), Math.cos(6 * RAD)];
      const found = at(type, { a: [0, 0, 6], b: [-0.8 * s, 0.8 * c, 6] });
      expect(found.mismatch_mm).toBeCloseTo(0.8, 10);
      expect(found.gap_mm).toBeCloseTo(2, 10);
    },
  );
});

it("is no root when faces that should meet are parallel, or one is missing", () => {
  const joint = jointFaces(modelOf("fillet_t"));
  const exact = exactLines(joint, {});
  const parallel = exact.lines.map((line, i) => (i === 1 ? { ...line, angle_rad: Math.PI / 2 } : line));
  expect(constructRoot(joint, { ...exact, lines: parallel })).toBeNull();
  expect(
    constructRoot(joint, { ...exact, lines: exact.lines.map((line, i) => (i === 0 ? null : line)) }),
  ).toBeNull();
});
