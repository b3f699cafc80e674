import type { FitUpScanPage } from "@beadroll/domain/schemas/scan";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, inject, it } from "vitest";
import { launchChromium } from "./chromium.ts";
import { askApi, askFile, passSignIn, visit } from "./visitor.ts";

const url = inject("demo_url");

interface Seam {
  readonly number: string;
  readonly model_seam: { readonly drawing_id: string };
  readonly scans: readonly { readonly id: string }[];
}

let browser: Browser;
let seam: Seam;
let scan: FitUpScanPage;

beforeAll(async () => {
  browser = await launchChromium();
  const ask = <T>(path: string) => askApi<T>(url, "coordinator", path);
  const [part] = (await ask<{ items: { tag: string }[] }>("/parts?with=held&limit=1")).items;
  const { roll } = await ask<{ roll: { tag: string; state: string }[] }>(`/parts/${part?.tag}`);
  seam = await ask(`/seams/${roll.find(({ state }) => state === "held")?.tag}`);
  scan = await ask(`/scans/${seam.scans[0]?.id}`);
}, 60_000);
afterAll(() => browser?.close());

describe("measuring in the browser", () => {
  it("gives what the server measured of the same files, and stores nothing", async () => {
    const { page, complaints, close } = await visit(
      browser,
      `${url}/drawings/${seam.model_seam.drawing_id}/seams/${seam.number}`,
    );
    await passSignIn(page, "coordinator");
    const files = await Promise.all(
      [
        { name: scan.file_name, digest: scan.file_digest },
        ...(scan.poses_digest === null ? [] : [{ name: "poses.csv", digest: scan.poses_digest }]),
      ].map(async ({ name, digest }) => ({
        name,
        mimeType: "application/octet-stream",
        buffer: await askFile(url, "coordinator", digest),
      })),
    );
    await page.getByLabel(/^Scan, and its poses/).setInputFiles(files);
    const sent: string[] = [];
    page.on("request", (request) => sent.push(request.method()));
    await page.getByRole("button", { name: "Measure it" }).click();
    const [reason] = scan.result.reasons;
    await page.getByRole("heading", { name: reason?.text.slice(0, 20) ?? "" }).waitFor();
    await page.getByText(/not stored/).waitFor();
    await page.getByRole("img", { name: /section/i }).waitFor();
    expect(sent.filter((method) => method !== "GET")).toEqual([]);
    expect(complaints).toEqual([]);
    await close();
  });

  it("says in a sentence why a file cannot be measured", async () => {
    const { page, close } = await visit(
      browser,
      `${url}/drawings/${seam.model_seam.drawing_id}/seams/${seam.number}`,
    );
    await passSignIn(page, "coordinator");
    await page
      .getByLabel(/^Scan, and its poses/)
      .setInputFiles({ name: "cut.xyz", mimeType: "text/plain", buffer: Buffer.from("1 2 3\n4 five 6\n") });
    await page.getByRole("button", { name: "Measure it" }).click();
    await page.getByText(/line 2/).waitFor();
    await close();
  });

  it("plans a scan anew while the figures are typed", async () => {
    const { page, close } = await visit(
      browser,
      `${url}/drawings/${seam.model_seam.drawing_id}/seams/${seam.number}`,
    );
    await passSignIn(page, "coordinator");
    await page.getByText("The plan serves", { exact: true }).waitFor();
    await page.getByLabel("Travel while scanning").fill("900");
    await page.getByText("The plan does not serve", { exact: true }).waitFor();
    await close();
  });
});
