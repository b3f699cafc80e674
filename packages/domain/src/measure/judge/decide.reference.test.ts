import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { decide } from "./decide.ts";

describe("decision with guard bands (ISO 14253-1, U = 2 u)", () => {
  /** Results about limits of ±1, as JCGM 106 has them: y, u, decision. */
  it.each([
    [0, 0.1, "inside"],
    [0.8, 0.1, "inside"],
    [0.9, 0.1, "not_proven"],
    [1, 0.1, "not_proven"],
    [1.1, 0.1, "not_proven"],
    [0.835515, 0.1, "not_proven"],
    [-0.8, 0.1, "inside"],
    [1.3, 0.1, "outside"],
    [-1.3, 0.1, "outside"],
    [0.5, 0.5, "too_coarse"],
  ] as const)("%d ± 2 × %d against ±1: %s", (departure, u, proof) => {
    expect(decide(departure, 1, u)).toBe(proof);
  });

  /** JCGM 106 and ISO 14253-1, k = 2, limits on either side of a middle: y, u, lower, upper, decision. */
  it.each([
    [0.8, 0.1, -1, 1, "inside"],
    [0.9, 0.1, -1, 1, "not_proven"],
    [1.2, 0.15, 0, 1.5, "inside"],
    [0.3, 0.2, 0, 2, "not_proven"],
    [0.5, 0.5, -1, 1, "too_coarse"],
    [1.501, 0.0002, 0, 1.5, "outside"],
  ] as const)("%d ± 2 × %d in %d to %d: %s", (y, u, lower, upper, proof) => {
    expect(decide(y - (lower + upper) / 2, (upper - lower) / 2, u)).toBe(proof);
  });

  it("accepts the resistor of JCGM 106 to ±0.12 of ±0.2 with u 0.04", () => {
    expect(decide(0.12, 0.2, 0.04)).toBe("inside");
    expect(decide(0.1201, 0.2, 0.04)).toBe("not_proven");
    expect(decide(0.28, 0.2, 0.04)).toBe("not_proven");
    expect(decide(0.2801, 0.2, 0.04)).toBe("outside");
  });

  it("proves what is known exactly by its size alone", () => {
    expect([decide(1, 1, 0), decide(-1, 1, 0), decide(1.000001, 1, 0)]).toEqual([
      "inside",
      "inside",
      "outside",
    ]);
  });

  it("tells either side alike", () => {
    const size = fc.double({ min: 0, max: 5, noNaN: true });
    fc.assert(
      fc.property(size, fc.double({ min: 0.01, max: 5, noNaN: true }), size, (y, limit, u) => {
        expect(decide(-y, limit, u)).toBe(decide(y, limit, u));
      }),
    );
  });

  it("proves outside however coarse the scan, where the result is far enough out", () => {
    expect(decide(4, 1, 1)).toBe("outside");
    expect(decide(2.9, 1, 1)).toBe("too_coarse");
  });

  it("takes a result on the bound as inside, rounding or not: 1.2 + 2 × 0.15 against 1.5", () => {
    expect(decide(1.2, 1.5, 0.15)).toBe("inside");
  });

  it("never proves with more uncertainty what it does not prove with less", () => {
    const size = fc.double({ min: 0, max: 5, noNaN: true });
    fc.assert(
      fc.property(size, fc.double({ min: 0.01, max: 5, noNaN: true }), size, size, (y, limit, u, more) => {
        const [less, greater] = [decide(y, limit, u), decide(y, limit, u + more)];
        if (greater === "inside") expect(less).toBe("inside");
        if (greater === "outside") expect(less).toBe("outside");
      }),
    );
  });
});
