import { readFile } from "node:fs/promises";
import { join, normalize } from "node:path";
import { FAULT_KINDS } from "@beadroll/domain/faults/codes";
import { type RequestHandler, Router } from "express";
import { marked } from "marked";
import { refusal } from "./refusal.ts";

/** The problem types as a page: generated from the registry, so that none is missing. */
export function problemTypesMarkdown(): string {
  const sections = Object.entries(FAULT_KINDS).map(
    ([code, kind]) =>
      `## ${code}\n\n**${kind.title}** (status ${kind.status}, exit code ${kind.exit}). ${kind.help}\n`,
  );
  return `# Problem types\n\nEvery refusal is a problem document (RFC 9457). Its \`type\` ends in one of these codes.\n\n${sections.join("\n")}`;
}

const page = (title: string, html: string): string => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${title} · Beadroll</title><link rel="stylesheet" href="/docs/docs.css"></head>
<body><header><a href="/">BEADROLL</a><a href="/docs/">Docs</a><a href="/api/docs/">API</a></header><main>${html}</main></body></html>`;

/** Headings get ids, so that problem types and chapters can be linked to. */
const withIds = (html: string): string =>
  html.replaceAll(/<h([1-3])>(.*?)<\/h\1>/g, (_all, level: string, text: string) => {
    const id = text
      .replaceAll(/<[^>]*>/g, "")
      .toLowerCase()
      .replaceAll(/[^a-z0-9]+/g, "-");
    return `<h${level} id="${id}">${text}</h${level}>`;
  });

async function readPage(folder: string, path: string): Promise<string> {
  if (path === "api/problems") return problemTypesMarkdown();
  const safe = normalize(path).replace(/^(\.\.[/\\])+/, "");
  for (const candidate of [`${safe}.md`, join(safe, "README.md")]) {
    try {
      return await readFile(join(folder, candidate), "utf8");
    } catch (error) {
      if (
        !(error instanceof Error && "code" in error && (error.code === "ENOENT" || error.code === "ENOTDIR"))
      )
        throw error;
    }
  }
  throw refusal("not-found", `There is no page ${path} in the documents.`);
}

/** Serves the documents of the project as pages. */
export function docsPages(folder: string): Router {
  const router = Router();
  router.get("/docs.css", (_req, res) => {
    res.type("css").set("Cache-Control", "max-age=3600").send(STYLE);
  });
  const serve: RequestHandler = async (req, res) => {
    const path = req.path.replaceAll(/^\/+|\/+$/g, "").replace(/\.md$/, "");
    if (/\.(png|svg)$/.test(path)) {
      res.sendFile(join(folder, normalize(path).replace(/^(\.\.[/\\])+/, "")));
      return;
    }
    const text = await readPage(folder, path);
    const title = /^# (.+)$/m.exec(text)?.[1] ?? "Documents";
    res.type("html").send(page(title, withIds(await marked(text))));
  };
  router.get("/{*path}", serve);
  return router;
}

const STYLE = `body{margin:0;background:#f3f2ee;color:#14181c;font:16px/1.55 Barlow,system-ui,sans-serif}
header{background:#1b2126;padding:14px 24px;display:flex;gap:24px}header a{color:#fff;text-decoration:none;font-weight:600}
main{max-width:860px;margin:24px auto;background:#fff;border:1px solid #d9d6cc;border-top:3px solid #1b2126;border-radius:2px;padding:8px 32px 32px}
code,pre{font-family:"Spline Sans Mono",ui-monospace,monospace;font-size:.9em}pre{background:#f3f2ee;border:1px solid #e7e4db;padding:12px;overflow:auto}
a{color:#1f5a8c}table{border-collapse:collapse;width:100%}th{text-align:left;border-bottom:1px solid #14181c}td,th{padding:6px 10px 6px 0;vertical-align:top}
td{border-bottom:1px solid #e7e4db}img{max-width:100%}`;
