import { createServer, type IncomingMessage, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { patchLot } from "@beadroll/domain/contract/lots.contract";
import { find } from "@beadroll/domain/contract/records.contract";
import { pushScan } from "@beadroll/domain/contract/seams.contract";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { ApiProblem, UnexpectedAnswer, Unreachable } from "./api-problem.ts";
import { type Client, createClient } from "./transport.ts";

interface Asked {
  readonly method: string;
  readonly url: string;
  readonly headers: IncomingMessage["headers"];
  readonly body: string;
}

let server: Server;
let client: Client;
let asked: Asked[];
let answers: { status: number; type?: string; body: unknown }[];
let renewed: number;

beforeEach(async () => {
  asked = [];
  answers = [];
  renewed = 0;
  server = createServer((req, res) => {
    const chunks: Buffer[] = [];
    req.on("data", (chunk: Buffer) => chunks.push(chunk));
    req.on("end", () => {
      asked.push({
        method: req.method ?? "",
        url: req.url ?? "",
        headers: req.headers,
        body: Buffer.concat(chunks).toString(),
      });
      const answer = answers.shift() ?? { status: 200, body: { items: [] } };
      res.writeHead(answer.status, { "Content-Type": answer.type ?? "application/json" });
      res.end(typeof answer.body === "string" ? answer.body : JSON.stringify(answer.body));
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  client = createClient({
    base_url: `http://127.0.0.1:${port}`,
    token: () => `token-${renewed}`,
    renew: () => {
      renewed += 1;
      return Promise.resolve(renewed === 1);
    },
  });
});
afterEach(() => new Promise((resolve) => server.close(resolve)));

const problem = (status: number, code: string) => ({
  status,
  type: "application/problem+json",
  body: {
    type: `/docs/api/problems#${code}`,
    title: "t",
    status,
    detail: "what happened",
    instance: "i",
    errors: [],
  },
});

describe("a call", () => {
  it("asks the contract's address with token and query", async () => {
    await client.call(find, { query: { q: "0418 & more" } });
    expect(asked[0]).toMatchObject({ method: "GET", url: "/api/v1/find?q=0418+%26+more" });
    expect(asked[0]?.headers.authorization).toBe("Bearer token-0");
  });

  it("sends files and fields as a form, under a key of its own", async () => {
    answers.push(problem(422, "file-empty"));
    const scan = { name: "profiles.csv", bytes: new Blob(["station_mm,x_mm,z_mm\n"]) };
    const call = client.call(pushScan, {
      params: { tag: "S-8K3F7Q2NS" },
      body: { stage: "fitup" },
      files: { scan },
    });
    await expect(call).rejects.toThrow("what happened");
    expect(asked[0]?.url).toBe("/api/v1/seams/S-8K3F7Q2NS/scans");
    expect(asked[0]?.headers["idempotency-key"]).toMatch(/^[0-9a-f-]{36}$/);
    expect(asked[0]?.body).toContain('name="scan"; filename="profiles.csv"');
    expect(asked[0]?.body).toContain('name="stage"');
  });

  it("sends the version it saw as an ETag", async () => {
    answers.push(problem(412, "version-stale"));
    const call = client.call(patchLot, {
      params: { tag: "L-8K3F7Q2NN" },
      body: { state: "released" },
      seen_version: 3,
    });
    await expect(call).rejects.toBeInstanceOf(ApiProblem);
    expect(asked[0]?.headers["if-match"]).toBe('"3"');
  });

  it("renews the token once after a 401, and asks again", async () => {
    answers.push(problem(401, "not-signed-in"));
    await client.call(find, { query: { q: "x" } });
    expect(asked.map(({ headers }) => headers.authorization)).toEqual(["Bearer token-0", "Bearer token-1"]);
  });

  it("gives up after a second 401", async () => {
    answers.push(problem(401, "not-signed-in"), problem(401, "not-signed-in"));
    const call = client.call(find, { query: { q: "x" } });
    await expect(call).rejects.toMatchObject({ status: 401, code: "not-signed-in" });
    expect(asked.length).toBe(2);
  });

  it("tells a proxy's page and a closed port from the server's own refusal", async () => {
    answers.push({ status: 502, type: "text/html", body: "<h1>Bad gateway</h1>" });
    await expect(client.call(find, { query: { q: "x" } })).rejects.toBeInstanceOf(Unreachable);
    const nobody = createClient({ base_url: "http://127.0.0.1:9", token: () => null });
    await expect(nobody.call(find, { query: { q: "x" } })).rejects.toBeInstanceOf(Unreachable);
  });

  it("names the place where an answer does not fit its contract", async () => {
    answers.push({ status: 200, body: { items: [{ kind: "spoon" }] } });
    const call = client.call(find, { query: { q: "x" } });
    await expect(call).rejects.toBeInstanceOf(UnexpectedAnswer);
    await expect(client.call(find, { query: { q: "x" } })).resolves.toEqual({ items: [] });
  });
});
