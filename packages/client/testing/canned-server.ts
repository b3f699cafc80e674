import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";

/** What a server was asked. */
export interface Asked {
  readonly method: string;
  readonly url: string;
  readonly headers: IncomingMessage["headers"];
  readonly body: string;
}

/** What it answers: `cut` ends the connection before the body is whole; `never` leaves the caller waiting. */
export type Canned =
  | "never"
  | {
      readonly status: number;
      readonly type?: string;
      readonly headers?: Readonly<Record<string, string>>;
      readonly body: unknown;
      readonly cut?: boolean;
    };

/** A server on 127.0.0.1 that answers with what a test puts in `answers`, in turn; after that with an empty list. */
export interface CannedServer {
  readonly url: string;
  readonly asked: Asked[];
  readonly answers: Canned[];
  close(): Promise<void>;
}

function answer(res: ServerResponse, canned: Canned): void {
  if (canned === "never") return;
  const body = typeof canned.body === "string" ? canned.body : JSON.stringify(canned.body);
  const length = Buffer.byteLength(body) + (canned.cut ? 100 : 0);
  const headers = { "Content-Type": canned.type ?? "application/json", "Content-Length": length };
  res.writeHead(canned.status, { ...headers, ...canned.headers });
  if (canned.cut) res.write(body, () => setTimeout(() => res.destroy(), 20));
  else res.end(body);
}

/** Starts one. */
export async function startCannedServer(): Promise<CannedServer> {
  const asked: Asked[] = [];
  const answers: Canned[] = [];
  const server = createServer((req, res) => {
    const chunks: Buffer[] = [];
    req.on("data", (chunk: Buffer) => chunks.push(chunk));
    req.on("end", () => {
      const { method = "", url = "", headers } = req;
      asked.push({ method, url, headers, body: Buffer.concat(chunks).toString() });
      answer(res, answers.shift() ?? { status: 200, body: { items: [] } });
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  // A server that listens on a port has an address with one.
  const { port } = server.address() as AddressInfo;
  return {
    url: `http://127.0.0.1:${port}`,
    asked,
    answers,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

/** A refusal as the server words it. */
export const aProblem = (status: number, code: string): Exclude<Canned, "never"> => ({
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
