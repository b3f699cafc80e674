import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { findAccessFaults } from "./axe.ts";
import { launchChromium } from "./chromium.ts";
import { askApi, passSignIn, type Visitor, visit } from "./visitor.ts";

const url = inject("demo_url");
let browser: Browser;
let addresses: Record<string, string>;

interface Listed {
  readonly items: readonly { readonly tag: string; readonly id: string }[];
}
interface PartRoll {
  readonly roll: readonly { readonly tag: string; readonly state: string; readonly verdict: string | null }[];
}

/** Addresses of pages that have something to say, found through the API. */
async function findAddresses(): Promise<Record<string, string>> {
  const first = async (path: string) => (await askApi<Listed>(url, "quality", path)).items[0];
  const [held, lot, person, procedure, drawing] = await Promise.all([
    first("/parts?with=held&limit=1"),
    first("/lots?limit=1"),
    first("/people?limit=1"),
    first("/procedures?limit=1"),
    first("/drawings?limit=1"),
  ]);
  const { roll } = await askApi<PartRoll>(url, "quality", `/parts/${held?.tag}`);
  const planned = roll.find((seam) => seam.state === "planned") ?? roll[0];
  const seen = roll.find((seam) => seam.state === "held") ?? roll[0];
  return {
    floor: "/",
    parts: "/parts",
    "parts with nothing": "/parts?serial=none",
    part: `/parts/${held?.tag}`,
    "new part": "/parts/new",
    "held seam": `/seams/${seen?.tag}`,
    "planned seam": `/seams/${planned?.tag}`,
    lots: "/lots",
    lot: `/lots/${lot?.tag}`,
    "new lot": "/lots/new",
    people: "/people",
    person: `/people/${person?.tag}`,
    "new person": "/people/new",
    procedures: "/procedures",
    procedure: `/procedures/${procedure?.id}`,
    "new procedure": "/procedures/new",
    drawings: "/drawings",
    drawing: `/drawings/${drawing?.id}`,
    "model seam": `/drawings/${drawing?.id}/seams/S1`,
    "new drawing": "/drawings/new",
    users: "/users",
    records: "/records",
    find: "/find?q=04",
    "find without an answer": "/find?q=zzz",
    "mistyped tag": "/t/S-8K3F7Q2NT",
    "no page": "/nowhere",
  };
}

/** Whether the page comes to fit; pictures are drawn anew a moment after the screen has changed. */
async function fitsIn(page: Page, width: number): Promise<boolean> {
  for (let i = 0; i < 20; i++) {
    if ((await page.evaluate(() => document.documentElement.scrollWidth)) <= width) return true;
    await page.waitForTimeout(100);
  }
  return false;
}

beforeAll(async () => {
  [browser, addresses] = await Promise.all([launchChromium(), findAddresses()]);
}, 60_000);
afterAll(() => browser?.close());

describe.each(["light", "dark"] as const)("in the %s theme", (colorScheme) => {
  let visitor: Visitor;
  beforeAll(async () => {
    visitor = await visit(browser, `${url}/sign-in`, { colorScheme });
  });
  afterAll(() => visitor?.close());

  it("the sign-in page has no fault that axe finds", async () => {
    await visitor.page.getByLabel("Name").waitFor();
    expect(await findAccessFaults(visitor.page)).toEqual([]);
    await passSignIn(visitor.page, "administrator");
  });

  it("every page is drawn, fits its screen, and has no fault that axe finds", {
    timeout: 300_000,
  }, async () => {
    const { page, complaints } = visitor;
    const faults: string[] = [];
    for (const [name, address] of Object.entries(addresses)) {
      await page.setViewportSize({ width: 1280, height: 800 });
      await page.goto(`${url}${address}`);
      await page.getByRole("heading", { level: 1 }).waitFor();
      await page.waitForLoadState("networkidle");
      faults.push(...(await findAccessFaults(page)).map((fault) => `${name}: ${fault}`));
      await page.setViewportSize({ width: 390, height: 800 });
      if (!(await fitsIn(page, 390))) faults.push(`${name}: wider than a screen of 390 px`);
      faults.push(...complaints.splice(0).map((complaint) => `${name}: ${complaint}`));
    }
    expect(faults).toEqual([]);
  });
});
