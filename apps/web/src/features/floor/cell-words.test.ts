import type { FloorCell } from "@beadroll/domain/schemas/floor";
import { describe, expect, it } from "vitest";
import { cellState, lastRecordWords, missingWords, sinceWords } from "./cell-words.ts";
import { cellSpecimen, mountSpecimen, NOON, seamSpecimen } from "./floor-specimen.ts";

const now_ms = Date.parse(NOON);
const stateOf = (some: Partial<FloorCell>) => cellState(cellSpecimen(some), now_ms);

describe("a cell's state", () => {
  it("is at work while it sends, and quiet when it has not for long", () => {
    expect(stateOf({})).toEqual({ tone: "good", word: "At work" });
    expect(stateOf({ last_event_at: "2026-12-01T11:00:00.000Z" }).word).toBe("Quiet");
    expect(stateOf({ last_event_at: null }).word).toBe("Nothing sent yet");
  });

  it("names held seams before what is missing", () => {
    expect(stateOf({ latest: [seamSpecimen("held")], mounts: [] })).toEqual({
      tone: "stop",
      word: "1 seam held",
    });
    expect(stateOf({ latest: [seamSpecimen("held"), seamSpecimen("held")] }).word).toBe("2 seams held");
    expect(stateOf({ mounts: [mountSpecimen("gas")] })).toEqual({ tone: "attend", word: "No wire mounted" });
  });

  it("asks for wire, and for gas or flux", () => {
    expect(missingWords({ mounts: [] })).toBe("Nothing mounted");
    expect(missingWords({ mounts: [mountSpecimen("wire")] })).toBe("No gas mounted");
    expect(missingWords({ mounts: [mountSpecimen("wire"), mountSpecimen("flux")] })).toBeNull();
  });
});

it.each([
  ["2026-12-01T12:00:20.000Z", "just now"],
  ["2026-12-01T11:59:30.000Z", "just now"],
  ["2026-12-01T11:56:30.000Z", "3 min ago"],
  ["2026-12-01T09:00:00.000Z", "3 h ago"],
  ["2026-11-30T11:00:00.000Z", "1 day ago"],
  ["2026-11-06T12:00:00.000Z", "25 days ago"],
])("%s is %s at noon", (at, words) => expect(sinceWords(at, now_ms)).toBe(words));

it("says of a clear seam whether the path has to follow the joint", () => {
  expect(lastRecordWords({ state: "clear", verdict: "adapt" })).toContain("follow the joint");
  expect(lastRecordWords({ state: "clear", verdict: "within" })).toContain("the path serves");
});
