import { describe, expect, it } from "vitest";
import { partLook, partState, tallyWords } from "./part-words.ts";

const tally = (fields: Partial<Parameters<typeof partState>[0]>) => ({
  total: 0,
  planned: 0,
  held: 0,
  clear: 0,
  welded: 0,
  accepted: 0,
  rejected: 0,
  ...fields,
});

describe("a part in words", () => {
  it("is in the state of the seam that needs somebody most", () => {
    expect(partState(tally({ total: 3, accepted: 2, held: 1 }))).toBe("held");
    expect(partState(tally({ total: 3, accepted: 2, rejected: 1 }))).toBe("rejected");
    expect(partState(tally({ total: 3, accepted: 3 }))).toBe("accepted");
    expect(partState(tally({ total: 3, welded: 1, accepted: 2 }))).toBe("welded");
    expect(partState(tally({ total: 3, planned: 3 }))).toBe("planned");
  });

  it("is in work, not clear, while some seams are still planned", () => {
    expect(partLook(tally({ total: 3, planned: 1, clear: 2 }))).toEqual({ tone: "plain", word: "In work" });
    expect(partLook(tally({ total: 1, accepted: 1 }))).toEqual({ state: "accepted" });
  });

  it("counts its seams", () => {
    expect(tallyWords(tally({ total: 14, held: 1, accepted: 9, planned: 4 }))).toBe(
      "14 seams: 1 held, 9 accepted, 4 planned",
    );
    expect(tallyWords(tally({ total: 1, planned: 1 }))).toBe("1 seam: 1 planned");
    expect(tallyWords(tally({}))).toBe("0 seams");
  });
});
