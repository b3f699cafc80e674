import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { BeadRequirement } from "../../schemas/bead-requirement.ts";
import type { SeamModel } from "../../schemas/seam-model.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import { beadCloud, beadModel, type FilletSection, flatFillet, vButt } from "../testing/beads.ts";
import { evaluateBead } from "./evaluate-bead.ts";

const requirement = (more: Partial<BeadRequirement> = {}): BeadRequirement => ({
  weld_size_mm: 5,
  quality_level: "C",
  edition: "2023",
  ...more,
});

function evaluated(model: SeamModel, cloud: ScanCloud, more: Partial<BeadRequirement> = {}) {
  const outcome = evaluateBead(model, cloud, { requirement: requirement(more), scanner_accuracy_mm: 0.01 });
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
  return outcome.value;
}

const codes = (findings: readonly { code: string; state: string }[], state: string) =>
  findings.flatMap((one) => (one.state === state ? one.code : []));

const fillet = (section: Partial<FilletSection> = {}, at?: (s: number) => Partial<FilletSection>) =>
  beadCloud((s) => flatFillet({ leg_a_mm: 7.2, leg_b_mm: 7.2, ...section, ...at?.(s) }));

describe("a flat fillet without noise", () => {
  const result = evaluated(beadModel("fillet_t"), fillet());

  it("measures what plain geometry says: legs 7.2, throat 7.2 cos 45°, toes 135°", () => {
    for (const station of result.stations) {
      expect(station.leg_a_mm).toBeCloseTo(7.2, 2);
      expect(station.leg_b_mm).toBeCloseTo(7.2, 2);
      expect(station.throat_mm).toBeCloseTo(7.2 * Math.SQRT1_2, 2);
      expect(station.throat_actual_mm).toBeCloseTo(7.2 * Math.SQRT1_2, 2);
      expect(station.toe_angle_a_deg).toBeCloseTo(135, 0);
      expect(station.width_mm).toBeCloseTo(7.2 * Math.SQRT2, 2);
    }
  });

  it("keeps level C, with every check told", () => {
    expect([result.verdict, result.reasons]).toEqual(["within", []]);
    expect(codes(result.findings, "met").sort()).toEqual(
      ["503", "505", "505", "5012", "5012", "512", "5213", "5214"].sort(),
    );
  });

  it("says what a scan does not show", () => {
    expect(result.warnings[0]).toMatch(/cracks/);
  });
});

describe("faults of a fillet are found where they are", () => {
  const model = beadModel("fillet_t");

  it("a throat too small along more than a short stretch (5213)", () => {
    const { findings, verdict } = evaluated(
      model,
      fillet({}, (s) => (s > 20 && s < 90 ? { leg_a_mm: 6.7, leg_b_mm: 6.7 } : {})),
    );
    const found = findings.find(({ code }) => code === "5213");
    expect([verdict, found?.state]).toEqual(["hold", "not_met"]);
    // 5 - 6.7 cos 45° = 0.26: under the 0.8 of level C, but 25 mm in any 100 mm are allowed.
    expect(found?.value).toBeCloseTo(5 - 6.7 * Math.SQRT1_2, 1);
    expect(found?.text).toMatch(/of it in 100 mm, 25 mm allowed/);
  });

  it("the same on a short stretch is allowed", () => {
    const { findings } = evaluated(
      model,
      fillet({}, (s) => (s > 20 && s < 38 ? { leg_a_mm: 6.7, leg_b_mm: 6.7 } : {})),
    );
    expect(findings.find(({ code }) => code === "5213")?.state).toBe("met");
  });

  it("an undercut on plate B only (5011), with its length", () => {
    const { findings } = evaluated(
      model,
      fillet({}, (s) => (s > 30 && s < 70 ? { undercut_b_mm: 0.8 } : {})),
    );
    const on = (plate: string) => findings.find((one) => one.code.startsWith("501") && one.plate === plate);
    expect([on("b")?.code, on("b")?.state, on("a")?.state]).toEqual(["5011", "not_met", "met"]);
    expect(on("b")?.value).toBeCloseTo(0.8, 1);
    expect(on("b")?.length_mm).toBeGreaterThan(36);
    expect(on("b")?.length_mm).toBeLessThan(42);
    expect(on("b")?.station_mm).toBeGreaterThan(30);
  });

  it("legs that differ too much (512) and a hump (503)", () => {
    const uneven = evaluated(model, fillet({ leg_a_mm: 11, leg_b_mm: 7.2 }));
    expect(codes(uneven.findings, "not_met")).toContain("512");
    const humped = evaluated(model, fillet({ bow_mm: 3 }));
    expect(codes(humped.findings, "not_met")).toContain("503");
    expect(humped.stations[50]?.convexity_mm).toBeCloseTo(3, 1);
  });

  it("a weld that is missing on a stretch: no throat there", () => {
    const gone = evaluated(
      model,
      fillet({}, (s) => (s > 80 ? { leg_a_mm: 0, leg_b_mm: 0 } : {})),
    );
    const found = gone.findings.find(({ code }) => code === "5213");
    expect([found?.state, found?.value]).toEqual(["not_met", 5]);
  });
});

describe("a butt weld", () => {
  const model = beadModel("butt_v");

  it("has its width, excess and mismatch as drawn", () => {
    const result = evaluated(
      model,
      beadCloud(() => vButt({ width_mm: 12, excess_mm: 1.5, step_mm: 0.6 })),
      {
        weld_size_mm: 8,
      },
    );
    const station = result.stations[30];
    expect(station?.width_mm).toBeCloseTo(12, 1);
    expect(station?.excess_mm).toBeCloseTo(1.5, 1);
    expect(station?.mismatch_mm).toBeCloseTo(0.6, 2);
    expect(codes(result.findings, "not_met")).toEqual([]);
  });

  it("that is not filled fails (511)", () => {
    const result = evaluated(
      model,
      beadCloud(() => vButt({ width_mm: 12, excess_mm: -1.6, step_mm: 0 })),
      {
        weld_size_mm: 8,
      },
    );
    expect(codes(result.findings, "not_met")).toContain("511");
    expect(result.stations[30]?.underfill_mm).toBeCloseTo(1.6, 1);
  });
});

describe("laws", () => {
  const model = beadModel("fillet_t");
  const mm = (least: number, most: number) => fc.double({ min: least, max: most, noNaN: true });

  it("legs, throat and bow come out as they went in", { timeout: 60_000 }, () => {
    fc.assert(
      fc.property(mm(4, 9), mm(4, 9), mm(-0.6, 1.5), (leg_a_mm, leg_b_mm, bow_mm) => {
        const { stations } = evaluated(model, fillet({ leg_a_mm, leg_b_mm, bow_mm }));
        const station = stations[40];
        return (
          Math.abs((station?.leg_a_mm ?? 0) - leg_a_mm) < 0.08 &&
          Math.abs((station?.leg_b_mm ?? 0) - leg_b_mm) < 0.08 &&
          Math.abs((station?.convexity_mm ?? 0) - Math.max(0, bow_mm)) < 0.06 &&
          Math.abs((station?.concavity_mm ?? 0) - Math.max(0, -bow_mm)) < 0.06
        );
      }),
      { numRuns: 25, seed: 1 },
    );
  });

  it("a moved part has the same weld", () => {
    const move = (l: number, n: number) =>
      beadCloud((s) =>
        flatFillet({ leg_a_mm: 7.2, leg_b_mm: 6.4 }).map(([x, y]): [number, number] => [
          x + l,
          y + n + 0 * s,
        ]),
      );
    const [here, there] = [move(0, 0), move(1.7, -0.8)].map((cloud) => evaluated(model, cloud));
    expect(there?.stations[40]?.leg_a_mm).toBeCloseTo(here?.stations[40]?.leg_a_mm ?? 0, 2);
    expect(there?.stations[40]?.throat_mm).toBeCloseTo(here?.stations[40]?.throat_mm ?? 0, 2);
  });

  it("nothing seen is hold, never a number", () => {
    const result = evaluated(
      model,
      beadCloud(() => [
        [-30, 5],
        [-29, 5],
      ]),
    );
    expect(result.verdict).toBe("hold");
    expect(result.stations.every(({ measured }) => !measured)).toBe(true);
    expect(result.findings).toEqual([]);
  });
});
