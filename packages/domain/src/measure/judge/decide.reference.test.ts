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
