import { describe, expect, it } from "vitest";
import type { FittedLine } from "../fit/line-fit.ts";
import { type JointFaces, jointFaces } from "../joints/joint-faces.ts";
import type { SectionPoint } from "../joints/nominal-profile.ts";
import { jointModel, type Moves, movedLine, pointsOn, SECTIONS, sliceFrom } from "../testing/joints.ts";
import { seenGap } from "./seen-gap.ts";
import { surfaceEdge } from "./surface-edge.ts";

const exactly = (line: ReturnType<typeof movedLine>): FittedLine => ({
  ...line,
  scale_mm: 0.02,
  inliers: 100,
  weight: 100,
  spread_mm2: 1000,
});

const fitsOf = (joint: JointFaces, moves: Moves) =>
  joint.faces.map((face) => exactly(movedLine(face, moves)));

const SPACING_MM = 0.1;

describe.each([
  ["fillet_t", "b"],
  ["lap", "b"],
  ["corner_open", "a"],
] as const)("seen gap of a %s", (type, plate) => {
  const joint = jointFaces(jointModel(type, SECTIONS[type]));
  const seen = (gap_mm: number, keep: (point: SectionPoint) => boolean = () => true) => {
    const moves: Moves = { [plate]: [0, gap_mm, 0] };
    const points = pointsOn(joint, { moves, noise_mm: 0, spacing_mm: SPACING_MM }).filter(keep);
    return seenGap(sliceFrom(points), joint, fitsOf(joint, moves));
  };

  it.each([0.5, 1, 2.4])(
    "is from the root to the edge's first point, half a spacing less: %d mm",
    (gap_mm) => {
      const gap = seen(gap_mm);
      // The first point stands half a spacing past the edge.
      expect(gap?.gap_mm).toBeCloseTo(gap_mm, 6);
      expect(gap?.is_open).toBe(true);
      expect(gap?.begins_mm).toBeCloseTo(gap_mm + SPACING_MM / 2, 6);
      expect(gap?.u_mm).toBeCloseTo(SPACING_MM / Math.sqrt(12), 6);
    },
  );

  it("of a closed joint is anything from nought to where the points begin", () => {
    const gap = seen(0);
    if (!gap) throw new Error("no gap");
    expect(gap.is_open).toBe(false);
    expect(gap.begins_mm).toBeGreaterThan(0);
    expect(gap.begins_mm).toBeLessThan(0.3);
    expect(gap.gap_mm).toBeCloseTo(gap.begins_mm / 2, 9);
    expect(gap.u_mm).toBeCloseTo(gap.begins_mm / Math.sqrt(12), 9);
  });

  it("is none where metal covers both faces at the root", () => {
    expect(seen(0, ([l, n]) => Math.hypot(l, n) > 3)).toBeNull();
  });

  it("is none where a face is missing", () => {
    const points = sliceFrom(pointsOn(joint, {}));
    expect(
      seenGap(
        points,
        joint,
        fitsOf(joint, {}).map((fit, i) => (i === 0 ? null : fit)),
      ),
    ).toBeNull();
  });
});

it("no gap is seen of a butt joint: it is constructed", () => {
  const joint = jointFaces(jointModel("butt_v", SECTIONS.butt_v));
  expect(seenGap(sliceFrom(pointsOn(joint)), joint, fitsOf(joint, {}))).toBeNull();
});

describe("the edge of a surface", () => {
  const joint = jointFaces(jointModel("butt_square", SECTIONS.butt_square));
  const [left, right] = joint.faces;
  if (!left || !right) throw new Error("no faces");

  /** Both surfaces, the right one moved. */
  const edgeOf = (face: typeof left, moves: Moves, keep: (point: SectionPoint) => boolean = () => true) => {
    const points = pointsOn(joint, { moves, noise_mm: 0, spacing_mm: SPACING_MM }).filter(keep);
    return surfaceEdge(sliceFrom(points), joint, {
      face,
      fit: exactly(movedLine(face, moves)),
      expected_mm: 0,
    });
  };

  it("is the far side of the opening, half a spacing less, u of a rectangle over a spacing either way", () => {
    const edge = edgeOf(right, { b: [0.6, 0, 0] });
    expect(edge?.t_mm).toBeCloseTo(0.6, 6);
    expect(edge?.u_mm).toBeCloseTo(SPACING_MM / Math.sqrt(3), 6);
    expect(edgeOf(left, { a: [-0.4, 0, 0] })?.t_mm).toBeCloseTo(0.4, 6);
  });

  it("is found where the other plate is out of line, so that nothing lies before it", () => {
    expect(edgeOf(right, { a: [0, -1.5, 0], b: [0.3, 0, 0] })?.t_mm).toBeCloseTo(0.3, 6);
  });

  it("is not a few lost returns farther out", () => {
    const lost = ([l]: SectionPoint) => !(l > 3 && l < 3.35);
    expect(edgeOf(right, {}, lost)?.t_mm).toBeCloseTo(0, 6);
  });

  it("is none where it is farther off than a plate is looked for", () => {
    expect(edgeOf(right, { b: [6, 0, 0] })).toBeNull();
  });
});
