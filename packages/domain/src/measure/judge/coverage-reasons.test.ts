import { describe, expect, it } from "vitest";
import { BLIND_REASONS, type StationResult } from "../../schemas/scan-result.ts";
import { DEFAULT_LIMITS } from "../../schemas/seam-model.ts";
import { coverageOf } from "../result/summary.ts";
import { BLIND_WORDS, coverageReasons } from "./coverage-reasons.ts";

const seen = (station_mm: number): StationResult => ({ station_mm, measured: true });
const blind = (station_mm: number, why: StationResult["why"] = "no_points"): StationResult => ({
  station_mm,
  measured: false,
  why,
});

const limits = { ...DEFAULT_LIMITS, coverage_share: 0.9, longest_blind_mm: 10 };
const reasons = (stations: StationResult[], of = limits) =>
  coverageReasons(stations, coverageOf(stations), of);

/** Stations 0 to 100, every millimetre, some of them blind. */
const seam = (isBlind: (x: number) => StationResult["why"] | false) =>
  Array.from({ length: 101 }, (_, x) => {
    const why = isBlind(x);
    return why ? blind(x, why) : seen(x);
  });

describe("reasons from what was not measured", () => {
  it("are none of a seam that was measured whole, or short of its limits", () => {
    expect(reasons(seam(() => false))).toEqual([]);
    expect(reasons(seam((x) => x >= 40 && x < 49 && "no_points"))).toEqual([]);
  });

  it("name the stretch from the last station before it to the first after it", () => {
    expect(reasons(seam((x) => x >= 40 && x <= 49 && "few_points_b"))).toEqual([
      {
        check: "coverage",
        level: "adapt",
        proof: "not_measured",
        station_mm: 39,
        value: 11,
        limit: 10,
        unit: "mm",
        from_mm: 39,
        to_mm: 50,
        text: "Nothing measured from 39 mm to 50 mm; 10 mm may stay unmeasured: mostly because too few points lie on plate B",
      },
    ]);
  });

  it("name the share in percent, cut and not rounded up to what is asked for", () => {
    const [share] = reasons(
      Array.from({ length: 10_000 }, (_, i) =>
        i < 8996 ? seen(i / 1000) : blind(i / 1000, "root_not_seen"),
      ),
      { ...limits, longest_blind_mm: 99 },
    );
    expect(share).toMatchObject({ unit: "share", value: 0.8996, limit: 0.9 });
    expect(share?.text).toBe(
      "89.9 % of the stations were measured, 90 % are asked for: mostly because the root cannot be constructed from what is seen",
    );
  });

  it("give both where both are short, the share first", () => {
    expect(reasons(seam((x) => x > 50 && "beyond_end")).map(({ unit }) => unit)).toEqual(["share", "mm"]);
  });

  it("give the commonest cause, the first met of two alike", () => {
    const [first] = reasons(seam((x) => (x < 30 ? "few_points_a" : x < 80 && "ambiguous")));
    expect(first?.text).toContain(BLIND_WORDS.ambiguous);
    const [alike] = reasons(seam((x) => (x < 30 ? "few_points_a" : x < 60 && "ambiguous")));
    expect(alike?.text).toContain(BLIND_WORDS.few_points_a);
  });

  it("say nothing of causes where none is known", () => {
    const [first] = reasons(
      [{ station_mm: 0, measured: false }, blind(20), seen(40)].map(({ why, ...rest }) => rest),
    );
    expect(first?.text).toMatch(/are asked for$/);
  });

  it("hold a scan of nothing", () => {
    expect(reasons([])).toMatchObject([{ value: 0, from_mm: 0, to_mm: 0 }]);
    expect(reasons(seam(() => "no_points"))).toMatchObject([
      { value: 0, unit: "share" },
      { value: 100, unit: "mm", from_mm: 0, to_mm: 100 },
    ]);
  });

  it("have words for every cause there is", () => {
    expect(Object.keys(BLIND_WORDS).sort()).toEqual([...BLIND_REASONS].sort());
  });
});
