// Bundles the command into one file: it has to start fast on a slow computer, so a verb's code is only run when asked for.
import { stat } from "node:fs/promises";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { build } from "esbuild";

const root = fileURLToPath(new URL(".", import.meta.url));

/** zod brings its messages in fifty languages, nearly half of the bundle; the command speaks one. */
const oneLanguage = {
  name: "one-language",
  setup(building) {
    building.onLoad({ filter: /zod[\\/]v4[\\/]locales[\\/]index\.js$/ }, () => ({ contents: "export {};" }));
  },
};

/** Builds beadroll.mjs into a folder, apps/cli/dist unless another is given; gives its size in bytes. */
export async function buildCli(outdir = join(root, "dist")) {
  await build({
    entryPoints: { beadroll: join(root, "src/main.ts") },
    outdir,
    outExtension: { ".js": ".mjs" },
    bundle: true,
    minify: true,
    platform: "node",
    format: "esm",
    target: "node20",
    plugins: [oneLanguage],
    // commander is CommonJS and asks for node's modules by require.
    banner: {
      js: 'import { createRequire } from "node:module"; const require = createRequire(import.meta.url);',
    },
    logLevel: "warning",
  });
  return (await stat(join(outdir, "beadroll.mjs"))).size;
}

if (process.argv[1] === fileURLToPath(import.meta.url))
  console.log(`beadroll.mjs: ${Math.round((await buildCli()) / 1024)} kB`);
