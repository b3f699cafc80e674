import axe from "axe-core";
import type { Page } from "playwright-core";

/** The rules of WCAG 2.2 A and AA, and what axe calls best practice. */
const RULES = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"];

/** What axe finds wrong with a page as it stands, one line a place; empty when nothing is. */
export async function findAccessFaults(page: Page): Promise<string[]> {
  await page.evaluate(axe.source);
  const results = await page.evaluate(
    async (rules) => window.axe.run(document, { runOnly: { type: "tag", values: rules } }),
    RULES,
  );
  return results.violations.flatMap((violation) =>
    violation.nodes.map((node) => `${violation.id}: ${node.target.join(" ")}: ${node.failureSummary ?? ""}`),
  );
}

declare global {
  interface Window {
    axe: typeof axe;
  }
}
