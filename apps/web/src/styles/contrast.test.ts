import { temperColour } from "@beadroll/domain/quality/temper";
import { describe, expect, it } from "vitest";
import { contrast, tokensOf } from "./contrast.ts";
import css from "./tokens.css?raw";

/** Text on its ground: 4.5 (WCAG 2.2, 1.4.3). */
const TEXT: readonly (readonly [text: string, ground: string])[] = [
  ...["paper", "sheet", "hush"].flatMap((ground) =>
    ["ink", "ash", "link", "good", "attend", "stop"].map((text) => [text, ground] as const),
  ),
  ["on-soot", "soot"],
  ["ash-on-soot", "soot"],
  ["on-soot", "field-on-soot"],
  ["ash-on-soot", "field-on-soot"],
  ["spark", "soot"],
  ["on-act", "act"],
  ["on-stop-fill", "stop-fill"],
];

/** Edges of controls, focus rings, outlines of drawings: 3 (WCAG 2.2, 1.4.11). */
const EDGES: readonly (readonly [edge: string, ground: string])[] = [
  ["edge", "paper"],
  ["edge", "sheet"],
  ["edge", "hush"],
  ["link", "paper"],
  ["link", "sheet"],
  ["spark", "soot"],
  ["spark", "field-on-soot"],
  ["bead-outline", "sheet"],
  ["bead-outline", "hush"],
];

describe.each(["light", "night"] as const)("the %s theme", (theme) => {
  const tokens = tokensOf(css, theme);
  const ratio = (a: string, b: string) => {
    const [first, second] = [tokens.get(a), tokens.get(b)];
    if (first === undefined || second === undefined) throw new RangeError(`tokens: expected ${a} and ${b}`);
    return contrast(first, second);
  };

  it.each(TEXT)("lets %s be read on %s", (text, ground) => {
    expect(ratio(text, ground)).toBeGreaterThanOrEqual(4.5);
  });

  it.each(EDGES)("lets %s be seen on %s", (edge, ground) => {
    expect(ratio(edge, ground)).toBeGreaterThanOrEqual(3);
  });
});

it("writes the ratio as WCAG does: 21 for black on white, 4.54 for #767676 on white", () => {
  expect(contrast("#000000", "#ffffff")).toBeCloseTo(21, 10);
  expect(contrast("#767676", "#ffffff")).toBeCloseTo(4.54, 2);
});

it("keeps the temper scale's steps apart from each other by eye: each darker than the one before, ember apart", () => {
  const steps = [0, 0.25, 0.5, 0.72, 0.88].map((share) => contrast(temperColour(share), "#000000"));
  expect([...steps].sort((a, b) => b - a)).toEqual(steps);
  expect(temperColour(1)).not.toBe(temperColour(1.0001));
});
