import { describe, expect, it } from "vitest";
import { jointFaces } from "./joints/joint-faces.ts";
import type { SectionPoint } from "./joints/nominal-profile.ts";
import { measureSeam } from "./seam/measure-seam.ts";
import { sectionAt } from "./section-at.ts";
import { jointModel, pointsOn, SECTIONS, scanOf } from "./testing/joints.ts";

const LENGTH_MM = 40;
const model = jointModel("fillet_t", SECTIONS.fillet_t, { length_mm: LENGTH_MM, step_mm: 2 });
const joint = jointFaces(model);

type Section = (x: number, index: number) => readonly SectionPoint[];
const clean: Section = (_, index) =>
  pointsOn(joint, { moves: { b: [0.8, 0, 0] }, seed: index + 1, spacing_mm: 0.1 });
const seamOf = (section: Section) => measureSeam(model, scanOf(LENGTH_MM, section));

describe("one section of a seam", () => {
  const seam = seamOf(clean);

  it("is the nearest to the station asked for", () => {
    expect(sectionAt(seam, 17.4).station_mm).toBe(17);
    expect(sectionAt(seam, 17.6).station_mm).toBe(18);
    expect(sectionAt(seam, -100).station_mm).toBe(0);
    expect(sectionAt(seam, 1e6).station_mm).toBe(LENGTH_MM);
  });

  it("shows its root, its faces and the model's outline", () => {
    const view = sectionAt(seam, 20);
    expect(view.measured).toBe(true);
    expect(view.why).toBeNull();
    expect(view.root?.[0]).toBeCloseTo(0.8, 1);
    expect(view.root?.[1]).toBeCloseTo(0, 1);
    expect(view.plates.map(({ plate }) => plate)).toEqual(["a", "b", "b"]);
    expect(view.model).toEqual([
      [
        [-40, 0],
        [0, 0],
      ],
      [
        [expect.closeTo(0), 0],
        [expect.closeTo(0), 20],
      ],
    ]);
  });

  it("draws each root face from the root outward, where its points lie", () => {
    const [a, b] = sectionAt(seam, 20).plates;
    expect(a?.from[0]).toBeCloseTo(0.8, 1);
    expect(a?.from[1]).toBeCloseTo(0, 1);
    expect(a?.to[0]).toBeCloseTo(0.8 - 15, 1);
    expect(b?.from[0]).toBeCloseTo(0.8, 1);
    expect(b?.to[0]).toBeCloseTo(0.8, 1);
    expect(b?.to[1]).toBeCloseTo(15, 1);
    for (const plate of [a, b]) {
      expect(plate?.rms_mm).toBeCloseTo(0.03, 2);
      expect(plate?.points).toBeGreaterThan(100);
    }
  });

  it("keeps or rejects every point there is", () => {
    const { kept, rejected } = sectionAt(seam, 20);
    const all = clean(20, 20);
    expect(kept.length + rejected.length).toBe(all.length);
    expect(kept.length).toBeGreaterThan(0.95 * all.length);
  });

  it("says why it rejects: a spike far off, an edge near a face, metal over the root", () => {
    const spike: SectionPoint = [-6, 7];
    const near: SectionPoint = [-8, 0.4];
    const whys = (section: Section) => sectionAt(seamOf(section), 20).rejected;
    const found = whys((x, index) => [...clean(x, index), spike, near]);
    expect(found).toContainEqual({ point: spike, why: "spike" });
    expect(found).toContainEqual({ point: near, why: "edge" });
    // Without metal over it a stray point by the root is a spike like any other.
    const stray: SectionPoint = [-2, 2];
    expect(whys((x, index) => [...clean(x, index), stray])).toContainEqual({ point: stray, why: "spike" });
    const tack = Array.from({ length: 40 }, (_, i): SectionPoint => [-3.2 + i / 10, i / 10]);
    const covered = whys((x, index) => [...clean(x, index).filter(([l, n]) => l < -4 || n > 4), ...tack]);
    expect(covered.filter(({ why }) => why === "tack").length).toBeGreaterThan(20);
  });

  it("that was not measured says why in words, and shows all its points as none of a plate's", () => {
    const blind = seamOf((x, index) =>
      x === 20 ? clean(x, index).filter(([l]) => l < -0.5) : clean(x, index),
    );
    const view = sectionAt(blind, 20);
    expect(view).toMatchObject({ measured: false, root: null, plates: [], kept: [] });
    expect(view.why).toMatch(/plate B/);
    expect(new Set(view.rejected.map(({ why }) => why))).toEqual(new Set(["not_a_plate"]));
  });

  it("of a scan of nothing is empty, at the station asked for", () => {
    expect(
      sectionAt(
        seamOf(() => []),
        12,
      ),
    ).toMatchObject({
      station_mm: 12,
      measured: false,
      why: "there are no points there",
      kept: [],
      rejected: [],
      plates: [],
      root: null,
    });
  });

  it("of a great many points shows some of them, spread over all", () => {
    const dense = seamOf((x, index) =>
      x === 20 ? pointsOn(joint, { moves: { b: [0.8, 0, 0] }, spacing_mm: 0.002 }) : clean(x, index),
    );
    const { kept } = sectionAt(dense, 20);
    expect(kept.length).toBeLessThanOrEqual(4000);
    expect(kept.length).toBeGreaterThan(1500);
    expect(Math.max(...kept.map(([, n]) => n))).toBeGreaterThan(19);
    expect(Math.min(...kept.map(([l]) => l))).toBeLessThan(-18);
  });
});
