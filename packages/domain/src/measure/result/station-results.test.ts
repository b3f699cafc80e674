import { describe, expect, it } from "vitest";
import { type EvaluateOptions, evaluateScan } from "../evaluate.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import { jointModel, type Moves, pointsOn, SECTIONS, scanOf } from "../testing/joints.ts";
import { cloudOf } from "../testing/models.ts";

const LENGTH_MM = 60;
const model = jointModel("fillet_t", SECTIONS.fillet_t, { length_mm: LENGTH_MM, step_mm: 2 });
const joint = jointFaces(model);

const section = (index: number, moves: Moves = {}) =>
  pointsOn(joint, { moves, seed: index + 1, spacing_mm: 0.1 });

/** A scan of the joint as it should be; some places left out. */
const scan = (isLost: (x: number) => boolean = () => false): ScanCloud =>
  scanOf(LENGTH_MM, (x, index) => (isLost(x) ? [] : section(index)));

function evaluated(cloud: ScanCloud, options: EvaluateOptions = { scanner_accuracy_mm: 0.02 }) {
  const outcome = evaluateScan(model, cloud, options);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value;
}

describe("stations", () => {
  const whys = (of: ScanCloud) =>
    Object.fromEntries(
      evaluated(of).stations.flatMap((station) => (station.why ? [[station.station_mm, station.why]] : [])),
    );

  it("stand where they are asked for, whatever the model's own", () => {
    const { stations } = evaluated(scan(), { step_mm: 7 });
    expect(stations.map((station) => station.station_mm)).toEqual([0, 7, 14, 21, 28, 35, 42, 49, 56]);
    expect(() => evaluateScan(model, scan(), { step_mm: 0 })).toThrow(RangeError);
    expect(() => evaluateScan(model, scan(), { step_mm: Number.NaN })).toThrow(RangeError);
  });

  it("are not measured where a profile was lost: nothing is carried over from beside", () => {
    expect(whys(scan((x) => x === 30))).toEqual({ 30: "no_points" });
    expect(whys(scan((x) => x > 20 && x < 27))).toEqual({
      22: "no_points",
      24: "no_points",
      26: "no_points",
    });
  });

  it("are beyond the end where the scan does not reach", () => {
    expect(whys(scan((x) => x < 3 || x > 56))).toEqual({
      0: "beyond_end",
      2: "beyond_end",
      58: "beyond_end",
      60: "beyond_end",
    });
  });

  it("take the scanner's accuracy as a bound that never averages out", () => {
    const u = (options: EvaluateOptions) => evaluated(scan(), options).stations[15]?.u_lateral_mm ?? 0;
    expect(u({})).toBeGreaterThan(0);
    expect(u({ scanner_accuracy_mm: 0 })).toBe(u({}));
    expect(u({ scanner_accuracy_mm: 0.3 })).toBeCloseTo(Math.hypot(u({}), 0.3 / Math.sqrt(3)), 3);
  });

  it("say where their root is in the part's frame, y across and z up", () => {
    const moved = scanOf(LENGTH_MM, (_, index) => section(index, { a: [0.7, -0.3, 0], b: [0.7, -0.3, 0] }));
    for (const station of evaluated(moved).stations) {
      expect(station.lateral_mm).toBeCloseTo(0.7, 1);
      expect(station.root_mm).toEqual([station.station_mm, station.lateral_mm, station.normal_mm]);
    }
  });

  it("never tell a gap below nought", () => {
    const pressed = scanOf(LENGTH_MM, (_, index) => section(index, { b: [0, -0.1, 0] }));
    const gaps = evaluated(pressed).stations.map((station) => station.gap_mm);
    expect(gaps.every((gap) => gap === 0)).toBe(true);
  });

  it("count their points: those that carry each plate, and those that carry none", () => {
    const spiked = scanOf(LENGTH_MM, (_, index) => [
      ...section(index),
      ...Array.from({ length: 10 }, (__, i): [number, number] => [-12 - i, 9 + i]),
    ]);
    const [clean, dirty] = [evaluated(scan()), evaluated(spiked)].map(({ stations }) => stations[15]);
    expect(clean?.points_a).toBeGreaterThan(100);
    expect(clean?.points_b).toBeGreaterThan(100);
    expect((dirty?.rejected ?? 0) - (clean?.rejected ?? 0)).toBe(10);
    expect(clean?.residual_mm).toBeCloseTo(0.03, 2);
  });
});

describe("warnings", () => {
  it("are none of a clean scan with a stated accuracy", () => {
    expect(evaluated(scan()).warnings).toEqual([]);
  });

  it("say that no accuracy was stated", () => {
    expect(evaluated(scan(), {}).warnings).toEqual([
      expect.stringMatching(/^No scanner accuracy was stated/),
    ]);
  });

  it("name the stretches under a tack", () => {
    const tack = Array.from({ length: 40 }, (_, i): [number, number] => [-4 + i / 10, i / 10]);
    const tacked = scanOf(LENGTH_MM, (x, index) =>
      (x >= 20 && x <= 26) || x === 40
        ? [...section(index).filter(([l, n]) => l < -4 || n > 4), ...tack]
        : section(index),
    );
    expect(evaluated(tacked).warnings).toEqual([
      "Metal over the root at 20 mm to 26 mm, 40 mm: the root there is constructed from the faces beside it.",
    ]);
  });

  it("name a plate that is not the size of the model's, the gap then taken from its edge", () => {
    // The upright is 19.2 mm high, not 20: over a gap of 1 mm its top stands at 20.2 mm.
    const short = scanOf(LENGTH_MM, (_, index) =>
      section(index, { b: [0, 1, 0] })
        .filter(([, n]) => n < 20 || n > 20.9)
        .map(([l, n]): [number, number] => (n > 20.9 ? [l, n - 0.8] : [l, n])),
    );
    const { warnings, stations } = evaluated(short);
    expect(warnings).toEqual([
      expect.stringMatching(
        /^Plate B is 0\.\d+ mm smaller than the model says; gaps are taken from its edge/,
      ),
    ]);
    for (const station of stations) expect(Math.abs((station.gap_mm ?? 9) - 1)).toBeLessThan(0.1);
  });

  it("count points that lie elsewhere, where they are most of the scan", () => {
    const near = scan();
    const elsewhere = Array.from({ length: near.count + 1 }, (_, i) => [i / 700, 300, 20] as const);
    const all = cloudOf([...pointsIn(near), ...elsewhere]);
    expect(evaluated(all).warnings).toEqual([
      `${near.count + 1} of ${all.count} points lie nowhere near this seam.`,
    ]);
    const fewer = cloudOf([...pointsIn(near), ...elsewhere.slice(2)]);
    expect(evaluated(fewer).warnings).toEqual([]);
  });
});

const pointsIn = (cloud: ScanCloud) =>
  Array.from(
    { length: cloud.count },
    (_, k) => [cloud.xyz_mm[3 * k]!, cloud.xyz_mm[3 * k + 1]!, cloud.xyz_mm[3 * k + 2]!] as const,
  );
