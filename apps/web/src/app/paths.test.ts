import { expect, it } from "vitest";
import { storedChoice } from "./choices/stored-choice.ts";
import { navEntries, pageNames } from "./page-modules.ts";
import { findPath, PATHS, pathTo } from "./paths.ts";

it("leads to a page by its name", () => {
  expect(pathTo("parts")).toBe("/parts");
  expect(pathTo("part", { tag: "P-7K3F9Q2MX" })).toBe("/parts/P-7K3F9Q2MX");
  expect(findPath("heat H48812 & more")).toBe("/find?q=heat+H48812+%26+more");
});

it("has no address twice", () => {
  const paths = pageNames().map((name) => PATHS[name].path);
  expect(new Set(paths).size).toBe(paths.length);
});

it("shows in the bar only the pages that exist, in the table's order", () => {
  const exists = (name: string) => name === "lots" || name === "floor" || name === "lot";
  expect(navEntries(exists).map((entry) => entry.nav)).toEqual(["Floor", "Lots"]);
});

it("remembers a choice while the page lives, tells of it, and takes no other for it", () => {
  const choice = storedChoice("beadroll.test", ["mm", "in"]);
  const seen: string[] = [];
  const stop = choice.subscribe(() => seen.push(choice.read()));
  expect(choice.read()).toBe("mm");
  choice.write("in");
  stop();
  choice.write("mm");
  expect(seen).toEqual(["in"]);
});
