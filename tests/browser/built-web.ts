import { execFile } from "node:child_process";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { promisify } from "node:util";

const WEB = fileURLToPath(new URL("../../apps/web/", import.meta.url));

/** The web application, built into a folder of its own. */
export interface BuiltWeb {
  readonly folder: string;
  remove(): Promise<void>;
}

/** Builds the web application as it stands. */
export async function buildWeb(): Promise<BuiltWeb> {
  const folder = await mkdtemp(join(tmpdir(), "beadroll-web-"));
  const vite = join(WEB, "node_modules/vite/bin/vite.js");
  await promisify(execFile)(process.execPath, [vite, "build", "--outDir", folder, "--emptyOutDir"], {
    cwd: WEB,
  });
  return { folder, remove: () => rm(folder, { recursive: true, force: true }) };
}
