import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { JOINT_TYPES } from "../../schemas/seam-model.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import { jointModel, movedLine, movedPoint, pointsOn, SECTIONS, sliceFrom } from "../testing/joints.ts";
import { placeSection, supportFields } from "./place-section.ts";
import { placedLine } from "./placement.ts";

const RAD = Math.PI / 180;
const shift = fc.double({ min: -9, max: 9, noNaN: true });
const turn = fc.double({ min: -6, max: 6, noNaN: true });
const seed = fc.integer({ min: 1, max: 1e6 });

describe.each(JOINT_TYPES)("a %s looked for in a section", (type) => {
  const joint = jointFaces(jointModel(type, SECTIONS[type]));
  const fields = supportFields(joint);

  it("is found to some tenths of a millimetre and about two degrees, wherever it is", () => {
    fc.assert(
      fc.property(shift, shift, turn, seed, (l, n, turn_deg, of) => {
        const move = [l, n, turn_deg] as const;
        const points = pointsOn(joint, { moves: { a: move, b: move }, seed: of, reach_mm: 30 });
        const found = placeSection(sliceFrom(points), fields, null);
        const [l_mm, n_mm] = movedPoint([0, 0], move);
        expect(Math.hypot(found.l_mm - l_mm, found.n_mm - n_mm)).toBeLessThan(0.8);
        expect(Math.abs(found.turn_rad / RAD - turn_deg)).toBeLessThan(2.5);
        expect(found.support).toBeGreaterThan(0.6);
      }),
      { numRuns: 25, seed: 23 },
    );
  });

  it("is found where it stands when it is turned far off, not where it stood before the turn", () => {
    for (const turn_deg of [6, -6]) {
      const move = [8, 8, turn_deg] as const;
      const points = sliceFrom(pointsOn(joint, { moves: { a: move, b: move }, reach_mm: 30 }));
      const found = placeSection(points, fields, null);
      expect(Math.hypot(found.l_mm - 8, found.n_mm - 8)).toBeLessThan(0.5);
    }
  });

  it("is believed beside where it was found before", () => {
    const move = [2.3, -1.2, 2] as const;
    const points = sliceFrom(pointsOn(joint, { moves: { a: move, b: move }, reach_mm: 30 }));
    const found = placeSection(points, fields, { l_mm: 1.9, n_mm: -0.9, turn_rad: 0 });
    expect(Math.hypot(found.l_mm - 2.3, found.n_mm + 1.2)).toBeLessThan(0.6);
  });

  it("is found anew where what held before explains nothing", () => {
    const points = sliceFrom(pointsOn(joint, { reach_mm: 30 }));
    const found = placeSection(points, fields, { l_mm: 14, n_mm: 14, turn_rad: 0 });
    expect(Math.hypot(found.l_mm, found.n_mm)).toBeLessThan(0.6);
  });

  it("has little support among points that are none of its own", () => {
    const cloud = Array.from({ length: 900 }, (_, i): [number, number] => [
      1.7 * (i % 30) - 25,
      1.7 * Math.floor(i / 30) - 25,
    ]);
    expect(placeSection(sliceFrom(cloud), fields, null).support).toBeLessThan(0.3);
  });
});

describe("a placed face", () => {
  const joint = jointFaces(jointModel("corner_open", SECTIONS.corner_open));

  it("is the nominal one, turned about the nominal root, then moved", () => {
    for (const face of joint.faces) {
      const placed = placedLine(face, { l_mm: 1.5, n_mm: -0.5, turn_rad: 3 * RAD });
      const moved = movedLine(face, { a: [1.5, -0.5, 3], b: [1.5, -0.5, 3] });
      expect(placed.t_mm).toBeCloseTo(moved.t_mm, 12);
      expect(placed.d_mm).toBeCloseTo(moved.d_mm, 12);
      expect(placed.angle_rad).toBeCloseTo(moved.angle_rad, 12);
    }
  });
});
