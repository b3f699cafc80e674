import { describe, expect, it } from "vitest";
import { changedKeys, marksAfter } from "./changed-keys.ts";

const map = (entries: Record<string, string>) => new Map(Object.entries(entries));

describe("what changed on a live screen", () => {
  it("is what has another value or is new, not what is gone", () => {
    const changed = changedKeys(map({ a: "1", b: "1", gone: "1" }), map({ a: "1", b: "2", c: "1" }));
    expect([...changed].sort()).toEqual(["b", "c"]);
  });

  it("stays marked for a few seconds, whatever changes after it", () => {
    const first = marksAfter(new Map(), new Set(["a"]), 0);
    const second = marksAfter(first, new Set(["b"]), 3000);
    expect([...second.keys()]).toEqual(["a", "b"]);
    expect([...marksAfter(second, new Set(), 6001).keys()]).toEqual(["b"]);
    expect([...marksAfter(second, new Set(), 9001).keys()]).toEqual([]);
  });

  it("is marked anew when it changes again", () => {
    const first = marksAfter(new Map(), new Set(["a"]), 0);
    const again = marksAfter(first, new Set(["a"]), 5000);
    expect([...marksAfter(again, new Set(), 7000).keys()]).toEqual(["a"]);
  });
});
