// `npm start`: installs, builds, migrates, loads the demo on the first run and serves everything on one port.
import { spawn } from "node:child_process";
import { existsSync } from "node:fs";
import { join } from "node:path";
import { build, install, root } from "./tools.mjs";

await install();
await build();

const env = { BEADROLL_LOG: "warn", ...process.env };
if (!env.BEADROLL_DATA && existsSync(join(root, ".env")) === false) env.BEADROLL_DATA = join(root, "data");
const dotenv = existsSync(join(root, ".env")) ? [`--env-file=${join(root, ".env")}`] : [];
const server = spawn(process.execPath, [...dotenv, "apps/api/dist/main.js", "--demo"], {
  cwd: root,
  env,
  stdio: "inherit",
});
for (const signal of ["SIGINT", "SIGTERM"]) process.on(signal, () => server.kill(signal));
server.on("exit", (code) => {
  process.exitCode = code ?? 1;
});
