import { describe, expect, it } from "vitest";
import { drawsFrom } from "../fit/consensus-line.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import type { SectionPoint } from "../joints/nominal-profile.ts";
import type { SliceOutcome } from "../section/measure-slice.ts";
import { jointModel, pointsOn, SECTIONS, scanOf } from "../testing/joints.ts";
import { guidesFor } from "./guides.ts";
import { measureSeam } from "./measure-seam.ts";

const LENGTH_MM = 60;
const model = jointModel("fillet_t", SECTIONS.fillet_t, { length_mm: LENGTH_MM, step_mm: 2 });
const joint = jointFaces(model);

type Section = (x: number, index: number) => readonly SectionPoint[];

/** The joint with plate B moved across at each place. */
const withB =
  (l: (x: number) => number): Section =>
  (x, index) =>
    pointsOn(joint, { moves: { b: [l(x), 0, 0] }, seed: index + 1 });

const seamOf = (section: Section) => measureSeam(model, scanOf(LENGTH_MM, section));
const lateralAt = (outcomes: readonly SliceOutcome[], i: number) => {
  const one = outcomes[i];
  return one?.found ? one.result.at.lateral_mm : Number.NaN;
};
const whyAt = (outcomes: readonly SliceOutcome[], i: number) => {
  const one = outcomes[i];
  return one && !one.found ? one.why : "found";
};

describe("slices measured along a seam", () => {
  it("are one a profile, each with its own root", () => {
    const { outcomes, slices, outside } = seamOf(withB((x) => 0.5 + 0.01 * x));
    expect(slices.count).toBe(61);
    expect(outside).toBe(0);
    for (let i = 0; i <= 60; i++)
      expect(Math.abs(lateralAt(outcomes, i) - 0.5 - 0.01 * i)).toBeLessThan(0.04);
  });

  it("are fitted again from their neighbours' faces where too little of their own is seen to be sure", () => {
    // One section shows no more than a millimetre of the upright.
    const short: Section = (x, index) =>
      withB(() => 0.4)(x, index).filter(([l, n]) => x !== 30 || n < 0.5 || l < -1 || (n > 4 && n < 5.6));
    const { outcomes } = seamOf(short);
    const one = outcomes[30];
    if (!one?.found) throw new Error(one?.why);
    expect(Math.abs(one.result.at.lateral_mm - 0.4)).toBeLessThan(0.08);
    // Plate B's own direction would be unsure by degrees.
    expect(Math.abs(one.result.at.turn_b_rad)).toBeLessThan((1 * Math.PI) / 180);
  });

  it("are ambiguous where both sides contradict them, not smoothed over", () => {
    // One section of 61 stands 0.9 mm off: a scale of slag, or a profile mislaid.
    const { outcomes } = seamOf(withB((x) => (x === 30 ? 0.9 : 0)));
    expect(whyAt(outcomes, 30)).toBe("ambiguous");
    for (const i of [27, 28, 29, 31, 32, 33]) expect(Math.abs(lateralAt(outcomes, i))).toBeLessThan(0.05);
  });

  it("keep a step: neither of its sides is ambiguous", () => {
    const { outcomes } = seamOf(withB((x) => (x < 30.5 ? 0 : 1.5)));
    for (let i = 0; i <= 60; i++)
      expect(Math.abs(lateralAt(outcomes, i) - (i < 30.5 ? 0 : 1.5))).toBeLessThan(0.06);
  });

  it("keep what a single section shows within three tenths of nothing", () => {
    const { outcomes } = seamOf(withB((x) => (x === 30 ? 0.1 : 0)));
    expect(Math.abs(lateralAt(outcomes, 30) - 0.1)).toBeLessThan(0.05);
  });

  it("are blind, with why, where a plate is hidden, and only there", () => {
    const hidden: Section = (x, index) =>
      withB(() => 0)(x, index).filter(([l, n]) => !(x >= 20 && x <= 25) || n < 0.2 || l < -0.5);
    const { outcomes } = seamOf(hidden);
    for (let i = 20; i <= 25; i++) expect(whyAt(outcomes, i)).toMatch(/^(plate_b_not_found|few_points_b)$/);
    expect(outcomes.filter((one) => one.found).length).toBe(55);
  });

  it("are found among spikes in every section", () => {
    const draw = drawsFrom(8);
    const spiked: Section = (x, index) =>
      withB(() => 0.6)(x, index).map(
        ([l, n], i): SectionPoint => (i % 15 === 4 ? [l - 8 * draw(), n + 8 * draw()] : [l, n]),
      );
    const { outcomes } = seamOf(spiked);
    for (let i = 0; i <= 60; i++) expect(Math.abs(lateralAt(outcomes, i) - 0.6)).toBeLessThan(0.05);
  });

  it("are none of a scan elsewhere, and its points are counted", () => {
    const { outcomes, outside } = seamOf(() => [
      [200, 0],
      [0, 200],
    ]);
    expect(outcomes).toEqual([]);
    expect(outside).toBe(122);
  });

  it("are all blind where the joint is found nowhere", () => {
    const flat: Section = () => Array.from({ length: 60 }, (_, i): SectionPoint => [-20 + 0.1 * i, -40]);
    const { outcomes } = seamOf(flat);
    expect(outcomes.length).toBe(61);
    expect(outcomes.every((one) => !one.found)).toBe(true);
  });
});

describe("what neighbours know", () => {
  const { slices, outcomes } = seamOf(withB((x) => 0.02 * x));

  it("is each face's line and direction, from the slices around", () => {
    const { lines, directions } = guidesFor(slices, outcomes, 30, joint.faces.length);
    expect(lines.length).toBe(joint.faces.length);
    // Plate B's face looks along growing normal: its distance counts against the lateral.
    expect(lines[1]?.d_mm).toBeCloseTo(-0.6, 1);
    expect(directions[1]?.angle_rad).toBeCloseTo(0, 2);
    expect(directions[1]?.u_rad).toBeGreaterThanOrEqual((0.15 * Math.PI) / 180);
  });

  it("is nothing of slices that were not found, or lie more than 15 mm off", () => {
    const blind = outcomes.map(
      (one, i): SliceOutcome =>
        Math.abs(i - 30) > 15 || i === 30 ? one : { found: false, why: "no_points" },
    );
    expect(guidesFor(slices, blind, 30, 3)).toEqual({
      lines: [null, null, null],
      directions: [null, null, null],
    });
  });

  it("is no direction from fewer than three", () => {
    const two = outcomes.map(
      (one, i): SliceOutcome => (Math.abs(i - 30) === 1 ? one : { found: false, why: "no_points" }),
    );
    const { lines, directions } = guidesFor(slices, two, 30, 3);
    expect(lines[0]).not.toBeNull();
    expect(directions[0]).toBeNull();
  });

  it("is not the slice's own: it is asked of the others only", () => {
    const odd = outcomes.map((one, i): SliceOutcome => (i === 30 ? { found: false, why: "ambiguous" } : one));
    expect(guidesFor(slices, odd, 30, 3)).toEqual(guidesFor(slices, outcomes, 30, 3));
  });
});
