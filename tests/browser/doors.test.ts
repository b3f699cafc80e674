import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { launchChromium } from "./chromium.ts";
import { askApi, passSignIn, type Role, type Visitor, visit } from "./visitor.ts";

const url = inject("demo_url");

interface Floor {
  readonly cells: readonly { readonly cell: { readonly tag: string; readonly name: string } }[];
  readonly held: readonly { readonly tag: string; readonly number: string }[];
}

let browser: Browser;
let floor: Floor;

beforeAll(async () => {
  [browser, floor] = await Promise.all([launchChromium(), askApi<Floor>(url, "quality", "/floor")]);
}, 60_000);
afterAll(() => browser?.close());

/** Signed in and standing at an address. */
async function standAt(address: string, role: Role = "quality"): Promise<Visitor> {
  const visitor = await visit(browser, `${url}${address}`);
  await visitor.page.getByLabel("Name").waitFor();
  await passSignIn(visitor.page, role);
  return visitor;
}

async function search(page: Page, text: string): Promise<void> {
  await page.getByRole("searchbox", { name: "Find by tag" }).fill(text);
  await page.keyboard.press("Enter");
}

const focused = (page: Page) => page.evaluate(() => document.activeElement?.getAttribute("href") ?? null);

describe("searching", () => {
  it("goes through what was found by the arrow keys and opens it by Enter", async () => {
    const { page, close } = await standAt("/");
    await search(page, "04");
    await page.getByRole("heading", { level: 1, name: "Find “04”" }).waitFor();
    const links = await page
      .locator("a[data-found]")
      .evaluateAll((all) => all.map((a) => a.getAttribute("href")));
    expect(links.length).toBeGreaterThan(2);
    await page.keyboard.press("ArrowDown");
    await page.keyboard.press("ArrowDown");
    expect(await focused(page)).toBe(links[1]);
    await page.keyboard.press("ArrowUp");
    expect(await focused(page)).toBe(links[0]);
    await page.keyboard.press("Enter");
    await page.waitForURL(`${url}${links[0]}`);
    await close();
  });

  it("for a whole tag goes to its record, and Back leads to where one was", async () => {
    const [held] = floor.held;
    const { page, close } = await standAt("/lots");
    await page.getByRole("heading", { level: 1, name: "Lots" }).waitFor();
    await search(page, `HTTPS://ANY.EXAMPLE/T/${held?.tag}`);
    await page.waitForURL(`${url}/seams/${held?.tag}`);
    await page.goBack();
    await page.waitForURL(`${url}/lots`);
    await close();
  });

  it("for a whole tag that nothing has says so, and goes round in no circle", async () => {
    const { page, close } = await standAt("/");
    await search(page, "S-8K3F7Q2NS");
    await page.getByText("Nothing here is called “S-8K3F7Q2NS”").waitFor();
    await page.getByRole("link", { name: "Read it as a tag" }).click();
    await page.getByRole("heading", { level: 1, name: "No seam here has this tag" }).waitFor();
    expect(await page.getByRole("link", { name: "Search for it" }).count()).toBe(0);
    await close();
  });
});

describe("a tag's door", () => {
  it("is left out of the history, so that Back leaves it", async () => {
    const [held] = floor.held;
    const visitor = await visit(browser, "about:blank");
    const { page } = visitor;
    await page.goto(`${url}/t/${held?.tag}`);
    await passSignIn(page, "quality");
    await page.waitForURL(`${url}/seams/${held?.tag}`);
    await page.goBack();
    expect(page.url()).toBe("about:blank");
    await visitor.close();
  });

  it("offers what a tag with two swapped characters would be", async () => {
    const { page, close } = await standAt("/t/S-8K3F7Q2SN");
    await page.getByText("may be swapped").waitFor();
    await page.getByRole("link", { name: "Open S-8K3F7Q2NS if the label says so" }).click();
    await page.getByRole("heading", { level: 1, name: "No seam here has this tag" }).waitFor();
    await close();
  });

  it("of a cell opens the floor with that cell alone", async () => {
    const [, second] = floor.cells;
    if (second === undefined) throw new Error("the demo has one cell only");
    const { page, close } = await standAt(`/t/${second.cell.tag.toLowerCase()}`);
    await page.getByRole("heading", { level: 2, name: second.cell.name }).waitFor();
    expect(new URL(page.url()).searchParams.get("cell")).toBe(second.cell.tag);
    const [first] = floor.cells;
    expect(await page.getByRole("heading", { level: 2, name: first?.cell.name ?? "" }).count()).toBe(0);
    await page.getByRole("link", { name: "All cells" }).click();
    await page.getByRole("heading", { level: 2, name: first?.cell.name ?? "" }).waitFor();
    await close();
  });
});

describe("the floor", () => {
  it("shows a cell that was recorded on it, and what the cell still needs", async () => {
    const { page, close } = await standAt("/", "administrator");
    await page.getByRole("button", { name: "Record a cell" }).click();
    await page.keyboard.type("Cell of the floor test");
    await page.getByLabel("Robot").fill("Six-axis, 1.4 m");
    await page.getByLabel("Power source").fill("350 A");
    await page.getByLabel("Scanner", { exact: true }).fill("Laser line 60 mm");
    await page.getByLabel("Scanner's stated accuracy").fill("0,05");
    await page.getByRole("button", { name: "Record the cell" }).click();
    const sheet = page.getByRole("region", { name: "Cell of the floor test" });
    await sheet.getByText("Nothing mounted").first().waitFor();
    await sheet.getByText("Its computer needs a key").waitFor();
    await sheet.getByText("0.05 mm").waitFor();
    await close();
  });

  it("says when the server no longer answers, and when it does again", async () => {
    const { page, close } = await standAt("/");
    await page.getByText("Shows by itself what is recorded").waitFor();
    await page.route("**/api/v1/floor", (route) => route.abort());
    await page
      .getByText(/The server has not answered since .*: this may be old/)
      .waitFor({ timeout: 60_000 });
    await page.unroute("**/api/v1/floor");
    await page.getByText("Shows by itself what is recorded").waitFor({ timeout: 30_000 });
    await close();
  });
});
