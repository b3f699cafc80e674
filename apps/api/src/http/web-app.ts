import { existsSync } from "node:fs";
import { join } from "node:path";
import express, { type RequestHandler, Router } from "express";
import { refusal } from "./refusal.ts";

const YEAR_S = 31_536_000;

/** A label's address in upper case, as its QR code has it, leads to the page. */
const tagDoor: RequestHandler = (req, res) => {
  res.redirect(302, `/t/${encodeURIComponent(String(req.params["tag"]).toUpperCase())}`);
};

/** Serves the built web application: hashed files for good, everything else its one page. */
export function webApp(folder: string): Router {
  const router = Router({ caseSensitive: true });
  router.get("/T/:tag", tagDoor);
  router.use(
    "/assets",
    express.static(join(folder, "assets"), { immutable: true, maxAge: YEAR_S * 1000, fallthrough: false }),
  );
  router.use(express.static(folder, { index: false, maxAge: 0 }));
  router.get("/{*path}", (_req, res) => {
    const page = join(folder, "index.html");
    if (!existsSync(page))
      throw refusal("not-found", "The web application is not built: run `npm run build`.");
    res.set("Cache-Control", "no-cache").sendFile(page);
  });
  return router;
}
