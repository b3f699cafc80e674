// Type-checks every part with its own tsconfig, in parallel.
import { spawn } from "node:child_process";
import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";

const root = fileURLToPath(new URL("..", import.meta.url));
const projects = [
  "packages/domain/tsconfig.json",
  "packages/domain/tsconfig.test.json",
  "packages/client",
  "packages/client/tsconfig.test.json",
  "apps/api",
  "apps/cli",
  "apps/web",
  "migrations",
  "seeds",
  "tests",
];

const check = (project) =>
  new Promise((resolve) => {
    const child = spawn(process.execPath, [`${root}node_modules/typescript/bin/tsc`, "-p", project], {
      cwd: root,
      stdio: "inherit",
    });
    child.on("exit", (code) => resolve(code ?? 1));
  });

const codes = await Promise.all(projects.filter((p) => existsSync(`${root}${p}`)).map(check));
process.exitCode = codes.some((code) => code !== 0) ? 1 : 0;
