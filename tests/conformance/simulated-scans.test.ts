import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import { JOINT_TYPES, type JointType } from "@beadroll/domain/schemas/seam-model";
import { afterAll, describe, expect, it } from "vitest";
import { type Simulated, simulate, type TrueStation } from "../simulation/simulate-scan.ts";

/**
 * Hundreds of seams scanned by chance, of every joint type, straight, bent and closed, clean and dirty, held against
 * the truth they were made from. The simulator shares no code with the measuring nor with the demo's generator.
 */
const SEEDS = Array.from({ length: 14 }, (_, i) => i + 1);

type Quantity = "lateral" | "normal" | "gap" | "mismatch";
const QUANTITIES: readonly Quantity[] = ["lateral", "normal", "gap", "mismatch"];

/** 95th percentiles of |error| that every type must keep, mm. An edge is known to the spacing of points only. */
const LIMITS: Record<"clean" | "dirty", Record<JointType, Record<Quantity, number>>> = {
  clean: limits(0.03, 0.05),
  dirty: limits(0.05, 0.08),
};

function limits(root_mm: number, edge_mm: number): Record<JointType, Record<Quantity, number>> {
  const faces = { lateral: root_mm, normal: root_mm, gap: root_mm, mismatch: root_mm };
  // Where no far corner is seen the gap comes from the edge alone.
  const edgeGap = { ...faces, gap: 0.2 };
  return {
    fillet_t: edgeGap,
    corner_closed: edgeGap,
    lap: faces,
    corner_open: faces,
    butt_v: faces,
    butt_half_v: { lateral: 2 * edge_mm, normal: 1.5 * edge_mm, gap: 0.2, mismatch: 2 * edge_mm },
    butt_square: { lateral: 2 * edge_mm, normal: root_mm, gap: 0.25, mismatch: root_mm },
  };
}

interface Found {
  readonly error: number;
  readonly u: number;
}

function compare(result: ScanResult, truth: readonly TrueStation[], quantity: Quantity): Found[] {
  return result.stations.flatMap((station, i) => {
    const [value, u, real] = [
      station[`${quantity}_mm`],
      station[`u_${quantity}_mm`],
      truth[i]?.[`${quantity}_mm`],
    ];
    return value === undefined || u === undefined || typeof real !== "number"
      ? []
      : { error: Math.abs(value - real), u };
  });
}

interface Run {
  readonly simulated: Simulated;
  readonly result: ScanResult;
}

function runsOf(joint: JointType, hard: number): Run[] {
  return SEEDS.map((seed) => {
    const simulated = simulate(joint, seed, hard);
    const outcome = evaluateScan(simulated.model, simulated.cloud);
    if (!outcome.ok) throw new Error(`${simulated.name}: ${JSON.stringify(outcome.faults)}`);
    return { simulated, result: outcome.value };
  });
}

const rows: string[] = [];
afterAll(() =>
  console.log(["joint          dirt   quantity    n      p95    max   covered (k = 2)", ...rows].join("\n")),
);

describe.each(JOINT_TYPES)("%s", (joint) => {
  describe.each([
    ["clean", 0],
    ["dirty", 1],
  ] as const)("%s", (dirt, hard) => {
    const runs = runsOf(joint, hard);

    it.each(QUANTITIES)("%s is found, with an uncertainty that holds", (quantity) => {
      const found = runs.flatMap(({ result, simulated }) => compare(result, simulated.truth, quantity));
      if (quantity === "mismatch" && !joint.startsWith("butt")) {
        expect(found).toEqual([]);
        return;
      }
      const sizes = found.map(({ error }) => error).sort((a, b) => a - b);
      const p95 = sizes[Math.ceil(0.95 * sizes.length) - 1] ?? Number.NaN;
      const covered = found.filter(({ error, u }) => error <= 2 * u).length / found.length;
      rows.push(
        `${joint.padEnd(14)} ${dirt}  ${quantity.padEnd(9)} ${String(found.length).padStart(5)}  ${p95.toFixed(3)}  ${(sizes.at(-1) ?? 0).toFixed(2)}  ${(100 * covered).toFixed(1)} %`,
      );
      expect(p95).toBeLessThan(LIMITS[dirt][joint][quantity]);
      // One scan's errors go together along it, so a handful of seams scatters about the 95 % meant.
      expect(covered).toBeGreaterThan(0.8);
    });

    it("hardly ever errs by a millimetre", () => {
      const all = runs.flatMap(({ result, simulated }) =>
        QUANTITIES.flatMap((quantity) => compare(result, simulated.truth, quantity)),
      );
      expect(all.filter(({ error }) => error > 1).length / all.length).toBeLessThan(0.002);
    });

    it("never measures where the profile was lost, and most of what was scanned", () => {
      let [scanned, measured] = [0, 0];
      for (const { result, simulated } of runs)
        result.stations.forEach((station, i) => {
          if (!simulated.truth[i]?.scanned) expect(station.measured).toBe(false);
          else {
            scanned += 1;
            if (station.measured) measured += 1;
          }
        });
      expect(measured / scanned).toBeGreaterThan(hard > 0 && joint.startsWith("butt") ? 0.8 : 0.94);
    });
  });
});
