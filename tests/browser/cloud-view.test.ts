import type { Browser, Page } from "playwright-core";
import { PNG } from "pngjs";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { findAccessFaults } from "./axe.ts";
import { launchChromium } from "./chromium.ts";
import { askApi, passSignIn, visit } from "./visitor.ts";

const url = inject("demo_url");
let browser: Browser;
let tag: string;

beforeAll(async () => {
  browser = await launchChromium();
  const ask = <T>(path: string) => askApi<T>(url, "quality", path);
  const [part] = (await ask<{ items: { tag: string }[] }>("/parts?with=held&limit=1")).items;
  const { roll } = await ask<{ roll: { tag: string; state: string }[] }>(`/parts/${part?.tag}`);
  tag = roll.find(({ state }) => state === "held")?.tag ?? "";
}, 60_000);
afterAll(() => browser?.close());

/** Different colours in the drawing: an empty one has a single one. */
async function colours(page: Page): Promise<{ count: number; picture: Buffer }> {
  const picture = await page.locator("canvas").screenshot();
  const { data } = PNG.sync.read(picture);
  const seen = new Set<number>();
  for (let i = 0; i < data.length; i += 4)
    seen.add(((data[i] ?? 0) << 16) | ((data[i + 1] ?? 0) << 8) | (data[i + 2] ?? 0));
  return { count: seen.size, picture };
}

describe("a scan in 3D", () => {
  it("is loaded when asked for, drawn, turned by its buttons, and marks the shared cursor", async () => {
    const { page, complaints, close } = await visit(browser, `${url}/seams/${tag}`);
    await passSignIn(page, "quality");
    await page.getByRole("button", { name: "Show the scan in 3D" }).waitFor();
    const loaded = () =>
      page.evaluate(
        () => performance.getEntriesByType("resource").filter(({ name }) => /cloud-viewer/.test(name)).length,
      );
    expect(await loaded()).toBe(0);
    await page.getByRole("button", { name: "Show the scan in 3D" }).click();
    await page.locator("canvas").waitFor();
    await page.waitForTimeout(500);
    expect(await loaded()).toBe(1);
    const before = await colours(page);
    expect(before.count).toBeGreaterThan(20);
    await page.getByRole("button", { name: "Turn left" }).click();
    await page.waitForTimeout(300);
    const turned = await colours(page);
    expect(turned.picture.equals(before.picture)).toBe(false);
    await page.getByRole("slider").first().focus();
    for (let i = 0; i < 5; i++) await page.keyboard.press("ArrowRight");
    await page.waitForTimeout(300);
    expect((await colours(page)).picture.equals(turned.picture)).toBe(false);
    expect(await findAccessFaults(page)).toEqual([]);
    expect(complaints.filter((complaint) => !/GL Driver/.test(complaint))).toEqual([]);
    await page.getByRole("button", { name: "Hide the scan in 3D" }).click();
    await page.locator("canvas").waitFor({ state: "detached" });
    await close();
  });
});
