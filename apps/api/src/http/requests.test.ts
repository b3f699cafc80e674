import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { aDrawing, aPart } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

let server: TestServer;
let coordinator: string;
let quality: string;
beforeAll(async () => {
  server = await startTestServer();
  coordinator = await server.as("coordinator");
  quality = await server.as("quality");
});
afterAll(() => server.close());

const lot = {
  kind: "plate",
  number: "H90001",
  supplier: "Nordhall Steel",
  grade: "S355J2",
  quantity: 2,
  unit: "pcs",
  received_on: "2026-11-02",
};
const post = (path: string, body: object, key: string) =>
  server.http.post(`/api/v1${path}`).set("Authorization", quality).set("Idempotency-Key", key).send(body);
const count = async (table: string) => (await server.deps.db.reader(table)).length;

describe("a request that is repeated", () => {
  it("with the same key and body is answered with the first record, made once", async () => {
    const first = await post("/lots", lot, "lot-key-0001");
    const before = await count("ledger_entries");
    const second = await post("/lots", lot, "lot-key-0001");
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(second.body).toEqual(first.body);
    expect(second.headers["idempotency-replayed"]).toBe("true");
    expect(await count("ledger_entries")).toBe(before);
  });

  it("with the same key and another body is refused", async () => {
    await post("/lots", { ...lot, number: "H90002" }, "lot-key-0002");
    const other = await post("/lots", { ...lot, number: "H90003" }, "lot-key-0002");
    expect([other.status, other.body.errors[0].code]).toEqual([422, "idempotency-mismatch"]);
  });

  it("at the same moment makes one record and answers both alike", async () => {
    const body = { ...lot, number: "H90004" };
    const answers = await Promise.all([1, 2, 3, 4].map(() => post("/lots", body, "lot-key-0004")));
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201, 201]);
    expect(new Set(answers.map((answer) => answer.body.tag)).size).toBe(1);
  });

  it("needs a key where a record is made", async () => {
    const answer = await server.http.post("/api/v1/lots").set("Authorization", quality).send(lot);
    expect([answer.status, answer.body.errors[0].code]).toEqual([400, "idempotency-required"]);
  });
});

describe("a request that does not fit", () => {
  it("is refused naming every field, and nothing is written", async () => {
    const before = await count("lots");
    const answer = await post("/lots", { ...lot, number: "", quantity: -1, colour: "red" }, "lot-key-0010");
    expect(answer.status).toBe(422);
    expect(answer.type).toBe("application/problem+json");
    expect(answer.body.errors.map((error: { pointer: string }) => error.pointer).sort()).toEqual([
      "/colour",
      "/number",
      "/quantity",
    ]);
    expect(await count("lots")).toBe(before);
  });

  it("is refused when it is no JSON, too large, or of an unknown parameter", async () => {
    const broken = await server.http
      .post("/api/v1/lots")
      .set("Authorization", quality)
      .set("Idempotency-Key", "lot-key-0011")
      .set("Content-Type", "application/json")
      .send('{"kind": "plate", ');
    expect([broken.status, broken.body.errors[0].code]).toEqual([400, "request-malformed"]);
    const large = await post("/lots", { ...lot, note: "x".repeat(2_000_000) }, "lot-key-0012");
    expect(large.status).toBe(413);
    const unknown = await server.http.get("/api/v1/lots?colour=red").set("Authorization", quality);
    expect([unknown.status, unknown.body.errors[0].field]).toEqual([400, "colour"]);
  });

  it("is refused with a problem document where there is no such path or method", async () => {
    const nowhere = await server.http.get("/api/v1/welds").set("Authorization", quality);
    expect([nowhere.status, nowhere.type]).toEqual([404, "application/problem+json"]);
    const method = await server.http.put("/api/v1/lots").set("Authorization", quality);
    expect([method.status, method.headers["allow"]]).toEqual([405, "GET, POST"]);
  });
});

describe("changing what others change too", () => {
  it("needs the version that was seen, and refuses a stale one", async () => {
    const drawing = await aDrawing(server, 1);
    const path = `/api/v1/drawings/${drawing.id}`;
    const read = await server.http.get(path).set("Authorization", coordinator);
    const patch = (etag?: string) => {
      const request = server.http
        .patch(path)
        .set("Authorization", coordinator)
        .send({ title: "Other frame" });
      return etag === undefined ? request : request.set("If-Match", etag);
    };
    expect((await patch()).status).toBe(428);
    const done = await patch(read.headers["etag"]);
    expect([done.status, done.body.title, done.headers["etag"]]).toEqual([200, "Other frame", '"2"']);
    expect((await patch(read.headers["etag"])).status).toBe(412);
  });
});

describe("a list", () => {
  it("is paged without skipping or repeating, and refuses a foreign cursor", async () => {
    for (let i = 0; i < 7; i += 1) await aPart(server, 1);
    const tags: string[] = [];
    let cursor = "";
    do {
      const page = await server.http.get(`/api/v1/parts?limit=3${cursor}`).set("Authorization", quality);
      expect(page.status).toBe(200);
      tags.push(...page.body.items.map((part: { tag: string }) => part.tag));
      cursor = page.body.next_cursor ? `&cursor=${page.body.next_cursor}` : "";
    } while (cursor);
    const all = await server.deps.db.reader("parts").orderBy([
      { column: "created_at", order: "desc" },
      { column: "id", order: "desc" },
    ]);
    expect(tags).toEqual(all.map((part) => part.tag));
    const foreign = await server.http.get("/api/v1/parts?cursor=nonsense").set("Authorization", quality);
    expect([foreign.status, foreign.body.errors[0].field]).toEqual([422, "cursor"]);
  });
});
