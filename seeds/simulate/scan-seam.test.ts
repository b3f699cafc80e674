import { describe, expect, test } from "vitest";
import { LADDER_BRACKET } from "../design/brackets.ts";
import type { SeamDesign } from "../design/product.ts";
import { PUMP_BASE } from "../design/pump-base.ts";
import { SKID_FRAME } from "../design/skid-frame.ts";
import { Random } from "../random.ts";
import { type FitUp, level } from "./fit-up.ts";
import { type PartPose, scanSeam } from "./scan-seam.ts";

const AT_REST: PartPose = { move_mm: [0, 0, 0], turn_deg: 0, about_mm: [0, 0] };

const fitUp = (change: Partial<FitUp> = {}): FitUp => ({
  lateral_mm: level(0),
  normal_mm: level(0),
  gap_mm: level(0),
  mismatch_mm: level(0),
  turn_a_deg: level(0),
  turn_b_deg: level(0),
  tacks: [],
  blind: [],
  spatter: 0,
  ...change,
});

/** Points of a PLY as (station, lateral, normal) beside the start frame of a straight seam. */
function pointsOf(seam: SeamDesign, ply: Uint8Array): { s: number; l: number; n: number }[] {
  const header = new TextDecoder("latin1").decode(ply.subarray(0, 400));
  const body = header.indexOf("end_header\n") + "end_header\n".length;
  const count = Number(/element vertex (\d+)/.exec(header)?.[1]);
  expect(ply.length).toBe(body + 12 * count);
  const view = new DataView(ply.buffer, ply.byteOffset + body);
  const { point, tangent, lateral, normal } = seam.line.frameAt(0);
  return Array.from({ length: count }, (_, i) => {
    const off = [0, 1, 2].map((axis) => view.getFloat32(12 * i + 4 * axis, true) - (point[axis] ?? 0));
    const along = (axis: readonly number[]) => off.reduce((sum, value, k) => sum + value * (axis[k] ?? 0), 0);
    return { s: along(tangent), l: along(lateral), n: along(normal) };
  });
}

function median(values: readonly number[]): number {
  return values.toSorted((a, b) => a - b)[values.length >> 1] ?? Number.NaN;
}

const seamOf = (seams: readonly SeamDesign[], number: string): SeamDesign => {
  const found = seams.find((seam) => seam.number === number);
  if (found === undefined) throw new RangeError(number);
  return found;
};

const T_JOINT = seamOf(SKID_FRAME.seams, "S1");
const BUTT = seamOf(PUMP_BASE.seams, "S1");
const CORNER = seamOf(PUMP_BASE.seams, "S3");
const SHORT = seamOf(LADDER_BRACKET.seams, "S7");

const scan = (seam: SeamDesign, change: Partial<FitUp>, pose = AT_REST) =>
  pointsOf(seam, scanSeam({ seam, fitUp: fitUp(change), pose }, new Random(5, "a scan")));

describe("a simulated scan", () => {
  test("of a displaced T joint shows the base at the normal and the upright at the lateral deviation", () => {
    const points = scan(T_JOINT, { lateral_mm: level(1.4), normal_mm: level(-0.6) });
    expect(median(points.filter(({ l, n }) => l < -2 && n < 2).map(({ n }) => n))).toBeCloseTo(-0.6, 2);
    expect(median(points.filter(({ n }) => n > 3).map(({ l }) => l))).toBeCloseTo(1.4, 2);
  });

  test("of a leaning T joint shows the deviation grow along the seam", () => {
    const points = scan(T_JOINT, { lateral_mm: { start: 0, end: 3, bow: 0 } }).filter(({ n }) => n > 3);
    const near = (s_mm: number) => median(points.filter(({ s }) => Math.abs(s - s_mm) < 1).map(({ l }) => l));
    expect(near(95)).toBeCloseTo(0.75, 1);
    expect(near(285)).toBeCloseTo(2.25, 1);
  });

  test("of a gap shows nothing of the upright below its edge, and the base under it", () => {
    const points = scan(T_JOINT, { gap_mm: level(2) });
    expect(points.filter(({ l, n }) => Math.abs(l) < 0.15 && n > 0.3 && n < 1.7).length).toBeLessThan(8);
    expect(points.filter(({ l, n }) => l > 0.4 && l < 2 && Math.abs(n) < 0.2).length).toBeGreaterThan(70);
  });

  test("of a butt with mismatch shows plate B's surface above plate A's by it", () => {
    const points = scan(BUTT, { gap_mm: level(2), mismatch_mm: level(1.2) });
    const left = median(points.filter(({ l }) => l < -8).map(({ n }) => n));
    const right = median(points.filter(({ l }) => l > 8).map(({ n }) => n));
    expect(right - left).toBeCloseTo(1.2, 2);
    expect((right + left) / 2).toBeCloseTo(8, 2);
  });

  test("of an open corner shows plate A's surface at its thickness and plate B's outer face at its own", () => {
    const points = scan(CORNER, {});
    expect(median(points.filter(({ l }) => l < -2).map(({ n }) => n))).toBeCloseTo(10, 2);
    expect(median(points.filter(({ n }) => n < -2).map(({ l }) => l))).toBeCloseTo(8, 2);
  });

  test("follows the part's own displacement", () => {
    const pose: PartPose = { move_mm: [0, 0.5, -0.3], turn_deg: 0, about_mm: [0, 0] };
    const points = scan(T_JOINT, {}, pose);
    expect(median(points.filter(({ n }) => n > 3).map(({ l }) => l))).toBeCloseTo(0.5, 2);
    expect(median(points.filter(({ l }) => l < -2).map(({ n }) => n))).toBeCloseTo(-0.3, 2);
  });

  test("has no points in a blind stretch", () => {
    const points = scan(T_JOINT, { blind: [{ from_mm: 100, to_mm: 160 }] });
    expect(points.filter(({ s }) => s > 101 && s < 159)).toEqual([]);
  });

  test("shows a tack as steel before the root", () => {
    const points = scan(SHORT, { tacks: [{ at_mm: 60, half_mm: 8, leg_mm: 3 }] });
    const onTack = points.filter(({ s, l, n }) => Math.abs(s - 60) < 1 && l < -0.8 && n > 0.8 && n - l < 3.4);
    expect(onTack.length).toBeGreaterThan(4);
  });

  test("keeps to the size that was promised: 12 000 points and 150 kB", () => {
    for (const { seams } of [SKID_FRAME, PUMP_BASE, LADDER_BRACKET]) {
      for (const seam of seams) {
        const ply = scanSeam({ seam, fitUp: fitUp(), pose: AT_REST }, new Random(1, seam.number));
        expect(ply.length).toBeLessThan(12_000 * 12 + 400);
      }
    }
  });
});
