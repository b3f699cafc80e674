#!/usr/bin/env node
// The launcher exists before the first build, so that the package manager can link it at install.
import { existsSync } from "node:fs";

const built = new URL("../dist/beadroll.mjs", import.meta.url);
if (existsSync(built)) {
  await import(built.href);
} else {
  process.stderr.write("beadroll is not built yet: run `npm start` or `npm run build` once.\n");
  process.exitCode = 1;
}
