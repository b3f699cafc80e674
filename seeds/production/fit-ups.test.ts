import { describe, expect, test } from "vitest";
import type { SeamDesign } from "../design/product.ts";
import { Random } from "../random.ts";
import { jointAt } from "../simulate/fit-up.ts";
import { displaced, type PartPose } from "../simulate/scan-seam.ts";
import { commonFit, type Fit, fitUpFor, partPose } from "./fit-ups.ts";
import { PARTS } from "./part-plan.ts";

/** How far the true joint goes, as shares of its limits: the largest over all its stations and quantities. */
function sharesUsed(
  seam: SeamDesign,
  fit: Fit,
  seed: number,
): { within: number; adapt: number; blind_mm: number } {
  const random = new Random(seed, "fit-up");
  const fitUp = fitUpFor(seam, fit, random);
  const pose: PartPose = partPose(new Random(seed, "pose"));
  const used = { within: 0, adapt: 0, blind_mm: 0 };
  for (let station_mm = 0; station_mm <= seam.line.length_mm; station_mm += 5) {
    const frame = seam.line.frameAt(station_mm);
    const joint = displaced(jointAt(fitUp, station_mm, seam.line.length_mm), frame, pose);
    const turn_deg = Math.abs(joint.turn_a_deg - joint.turn_b_deg);
    for (const level of ["within", "adapt"] as const) {
      const limits = seam.limits[level] ?? {};
      used[level] = Math.max(
        used[level],
        Math.abs(joint.lateral_mm) / (limits.lateral_mm ?? 1),
        Math.abs(joint.normal_mm) / (limits.normal_mm ?? 1),
        Math.abs(joint.gap_mm - seam.gap_mm) / (limits.gap_mm ?? 1),
        Math.abs(joint.mismatch_mm) / (limits.mismatch_mm ?? 1),
        turn_deg / (limits.angle_deg ?? 1),
      );
    }
    if (joint.blind) used.blind_mm += 5;
  }
  return used;
}

const SEAMS = [...new Set(PARTS.flatMap(({ product }) => product.seams))];
const cases = SEAMS.flatMap((seam, i) => [1, 2, 3, 4, 5].map((seed) => ({ seam, seed: 10 * i + seed })));

describe("how the demo's joints stand", () => {
  test("is inside the limits for welding as drawn when they stand near their model", () => {
    const beyond = cases.filter(({ seam, seed }) => sharesUsed(seam, "near", seed).within > 0.95);
    expect(beyond.length / cases.length).toBeLessThan(0.03);
  });

  test("is beyond those, but inside what the path may follow, when they stand off it", () => {
    for (const { seam, seed } of cases) {
      expect(sharesUsed(seam, "off", seed).adapt, `${seam.number} ${seed}`).toBeLessThan(0.97);
    }
    const beyond = cases.filter(({ seam, seed }) => sharesUsed(seam, "off", seed).within > 1.03);
    expect(beyond.length / cases.length).toBeGreaterThan(0.95);
  });

  test("is beyond all limits when they do not fit", () => {
    for (const { seam, seed } of cases) {
      expect(sharesUsed(seam, "gap", seed).adapt).toBeGreaterThan(1.2);
      expect(sharesUsed(seam, "offset", seed).adapt).toBeGreaterThan(1.05);
      expect(sharesUsed(seam, "blind", seed).blind_mm).toBeGreaterThan(30);
      if (seam.joint === "butt_v") expect(sharesUsed(seam, "mismatch", seed).adapt).toBeGreaterThan(1.1);
    }
  });

  test("is off the model for about a quarter of the joints that nothing is said about", () => {
    const fits = Array.from({ length: 2000 }, (_, seed) => commonFit(new Random(seed, "common")));
    const off = fits.filter((fit) => fit === "off").length / fits.length;
    expect(off).toBeGreaterThan(0.22);
    expect(off).toBeLessThan(0.32);
  });
});
