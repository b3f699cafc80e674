import { contract } from "@beadroll/domain/contract/contract";
import { patchLot } from "@beadroll/domain/contract/lots.contract";
import { getPart } from "@beadroll/domain/contract/parts.contract";
import { find, getFile } from "@beadroll/domain/contract/records.contract";
import { listSeams, pushScan } from "@beadroll/domain/contract/seams.contract";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { z } from "zod";
import { aProblem, type CannedServer, startCannedServer } from "../testing/canned-server.ts";
import { ApiProblem, UnexpectedAnswer, Unreachable } from "./api-problem.ts";
import { type Client, createClient } from "./transport.ts";

let server: CannedServer;
let client: Client;
let renewed: number;

beforeEach(async () => {
  renewed = 0;
  server = await startCannedServer();
  client = createClient({
    base_url: server.url,
    token: () => `token-${renewed}`,
    renew: () => {
      renewed += 1;
      return Promise.resolve(renewed === 1);
    },
  });
});
afterEach(() => server.close());

const findX = { query: { q: "x" } };
const aScan = { name: "profiles.csv", bytes: new Blob(["station_mm,x_mm,z_mm\n"]) };
const scanCall = {
  params: { tag: "S-8K3F7Q2NS" },
  body: { stage: "fitup" },
  files: { scan: aScan },
} as const;

describe("what a call sends", () => {
  it("asks the contract's address with token and query", async () => {
    await client.call(find, { query: { q: "0418 & more" } });
    expect(server.asked[0]).toMatchObject({ method: "GET", url: "/api/v1/find?q=0418+%26+more" });
    expect(server.asked[0]?.headers.authorization).toBe("Bearer token-0");
  });

  it("leaves out what was not given, in address and form alike", async () => {
    server.answers.push({ status: 200, body: { items: [], next_cursor: null } });
    await client.call(listSeams, { query: { limit: 5, verdict: undefined } });
    expect(server.asked[0]?.url).toBe("/api/v1/seams?limit=5");
  });

  it("escapes what stands in a path", async () => {
    server.answers.push(aProblem(422, "tag-invalid"));
    await expect(client.call(getPart, { params: { tag: "P-1/../x" } })).rejects.toThrow(ApiProblem);
    expect(server.asked[0]?.url).toBe("/api/v1/parts/P-1%2F..%2Fx");
  });

  it("sends files and fields as a form, under a key of its own", async () => {
    server.answers.push(aProblem(422, "file-empty"));
    await expect(client.call(pushScan, scanCall)).rejects.toThrow("what happened");
    const [asked] = server.asked;
    expect(asked?.url).toBe("/api/v1/seams/S-8K3F7Q2NS/scans");
    expect(asked?.headers["idempotency-key"]).toMatch(/^[0-9a-f]{32}$/);
    expect(asked?.body).toContain('name="scan"; filename="profiles.csv"');
    expect(asked?.body).toMatch(/name="stage"\r\n\r\nfitup\r\n/);
  });

  it("sends the key it was given", async () => {
    server.answers.push(aProblem(422, "file-empty"));
    const call = client.call(pushScan, { ...scanCall, idempotency_key: "0123456789abcdef" });
    await expect(call).rejects.toThrow(ApiProblem);
    expect(server.asked[0]?.headers["idempotency-key"]).toBe("0123456789abcdef");
  });

  it("sends JSON with the version it saw", async () => {
    server.answers.push(aProblem(412, "version-stale"));
    const call = client.call(patchLot, {
      params: { tag: "L-8K3F7Q2NN" },
      body: { state: "released" },
      seen_version: 3,
    });
    await expect(call).rejects.toBeInstanceOf(ApiProblem);
    expect(server.asked[0]).toMatchObject({ method: "PATCH", body: '{"state":"released"}' });
    expect(server.asked[0]?.headers["if-match"]).toBe('"3"');
  });

  it("is not made without the version or the file that its contract asks for", async () => {
    const lot = { params: { tag: "L-8K3F7Q2NN" }, body: {} };
    // @ts-expect-error the version is missing: the compiler says so before the call does
    await expect(client.call(patchLot, lot)).rejects.toThrow("expected seen_version");
    // @ts-expect-error the file is missing
    const scan: Parameters<typeof client.call<typeof pushScan>>[1] = { params: { tag: "S-1" }, body: {} };
    expect(scan.files).toBeUndefined();
    expect(server.asked).toEqual([]);
  });

  it("sends no key where the operation is not guarded by one", async () => {
    await client.call(find, findX);
    expect(server.asked[0]?.headers["idempotency-key"]).toBeUndefined();
  });
});

describe("a token that ran out", () => {
  it("is renewed once, and the call asked again under the same key", async () => {
    server.answers.push(aProblem(401, "not-signed-in"), aProblem(422, "file-empty"));
    await expect(client.call(pushScan, scanCall)).rejects.toMatchObject({ code: "file-empty" });
    const headers = server.asked.map((asked) => asked.headers);
    expect(headers.map(({ authorization }) => authorization)).toEqual(["Bearer token-0", "Bearer token-1"]);
    expect(headers[0]?.["idempotency-key"]).toBe(headers[1]?.["idempotency-key"]);
  });

  it("ends the call after a second refusal", async () => {
    server.answers.push(aProblem(401, "not-signed-in"), aProblem(401, "not-signed-in"));
    await expect(client.call(find, findX)).rejects.toMatchObject({ status: 401, code: "not-signed-in" });
    expect(server.asked.length).toBe(2);
  });
});

describe("a good answer", () => {
  it("comes with its version and whether it is a repeat", async () => {
    const headers = { ETag: '"4"', "Idempotency-Replayed": "true" };
    server.answers.push({ status: 200, headers, body: { items: [] } });
    const answer = await client.exchange(find, findX);
    expect(answer).toEqual({ data: { items: [] }, etag: '"4"', replayed: true });
    const plain = await client.exchange(find, findX);
    expect(plain).toEqual({ data: { items: [] }, etag: null, replayed: false });
  });

  it("is bytes where the contract says so", async () => {
    const bytes = "solid bytes \u00e9";
    server.answers.push({ status: 200, type: "application/octet-stream", body: bytes });
    const file = await client.call(getFile, { params: { digest: "0".repeat(64) } });
    expect(await file.text()).toBe(bytes);
  });
});

describe("a refusal", () => {
  it("brings the problem, its code and when to try again", async () => {
    server.answers.push({ ...aProblem(503, "busy"), headers: { "Retry-After": "7" } });
    const refused = client.call(find, findX);
    await expect(refused).rejects.toMatchObject({ status: 503, code: "busy", retry_after_s: 7 });
    await expect(refused).rejects.toBeInstanceOf(ApiProblem);
  });
});

describe("silence of the server", () => {
  const cases = [
    ["a proxy's page", { status: 502, type: "text/html", body: "<h1>Bad gateway</h1>" }, "502, text/html"],
    [
      "a sign-in page of the network",
      { status: 200, type: "text/html", body: "<form>" },
      "Something other than",
    ],
    [
      "a problem that is none",
      { status: 500, type: "application/problem+json", body: "<oops>" },
      "Something other than",
    ],
    [
      "a redirect",
      { status: 301, headers: { Location: "https://weld.example/" }, body: "" },
      "https://weld.example/",
    ],
  ] as const;
  it.each(cases)("is what %s means", async (_name, answer, words) => {
    server.answers.push(answer);
    const call = client.call(find, findX);
    await expect(call).rejects.toBeInstanceOf(Unreachable);
    await expect(call).rejects.toThrow(words);
  });

  it("is what a closed port means", async () => {
    await server.close();
    await expect(client.call(find, findX)).rejects.toBeInstanceOf(Unreachable);
    await expect(client.call(find, findX)).rejects.toThrow("ECONNREFUSED");
  });

  it("is what a connection cut in the middle of the answer means", async () => {
    server.answers.push({ status: 200, body: '{"items": [', cut: true });
    await expect(client.call(find, findX)).rejects.toBeInstanceOf(Unreachable);
  });

  it("is what an answer that does not come in time means", async () => {
    const hurried = createClient({ base_url: server.url, token: () => null, timeout_ms: 50 });
    server.answers.push("never");
    await expect(hurried.call(find, findX)).rejects.toThrow("did not answer in time");
  });

  it("is not what the caller's own abort means", async () => {
    server.answers.push("never");
    const abort = new AbortController();
    const call = client.call(find, { ...findX, signal: abort.signal });
    abort.abort();
    await expect(call).rejects.toMatchObject({ name: "AbortError" });
  });
});

describe("an answer beside its contract", () => {
  it("is refused with operation and place", async () => {
    server.answers.push({ status: 200, body: { items: [{ kind: "spoon" }] } });
    const call = client.call(find, findX);
    await expect(call).rejects.toBeInstanceOf(UnexpectedAnswer);
    await expect(call).rejects.toMatchObject({ operation_id: "find", pointer: "/items/0/kind" });
  });

  it("is read all the same when a newer server only says more", async () => {
    const schema = z.strictObject({ items: z.array(z.strictObject({ gap_mm: z.number() })) });
    const listGaps = contract({
      method: "get",
      path: "/gaps",
      operationId: "listGaps",
      summary: "Gaps",
      group: "Gaps",
      access: "open",
      answer: { status: 200, description: "Gaps", schema },
      problems: [],
    });
    server.answers.push({ status: 200, body: { items: [{ gap_mm: 0.4, mood: "sunny" }], more: 1 } });
    await expect(client.call(listGaps, {})).resolves.toEqual({ items: [{ gap_mm: 0.4 }] });
    server.answers.push({ status: 200, body: { items: [{ gap_mm: "wide", mood: "sunny" }] } });
    await expect(client.call(listGaps, {})).rejects.toMatchObject({ pointer: "/items/0/gap_mm" });
  });
});
