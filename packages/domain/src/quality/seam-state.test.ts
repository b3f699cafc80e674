import { describe, expect, it } from "vitest";
import { deriveSeamState, type SeamFacts } from "./seam-state.ts";

const facts = (known: Partial<SeamFacts> = {}): SeamFacts => ({
  attempt: 1,
  verdict: null,
  pass_seqs: [],
  inspections: [],
  ...known,
});

describe("a seam's state", () => {
  it.each([
    ["planned", facts()],
    ["repair", facts({ attempt: 2 })],
    ["clear", facts({ verdict: "within" })],
    ["clear", facts({ verdict: "adapt" })],
    ["held", facts({ verdict: "hold" })],
    ["welded", facts({ verdict: "within", pass_seqs: [4] })],
    ["accepted", facts({ pass_seqs: [4], inspections: [{ method: "VT", result: "accepted", seq: 5 }] })],
    ["rejected", facts({ pass_seqs: [4], inspections: [{ method: "VT", result: "rejected", seq: 5 }] })],
  ] as const)("is %s from what is recorded", (state, known) => {
    expect(deriveSeamState(known).state).toBe(state);
  });

  it("is welded again when a pass follows the inspection", () => {
    const known = facts({ pass_seqs: [4, 9], inspections: [{ method: "VT", result: "accepted", seq: 5 }] });
    expect(deriveSeamState(known).state).toBe("welded");
  });

  it("is rejected when one method rejects, whatever others say", () => {
    const known = facts({
      pass_seqs: [4],
      inspections: [
        { method: "MT", result: "rejected", seq: 5 },
        { method: "VT", result: "accepted", seq: 6 },
      ],
    });
    expect(deriveSeamState(known)).toEqual({ state: "rejected", reason: "Rejected by MT." });
  });

  it("follows the latest inspection of a method", () => {
    const known = facts({
      pass_seqs: [4],
      inspections: [
        { method: "VT", result: "rejected", seq: 5 },
        { method: "VT", result: "accepted", seq: 6 },
      ],
    });
    expect(deriveSeamState(known).state).toBe("accepted");
  });

  it("is not accepted by an inspection of a seam that has no pass", () => {
    expect(
      deriveSeamState(facts({ inspections: [{ method: "VT", result: "accepted", seq: 5 }] })).state,
    ).toBe("planned");
  });

  it("says when a seam was welded in spite of a hold", () => {
    expect(deriveSeamState(facts({ verdict: "hold", pass_seqs: [4] })).reason).toContain("hold");
  });
});
