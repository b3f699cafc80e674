import { describe, expect, it } from "vitest";
import { JOINT_TYPES, type JointType } from "../../schemas/seam-model.ts";
import { drawsFrom } from "../fit/consensus-line.ts";
import { type JointFaces, jointFaces } from "../joints/joint-faces.ts";
import type { SectionPoint } from "../joints/nominal-profile.ts";
import { jointModel, type Moves, pointsOn, SECTIONS, sliceFrom } from "../testing/joints.ts";
import { normalsFrom } from "../testing/noise.ts";
import { fitSection, meetingAlong } from "./fit-section.ts";
import { measureSlice, type SliceResult } from "./measure-slice.ts";

const jointOf = (type: JointType, more: object = {}) =>
  jointFaces(jointModel(type, { ...SECTIONS[type], ...more }));

const NEAR = { l_mm: 0, n_mm: 0, turn_rad: 0 };

function outcomeOf(joint: JointFaces, points: readonly SectionPoint[]) {
  const input = { slice: sliceFrom(points), joint, placement: NEAR };
  return measureSlice(input, fitSection(input, 7919));
}

function measured(joint: JointFaces, points: readonly SectionPoint[]): SliceResult {
  const outcome = outcomeOf(joint, points);
  if (!outcome.found) throw new Error(outcome.why);
  return outcome.result;
}

const whyNot = (joint: JointFaces, points: readonly SectionPoint[]) => {
  const outcome = outcomeOf(joint, points);
  return outcome.found ? "found" : outcome.why;
};

const both = (move: readonly [number, number, number]): Moves => ({ a: move, b: move });

/** Points drawn on a polyline, 0.1 mm apart, with noise. */
function drawn(corners: readonly SectionPoint[], seed = 3): SectionPoint[] {
  const normal = normalsFrom(seed);
  return corners.slice(1).flatMap(([l1, n1], i) => {
    const [l0, n0] = corners[i] ?? [0, 0];
    const count = Math.ceil(Math.hypot(l1 - l0, n1 - n0) / 0.1);
    return Array.from({ length: count }, (_, k): SectionPoint => {
      const share = (k + 0.5) / count;
      return [l0 + share * (l1 - l0) + 0.03 * normal(), n0 + share * (n1 - n0) + 0.03 * normal()];
    });
  });
}

describe.each(JOINT_TYPES)("one section of a %s", (type) => {
  const joint = jointOf(type);
  // A surface's edge is known to the spacing of its points, a face far better.
  const within_mm = joint.form.includes("edge") ? 0.15 : 0.06;

  it("gives root, sizes and angle where the joint stands off the model", () => {
    const { at, tack } = measured(joint, pointsOn(joint, { moves: both([0.7, -0.4, 0]), spacing_mm: 0.1 }));
    expect(Math.abs(at.lateral_mm - 0.7)).toBeLessThan(within_mm);
    expect(Math.abs(at.normal_mm + 0.4)).toBeLessThan(within_mm);
    expect(Math.abs(at.angle_rad)).toBeLessThan(0.02);
    expect(Math.abs(at.gap_mm - joint.gap_mm)).toBeLessThan(2 * within_mm);
    if (joint.kind === "butt") expect(Math.abs(at.mismatch_mm)).toBeLessThan(0.06);
    expect(tack).toBe(false);
  });

  it("states the error's size", () => {
    const errors = Array.from({ length: 60 }, (_, i) => {
      const { at, u } = measured(joint, pointsOn(joint, { seed: i + 1, spacing_mm: 0.1 }));
      return [at.lateral_mm / u.lateral_mm, at.normal_mm / u.normal_mm] as const;
    });
    for (const k of [0, 1] as const) {
      const beyond = errors.filter((one) => Math.abs(one[k]) > 3).length;
      expect(beyond).toBeLessThanOrEqual(2);
    }
  });

  it("is not moved by spikes, nor by stray points near the root", () => {
    const draw = drawsFrom(31);
    const spiked = pointsOn(joint, { spacing_mm: 0.1 }).map(
      ([l, n], i): SectionPoint => (i % 12 === 5 ? [l, n + 1 + 8 * draw()] : [l, n]),
    );
    const { at, tack } = measured(joint, spiked);
    expect(Math.abs(at.lateral_mm)).toBeLessThan(within_mm);
    expect(Math.abs(at.normal_mm)).toBeLessThan(within_mm);
    expect(tack).toBe(false);
  });

  it("is no section without one of its plates", () => {
    const points = pointsOn(joint, { spacing_mm: 0.1 });
    const ends = joint.faces.map((face) => Math.floor(Math.min(20, face.length_mm) / 0.1));
    const only = (plate: "a" | "b") => {
      let from = 0;
      return joint.faces.flatMap((face, i) => {
        const own = points.slice(from, from + (ends[i] ?? 0));
        from += ends[i] ?? 0;
        return face.plate === plate ? own : [];
      });
    };
    expect(whyNot(joint, only("b"))).toMatch(/^(plate_a_not_found|few_points_a)$/);
    expect(whyNot(joint, only("a"))).toMatch(/^(plate_b_not_found|few_points_b)$/);
  });

  it("is no section of a few points", () => {
    expect(whyNot(joint, [])).toBe("no_points");
    expect(whyNot(joint, pointsOn(joint).slice(0, 15))).toBe("no_points");
  });
});

describe("a section under a tack", () => {
  it.each([3, 4, 5])("of a T with legs of %d mm: the root is constructed from the faces beside it", (leg) => {
    const joint = jointOf("fillet_t");
    const points = [
      ...pointsOn(joint, { spacing_mm: 0.1 }).filter(([l, n]) => l < -leg || n > leg),
      ...drawn([
        [-leg, 0],
        [-0.4 * leg, 0.4 * leg],
        [0, leg],
      ]),
    ];
    const { at, u, tack, seen_gap } = measured(joint, points);
    expect(tack).toBe(true);
    // The edge under the tack is covered.
    expect(seen_gap).toBeNull();
    expect(Math.abs(at.lateral_mm)).toBeLessThan(0.1);
    expect(Math.abs(at.normal_mm)).toBeLessThan(0.1);
    const clear = measured(joint, pointsOn(joint, { spacing_mm: 0.1 }));
    expect(u.normal_mm).toBeGreaterThan(clear.u.normal_mm);
  });

  it("of a V: the root edges are constructed from what is left of the bevels", () => {
    const joint = jointOf("butt_v");
    const level = 2;
    const half = 1 + level * Math.tan(Math.PI / 6);
    const points = [
      ...pointsOn(joint, { spacing_mm: 0.1 }).filter(([, n]) => n > level),
      ...drawn([
        [-half, level],
        [half, level],
      ]),
    ];
    const { at, tack } = measured(joint, points);
    expect(tack).toBe(true);
    expect(Math.abs(at.lateral_mm)).toBeLessThan(0.1);
    expect(Math.abs(at.gap_mm - 2)).toBeLessThan(0.25);
  });

  it("of a square butt whose edges it covers: the root is not seen, and not guessed", () => {
    const joint = jointOf("butt_square");
    const bridged = [
      ...pointsOn(joint, { spacing_mm: 0.1 }),
      ...drawn([
        [-1.5, 0.6],
        [1.5, 0.6],
      ]),
    ];
    expect(whyNot(joint, bridged)).toBe("root_not_seen");
  });

  it("is no tack of a few stray points", () => {
    const joint = jointOf("fillet_t");
    const stray: SectionPoint[] = [
      [-1, 1],
      [-1.5, 1.2],
      [-2, 1],
      [-1.2, 1.8],
    ];
    const { tack } = measured(joint, [...pointsOn(joint, { spacing_mm: 0.1 }), ...stray]);
    expect(tack).toBe(false);
  });

  it("is no tack of four stray points in a coarse scan, where they are a larger share", () => {
    const joint = jointOf("fillet_t");
    const stray: SectionPoint[] = [
      [-1, 1],
      [-1.5, 1.2],
      [-2, 1],
      [-1.2, 1.8],
    ];
    const coarse = pointsOn(joint, { spacing_mm: 0.5 });
    expect(measured(joint, [...coarse, ...stray]).tack).toBe(false);
    expect(measured(joint, [...coarse, ...stray, [-1.7, 1.6]]).tack).toBe(true);
  });

  it("shows no gap under metal, though the faces beneath be seen as well", () => {
    const joint = jointOf("fillet_t");
    const open = pointsOn(joint, { moves: { b: [0, 1, 0] }, spacing_mm: 0.1 });
    const metal = drawn([
      [-3, 0.5],
      [-0.5, 3],
    ]);
    expect(measured(joint, open).seen_gap?.gap_mm).toBeCloseTo(1, 1);
    expect(measured(joint, [...open, ...metal])).toMatchObject({ tack: true, seen_gap: null });
  });

  it("is no tack where metal lies beyond the root's neighbourhood", () => {
    const joint = jointOf("fillet_t");
    const ball = drawn([
      [-9, 1],
      [-8, 2],
      [-7, 1],
    ]);
    expect(measured(joint, [...pointsOn(joint, { spacing_mm: 0.1 }), ...ball]).tack).toBe(false);
  });
});

it("rounded corners, as wide as a laser line, move neither root nor angle", () => {
  const joint = jointOf("fillet_t");
  const radius = 0.7;
  /** The root's corner filled with an arc, the upright's top edge worn off by one. */
  const rounded = (seed: number) => {
    const arc = (l: number, n: number, from: number) =>
      Array.from({ length: 12 }, (_, i): SectionPoint => {
        const angle = from + ((i + 0.5) / 12) * (Math.PI / 2);
        return [l + radius * Math.cos(angle), n + radius * Math.sin(angle)];
      });
    const far = ([l, n]: SectionPoint) => !(n < radius && l > -radius) && !(n > 20 - radius && l < radius);
    return [
      ...pointsOn(joint, { seed, spacing_mm: 0.1, noise_mm: 0.01 }).filter(far),
      ...arc(-radius, radius, -Math.PI / 2),
      ...arc(radius, 20 - radius, Math.PI / 2),
    ];
  };
  const found = Array.from({ length: 20 }, (_, i) => measured(joint, rounded(i + 1)).at);
  const mean = (key: "lateral_mm" | "normal_mm" | "angle_rad") =>
    found.reduce((sum, at) => sum + at[key] / found.length, 0);
  expect(Math.abs(mean("lateral_mm"))).toBeLessThan(0.002);
  expect(Math.abs(mean("normal_mm"))).toBeLessThan(0.002);
  expect(Math.abs(mean("angle_rad"))).toBeLessThan(0.0005);
});

describe("where two faces meet", () => {
  const [surface, upright] = jointOf("fillet_t").faces;
  const on = (d_mm: number, angle_rad = 0) => ({ t_mm: 0, d_mm, angle_rad });

  it("is told along either of them", () => {
    if (!surface || !upright) throw new Error("no faces");
    // Plate A's surface 0.3 mm lower, the upright 0.5 mm toward the open side.
    expect(meetingAlong(surface, on(0.3), upright, on(0.5))).toBeCloseTo(0.5, 12);
    expect(meetingAlong(upright, on(0.5), surface, on(0.3))).toBeCloseTo(-0.3, 12);
  });

  it("is nowhere where they are parallel", () => {
    if (!surface || !upright) throw new Error("no faces");
    expect(meetingAlong(surface, on(0), surface, on(1))).toBeNull();
    expect(meetingAlong(surface, on(0), upright, on(0, Math.PI / 2))).toBeNull();
  });
});
