import { describe, expect, it } from "vitest";
import { changedKeys } from "./changed-keys.ts";

const map = (entries: Record<string, string>) => new Map(Object.entries(entries));

describe("what changed on a live screen", () => {
  it("is what has another value or is new, not what is gone", () => {
    const changed = changedKeys(map({ a: "1", b: "1", gone: "1" }), map({ a: "1", b: "2", c: "1" }));
    expect([...changed].sort()).toEqual(["b", "c"]);
  });
});
