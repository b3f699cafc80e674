import { createHash } from "node:crypto";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";
import { PassCreate } from "@beadroll/domain/schemas/pass";
import { ScanCreate } from "@beadroll/domain/schemas/scan";
import { aPassRecord, aScanRecord } from "./records.ts";

/** A push that arrived: under which key, with what. */
export interface Arrived {
  readonly seam: string;
  readonly kind: string;
  readonly key: string;
  readonly fields: Readonly<Record<string, string>>;
  readonly names: readonly string[];
  readonly digests: Readonly<Record<string, string>>;
}

/** A record made: once for a key, once for the same bytes on the same seam. */
export interface Kept extends Arrived {
  readonly at: string;
}

/** What happens to a push instead of the usual answer; `null` is the usual one. */
export type Mishap =
  | { readonly problem: readonly [status: number, code: string]; readonly headers?: Record<string, string> }
  | { readonly page: number }
  | "cut-after-recording"
  | "never-answer"
  | "other-bytes"
  | "another-version";

/** A small server on 127.0.0.1 that keeps pushes as the API promises to. */
export interface RecordServer {
  readonly url: string;
  readonly key: string;
  /** Every push that arrived, answered or not. */
  readonly arrived: Arrived[];
  readonly records: Kept[];
  /** Verdict of the scans it answers with. */
  verdict: "within" | "adapt" | "hold";
  mishap: ((push: Arrived) => Mishap | null) | null;
  /** What a search finds. */
  found: unknown[];
  close(): Promise<void>;
}

const KEY = "brk_test-key-of-cell-2";
const digest = (bytes: Uint8Array): string => createHash("sha256").update(bytes).digest("hex");

async function bodyOf(req: IncomingMessage): Promise<Buffer> {
  const chunks: Buffer[] = [];
  for await (const chunk of req) chunks.push(chunk);
  return Buffer.concat(chunks);
}

async function readPush(req: IncomingMessage, seam: string, kind: string): Promise<Arrived> {
  const headers = { "Content-Type": req.headers["content-type"] ?? "" };
  const form = await new Response(new Uint8Array(await bodyOf(req)), { headers }).formData();
  const fields: Record<string, string> = {};
  const digests: Record<string, string> = {};
  const names: string[] = [];
  for (const [name, value] of form) {
    if (typeof value === "string") {
      fields[name] = value;
    } else {
      digests[name] = digest(new Uint8Array(await value.arrayBuffer()));
      names.push(value.name);
    }
  }
  (kind === "scans" ? ScanCreate : PassCreate).parse(fields);
  return { seam, kind, key: String(req.headers["idempotency-key"]), fields, names, digests };
}

function send(
  res: ServerResponse,
  status: number,
  value: unknown,
  headers: Record<string, string> = {},
): void {
  const type = status < 400 ? "application/json" : "application/problem+json";
  res.writeHead(status, { "Content-Type": type, ...headers }).end(JSON.stringify(value));
}

const aProblem = (status: number, code: string) => ({
  type: `/docs/api/problems#${code}`,
  title: `Title of ${code}`,
  status,
  detail: `Detail of ${code}`,
  instance: "request-7",
  errors: [{ code, detail: `Detail of ${code}`, field: "scan" }],
});

/** The record of a push: the first one of its key or of its bytes, or a new one. */
function keep(records: Kept[], push: Arrived): { kept: Kept; replayed: boolean } {
  const sameKey = records.find((record) => record.key === push.key);
  const bytes = JSON.stringify([push.seam, push.kind, push.digests]);
  const same = records.find((one) => JSON.stringify([one.seam, one.kind, one.digests]) === bytes);
  const kept = sameKey ?? same ?? { ...push, at: new Date().toISOString() };
  if (!sameKey && !same) records.push(kept);
  return { kept, replayed: sameKey !== undefined };
}

function answerPush(res: ServerResponse, server: RecordServer, push: Arrived): void {
  const mishap = server.mishap?.(push) ?? null;
  if (mishap === "never-answer") return;
  if (mishap !== null && typeof mishap === "object" && "problem" in mishap) {
    send(res, mishap.problem[0], aProblem(...mishap.problem), mishap.headers);
    return;
  }
  if (mishap !== null && typeof mishap === "object") {
    res.writeHead(mishap.page, { "Content-Type": "text/html" }).end("<h1>Bad gateway</h1>");
    return;
  }
  const { kept, replayed } = keep(server.records, push);
  if (mishap === "cut-after-recording") {
    res.destroy();
    return;
  }
  const record = push.kind === "scans" ? aScanRecord(kept, server.verdict) : aPassRecord(kept);
  if (mishap === "other-bytes") record.file_digest = "0".repeat(64);
  const answer = mishap === "another-version" ? { ...record, ledger_seq: "many" } : record;
  send(res, 201, answer, replayed ? { "Idempotency-Replayed": "true" } : {});
}

async function handle(req: IncomingMessage, res: ServerResponse, server: RecordServer): Promise<void> {
  if (req.headers.authorization !== `Bearer ${KEY}`) {
    await bodyOf(req);
    send(res, 401, aProblem(401, "not-signed-in"));
    return;
  }
  const { pathname } = new URL(req.url ?? "", "http://localhost");
  const push = /^\/api\/v1\/seams\/([^/]+)\/(scans|passes)$/.exec(pathname);
  if (req.method === "POST" && push?.[1] && push[2]) {
    const arrived = await readPush(req, push[1], push[2]);
    server.arrived.push(arrived);
    answerPush(res, server, arrived);
  } else if (pathname === "/api/v1/me") {
    const permissions = ["records:read", "scans:write", "passes:write"];
    send(res, 200, {
      kind: "machine",
      name: "Cell 2 PC",
      permissions,
      cell_tag: "C-F0GT5KKGY",
      account: null,
    });
  } else if (pathname === "/api/v1/find") {
    send(res, 200, { items: server.found });
  } else {
    send(res, 404, aProblem(404, "not-found"));
  }
}

/** Starts one; on the given port where a test wants it back at the same address. */
export async function startRecordServer(port = 0): Promise<RecordServer> {
  const http = createServer((req, res) => {
    handle(req, res, server).catch((error: unknown) => {
      send(res, 500, { ...aProblem(500, "internal"), detail: String(error) });
    });
  });
  await new Promise<void>((resolve) => http.listen(port, "127.0.0.1", resolve));
  // A server that listens on a port has an address with one.
  const { port: listening } = http.address() as AddressInfo;
  const server: RecordServer = {
    url: `http://127.0.0.1:${listening}`,
    key: KEY,
    arrived: [],
    records: [],
    verdict: "within",
    mishap: null,
    found: [],
    close: () =>
      new Promise((resolve) => {
        http.close(() => resolve());
        http.closeAllConnections();
      }),
  };
  return server;
}
