import { mkdtemp, rm } from "node:fs/promises";
import type { Server } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import type { KeyScope, Role } from "@beadroll/domain/auth/permissions";
import { pino } from "pino";
import supertest from "supertest";
import { createApp } from "../app.ts";
import { systemCaller } from "../auth/caller.ts";
import { signAccessToken } from "../auth/tokens.ts";
import { readConfig } from "../config.ts";
import type { Deps } from "../deps.ts";
import type { ChangeContext } from "../ledger/change.ts";
import { openDeps } from "../server.ts";
import { createKey, createUser } from "../users/users.service.ts";

const WORKER = fileURLToPath(new URL("../../dist/measure-worker.js", import.meta.url));

/** A real server on 127.0.0.1 with a database of its own, and people and machines to ask it. */
export interface TestServer {
  readonly deps: Deps;
  readonly url: string;
  readonly data_dir: string;
  readonly http: ReturnType<typeof supertest>;
  /** What tests hand to services: the system, now. */
  readonly context: ChangeContext;
  /** The Authorization header of a person with these roles. */
  as(...roles: Role[]): Promise<string>;
  /** The Authorization header of a machine's key with these scopes. */
  machine(scopes: KeyScope[], cellId?: string): Promise<string>;
  close(): Promise<void>;
}

/** The cheapest hash bcrypt makes: tests sign in often. */
const TEST_PASSWORD_COST = 4;
export const TEST_PASSWORD = "a-password-for-tests";

async function listen(deps: Deps): Promise<{ server: Server; url: string }> {
  const nowhere = join(tmpdir(), "no-web-application");
  const app = createApp(
    deps,
    {
      web: nowhere,
      docs: fileURLToPath(new URL("../../../../docs", import.meta.url)),
    },
    { check_answers: true },
  );
  const server = await new Promise<Server>((resolve) => {
    const listening = app.listen(0, "127.0.0.1", () => resolve(listening));
  });
  // A server that listens on a port has an address with one.
  const { port } = server.address() as AddressInfo;
  return { server, url: `http://127.0.0.1:${port}` };
}

/** Starts a server for tests; `now` may be given to move its clock. */
export async function startTestServer(now: () => Date = () => new Date()): Promise<TestServer> {
  const data_dir = await mkdtemp(join(tmpdir(), "beadroll-api-"));
  const config = readConfig({ BEADROLL_DATA: data_dir, BEADROLL_WORKERS: "1", BEADROLL_LOG: "silent" });
  const opened = await openDeps(config, pino({ level: "silent" }), WORKER);
  const deps: Deps = { ...opened, now };
  const { server, url } = await listen(deps);
  const context: ChangeContext = { writer: deps.db.writer, now, caller: systemCaller("test"), once: null };
  let made = 0;
  return {
    deps,
    url,
    data_dir,
    http: supertest(url),
    context,
    as: async (...roles) => {
      made += 1;
      const fields = {
        login: `${roles[0]}-${made}`,
        name: `Test ${roles[0]} ${made}`,
        roles,
        password: TEST_PASSWORD,
      };
      const user = await createUser(context, fields, TEST_PASSWORD_COST);
      return `Bearer ${signAccessToken(deps.secret, user.id, now())}`;
    },
    machine: async (scopes, cellId) => {
      made += 1;
      const key = await createKey(context, { name: `Test key ${made}`, scopes, cell_id: cellId ?? null });
      return `Bearer ${key.secret}`;
    },
    close: async () => {
      await new Promise((resolve) => {
        server.close(resolve);
        server.closeAllConnections();
      });
      await opened.close();
      await rm(data_dir, { recursive: true, force: true });
    },
  };
}
