import { execFile } from "node:child_process";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { launchChromium } from "./chromium.ts";
import { askApi, passSignIn, visit } from "./visitor.ts";

const url = inject("demo_url");
const BEADROLL = fileURLToPath(new URL("../../apps/cli/bin/beadroll.mjs", import.meta.url));
const SCAN = fileURLToPath(
  new URL("../../packages/domain/vectors/scans/01-two-uprights/seam-2/", import.meta.url),
);
/** Key of the demo's second cell, as the server prints it. */
const CELL_KEY = "brk_CE12DEM0CE12DEM0CE12DEM0CE12DEM0";

interface Row {
  readonly tag: string;
  readonly number: string;
  readonly state: string;
  readonly joint_type: string;
}

let browser: Browser;
let held: { readonly tag: string; readonly name: string };
let roll: readonly Row[];

beforeAll(async () => {
  browser = await launchChromium();
  const list = await askApi<{ items: (typeof held)[] }>(url, "quality", "/parts?with=held&limit=1");
  const [first] = list.items;
  if (!first) throw new Error("the demo has no part with a held seam");
  held = first;
  roll = (await askApi<{ roll: Row[] }>(url, "quality", `/parts/${held.tag}`)).roll;
}, 60_000);
afterAll(() => browser?.close());

const seamIn = (state: string): Row => {
  const found = roll.find((seam) => seam.state === state);
  if (!found) throw new Error(`the part has no seam that is ${state}`);
  return found;
};

/** Presses Tab until something has the focus; fails after many. */
async function tabTo(page: Page, selector: string): Promise<void> {
  for (let i = 0; i < 80; i++) {
    if (await page.evaluate((wanted) => document.activeElement?.matches(wanted) ?? false, selector)) return;
    await page.keyboard.press("Tab");
  }
  throw new Error(`the keyboard does not reach ${selector}`);
}

describe("a quality lead", () => {
  it("signs in, finds a seam and reads its stations by keyboard alone", async () => {
    const seam = seamIn("held");
    const { page, close } = await visit(browser, `${url}/`);
    await page.getByLabel("Name").waitFor();
    await page.keyboard.type("s.kowal");
    await page.keyboard.press("Tab");
    await page.keyboard.type("demo-quality-lead");
    await page.keyboard.press("Enter");
    await page.getByRole("heading", { level: 1, name: "Floor" }).waitFor();
    await page.keyboard.press("/");
    await page.keyboard.type(seam.tag.toLowerCase());
    await page.keyboard.press("Enter");
    await page.getByRole("heading", { level: 1, name: `Seam ${seam.number}` }).waitFor();
    await page.waitForLoadState("networkidle");
    await tabTo(page, "[role=slider]");
    const read = () => page.evaluate(() => document.activeElement?.getAttribute("aria-valuetext"));
    const start = await read();
    await page.keyboard.press("ArrowRight");
    await page.keyboard.press("ArrowRight");
    const next = await read();
    expect(start).toMatch(/mm/);
    expect(next).toMatch(/mm/);
    expect(next).not.toBe(start);
    await close();
  });

  it("opens a printed tag, signs in and stands before the seam", async () => {
    const seam = seamIn("held");
    const { page, close } = await visit(browser, `${url}/T/${seam.tag}`);
    await page.waitForURL((address) => address.pathname === "/sign-in");
    await passSignIn(page, "quality");
    await page.waitForURL(`${url}/seams/${seam.tag}`);
    await page.getByRole("heading", { level: 1, name: `Seam ${seam.number}` }).waitFor();
    await close();
  });

  it("sees a part as its roll, and opens a seam from it by keyboard", async () => {
    const { page, close } = await visit(browser, `${url}/parts/${held.tag}`);
    await passSignIn(page, "quality");
    await page.getByRole("heading", { level: 1, name: held.name }).waitFor();
    const table = page.getByRole("table", { name: /Seams of the part/ });
    expect(await table.getByRole("row").count()).toBe(roll.length + 1);
    await tabTo(page, "tbody tr");
    await page.keyboard.press("Enter");
    await page.waitForURL(/\/seams\/S-/);
    await close();
  });

  it("gets labels as a PDF", async () => {
    const { page, close } = await visit(browser, `${url}/parts/${held.tag}`);
    await passSignIn(page, "quality");
    await page.getByRole("button", { name: "Print labels" }).click();
    const [download] = await Promise.all([
      page.waitForEvent("download"),
      page.getByRole("button", { name: "Make the PDF" }).click(),
    ]);
    expect(download.suggestedFilename()).toMatch(/^labels-.*\.pdf$/);
    await close();
  });

  it("is told where a mistyped tag is wrong, and opens it once it is mended", async () => {
    const seam = seamIn("held");
    const wrong = `${seam.tag.slice(0, -1)}${seam.tag.endsWith("0") ? "1" : "0"}`;
    const { page, close } = await visit(browser, `${url}/t/${wrong}`);
    await passSignIn(page, "quality");
    await page.getByText(/check character does not match/i).waitFor();
    await page.getByLabel("Tag", { exact: true }).fill(seam.tag);
    await page.getByRole("button", { name: "Open the tag" }).click();
    await page.waitForURL(`${url}/seams/${seam.tag}`);
    await close();
  });
});

describe("the cell's computer", () => {
  let home: string;
  beforeAll(async () => {
    home = await mkdtemp(join(tmpdir(), "beadroll-cell-"));
  });
  afterAll(() => rm(home, { recursive: true, force: true }));

  const beadroll = (...args: string[]) =>
    new Promise<{ exit: number; out: string; err: string }>((resolve) => {
      const env = { ...process.env, BEADROLL_HOME: home, BEADROLL_SERVER: url, BEADROLL_KEY: CELL_KEY };
      execFile(process.execPath, [BEADROLL, ...args], { env }, (error, out, err) => {
        const exit = error === null ? 0 : Number(error.code ?? 1);
        resolve({ exit, out, err });
      });
    });

  it("pushes a scan and a log, and the seam's page shows them", async () => {
    const seam = seamIn("planned");
    const scan = await beadroll(
      "push",
      "scan",
      "--seam",
      seam.tag,
      "--scan",
      `${SCAN}profiles.csv.gz`,
      "--poses",
      `${SCAN}poses.csv`,
      "--json",
    );
    // The scan is of another part: nothing of it lies near this seam, so it is held, with the reason.
    expect([scan.exit, scan.err]).toEqual([10, expect.stringMatching(/^$|hold/)]);
    expect(JSON.parse(scan.out)).toMatchObject({ verdict: "hold", seam_tag: seam.tag });
    const log = Array.from({ length: 200 }, (_, i) => `${i / 10},${i > 9 && i < 190 ? 250 : 0},28,6`);
    await writeFile(join(home, "log.csv"), `time_s,current_a,voltage_v,travel_mm_s\n${log.join("\n")}\n`);
    const pass = await beadroll("push", "pass", "--seam", seam.tag, "--log", join(home, "log.csv"), "--json");
    expect([pass.exit, pass.err]).toEqual([0, ""]);
    const { page, close } = await visit(browser, `${url}/seams/${seam.tag}`);
    await passSignIn(page, "quality");
    await page.getByText("profiles.csv.gz").first().waitFor();
    await page.getByRole("heading", { level: 2, name: "Passes" }).waitFor();
    await page
      .getByText(/kJ\/mm/)
      .first()
      .waitFor();
    await close();
  });
});

describe("roles", () => {
  it("an inspector records an inspection, and the seam is accepted", async () => {
    const list = await askApi<{ to_inspect: Row[] }>(url, "inspector", "/floor");
    const [seam] = list.to_inspect;
    if (!seam) throw new Error("the demo has no seam to inspect");
    const { page, close } = await visit(browser, `${url}/seams/${seam.tag}`);
    await passSignIn(page, "inspector");
    await page.getByRole("button", { name: "Record the inspection" }).click();
    const dialog = page.getByRole("dialog");
    await dialog.getByRole("button").first().click();
    await dialog.waitFor({ state: "hidden" });
    await page.getByText("Accepted by VT.").waitFor();
    await close();
  });

  it("an auditor is offered nothing that writes", async () => {
    const { page, close } = await visit(browser, `${url}/parts/${held.tag}`);
    await passSignIn(page, "auditor");
    await page.getByRole("heading", { level: 1, name: held.name }).waitFor();
    expect(await page.getByRole("button", { name: "Build it in" }).count()).toBe(0);
    await page.goto(`${url}/lots`);
    await page.getByRole("heading", { level: 1, name: "Lots" }).waitFor();
    expect(await page.getByRole("link", { name: "Receive a lot" }).count()).toBe(0);
    await page.goto(`${url}/seams/${seamIn("held").tag}`);
    await page.getByRole("heading", { level: 1 }).waitFor();
    expect(await page.getByRole("button", { name: "Record the inspection" }).count()).toBe(0);
    await page.goto(`${url}/records`);
    await page.getByRole("table", { name: "Ledger entries" }).waitFor();
    await close();
  });

  it("a wrong password is refused in words, and nothing is lost", async () => {
    const { page, close } = await visit(browser, `${url}/sign-in`);
    await page.getByLabel("Name").fill("s.kowal");
    await page.getByLabel("Password", { exact: true }).fill("not-this");
    await page.keyboard.press("Enter");
    await page.getByText("Name or password is not right.").waitFor();
    expect(await page.getByLabel("Name").inputValue()).toBe("s.kowal");
    await close();
  });
});
