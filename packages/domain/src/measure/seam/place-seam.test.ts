import { describe, expect, it } from "vitest";
import { jointFaces } from "../joints/joint-faces.ts";
import type { SectionPoint } from "../joints/nominal-profile.ts";
import { jointModel, pointsOn, SECTIONS, scanOf } from "../testing/joints.ts";
import { placeSeam } from "./place-seam.ts";
import { lineFrames } from "./seam-frames.ts";
import { sectionPoints } from "./section-points.ts";
import { slicesOf } from "./slices.ts";

const LENGTH_MM = 150;
const model = jointModel("fillet_t", SECTIONS.fillet_t, { length_mm: LENGTH_MM, step_mm: 2 });
const joint = jointFaces(model);

const placed = (at: (x: number, index: number) => readonly SectionPoint[]) =>
  placeSeam(slicesOf(sectionPoints(lineFrames(model), scanOf(LENGTH_MM, at))), joint);

/** The joint moved across at each place along the seam. */
const shifted =
  (l: (x: number) => number, n: (x: number) => number = () => 0) =>
  (x: number, index: number) => {
    const move = [l(x), n(x), 0] as const;
    return pointsOn(joint, { moves: { a: move, b: move }, seed: index + 1 });
  };

/** How far the nearest of the placements that are tried lies from the truth, at its worst, at each of some places. */
function worst(
  found: ReturnType<typeof placed>,
  l: (x: number) => number,
  places: readonly number[],
): number {
  return Math.max(
    ...places.map((x) =>
      Math.min(...(found?.(x) ?? []).map((place) => Math.hypot(place.l_mm - l(x), place.n_mm))),
    ),
  );
}

const EVERYWHERE = Array.from({ length: 16 }, (_, i) => 10 * i);

describe("where the joint lies along the seam", () => {
  it("follows a joint that is shifted and slants", () => {
    const slant = (x: number) => 3 + 0.03 * (x - 75);
    expect(worst(placed(shifted(slant)), slant, EVERYWHERE)).toBeLessThan(1);
  });

  it("follows a bow", () => {
    const bow = (x: number) => 2 * Math.sin((Math.PI * x) / LENGTH_MM);
    expect(worst(placed(shifted(bow)), bow, EVERYWHERE)).toBeLessThan(1.2);
  });

  it("tries both sides where it steps", () => {
    const step = (x: number) => (x < 71 ? 0 : 3);
    const found = placed(shifted(step));
    expect(worst(found, step, EVERYWHERE)).toBeLessThan(0.8);
    expect(found?.(71).length).toBe(3);
  });

  it("tries one place where it runs on evenly", () => {
    expect(placed(shifted(() => 1))?.(60).length).toBe(1);
  });

  it("leaves out one place that contradicts those beside it", () => {
    // At 60 to 75 mm the scan shows a joint 9 mm to the side: a clamp with a corner of its own.
    const clamp = (x: number) => (x >= 60 && x < 75 ? 9 : 0);
    const found = placed(shifted(clamp));
    expect(worst(found, () => 0, EVERYWHERE)).toBeLessThan(0.8);
  });

  it("bridges a stretch without points", () => {
    const torn = (x: number, index: number) => (x > 50 && x < 90 ? [] : shifted(() => 2)(x, index));
    expect(worst(placed(torn), () => 2, EVERYWHERE)).toBeLessThan(0.8);
  });

  it("is nowhere where there are no points, too few in each section, or none of the joint's", () => {
    expect(placed(() => [])).toBeNull();
    expect(placed((_, index) => pointsOn(joint, { seed: index + 1 }).slice(0, 20))).toBeNull();
    const scattered = (x: number): SectionPoint[] =>
      Array.from(
        { length: 200 },
        (_, i): SectionPoint => [30 * Math.sin(12.9898 * i + x), 30 * Math.sin(78.233 * i + 3 * x)],
      );
    expect(placed(scattered)).toBeNull();
  });
});
