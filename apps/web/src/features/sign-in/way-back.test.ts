import { describe, expect, it } from "vitest";
import { wayBack } from "./way-back.ts";

describe("the way back after signing in", () => {
  it("leads to what was asked for inside the application", () => {
    expect(wayBack("/t/S-8K3F7Q2NS")).toBe("/t/S-8K3F7Q2NS");
    expect(wayBack("/lots?kind=wire")).toBe("/lots?kind=wire");
  });

  it.each([null, "", "lots", "//evil.example", "/\\evil.example", "https://evil.example", "/sign-in?to=/"])(
    "leads to the floor from %s",
    (to) => expect(wayBack(to)).toBe("/"),
  );
});
