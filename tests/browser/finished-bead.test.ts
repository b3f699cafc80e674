import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { findAccessFaults } from "./axe.ts";
import { launchChromium } from "./chromium.ts";
import { askApi, passSignIn, visit } from "./visitor.ts";

const url = inject("demo_url");
let browser: Browser;
let tag: string;

interface Scanned {
  readonly scans: readonly { readonly stage: string; readonly verdict: string }[];
}

beforeAll(async () => {
  browser = await launchChromium();
  const ask = <T>(path: string) => askApi<T>(url, "quality", path);
  const [part] = (await ask<{ items: { tag: string }[] }>("/parts?serial=0412&limit=1")).items;
  const { roll } = await ask<{ roll: { tag: string; number: string }[] }>(`/parts/${part?.tag}`);
  tag = roll.find(({ number }) => number === "S9")?.tag ?? "";
  const seam = await ask<Scanned>(`/seams/${tag}`);
  expect(seam.scans.map(({ stage, verdict }) => `${stage} ${verdict}`)).toContain("bead hold");
}, 60_000);
afterAll(() => browser?.close());

describe("a seam whose finished bead was scanned", () => {
  it("shows the findings, leads the cursor to the worst place, and lays the bead over its fit-up", async () => {
    const { page, complaints, close } = await visit(browser, `${url}/seams/${tag}`);
    await passSignIn(page, "quality");
    const scans = page.getByRole("row", { name: /Bead/ });
    await scans.getByRole("button", { name: "Show" }).click();
    await page.getByRole("heading", { name: /^Hold: 5011 continuous undercut, plate B/ }).waitFor();
    const findings = page.getByRole("table", { name: /Imperfections/ });
    const worst = findings.getByRole("row", { name: /5011/ });
    expect(await worst.textContent()).toMatch(/fails/);
    const station = await worst.getByRole("button").textContent();
    await worst.getByRole("button").click();
    await page.waitForLoadState("networkidle");
    await page.getByText("Toes of the weld").waitFor();
    await page.getByText("The fit-up before welding").waitFor();
    expect(await page.locator("[data-layer=under]").getAttribute("d")).toMatch(/^M/);
    expect(await page.getByRole("slider").first().getAttribute("aria-valuetext")).toContain(
      (station ?? "").replace(/\s*mm/, "").trim(),
    );
    expect(await findAccessFaults(page)).toEqual([]);
    expect(complaints).toEqual([]);
    await close();
  });
});
