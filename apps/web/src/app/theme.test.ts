import { expect, it } from "vitest";
import early from "../../public/theme.js?raw";
import { THEMES, themeChoice } from "./theme.ts";

it("sets the same choice before the first paint as the page keeps", () => {
  expect(early).toContain(`"${themeChoice.key}"`);
  for (const theme of THEMES.filter((choice) => choice !== "system")) expect(early).toContain(`"${theme}"`);
});
