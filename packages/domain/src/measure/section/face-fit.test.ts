import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { drawsFrom } from "../fit/consensus-line.ts";
import { distanceFrom } from "../fit/line-fit.ts";
import { type Face, jointFaces } from "../joints/joint-faces.ts";
import type { SectionPoint } from "../joints/nominal-profile.ts";
import { jointModel, SECTIONS, sliceFrom } from "../testing/joints.ts";
import { normalsFrom } from "../testing/noise.ts";
import { alongFace, type FaceSearch, faceEnd, fitFace } from "./face-fit.ts";

const RAD = Math.PI / 180;

const [surface, upright] = jointFaces(jointModel("fillet_t", SECTIONS.fillet_t)).faces as [Face, Face];

/** The upright as it is expected, looked for over its first 15 mm. */
const SEARCH: FaceSearch = {
  line: { t_mm: 0, d_mm: 0, angle_rad: 0 },
  band_mm: 2.5,
  from_mm: 0.5,
  to_mm: 15,
  seed: 7,
};

/** Points of the upright, off by `off_mm` toward the open side and turned; heights from 0.1 mm up. */
function uprightPoints(off_mm = 0, turn_deg = 0, seed = 1, spacing_mm = 0.1): SectionPoint[] {
  const normal = normalsFrom(seed);
  return Array.from({ length: Math.floor(20 / spacing_mm) }, (_, i): SectionPoint => {
    const t = 0.1 + i * spacing_mm;
    return [-off_mm - t * Math.tan(turn_deg * RAD) + 0.03 * normal(), t];
  });
}

describe("a face among other points", () => {
  it("is found where it stands, turned as it is", () => {
    const fit = fitFace(sliceFrom(uprightPoints(0.8, 3)), upright, SEARCH);
    if (!fit) throw new Error("no face");
    expect(fit.angle_rad / RAD).toBeCloseTo(3, 0);
    expect(Math.abs(distanceFrom(fit, 8, 0.8 + 8 * Math.tan(3 * RAD)))).toBeLessThan(0.012);
    expect(fit.scale_mm).toBeGreaterThan(0.02);
    expect(fit.scale_mm).toBeLessThan(0.04);
  });

  it("is not moved by spikes of a millimetre to ten, one return in eight", () => {
    const draw = drawsFrom(9);
    const spiked = uprightPoints().map(
      ([l, n], i): SectionPoint => (i % 8 === 3 ? [l - 1 - 9 * draw(), n] : [l, n]),
    );
    const fit = fitFace(sliceFrom(spiked), upright, SEARCH);
    if (!fit) throw new Error("no face");
    // u of the offset is 0.03 / √130; four of them.
    expect(Math.abs(distanceFrom(fit, 7.5, 0))).toBeLessThan(0.011);
    expect(Math.abs(fit.angle_rad)).toBeLessThan(0.0025);
  });

  it("is found among four strays in ten in every section, not only in most", () => {
    for (let seed = 1; seed <= 60; seed++) {
      const draw = drawsFrom(1000 + seed);
      const strewn = uprightPoints(1.5, 5, seed).map(
        ([l, n], i): SectionPoint => (i % 5 < 2 ? [4 * draw() - 2, n] : [l, n]),
      );
      const fit = fitFace(sliceFrom(strewn), upright, { ...SEARCH, seed });
      if (!fit) throw new Error(`no face, seed ${seed}`);
      expect(Math.abs(distanceFrom(fit, 6, 1.5 + 6 * Math.tan(5 * RAD)))).toBeLessThan(0.03);
    }
  });

  it("is not moved by a ghost of the other face, mirrored behind it and as straight as itself", () => {
    const normal = normalsFrom(4);
    // A second reflection: 30 points on a line of their own, in front of the foot.
    const ghost = Array.from(
      { length: 30 },
      (_, i): SectionPoint => [-0.5 - 0.05 * i, 0.5 + 0.05 * i + 0.02 * normal()],
    );
    const fit = fitFace(sliceFrom([...uprightPoints(), ...ghost]), upright, SEARCH);
    if (!fit) throw new Error("no face");
    expect(Math.abs(distanceFrom(fit, 7.5, 0))).toBeLessThan(0.011);
    expect(Math.abs(fit.angle_rad)).toBeLessThan(0.003);
  });

  it("is not moved by a tack over its foot", () => {
    const draw = drawsFrom(2);
    const tacked = uprightPoints().map(
      ([l, n]): SectionPoint => (n < 4 ? [n - 4 + 0.1 * draw(), n] : [l, n]),
    );
    const fit = fitFace(sliceFrom(tacked), upright, SEARCH);
    if (!fit) throw new Error("no face");
    expect(Math.abs(distanceFrom(fit, 9, 0))).toBeLessThan(0.02);
  });

  it("is the same for the same points in any order", () => {
    const points = uprightPoints(0.4, 2);
    const key = (_: SectionPoint, i: number) => (i * 7919) % points.length;
    const shuffled = points.map((point, i) => ({ point, by: key(point, i) }));
    shuffled.sort((a, b) => a.by - b.by);
    const [one, other] = [points, shuffled.map(({ point }) => point)].map((all) =>
      fitFace(sliceFrom(all), upright, SEARCH),
    );
    expect(one?.d_mm).toBeCloseTo(other?.d_mm ?? Number.NaN, 3);
    expect(one?.angle_rad).toBeCloseTo(other?.angle_rad ?? Number.NaN, 4);
  });

  it("is none of fewer than eight points", () => {
    const nine = uprightPoints(0, 0, 1, 1.5).filter(([, n]) => n > 0.5);
    expect(nine.filter(([, n]) => n < 15).length).toBe(9);
    const known = { ...SEARCH, known: { angle_rad: 0, u_rad: 0.001 } };
    expect(fitFace(sliceFrom(nine.slice(0, 7)), upright, SEARCH)).toBeNull();
    expect(fitFace(sliceFrom(nine.slice(0, 7)), upright, known)).toBeNull();
    expect(fitFace(sliceFrom(nine), upright, known)).not.toBeNull();
  });

  it("is none of points that stand square to it", () => {
    const across = Array.from({ length: 100 }, (_, i): SectionPoint => [-2 + i / 25, 6 + 0.001 * (i % 3)]);
    expect(fitFace(sliceFrom(across), upright, SEARCH)).toBeNull();
  });

  it("is looked for only in its band and its stretch", () => {
    const far = uprightPoints(4);
    expect(fitFace(sliceFrom(far), upright, SEARCH)).toBeNull();
    const short = { ...SEARCH, from_mm: 16, to_mm: 16.5 };
    expect(fitFace(sliceFrom(uprightPoints()), upright, short)).toBeNull();
  });

  it("of a known direction gives its offset, with the direction's own uncertainty", () => {
    const known = { angle_rad: 3 * RAD, u_rad: 0.004 };
    const line = { t_mm: 0, d_mm: 0.8, angle_rad: 3 * RAD };
    const few = uprightPoints(0.8, 3).filter(([, n]) => n > 3 && n < 4.5);
    const fit = fitFace(sliceFrom(few), upright, { ...SEARCH, line, known });
    if (!fit) throw new Error("no face");
    expect(fit.angle_rad).toBe(3 * RAD);
    expect(fit.scale_mm / Math.sqrt(fit.spread_mm2)).toBeCloseTo(0.004, 9);
    expect(Math.abs(distanceFrom(fit, 3.75, 0.8 + 3.75 * Math.tan(3 * RAD)))).toBeLessThan(0.035);
  });

  it("is read from its own stretch of a longer array only", () => {
    const slice = sliceFrom([...uprightPoints(5), ...uprightPoints(0.5)]);
    const fit = fitFace({ ...slice, from: 200 }, upright, SEARCH);
    expect(fit?.d_mm).toBeCloseTo(0.5, 1);
  });

  it("stands where it does, whatever its place and turn", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1.2, max: 1.2, noNaN: true }),
        fc.double({ min: -6, max: 6, noNaN: true }),
        fc.integer({ min: 1, max: 1e6 }),
        (off, turn, seed) => {
          const fit = fitFace(sliceFrom(uprightPoints(off, turn, seed)), upright, { ...SEARCH, seed });
          if (!fit) throw new Error("no face");
          const t = 6;
          // Five times the offset's standard uncertainty.
          expect(Math.abs(distanceFrom(fit, t, off + t * Math.tan(turn * RAD)))).toBeLessThan(0.016);
        },
      ),
      { seed: 11 },
    );
  });
});

describe("where a face begins", () => {
  const line = { t_mm: 0, d_mm: 0, angle_rad: 0 };
  const from = (points: SectionPoint[]) =>
    faceEnd(sliceFrom(points), surface, line, { band_mm: 0.12, from_mm: -2 });
  /** Points of plate A's surface from a distance off the root outward. */
  const plate = (begin_mm: number): SectionPoint[] =>
    Array.from({ length: 100 }, (_, i): SectionPoint => [-begin_mm - 0.1 * i, 0]);

  it("is its first point, with the spacing of its points", () => {
    const end = from(plate(0.7));
    expect(end?.t_mm).toBeCloseTo(0.7, 9);
    expect(end?.spacing_mm).toBeCloseTo(0.1, 9);
  });

  it("is not at a ghost that stands alone before it, nor at two", () => {
    expect(from([...plate(2), [-0.5, 0.02]])?.t_mm).toBeCloseTo(2, 9);
    expect(from([...plate(2.6), [-0.5, 0], [-0.6, 0]])?.t_mm).toBeCloseTo(2.6, 9);
  });

  it("is not moved by a few lost returns", () => {
    expect(from(plate(0.7).filter((_, i) => i !== 1 && i !== 3))?.t_mm).toBeCloseTo(0.7, 9);
  });

  it("is none of fewer than six points", () => {
    expect(from(plate(0.7).slice(0, 5))).toBeNull();
    expect(from(plate(0.7).slice(0, 6))?.t_mm).toBeCloseTo(0.7, 9);
  });

  it("counts points of the face's band only, in growing order", () => {
    const mixed: SectionPoint[] = [
      [-3, 0.05],
      [-1, -0.1],
      [-2, 0.2],
      [-4, 0],
    ];
    const search = { line, band_mm: 0.12, from_mm: 0, to_mm: 10 };
    expect(Array.from(alongFace(sliceFrom(mixed), surface, search), Math.round)).toEqual([1, 3, 4]);
  });
});
