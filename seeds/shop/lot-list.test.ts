import { describe, expect, test } from "vitest";
import { DOUBTFUL_LOT, LOTS, QUARANTINED_LOT } from "./lot-list.ts";

/** Smallest yield strength of EN 10025 grades for plate up to 16 mm, and of S460N and S355J2 up to 40 mm. */
const LEAST_YIELD_MPA: Readonly<Record<string, (thickness_mm: number) => number>> = {
  S275JR: () => 275,
  S355J2: (thickness_mm) => (thickness_mm <= 16 ? 355 : 345),
  S355J2H: () => 355,
  S460N: (thickness_mm) => (thickness_mm <= 16 ? 460 : 440),
};

describe("the demo lots", () => {
  test("are 27, each with a certificate of its own", () => {
    expect(LOTS).toHaveLength(27);
    expect(new Set(LOTS.map(({ number }) => number)).size).toBe(27);
    expect(new Set(LOTS.map(({ certificate }) => certificate.number)).size).toBe(27);
    expect(new Set(LOTS.map(({ certificate }) => certificate.type))).toEqual(
      new Set(["2.1", "2.2", "3.1", "3.2"]),
    );
  });

  test("keep what their grade promises, but for the one doubtful heat", () => {
    const short = LOTS.filter(({ grade, thickness_mm, certificate }) => {
      const least_mpa = LEAST_YIELD_MPA[grade]?.(thickness_mm ?? 0) ?? 0;
      return (certificate.mechanical?.["yield_mpa"] ?? 1000) < least_mpa;
    });
    expect(short.map(({ ref }) => ref)).toEqual([DOUBTFUL_LOT]);
  });

  test("have the heat that is quarantined later", () => {
    expect(LOTS.some(({ ref }) => ref === QUARANTINED_LOT)).toBe(true);
  });
});
