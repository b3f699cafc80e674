import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { aLog, aPart, aProcedure } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

let server: TestServer;
let coordinator: string;
beforeAll(async () => {
  server = await startTestServer();
  coordinator = await server.as("coordinator");
});
afterAll(() => server.close());

const patch = (id: string, version: number, body: object, as = coordinator) =>
  server.http
    .patch(`/api/v1/procedures/${id}`)
    .set("Authorization", as)
    .set("If-Match", `"${version}"`)
    .send(body);

describe("a procedure", () => {
  it("is not changed by an operator", async () => {
    const procedure = await aProcedure(server);
    const operator = await server.as("operator");
    const before = (await server.deps.db.reader("ledger_entries")).length;
    const answer = await patch(procedure.id, procedure.version, { status: "withdrawn" }, operator);
    expect([answer.status, answer.type]).toEqual([403, "application/problem+json"]);
    expect((await server.deps.db.reader("ledger_entries")).length).toBe(before);
    expect(
      (await server.deps.db.reader("procedures").where({ id: procedure.id }).first("status")).status,
    ).toBe("approved");
  });

  it("has ranges that make sense", async () => {
    const procedure = await aProcedure(server);
    const ranges = { ...procedure.ranges, current_a: { min: 280, max: 220 } };
    const answer = await patch(procedure.id, procedure.version, { ranges });
    expect([answer.status, answer.body.errors[0].pointer]).toEqual([422, "/ranges/current_a"]);
  });

  it("keeps its ranges once a seam was welded to it, and may still be withdrawn", async () => {
    const part = await aPart(server, 1);
    const key = await server.machine(["passes:write"]);
    await server.http
      .post(`/api/v1/seams/${part.roll[0]?.tag}/passes`)
      .set("Authorization", key)
      .set("Idempotency-Key", "procedure-test-1")
      .attach("log", aLog(), "pass.csv")
      .expect(201);
    const used = await server.deps.db.reader("passes").first("procedure_id");
    const read = await server.http
      .get(`/api/v1/procedures/${used.procedure_id}`)
      .set("Authorization", coordinator);
    expect(read.body.used).toBe(true);
    const frozen = await patch(read.body.id, read.body.version, { ranges: read.body.ranges });
    expect([frozen.status, frozen.body.errors[0].code]).toEqual([409, "state-conflict"]);
    expect((await patch(read.body.id, read.body.version, { status: "withdrawn" })).body.status).toBe(
      "withdrawn",
    );
  });
});
