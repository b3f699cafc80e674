import { existsSync } from "node:fs";
import { mkdir, rm, writeFile } from "node:fs/promises";
import { createServer, type Server } from "node:http";
import { availableParallelism } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { UserCreate } from "@beadroll/domain/schemas/user";
import type { Logger } from "pino";
import { createApp } from "./app.ts";
import { systemCaller } from "./auth/caller.ts";
import { type Config, ConfigError } from "./config.ts";
import { openDatabase } from "./db/database.ts";
import type { Deps } from "./deps.ts";
import { folderStore } from "./files/file-store.ts";
import { measurePool } from "./measure/measure-pool.ts";
import { signingSecret } from "./secret.ts";
import { createUser } from "./users/users.service.ts";

/** A running server. */
export interface RunningServer {
  readonly deps: Deps;
  readonly server: Server;
  close(): Promise<void>;
}

/** The demo's seed: change it and every demo shop in the world changes. */
const DEMO_SEED = 2210;

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** Everything the services are made of, opened. */
export async function openDeps(
  config: Config,
  log: Logger,
  workerScript: string,
): Promise<Deps & { close(): Promise<void> }> {
  await mkdir(config.data_dir, { recursive: true });
  const db = await openDatabase(join(config.data_dir, "beadroll.sqlite"));
  const measure = measurePool(workerScript, config.workers ?? Math.max(1, availableParallelism() - 1));
  return {
    db,
    measure,
    store: folderStore(join(config.data_dir, "files")),
    now: () => new Date(),
    secret: config.secret ?? (await signingSecret(config.data_dir)),
    public_url: config.public_url,
    log,
    close: async () => {
      await measure.close();
      await db.close();
    },
  };
}

async function isEmpty(deps: Deps): Promise<boolean> {
  return (await deps.db.reader("users").first("id")) === undefined;
}

/**
 * Loads the demo into an empty database. A load that was cut leaves its mark and is begun anew.
 * @returns true when it was loaded now
 */
export async function ensureDemo(config: Config, log: Logger, workerScript: string): Promise<boolean> {
  const mark = join(config.data_dir, "demo-loading");
  if (existsSync(mark)) {
    for (const name of ["beadroll.sqlite", "beadroll.sqlite-wal", "beadroll.sqlite-shm", "files"])
      await rm(join(config.data_dir, name), { recursive: true, force: true });
  }
  const deps = await openDeps(config, log, workerScript);
  try {
    if (!(await isEmpty(deps))) return false;
    await writeFile(mark, "");
    // The scenario's code is only read when it is needed.
    const { loadDemo } = await import("./demo/load-demo.ts");
    const ends_at = new Date().toISOString();
    const { events } = await loadDemo(deps, {
      seed: DEMO_SEED,
      ends_at,
      progress: (count, at) => log.info(`demo: ${count} events, ${at.slice(0, 10)}`),
    });
    log.info(`demo: ${events} events loaded`);
    await rm(mark);
    return true;
  } finally {
    await deps.close();
  }
}

/**
 * Makes the first account of an empty database: an administrator, who makes the others.
 * @throws ConfigError when there are accounts already, or the name or password does not do
 */
export async function createFirstAdministrator(
  config: Config,
  log: Logger,
  account: { readonly login: string; readonly password: string },
): Promise<void> {
  const parsed = UserCreate.safeParse({ ...account, name: account.login, roles: ["administrator"] });
  if (!parsed.success)
    throw new ConfigError(
      parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`).join("; "),
    );
  await mkdir(config.data_dir, { recursive: true });
  const db = await openDatabase(join(config.data_dir, "beadroll.sqlite"));
  try {
    if ((await db.reader("users").first("id")) !== undefined)
      throw new ConfigError(
        "There are accounts already; an administrator makes further ones in the web application.",
      );
    const context = { writer: db.writer, now: () => new Date(), caller: systemCaller("setup"), once: null };
    await createUser(context, parsed.data);
    log.info(`administrator ${account.login} made`);
  } finally {
    await db.close();
  }
}

/** Starts serving. Resolves when the port answers. */
export async function startServer(config: Config, log: Logger, workerScript: string): Promise<RunningServer> {
  const deps = await openDeps(config, log, workerScript);
  const root = here("../../..");
  const app = createApp(deps, { web: join(root, "apps/web/dist"), docs: join(root, "docs") });
  const server = createServer(app);
  await new Promise<void>((resolve, reject) => {
    server.once("error", reject);
    server.listen(config.port, config.host, resolve);
  });
  return {
    deps,
    server,
    close: async () => {
      server.closeIdleConnections();
      await new Promise<void>((resolve) => {
        server.close(() => resolve());
        setTimeout(() => server.closeAllConnections(), 2000).unref();
      });
      await deps.close();
    },
  };
}
