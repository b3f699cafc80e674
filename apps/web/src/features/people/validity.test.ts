import { describe, expect, it } from "vitest";
import { daysWords, validityOn } from "./validity.ts";

const qualification = { issued_on: "2026-01-01", valid_until: "2026-12-31" };

describe("a qualification's validity", () => {
  it.each([
    ["2026-06-01", "valid", "213 days left"],
    ["2026-11-01", "due", "60 days left"],
    ["2026-12-31", "due", "last day today"],
    ["2027-01-01", "expired", "ended 1 day ago"],
  ])("on %s is %s, %s", (today, state, words) => {
    const validity = validityOn(qualification, today);
    expect([validity.state, daysWords(validity)]).toEqual([state, words]);
  });

  it("uses its time up from issue to end", () => {
    expect(validityOn(qualification, "2026-01-01").share).toBe(0);
    expect(validityOn(qualification, "2026-07-02").share).toBeCloseTo(0.5, 2);
    expect(validityOn(qualification, "2027-03-01").share).toBeGreaterThan(1);
  });
});
