import { describe, expect, it } from "vitest";
import { JOINT_TYPES, type JointType } from "../../schemas/seam-model.ts";
import { jointModel, SECTIONS } from "../testing/joints.ts";
import { type JointFaces, jointFaces } from "./joint-faces.ts";

const facesOf = (type: JointType, more: object = {}) =>
  jointFaces(jointModel(type, { ...SECTIONS[type], ...more }));

const DEG = 180 / Math.PI;

/** Plate, direction in whole degrees and length in tenths of a millimetre of each face. */
const outline = ({ faces }: JointFaces) =>
  faces.map(
    (face) => `${face.plate} ${Math.round(face.direction_rad * DEG)}° ${Number(face.length_mm.toFixed(1))}`,
  );

describe("faces of a joint, root faces first", () => {
  it.each<[JointType, readonly string[], Partial<JointFaces>]>([
    [
      "fillet_t",
      ["a 180° 40", "b 90° 20", "b 0° 6"],
      { kind: "meeting", next: [-1, 2], form: ["face", "face"], chain: { plate: "b", size_mm: 20 } },
    ],
    [
      "corner_closed",
      ["a 180° 40", "b 90° 15", "b 0° 8"],
      { kind: "meeting", next: [-1, 2], form: ["face", "face"], chain: { plate: "b", size_mm: 15 } },
    ],
    [
      "lap",
      ["a 180° 40", "b 90° 6", "b 0° 40"],
      { kind: "meeting", next: [-1, 2], form: ["face", "face"], chain: { plate: "b", size_mm: 6 } },
    ],
    [
      "corner_open",
      ["a 90° 8", "b 0° 10", "a 180° 40", "b -90° 40"],
      { kind: "meeting", next: [2, 3], form: ["face", "face"], chain: { plate: "a", size_mm: 8 } },
    ],
    [
      "butt_v",
      ["a 120° 9.2", "b 60° 9.2", "a 180° 40", "b 0° 40"],
      { kind: "butt", next: [2, 3], form: ["bevel", "bevel"], depth_mm: [8, 8], chain: null },
    ],
    [
      "butt_half_v",
      ["a 180° 40", "b 45° 11.3", "b 0° 40"],
      { kind: "butt", next: [-1, 2], form: ["edge", "bevel"], depth_mm: [8, 8], chain: null },
    ],
    [
      "butt_square",
      ["a 180° 40", "b 0° 40"],
      { kind: "butt", next: [-1, -1], form: ["edge", "edge"], depth_mm: [0, 0], chain: null },
    ],
  ])("%s", (type, faces, rest) => {
    const joint = facesOf(type);
    expect(outline(joint)).toEqual(faces);
    expect(joint).toMatchObject({ root: [0, 1], ...rest });
  });

  it.each(JOINT_TYPES)("%s: each face runs from its root end to its far end", (type) => {
    for (const face of facesOf(type).faces) {
      expect(face.near[0] + face.length_mm * Math.cos(face.direction_rad)).toBeCloseTo(face.far[0], 9);
      expect(face.near[1] + face.length_mm * Math.sin(face.direction_rad)).toBeCloseTo(face.far[1], 9);
    }
  });

  it.each(JOINT_TYPES)("%s: the longest face of each plate is its own and none is longer", (type) => {
    const { faces, longest } = facesOf(type);
    for (const [side, plate] of (["a", "b"] as const).entries()) {
      const own = faces[longest[side] ?? -1];
      expect(own?.plate).toBe(plate);
      for (const face of faces.filter((one) => one.plate === plate))
        expect(face.length_mm).toBeLessThanOrEqual(own?.length_mm ?? 0);
    }
  });

  it("only a face that another follows ends at a corner", () => {
    expect(facesOf("lap").faces.map((face) => face.far_is_corner)).toEqual([false, true, false]);
    expect(facesOf("butt_v").faces.map((face) => face.far_is_corner)).toEqual([true, true, false, false]);
  });

  it("an upright of unknown height has no top edge and closes no chain", () => {
    const joint = jointFaces(
      jointModel("fillet_t", { plate_a: { thickness_mm: 12 }, plate_b: { thickness_mm: 6 } }),
    );
    expect(outline(joint)).toEqual(["a 180° 40", "b 90° 40"]);
    expect(joint.chain).toBeNull();
  });

  it("an upright whose drawing stops short of its height has no top edge there", () => {
    const nominal_profile = {
      plate_a: [
        [-40, 0],
        [0, 0],
      ],
      plate_b: [
        [0, 0],
        [0, 12],
      ],
    };
    expect(outline(facesOf("fillet_t", { nominal_profile }))).toEqual(["a 180° 40", "b 90° 12"]);
  });

  it("a face too short to be told from an edge is none", () => {
    expect(outline(facesOf("butt_v", { root_face_mm: 9.5 }))).toEqual(["a 180° 40", "b 0° 40"]);
    expect(facesOf("butt_v", { root_face_mm: 9.5 }).form).toEqual(["edge", "edge"]);
  });
});
