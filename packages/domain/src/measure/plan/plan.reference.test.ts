import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { ScanPlan, ScanPlanInput } from "../../schemas/scan-plan.ts";
import { straightModel } from "../testing/models.ts";
import { planScan } from "./plan-scan.ts";
import {
  blindBehindStep,
  clockError,
  fieldWidth,
  heightStep,
  litDepth,
  pointSpacing,
  profileCount,
  profileSpacing,
  speckleFloor,
} from "./scanner.ts";

interface Golden {
  readonly profile_spacing: readonly {
    travel_mm_s: number;
    profile_rate_hz: number;
    length_mm: number;
    spacing_mm: number;
    profiles: number;
  }[];
  readonly point_spacing: readonly {
    z_near: number;
    w_near: number;
    z_far: number;
    w_far: number;
    z: number;
    points: number;
    width_mm: number;
    spacing_mm: number;
  }[];
  readonly speckle_limit: readonly {
    wavelength_um: number;
    contrast: number;
    sin_u: number;
    theta_deg: number;
    dz_um: number;
  }[];
  readonly lit_depth_in_gap: readonly { gap_mm: number; fan_angle_deg: number; lit_depth_mm: number }[];
}
const golden: Golden = JSON.parse(
  readFileSync(new URL("../../../vectors/geometry/scanplan.json", import.meta.url), "utf8"),
);

const scanner = (z: Golden["point_spacing"][number]) => ({
  profile_rate_hz: 100,
  points_per_profile: z.points,
  near_mm: z.z_near,
  far_mm: z.z_far,
  width_near_mm: z.w_near,
  width_far_mm: z.w_far,
});

describe("a laser-line scanner", () => {
  it.each(golden.profile_spacing)("takes $profiles profiles $spacing_mm mm apart", (z) => {
    expect(profileSpacing(z.travel_mm_s, z.profile_rate_hz)).toBeCloseTo(z.spacing_mm, 12);
    expect(profileCount(z.length_mm, z.travel_mm_s, z.profile_rate_hz)).toBe(z.profiles);
  });

  it.each(golden.point_spacing)("has points $spacing_mm mm apart at a stand-off of $z", (z) => {
    expect(fieldWidth(scanner(z), z.z)).toBeCloseTo(z.width_mm, 12);
    expect(pointSpacing(scanner(z), z.z)).toBeCloseTo(z.spacing_mm, 12);
  });

  it("resolves heights by how laser and camera stand", () => {
    expect(heightStep(0.06, 30, 0)).toBeCloseTo(0.12, 12);
    expect(heightStep(0.06, 0, 30)).toBeCloseTo(0.10392304845413264, 12);
    expect(heightStep(0.06, 20, 20)).toBeCloseTo(0.06 / (2 * Math.sin(20 * (Math.PI / 180))), 12);
  });

  it.each(golden.speckle_limit)("is limited by speckle to $dz_um µm", (z) => {
    expect(speckleFloor(z.wavelength_um, z.contrast, z.sin_u, z.theta_deg)).toBeCloseTo(z.dz_um, 8);
  });

  it.each(golden.lit_depth_in_gap)("lights a gap of $gap_mm mm to $lit_depth_mm mm", (z) => {
    expect(litDepth(z.gap_mm, z.fan_angle_deg)).toBeCloseTo(z.lit_depth_mm, 9);
  });

  it("errs along the seam by its clock and is blind behind a step", () => {
    expect(clockError(100, 10)).toBeCloseTo(1, 12);
    expect(blindBehindStep(10, 30)).toBeCloseTo(5.773502691896257, 9);
  });
});

describe("a scan plan", () => {
  const model = straightModel(300, 1, { limits: { adapt: { lateral_mm: 5, normal_mm: 3 } } });
  const plan = (travel_mm_s: number, points_per_profile = 1280) =>
    planScan(
      model,
      ScanPlanInput.parse({
        scanner: {
          profile_rate_hz: 200,
          points_per_profile,
          near_mm: 120,
          far_mm: 220,
          width_near_mm: 60,
          width_far_mm: 100,
        },
        stand_off_mm: 170,
        travel_mm_s,
      }),
    );

  it("gives spacing, profiles, passes and time with the run-off", () => {
    const found = ScanPlan.parse(plan(100));
    expect(found).toMatchObject({ profile_spacing_mm: 0.5, profiles: 621, passes: 1, serves: true });
    expect(found.time_s).toBeCloseTo(3.1 + 2, 9);
    expect(found.points).toBe(621 * 1280);
  });

  it("says what does not serve: too fast, too few points, a field too narrow", () => {
    const failing = (found: ScanPlan) => found.checks.filter(({ ok }) => !ok).map(({ check }) => check);
    expect(failing(plan(200))).toEqual(["profile_spacing"]);
    expect(failing(plan(100, 64))).toEqual(expect.arrayContaining(["point_spacing", "points_on_faces"]));
    const wide = straightModel(300, 1, { limits: { adapt: { lateral_mm: 60 } } });
    const input = ScanPlanInput.parse({
      scanner: {
        profile_rate_hz: 200,
        points_per_profile: 1280,
        near_mm: 120,
        far_mm: 220,
        width_near_mm: 60,
        width_far_mm: 100,
      },
      stand_off_mm: 170,
      travel_mm_s: 100,
    });
    expect(planScan(wide, input).passes).toBe(2);
    expect(
      planScan(wide, { ...input, stand_off_mm: 230 }).checks.find(({ check }) => check === "stand_off")?.ok,
    ).toBe(false);
  });
});
