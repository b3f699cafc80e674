import { describe, expect, it } from "vitest";
import { JOINT_TYPES, type JointType } from "../../schemas/seam-model.ts";
import { jointModel, SECTIONS } from "../testing/joints.ts";
import { type NominalProfile, nominalProfile } from "./nominal-profile.ts";

const drawn = (type: JointType, more: object = {}) =>
  nominalProfile(jointModel(type, { ...SECTIONS[type], ...more }));

/** Every corner, to a millionth of a millimetre. */
function expectCorners(found: NominalProfile, plate_a: number[][], plate_b: number[][]): void {
  const rounded = (line: NominalProfile["plate_a"]) =>
    line.map((point) => point.map((value) => Math.round(value * 1e6) / 1e6 + 0));
  expect(rounded(found.plate_a)).toEqual(plate_a);
  expect(rounded(found.plate_b)).toEqual(plate_b);
}

/** 8 mm deep bevels of 30° and of 45° run this far across. */
const RUN_30 = 4.618802;
const RUN_45 = 8;

describe("nominal profile", () => {
  it("of a T: plate A's surface from the left, the upright on it, over its gap", () => {
    const a = [
      [-40, 0],
      [0, 0],
    ];
    expectCorners(drawn("fillet_t"), a, [
      [0, 0],
      [0, 20],
    ]);
    expectCorners(drawn("fillet_t", { gap_mm: 0.5 }), a, [
      [0, 0.5],
      [0, 20.5],
    ]);
  });

  it("of a T whose upright leans over the open side, where the model says less than 90°", () => {
    const { plate_b } = drawn("fillet_t", { included_angle_deg: 60 });
    expect(plate_b[1]?.[0]).toBeCloseTo(-10, 9);
    expect(plate_b[1]?.[1]).toBeCloseTo(20 * Math.sin(Math.PI / 3), 9);
  });

  it("of an inside corner: as a T", () => {
    expectCorners(
      drawn("corner_closed"),
      [
        [-40, 0],
        [0, 0],
      ],
      [
        [0, 0],
        [0, 15],
      ],
    );
  });

  it("of an upright without a height: wider than any window", () => {
    const { plate_b } = nominalProfile(
      jointModel("fillet_t", { plate_a: { thickness_mm: 12 }, plate_b: { thickness_mm: 6 } }),
    );
    expect(plate_b).toEqual([
      [expect.closeTo(0), 0],
      [expect.closeTo(0), 40],
    ]);
  });

  it("of a lap: plate B's edge face and its top, over the gap", () => {
    expectCorners(
      drawn("lap", { gap_mm: 0.4 }),
      [
        [-40, 0],
        [0, 0],
      ],
      [
        [0, 0.4],
        [0, 6.4],
        [40, 6.4],
      ],
    );
  });

  it("of an open corner: the notch between both end faces, plate A over the gap", () => {
    expectCorners(
      drawn("corner_open", { gap_mm: 0.8 }),
      [
        [-40, 8.8],
        [0, 8.8],
        [0, 0.8],
      ],
      [
        [0, 0],
        [10, 0],
        [10, -40],
      ],
    );
  });

  it("of a V: bevels of half the groove angle down to the root edges, then the root faces", () => {
    expectCorners(
      drawn("butt_v"),
      [
        [-41 - RUN_30, 8],
        [-1 - RUN_30, 8],
        [-1, 0],
        [-1, -2],
      ],
      [
        [1, -2],
        [1, 0],
        [1 + RUN_30, 8],
        [41 + RUN_30, 8],
      ],
    );
  });

  it("of a half V: plate A square, plate B with the whole groove angle", () => {
    expectCorners(
      drawn("butt_half_v"),
      [
        [-41, 8],
        [-1, 8],
        [-1, 0],
        [-1, -2],
      ],
      [
        [1, -2],
        [1, 0],
        [1 + RUN_45, 8],
        [41 + RUN_45, 8],
      ],
    );
  });

  it("of a square butt: both surfaces, the root between their edges", () => {
    expectCorners(
      drawn("butt_square"),
      [
        [-41, 0],
        [-1, 0],
      ],
      [
        [1, 0],
        [41, 0],
      ],
    );
  });

  it("of a V with its own depth: not worked out from thickness and root face", () => {
    const { plate_a } = drawn("butt_v", { root_depth_below_surface_mm: 6 });
    expect(plate_a.map(([, n]) => n)).toEqual([6, 6, 0, -2]);
  });

  it("is the model's own where it has one", () => {
    const nominal_profile = {
      plate_a: [
        [-25, 1],
        [0, 0],
      ],
      plate_b: [
        [0, 0],
        [3, 30],
      ],
    };
    expect(drawn("fillet_t", { nominal_profile })).toMatchObject(nominal_profile);
  });

  it.each(JOINT_TYPES)(
    "of a %s runs from plate A's far end to plate B's, neither crossing the root",
    (type) => {
      const { plate_a, plate_b } = drawn(type);
      for (const line of [plate_a, plate_b]) expect(line.length).toBeGreaterThanOrEqual(2);
      expect(plate_a[0]?.[0]).toBeLessThanOrEqual(-40);
      expect(Math.max(...plate_a.map(([l]) => l))).toBeLessThanOrEqual(0);
      expect(Math.min(...plate_b.map(([l]) => l))).toBeGreaterThan(-1e-9);
    },
  );
});
