import { existsSync } from "node:fs";
import { type Browser, chromium } from "playwright-core";

/** Where systems keep an installed Chromium. */
const INSTALLED = [
  "/usr/bin/chromium",
  "/usr/bin/chromium-browser",
  "/usr/bin/google-chrome",
  "/opt/google/chrome/chrome",
];

/** The package's own list asks for a single process, which dies with its first page, and switches web security off. */
const PACKED_ARGS = ["--no-sandbox", "--no-zygote", "--disable-gpu", "--font-render-hinting=none"];

/**
 * A Chromium without a window: the one that BEADROLL_CHROMIUM names, else an installed one, else the one that
 * @sparticuz/chromium brings along from npm.
 */
export async function launchChromium(): Promise<Browser> {
  const installed = process.env["BEADROLL_CHROMIUM"] ?? INSTALLED.find((path) => existsSync(path));
  if (installed !== undefined) {
    return chromium.launch({ executablePath: installed, args: ["--no-sandbox"] });
  }
  const { default: packed } = await import("@sparticuz/chromium");
  packed.setGraphicsMode = false;
  return chromium.launch({ executablePath: await packed.executablePath(), args: PACKED_ARGS });
}
