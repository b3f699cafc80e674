import { existsSync, readdirSync, readFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { describe, expect, it } from "vitest";

const ROOT = fileURLToPath(new URL("../../", import.meta.url));

const pages = (folder: string): string[] =>
  readdirSync(join(ROOT, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return pages(path);
    return entry.name.endsWith(".md") ? [path] : [];
  });

const PAGES = ["README.md", "DEVELOPERS.md", "seeds/README.md", ...pages("docs")];

/** Served by the product, not files: the API's own pages. */
const SERVED = /^(\/api\/|(\.\.\/)*api\/problems)/;

const slug = (heading: string) =>
  heading
    .toLowerCase()
    .replace(/[^\p{L}\p{N} -]/gu, "")
    .trim()
    .replaceAll(" ", "-");

function faultsOf(page: string): string[] {
  const text = readFileSync(join(ROOT, page), "utf8").replace(/```[\s\S]*?```/g, "");
  return [...text.matchAll(/\]\(([^)\s]+)\)/g)].flatMap(([, link = ""]) => {
    if (/^https?:/.test(link) || SERVED.test(link)) return [];
    const [path = "", anchor] = link.split("#");
    const target = path === "" ? page : join(dirname(page), path);
    if (!existsSync(join(ROOT, target))) return [`${link} leads nowhere`];
    if (anchor === undefined) return [];
    const headings = readFileSync(join(ROOT, target), "utf8").matchAll(/^#+ (.+)$/gm);
    return [...headings].some(([, heading = ""]) => slug(heading) === anchor)
      ? []
      : [`${link}: no such heading`];
  });
}

describe("documents", () => {
  it.each(PAGES)("%s links to what is there", (page) => {
    expect(faultsOf(page)).toEqual([]);
  });
});
