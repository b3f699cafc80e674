import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { findAccessFaults } from "./axe.ts";
import { type BuiltWeb, buildWeb } from "./built-web.ts";
import { launchChromium } from "./chromium.ts";
import { type StaticSite, serveFolder } from "./static-server.ts";

const THEMES = ["light", "dark"] as const;

let built: BuiltWeb;
let site: StaticSite;
let browser: Browser;

beforeAll(async () => {
  built = await buildWeb();
  [site, browser] = await Promise.all([serveFolder(built.folder), launchChromium()]);
});

afterAll(async () => {
  await browser?.close();
  await site?.close();
  await built?.remove();
});

/** The kit's page, ready; what the browser complains of is collected. */
async function openKit(options: { width: number; colorScheme: "light" | "dark" }): Promise<[Page, string[]]> {
  const complaints: string[] = [];
  const page = await browser.newPage({
    viewport: { width: options.width, height: 800 },
    colorScheme: options.colorScheme,
    reducedMotion: "reduce",
  });
  page.on("console", (message) => message.type() === "error" && complaints.push(message.text()));
  page.on("pageerror", (error) => complaints.push(error.message));
  await page.goto(`${site.url}/kit`);
  await page.getByRole("heading", { level: 1 }).waitFor();
  return [page, complaints];
}

describe.each(THEMES)("the kit's page in the %s theme", (colorScheme) => {
  it.each([1280, 390])(
    "has no fault that axe finds at %i px, and nothing is wider than the screen",
    async (width) => {
      const [page, complaints] = await openKit({ width, colorScheme });
      expect(await findAccessFaults(page)).toEqual([]);
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(width);
      expect(complaints).toEqual([]);
      await page.close();
    },
  );

  it("has no fault that axe finds with a dialog, a menu, wrong fields or a table of numbers open", async () => {
    const [page] = await openKit({ width: 1280, colorScheme });
    await page.getByRole("button", { name: "Show as table" }).click();
    await page.getByRole("button", { name: "Record the lot" }).click();
    await page.getByRole("button", { name: "Screen" }).click();
    expect(await findAccessFaults(page)).toEqual([]);
    await page.keyboard.press("Escape");
    await page.getByRole("button", { name: "Hold 12 parts" }).click();
    expect(await findAccessFaults(page)).toEqual([]);
    await page.close();
  });
});

describe("the kit by keyboard", () => {
  it("reads out a station's numbers as the arrow keys go along a strip", async () => {
    const [page] = await openKit({ width: 1280, colorScheme: "light" });
    const strip = page.getByRole("slider", { name: /^Seam S7/ });
    await strip.focus();
    await page.keyboard.press("End");
    expect(await strip.getAttribute("aria-valuetext")).toBe("115 mm, to minus, 60 % of the limit");
    for (let step = 0; step < 4; step++) await page.keyboard.press("ArrowLeft");
    expect(await strip.getAttribute("aria-valuetext")).toBe("75 mm, to plus, 120 % of the limit, beyond it");
    await page.close();
  });

  it("moves one cursor through all plots of a seam", async () => {
    const [page] = await openKit({ width: 1280, colorScheme: "light" });
    const axis = page.getByRole("slider", { name: "Station, Seam S4" });
    await axis.focus();
    await page.keyboard.press("End");
    const words = (await axis.getAttribute("aria-valuetext")) ?? "";
    expect(words).toMatch(
      /^at 318\.0 mm, Lateral \+3\.\d\d plus or minus 0\.06 mm, Normal −0\.\d\d .*, Current \d+ A$/,
    );
    await page.close();
  });

  it("goes through a thousand rows, opens one with Enter, and enters a row's strip", async () => {
    const [page] = await openKit({ width: 1280, colorScheme: "light" });
    const table = page.getByRole("table", { name: "Seams of all parts" });
    await table.getByRole("row", { name: /0200 S1/ }).focus();
    await page.keyboard.press("End");
    await page.getByRole("row", { name: /0399 S6/ }).waitFor();
    await page.waitForFunction(() => document.activeElement?.textContent?.includes("Skid frame 0399S6"));
    await page.keyboard.press("ArrowRight");
    expect(await page.evaluate(() => document.activeElement?.getAttribute("role"))).toBe("slider");
    await page.keyboard.press("Escape");
    await page.keyboard.press("Enter");
    await page.waitForURL(/open=Skid%20frame%200399%20S6/);
    await page.close();
  });

  it("puts the cursor into the search field with the slash key, and nowhere else when it is switched off", async () => {
    const [page] = await openKit({ width: 1280, colorScheme: "light" });
    await page.keyboard.press("/");
    const isSearching = () => page.evaluate(() => document.activeElement?.getAttribute("name") === "q");
    expect(await isSearching()).toBe(true);
    await page.getByRole("button", { name: "Screen" }).click();
    await page.getByRole("radio", { name: "Off" }).check();
    await page.keyboard.press("Escape");
    await page.keyboard.press("/");
    expect(await isSearching()).toBe(false);
    await page.close();
  });
});

describe("the choice of a screen", () => {
  it("keeps the night theme over a reload, set before the first paint", async () => {
    const [page] = await openKit({ width: 1280, colorScheme: "light" });
    await page.getByRole("button", { name: "Screen" }).click();
    await page.getByRole("radio", { name: "Night" }).check();
    await page.reload({ waitUntil: "commit" });
    await page.getByRole("heading", { level: 1 }).waitFor();
    expect(await page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor)).toBe(
      "rgb(21, 25, 29)",
    );
    await page.close();
  });

  it("shows lengths in inches and takes a fraction of one", async () => {
    const [page] = await openKit({ width: 1280, colorScheme: "light" });
    await page.getByRole("button", { name: "Screen" }).click();
    await page.getByRole("radio", { name: "inches" }).check();
    await page.keyboard.press("Escape");
    const gap = page.getByRole("textbox", { name: "Gap" });
    expect(await gap.inputValue()).toBe("0.125984");
    await gap.fill("1/16");
    await gap.blur();
    expect(await gap.inputValue()).toBe("0.0625");
    await page.close();
  });
});

describe("a form", () => {
  it("names each wrong field in plain words, and brings what was typed back after a reload", async () => {
    const [page] = await openKit({ width: 1280, colorScheme: "light" });
    await page.getByRole("textbox", { name: "Heat number" }).fill("H48812");
    await page.getByRole("textbox", { name: "Thickness" }).fill("-2,5");
    await page.getByRole("button", { name: "Record the lot" }).click();
    await page.getByText("More than 0 mm.", { exact: true }).waitFor();
    expect(await page.getByText("Fill this in.").count()).toBe(3);
    expect(await page.evaluate(() => document.activeElement?.getAttribute("name"))).toBe("grade");
    await page.reload();
    await page.getByText(/was kept and is back/).waitFor();
    expect(await page.getByRole("textbox", { name: "Heat number" }).inputValue()).toBe("H48812");
    await page.close();
  });
});
