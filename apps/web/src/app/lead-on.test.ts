import { describe, expect, it } from "vitest";
import { leadOn } from "./lead-on.ts";

const door = new Request("http://shop.example/t/S-8K3F7Q2NS");
const isReplacing = (answer: Response) => answer.headers.has("X-Remix-Replace");

describe("a door that leads on", () => {
  it("goes to the page it names", () =>
    expect(leadOn(door, "/seams/S-8K3F7Q2NS", "/").headers.get("Location")).toBe("/seams/S-8K3F7Q2NS"));

  it("replaces itself only where the browser stands at it", () => {
    expect(isReplacing(leadOn(door, "/seams/S-8K3F7Q2NS", "/t/S-8K3F7Q2NS"))).toBe(true);
    expect(isReplacing(leadOn(door, "/seams/S-8K3F7Q2NS", "/find?q=0418"))).toBe(false);
  });
});
