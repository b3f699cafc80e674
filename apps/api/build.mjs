// Bundles the server and its measuring worker. Packages stay outside, what is ours goes in.
import { readFile } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import { build } from "esbuild";

const root = fileURLToPath(new URL(".", import.meta.url));

/** Builds apps/api/dist. */
export async function buildApi() {
  const { dependencies } = JSON.parse(await readFile(`${root}package.json`, "utf8"));
  await build({
    entryPoints: { main: `${root}src/main.ts`, "measure-worker": `${root}src/measure/measure-worker.ts` },
    outdir: `${root}dist`,
    bundle: true,
    splitting: true,
    platform: "node",
    format: "esm",
    target: "node20",
    sourcemap: true,
    external: Object.keys(dependencies).filter((name) => !name.startsWith("@beadroll/")),
    logLevel: "warning",
  });
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await buildApi();
