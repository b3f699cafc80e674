import type { BeadResult, BeadStation } from "@beadroll/domain/schemas/bead-result";
import { describe, expect, it } from "vitest";
import { beadPlots } from "./bead-plots.ts";

const stations: BeadStation[] = [
  { station_mm: 0, measured: true, throat_mm: 5.1, u_throat_mm: 0.02, undercut_b_mm: 0.4 },
  { station_mm: 2, measured: false, why: "no_points" },
];
const finding = (code: string, limit: number, plate?: "a" | "b") => ({
  code,
  limit,
  ...(plate && { plate }),
});
const result = {
  requirement: { weld_size_mm: 5, quality_level: "C", edition: "2023" },
  findings: [finding("5213", 0.8), finding("5012", 0.5, "b"), finding("5011", 0.3, "a")],
  stations,
} as unknown as BeadResult;

describe("plots of a finished weld", () => {
  it("shows the figures that it has, with twice their standard uncertainty", () => {
    const plots = beadPlots(result);
    expect(plots.map(({ id }) => id)).toEqual(["throat_mm", "undercut_b_mm"]);
    expect(plots[0]?.values).toEqual([5.1, null]);
    expect(plots[0]?.expanded_u).toEqual([0.04, null]);
  });

  it("draws the level's limit on the figure's own axis, each plate its own", () => {
    const [throat, undercut] = beadPlots(result);
    expect(throat?.bands?.[0]).toMatchObject({ low: 4.2 });
    expect(undercut?.bands?.[0]).toMatchObject({ low: 0, high: 0.5 });
  });
});
