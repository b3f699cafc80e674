import { afterAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { readShared, readSharedBytes } from "../../../vectors/shared-vectors.ts";
import { robustCircle } from "../fit/circle-fit.ts";
import { type Opening, openingsIn } from "./groove.ts";

/**
 * Profiles of real line scanners, whose figures others have worked out. The files are kept outside this repository
 * (their licences and READMEs lie beside them); where they are absent each test says so and is passed over.
 */
const rows: string[] = [];
afterAll(() => {
  if (rows.length > 0)
    console.log(["profile                  figure            found     stated", ...rows].join("\n"));
});

function told(name: string, figure: string, found: number, stated: number): void {
  rows.push(
    `${name.padEnd(24)} ${figure.padEnd(14)} ${found.toFixed(3).padStart(9)}  ${stated.toFixed(3).padStart(9)}`,
  );
}

/** A table of numbers by the value of its first column; an empty cell is not a number. */
function profilesOf(
  bytes: Uint8Array,
  x: number,
  z: number,
): Map<number, { x: Float64Array; z: Float64Array }> {
  const lines = new TextDecoder().decode(bytes).trim().split(/\r?\n/).slice(1);
  const groups = new Map<number, number[][]>();
  for (const line of lines) {
    const cells = line.split(",").map((cell) => (cell === "" ? Number.NaN : Number(cell)));
    const key = cells[0] ?? Number.NaN;
    const group = groups.get(key);
    if (group) group.push(cells);
    else groups.set(key, [cells]);
  }
  const column = (cells: number[][], k: number) => Float64Array.from(cells, (row) => row[k] ?? Number.NaN);
  return new Map([...groups].map(([key, cells]) => [key, { x: column(cells, x), z: column(cells, z) }]));
}

const point = z.tuple([z.number(), z.number()]);

describe("a board with two grooves, by a robot's line scanner", () => {
  const Truth = z.object({
    profiles: z.array(
      z.object({
        profile: z.number(),
        grooves: z.array(
          z.object({
            shoulder_left: point,
            floor_left: point,
            floor_right: point,
            shoulder_right: point,
            opening_mm: z.number(),
            floor_width_mm: z.number(),
            depth_mm: z.number(),
            hi_lo_mm: z.number(),
            included_angle_deg: z.number(),
          }),
        ),
      }),
    ),
  });

  it("corners within 0.1 mm, depth and hi-lo within 0.05 mm, angle within 1.5 degrees, of every groove", () => {
    const text = readShared("data/line-scanner-grooves/truth.json");
    const bytes = readSharedBytes("data/line-scanner-grooves/profiles.csv");
    if (text === undefined || bytes === undefined) return expect(bytes).toBeUndefined();
    const profiles = profilesOf(bytes, 2, 3);
    const away = (a: readonly [number, number], b: readonly [number, number]) =>
      Math.hypot(a[0] - b[0], a[1] - b[1]);
    for (const { profile, grooves } of Truth.parse(JSON.parse(text)).profiles) {
      const own = profiles.get(profile);
      const found = own ? openingsIn(own.x, own.z).filter(({ groove }) => groove !== null) : [];
      expect(found).toHaveLength(grooves.length);
      grooves.forEach((stated, i) => {
        const opening = found[i];
        const groove = opening?.groove;
        if (!opening || !groove) throw new Error(`profile ${profile}: groove ${i + 1} not found`);
        const name = `groove ${i + 1} of profile ${profile}`;
        told(name, "opening", groove.opening_mm, stated.opening_mm);
        told(name, "depth", opening.depth_mm ?? Number.NaN, stated.depth_mm);
        told(name, "hi-lo", opening.hi_lo_mm, stated.hi_lo_mm);
        told(name, "angle", groove.included_angle_deg, stated.included_angle_deg);
        expect(away(groove.shoulders[0], stated.shoulder_left)).toBeLessThan(0.1);
        expect(away(groove.shoulders[1], stated.shoulder_right)).toBeLessThan(0.1);
        expect(away(groove.floor_corners[0], stated.floor_left)).toBeLessThan(0.1);
        expect(away(groove.floor_corners[1], stated.floor_right)).toBeLessThan(0.1);
        expect(Math.abs((opening.depth_mm ?? 0) - stated.depth_mm)).toBeLessThan(0.05);
        expect(Math.abs(opening.hi_lo_mm - stated.hi_lo_mm)).toBeLessThan(0.05);
        expect(Math.abs(groove.included_angle_deg - stated.included_angle_deg)).toBeLessThan(1.5);
      });
    }
  });
});

describe("a slot between two strips, one wall in the shadow", () => {
  const Truth = z.object({
    summary: z.object({
      width_mm_median: z.number(),
      depth_mm_median: z.number(),
      hi_lo_mm_median: z.number(),
      left_edge_drift_mm_per_mm: z.number(),
      right_edge_drift_mm_per_mm: z.number(),
    }),
    rows: z.array(z.object({ station_mm: z.number() })),
  });

  const median = (values: readonly number[]) =>
    [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? Number.NaN;

  /** Slope of an edge over the stations, by the median of slopes of pairs half a run apart. */
  const drift = (found: readonly { s: number; x: number }[]) => {
    const half = Math.floor(found.length / 2);
    return median(
      found.slice(0, half).map(({ s, x }, i) => {
        const other = found[i + half] ?? { s, x };
        return (other.x - x) / (other.s - s);
      }),
    );
  };

  it("width, depth, hi-lo and the slot's turn as worked out from the same rows", { timeout: 60_000 }, () => {
    const text = readShared("data/slot-heightmap/truth.json");
    const bytes = readSharedBytes("data/slot-heightmap/profiles.csv");
    if (text === undefined || bytes === undefined) return expect(bytes).toBeUndefined();
    const { summary, rows: stated } = Truth.parse(JSON.parse(text));
    const profiles = profilesOf(bytes, 1, 2);
    const found: { s: number; opening: Opening }[] = stated.flatMap(({ station_mm }) => {
      const own = profiles.get(station_mm);
      const openings = own ? openingsIn(own.x, own.z) : [];
      return openings
        .filter(({ depth_mm }) => depth_mm !== null)
        .map((opening) => ({ s: station_mm, opening }));
    });
    expect(found.length).toBeGreaterThan(0.95 * stated.length);
    const width = median(found.map(({ opening }) => opening.width_mm));
    const depth = median(found.map(({ opening }) => opening.depth_mm ?? 0));
    const hiLo = median(found.map(({ opening }) => opening.hi_lo_mm));
    const drifts = [
      drift(found.map(({ s, opening }) => ({ s, x: opening.left_edge[0] }))),
      drift(found.map(({ s, opening }) => ({ s, x: opening.right_edge[0] }))),
    ];
    told("slot", "width", width, summary.width_mm_median);
    told("slot", "depth", depth, summary.depth_mm_median);
    told("slot", "hi-lo", hiLo, summary.hi_lo_mm_median);
    told("slot", "left drift", drifts[0] ?? 0, summary.left_edge_drift_mm_per_mm);
    told("slot", "right drift", drifts[1] ?? 0, summary.right_edge_drift_mm_per_mm);
    expect(Math.abs(width - summary.width_mm_median)).toBeLessThan(0.12);
    expect(Math.abs(depth - summary.depth_mm_median)).toBeLessThan(0.05);
    expect(Math.abs(hiLo - summary.hi_lo_mm_median)).toBeLessThan(0.05);
    expect(Math.abs((drifts[0] ?? 0) - summary.left_edge_drift_mm_per_mm)).toBeLessThan(0.003);
    expect(Math.abs((drifts[1] ?? 0) - summary.right_edge_drift_mm_per_mm)).toBeLessThan(0.003);
  });
});

describe.each([
  ["set-a", 0.05, 0.03],
  ["set-c", 0.5, 0.3],
])("spheres by a robot's line scanner, %s", (set, centre_mm, residual_mm) => {
  const Truth = z.object({
    sphere_radius_mm: z.number(),
    circles: z.array(
      z.object({
        profile: z.number(),
        xc_mm: z.number(),
        zc_mm: z.number(),
        r_mm: z.number(),
        residual_std_mm: z.number(),
      }),
    ),
  });

  it("centre and radius of the circle in every profile, false returns left out", () => {
    const text = readShared(`data/line-scanner-sphere/${set}/truth.json`);
    const bytes = readSharedBytes(`data/line-scanner-sphere/${set}/profiles.csv`);
    if (text === undefined || bytes === undefined) return expect(bytes).toBeUndefined();
    const { circles, sphere_radius_mm } = Truth.parse(JSON.parse(text));
    const profiles = profilesOf(bytes, 2, 3);
    for (const stated of circles) {
      const own = profiles.get(stated.profile);
      if (!own) throw new Error(`profile ${stated.profile} is missing`);
      const seen = (_: number, i: number) => Number.isFinite(own.x[i]) && Number.isFinite(own.z[i]);
      const [x, y] = [own.x.filter(seen), own.z.filter(seen)];
      const found = robustCircle(x, y, {
        band_mm: 0.3,
        trials: 600,
        seed: stated.profile,
        radii_mm: [3, sphere_radius_mm + 1],
      });
      const name = `${set} profile ${stated.profile}`;
      if (!found) throw new Error(`${name}: no circle`);
      told(name, "radius", found.radius_mm, stated.r_mm);
      expect(Math.hypot(found.x_mm - stated.xc_mm, found.y_mm - stated.zc_mm)).toBeLessThan(centre_mm);
      expect(Math.abs(found.radius_mm - stated.r_mm)).toBeLessThan(centre_mm);
      expect(Math.abs(found.scale_mm - stated.residual_std_mm)).toBeLessThan(residual_mm);
      // A plane cuts a sphere in no larger a circle than its own.
      expect(found.radius_mm).toBeLessThan(sphere_radius_mm + 3 * residual_mm);
    }
  });
});
