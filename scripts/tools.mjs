// What start, build and test share: running a command, and installing only when the lockfile says something new.
import { spawn } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { fileURLToPath } from "node:url";

export const root = fileURLToPath(new URL("..", import.meta.url));

/** The package manager, pinned; it comes through npx, so that nothing needs to be installed by hand. */
const PNPM = "pnpm@10.34.9";

/** Runs a command with our output; rejects when it fails. */
export function run(command, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd: root, stdio: "inherit", ...options });
    child.on("error", reject);
    child.on("exit", (code, signal) => {
      if (code === 0) resolve();
      else reject(new Error(`${command} ${args.join(" ")} ended with ${code ?? signal}`));
    });
  });
}

/** A digest over files, in a stable order. */
function digestOf(paths) {
  const hash = createHash("sha256");
  for (const path of paths.toSorted()) hash.update(path).update(readFileSync(join(root, path)));
  return hash.digest("hex");
}

const readStamp = (name) => {
  const path = join(root, "node_modules", name);
  return existsSync(path) ? readFileSync(path, "utf8") : "";
};
const writeStamp = (name, digest) => writeFileSync(join(root, "node_modules", name), digest);

/** Installs what the lockfile names, unless that is what stands here already. */
export async function install() {
  const digest = digestOf(["pnpm-lock.yaml", "pnpm-workspace.yaml", "package.json"]);
  if (readStamp(".beadroll-installed") === digest) return;
  console.log("Installing packages …");
  await run("npx", ["-y", PNPM, "install", "--frozen-lockfile"]);
  writeStamp(".beadroll-installed", digest);
}

const SOURCES = ["apps", "packages", "migrations", "seeds", "scripts"];
const LEFT_OUT = new Set(["node_modules", "dist", "data", "vectors"]);

function sourcesBelow(folder) {
  return readdirSync(join(root, folder)).flatMap((name) => {
    if (LEFT_OUT.has(name)) return [];
    const path = join(folder, name);
    if (statSync(join(root, path)).isDirectory()) return sourcesBelow(path);
    return name.includes(".test.") ? [] : [path];
  });
}

/** Builds everything, unless the sources are what was built last. */
export async function build() {
  const digest = digestOf([...SOURCES.flatMap(sourcesBelow), "pnpm-lock.yaml", "tsconfig.base.json"]);
  const built = ["apps/api/dist/main.js", "apps/cli/dist/beadroll.mjs", "apps/web/dist/index.html"];
  if (readStamp(".beadroll-built") === digest && built.every((path) => existsSync(join(root, path)))) return;
  console.log("Building …");
  await run(process.execPath, ["apps/api/build.mjs"]);
  await run(process.execPath, ["apps/cli/build.mjs"]);
  await run(
    process.execPath,
    [join(root, "apps/web/node_modules/vite/bin/vite.js"), "build", "--logLevel", "warn"],
    {
      cwd: join(root, "apps/web"),
    },
  );
  writeStamp(".beadroll-built", digest);
}
