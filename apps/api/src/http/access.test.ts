import { KEY_SCOPES, type Permission, permissionsOf, ROLES } from "@beadroll/domain/auth/permissions";
import type { Contract } from "@beadroll/domain/contract/contract";
import { Problem } from "@beadroll/domain/schemas/problem";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { allRoutes } from "../routes.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

let server: TestServer;
let contracts: Contract[];

beforeAll(async () => {
  server = await startTestServer();
  contracts = allRoutes(server.deps).map((route) => route.contract);
});
afterAll(() => server.close());

const addressOf = (contract: Contract): string =>
  `/api/v1${contract.path
    .replace("{tag}", "P-000000000")
    .replace("{id}", "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77")
    .replace("{digest}", "0".repeat(64))
    .replace("{seq}", "0")}`;

const ask = (contract: Contract, authorization?: string) => {
  const request = server.http[contract.method](addressOf(contract)).set(
    "Idempotency-Key",
    "a-key-for-this-test",
  );
  if (authorization !== undefined) request.set("Authorization", authorization);
  return request;
};

const entries = async () =>
  Number((await server.deps.db.reader("ledger_entries").count({ n: "*" }).first())?.["n"]);

describe("access", () => {
  it("is refused to nobody on every operation that is not open to all", async () => {
    for (const contract of contracts.filter(({ access }) => access !== "open")) {
      const answer = await ask(contract);
      expect(answer.status, contract.operationId).toBe(401);
      expect(Problem.parse(answer.body).type).toBe("/docs/api/problems#not-signed-in");
    }
  });

  it.each(ROLES)(
    "is refused to the role %s on every operation its permissions do not cover",
    async (role) => {
      const authorization = await server.as(role);
      const before = await entries();
      const granted = new Set<string>(permissionsOf([role]));
      const beyond = contracts.filter(
        ({ access }) => access !== "open" && access !== "signed-in" && !granted.has(access),
      );
      for (const contract of beyond) {
        const answer = await ask(contract, authorization);
        expect(answer.status, contract.operationId).toBe(403);
        expect(answer.body.detail).toContain(contract.access);
      }
      expect(await entries()).toBe(before);
    },
  );

  it("is refused to a key on every operation outside its scope", async () => {
    for (const scope of KEY_SCOPES) {
      const authorization = await server.machine([scope]);
      const beyond = contracts.filter(({ access }) => !["open", "signed-in", scope].includes(access));
      for (const contract of beyond) {
        const answer = await ask(contract, authorization);
        expect(answer.status, `${scope} on ${contract.operationId}`).toBe(403);
      }
    }
  });

  it("is never refused for the permission by those who hold it", async () => {
    const everything = new Map<Permission, string>();
    for (const role of ROLES) {
      const authorization = await server.as(role);
      for (const permission of permissionsOf([role])) everything.set(permission, authorization);
    }
    for (const contract of contracts) {
      if (contract.access === "open" || contract.access === "signed-in") continue;
      const answer = await ask(contract, everything.get(contract.access));
      expect([401, 403], contract.operationId).not.toContain(answer.status);
    }
  });

  it("is refused to a withdrawn key and to a made-up one", async () => {
    const administrator = await server.as("administrator");
    const made = await server.http
      .post("/api/v1/keys")
      .set("Authorization", administrator)
      .send({ name: "Short-lived", scopes: ["records:read"] });
    const key = `Bearer ${made.body.secret}`;
    expect((await server.http.get("/api/v1/me").set("Authorization", key)).body.kind).toBe("machine");
    await server.http.delete(`/api/v1/keys/${made.body.id}`).set("Authorization", administrator).expect(204);
    expect((await server.http.get("/api/v1/me").set("Authorization", key)).status).toBe(401);
    expect(
      (await server.http.get("/api/v1/me").set("Authorization", `Bearer brk_${"0".repeat(32)}`)).status,
    ).toBe(401);
  });

  it("keeps secrets out of lists and out of the ledger", async () => {
    const administrator = await server.as("administrator");
    const made = await server.http
      .post("/api/v1/keys")
      .set("Authorization", administrator)
      .send({ name: "Kept quiet", scopes: ["records:read"] });
    const list = await server.http.get("/api/v1/keys").set("Authorization", administrator);
    const ledger = await server.deps.db.reader("ledger_entries").select("body");
    const text = JSON.stringify([list.body, ledger]);
    expect(text).toContain("Kept quiet");
    expect(text).not.toContain(made.body.secret);
    expect(text).not.toContain("$2b$");
  });
});
