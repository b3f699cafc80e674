import { fileURLToPath } from "node:url";
import { parseArgs } from "node:util";
import { DEMO_ACCOUNTS, DEMO_KEYS } from "@beadroll/seeds/demo-accounts";
import { pino } from "pino";
import { type Config, ConfigError, readConfig } from "./config.ts";
import { createFirstAdministrator, ensureDemo, startServer } from "./server.ts";

const workerScript = fileURLToPath(new URL("./measure-worker.js", import.meta.url));

/** What a person needs to begin, printed once the port answers. */
function welcome(config: Config, demo: boolean): string {
  const lines = [`Beadroll is at ${config.public_url}`, `API documents ${config.public_url}/api/docs`, ""];
  if (!demo) return lines.join("\n");
  const accounts = DEMO_ACCOUNTS.map(
    ({ login, password, roles }) => `  ${login.padEnd(14)} ${password.padEnd(22)} ${roles.join(", ")}`,
  );
  const keys = DEMO_KEYS.map(({ name, secret }) => `  ${name.padEnd(14)} ${secret}`);
  return [
    ...lines,
    "Demo accounts (name, password, role):",
    ...accounts,
    "",
    "Demo keys of the cells' computers:",
    ...keys,
    "",
    `  npx beadroll enrol --server ${config.public_url} --key ${DEMO_KEYS[0].secret}`,
    "",
    "Stop with Ctrl+C.",
    "",
  ].join("\n");
}

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const log = pino({ level: config.log_level });
  const { values } = parseArgs({
    options: { demo: { type: "boolean", default: false }, "create-administrator": { type: "string" } },
  });
  const login = values["create-administrator"];
  if (login !== undefined) {
    const password = process.env["BEADROLL_ADMIN_PASSWORD"] ?? "";
    await createFirstAdministrator(config, log, { login, password });
    process.stdout.write(`Made the administrator ${login}.\n`);
    return;
  }
  const { demo } = values;
  if (demo) await ensureDemo(config, log, workerScript);
  const running = await startServer(config, log, workerScript);
  process.stdout.write(welcome(config, demo));
  const stop = () => {
    running.close().then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, "stopping failed");
        process.exit(1);
      },
    );
  };
  process.once("SIGINT", stop);
  process.once("SIGTERM", stop);
}

main().catch((error: unknown) => {
  const sentence =
    error instanceof ConfigError
      ? error.message
      : error instanceof Error && "code" in error && error.code === "EADDRINUSE"
        ? `The port is taken: ${error.message}. Set BEADROLL_PORT to another.`
        : error instanceof Error
          ? (error.stack ?? error.message)
          : String(error);
  process.stderr.write(`${sentence}\n`);
  process.exitCode = 1;
});
