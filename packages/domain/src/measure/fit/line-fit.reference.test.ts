import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { drawsFrom } from "./consensus-line.ts";
import { distanceFrom, offsetLine, orthogonalLine, robustLine } from "./line-fit.ts";

const DEG = 180 / Math.PI;

interface LineCase {
  readonly id: string;
  readonly points: readonly (readonly [number, number])[];
  readonly expected: {
    readonly angle_deg: number;
    readonly offset_normal_dot_centroid: number;
    readonly sigma_residual: number;
  };
}

interface RobustCase {
  readonly x: readonly number[];
  readonly y: readonly number[];
  /** Intercept, slope, scale. */
  readonly r_mass_rlm_bisquare: readonly [number, number, number];
}

/** Golden lines: numpy's SVD of the centred points; the robust one by R's MASS::rlm, psi.bisquare. */
const { lines_2d, robust_line_y_on_x }: { lines_2d: { cases: LineCase[] }; robust_line_y_on_x: RobustCase } =
  JSON.parse(readFileSync(new URL("../../../vectors/geometry/fits.json", import.meta.url), "utf8"));

const columns = (points: readonly (readonly [number, number])[]) => ({
  ts: Float64Array.from(points, ([t]) => t),
  ds: Float64Array.from(points, ([, d]) => d),
  count: points.length,
});

describe("orthogonal line", () => {
  it("is Pearson's: y = 5.784 - 0.5456 x (Phil. Mag. 2 (1901) 559; digits beyond by numpy and ODRPACK)", () => {
    const x = [0, 0.9, 1.8, 2.6, 3.3, 4.4, 5.2, 6.1, 6.5, 7.4];
    const y = [5.9, 5.4, 4.4, 4.6, 3.5, 3.7, 2.8, 2.8, 2.4, 1.5];
    const line = orthogonalLine(Float64Array.from(x), Float64Array.from(y), 10);
    if (!line) throw new Error("no line");
    const slope = Math.tan(line.angle_rad);
    expect(slope).toBeCloseTo(-0.5455611975209648, 9);
    expect(line.d_mm - slope * line.t_mm).toBeCloseTo(5.784043774530086, 9);
  });

  it.each(lines_2d.cases)("agrees with numpy: $id", ({ points, expected }) => {
    const { ts, ds, count } = columns(points);
    const line = orthogonalLine(ts, ds, count);
    if (!line) throw new Error("no line");
    // A line has no direction along itself: half turns are the same line.
    const turn = (((line.angle_rad * DEG - expected.angle_deg) % 180) + 270) % 180;
    expect(turn).toBeCloseTo(90, 8);
    const normal = [-Math.sin(line.angle_rad), Math.cos(line.angle_rad)];
    const offset = (normal[0] ?? 0) * line.t_mm + (normal[1] ?? 0) * line.d_mm;
    expect(Math.abs(offset)).toBeCloseTo(Math.abs(expected.offset_normal_dot_centroid), 6);
    const square = points.reduce((sum, [t, d]) => sum + distanceFrom(line, t, d) ** 2, 0);
    expect(Math.sqrt(square / (count - 2))).toBeCloseTo(expected.sigma_residual, 9);
  });

  it("is none of a single place", () => {
    expect(orthogonalLine(new Float64Array(4), new Float64Array(4), 4)).toBeNull();
  });
});

/** A line with normal noise and some points far off, seeded. */
function spoilt(outliers: number) {
  const draw = drawsFrom(11);
  const normal = () => Math.sqrt(-2 * Math.log(1 - draw())) * Math.cos(2 * Math.PI * draw());
  const points = Array.from({ length: 200 }, (_, i): [number, number] => {
    const t = i / 20;
    return [t, 1 + 0.02 * t + 0.03 * normal() + (i % 100 < outliers ? 0.2 + draw() : 0)];
  });
  return columns(points);
}

describe("robust line", () => {
  it("is that of R's MASS::rlm where 4 of 41 points are spikes: 2.997715 + 0.250451 x, s 0.030618", () => {
    const { x, y, r_mass_rlm_bisquare: expected } = robust_line_y_on_x;
    const points = { ts: Float64Array.from(x), ds: Float64Array.from(y), count: x.length };
    // R takes every residual into its scale: a band that leaves none out.
    const line = robustLine(points, { t_mm: 10, d_mm: 5.5, angle_rad: Math.atan(0.25) }, 20);
    if (!line) throw new Error("no line");
    const slope = Math.tan(line.angle_rad);
    const intercept = line.d_mm - slope * line.t_mm;
    // R's distances are upright, ours square to the line: with this noise the lines differ by a twentieth of their u.
    expect(Math.abs(intercept - expected[0])).toBeLessThan(5e-4);
    expect(Math.abs(slope - expected[1])).toBeLessThan(5e-5);
    expect(line.scale_mm / (expected[2] * Math.cos(line.angle_rad))).toBeCloseTo(1, 2);
    // Plain least squares of the same points, spoilt by the spikes: R's lm.
    expect(intercept).not.toBeCloseTo(3.531244668989549, 1);
  });

  it("is not moved by one point in four that lies far off", () => {
    const start = { t_mm: 0, d_mm: 1, angle_rad: 0.02 };
    const line = robustLine(spoilt(25), start, 1);
    if (!line) throw new Error("no line");
    // Standard uncertainty of the offset is 0.03 / √150; four of them.
    expect(Math.abs(distanceFrom(line, 5, 1.1))).toBeLessThan(0.01);
    expect(line.scale_mm).toBeGreaterThan(0.02);
    expect(line.scale_mm).toBeLessThan(0.045);
    expect(line.inliers).toBeGreaterThan(120);
    expect(line.inliers).toBeLessThan(160);
  });

  it("gives an uncertainty of its direction that its scatter over many draws bears out", () => {
    const draw = drawsFrom(5);
    const normal = () => Math.sqrt(-2 * Math.log(1 - draw())) * Math.cos(2 * Math.PI * draw());
    const errors: number[] = [];
    let stated = 0;
    for (let run = 0; run < 400; run++) {
      const points = Array.from({ length: 60 }, (_, i): [number, number] => [i / 6, 0.03 * normal()]);
      const line = robustLine(columns(points), { t_mm: 0, d_mm: 0, angle_rad: 0 }, 0.5);
      if (!line) throw new Error("no line");
      errors.push(line.angle_rad);
      stated += line.scale_mm / Math.sqrt(line.spread_mm2) / 400;
    }
    const spread = Math.sqrt(errors.reduce((sum, e) => sum + e * e, 0) / errors.length);
    expect(stated / spread).toBeGreaterThan(0.85);
    expect(stated / spread).toBeLessThan(1.2);
  });

  it("is none of fewer than three points", () => {
    expect(
      robustLine(
        columns([
          [0, 0],
          [1, 0],
        ]),
        { t_mm: 0, d_mm: 0, angle_rad: 0 },
        1,
      ),
    ).toBeNull();
  });
});

describe("line of known direction", () => {
  it("finds the offset alone and states the direction's uncertainty as given", () => {
    const known = { band_mm: 0.5, angle_rad: 0.02, u_rad: 0.003 };
    const line = offsetLine(spoilt(20), { t_mm: 0, d_mm: 1, angle_rad: 0.02 }, known);
    if (!line) throw new Error("no line");
    expect(line.angle_rad).toBe(0.02);
    expect(Math.abs(distanceFrom(line, 5, 1.1))).toBeLessThan(0.01);
    expect(line.scale_mm / Math.sqrt(line.spread_mm2)).toBeCloseTo(0.003, 9);
  });
});
