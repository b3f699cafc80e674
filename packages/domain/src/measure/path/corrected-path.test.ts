import { describe, expect, it } from "vitest";
import { CorrectedPath } from "../../schemas/corrected-path.ts";
import { evaluateScan } from "../evaluate.ts";
import { cloudOf, scanOfT, straightModel } from "../testing/models.ts";
import { correctedPath, pathCsv } from "./corrected-path.ts";

const model = straightModel(60, 2);
const pathOf = (lateral: (x: number) => number) => {
  const outcome = evaluateScan(model, scanOfT(60, { lateral_mm: lateral }));
  if (!outcome.ok) throw new Error("refused");
  return correctedPath(model, outcome.value);
};

describe("corrected path", () => {
  it("runs through the measured roots, its tool axis midway between the plates and square to the travel", () => {
    const path = CorrectedPath.parse(pathOf((x) => 1 + 0.02 * x));
    expect(path.complete).toBe(true);
    for (const point of path.points) {
      expect(point.point_mm[1]).toBeCloseTo(1 + 0.02 * point.station_mm, 1);
      expect(point.shift_mm).toBeCloseTo(1 + 0.02 * point.station_mm, 1);
      const [t, a] = [point.tangent, point.tool_axis];
      expect(t[0] * a[0] + t[1] * a[1] + t[2] * a[2]).toBeCloseTo(0, 5);
      expect(Math.hypot(...a)).toBeCloseTo(1, 5);
      // The joint opens toward -y and +z.
      expect(a[1]).toBeCloseTo(-Math.SQRT1_2, 1);
      expect(a[2]).toBeCloseTo(Math.SQRT1_2, 1);
    }
    const middle = path.points[15];
    expect(Math.atan2(middle?.tangent[1] ?? 0, middle?.tangent[0] ?? 0)).toBeCloseTo(Math.atan(0.02), 2);
  });

  it("leaves out what was not measured and says so", () => {
    const scan = scanOfT(60);
    const kept = Array.from({ length: scan.count }, (_, k) => k).filter((k) => {
      const x = scan.xyz_mm[3 * k] ?? 0;
      return x < 20 || x > 30;
    });
    const torn = cloudOf(
      kept.map((k) => [scan.xyz_mm[3 * k] ?? 0, scan.xyz_mm[3 * k + 1] ?? 0, scan.xyz_mm[3 * k + 2] ?? 0]),
    );
    const outcome = evaluateScan(model, torn);
    if (!outcome.ok) throw new Error("refused");
    const path = correctedPath(model, outcome.value);
    expect(path.complete).toBe(false);
    expect(path.points.some((point) => point.station_mm > 21 && point.station_mm < 29)).toBe(false);
  });

  it("is written as CSV with a row a point, under what it is", () => {
    const path = pathOf(() => 0);
    const lines = pathCsv(path).trimEnd().split("\n");
    expect(lines[0]).toMatch(/^# test, verdict within, part frame\. Advice/);
    expect(lines[1]?.split(",")).toHaveLength(12);
    expect(lines).toHaveLength(path.points.length + 2);
    expect(lines[2]?.split(",")).toHaveLength(12);
  });

  it("wants the stations that its result has", () => {
    const outcome = evaluateScan(model, scanOfT(60), { step_mm: 5 });
    if (!outcome.ok) throw new Error("refused");
    const result = outcome.value;
    expect(() => correctedPath(model, result)).toThrow(RangeError);
    expect(correctedPath(model, result, 5).points).toHaveLength(13);
  });
});
