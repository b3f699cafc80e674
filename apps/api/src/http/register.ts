import type { Contract } from "@beadroll/domain/contract/contract";
import { json, type Request, type RequestHandler, type Response, Router } from "express";
import type { Knex } from "knex";
import type { Authenticate } from "../auth/authenticate.ts";
import { type Caller, callerKey } from "../auth/caller.ts";
import type { FileStore } from "../files/file-store.ts";
import { checkAnswer, checkRefusal } from "./answer-check.ts";
import { isKeyTaken, type KeyedRequest, once, recall, requestDigest } from "./idempotency.ts";
import { receivedFiles, receiveMultipart } from "./multipart.ts";
import { Refusal, refusal } from "./refusal.ts";
import type { Route, RouteInput, StreamAnswer } from "./route.ts";
import { validBody, validParams, validQuery } from "./validation.ts";

/** What registering routes needs. */
export interface Registry {
  readonly authenticate: Authenticate;
  readonly store: FileStore;
  readonly reader: Knex;
  /** Hold every answer and refusal to its contract: for tests. */
  readonly check_answers: boolean;
}

const KEY_PATTERN = /^[\x21-\x7e]{8,200}$/;
const readJson = json({ limit: "1mb", strict: true });

/** A router over all routes, in reading order: sign-in, permission, body, validation, idempotency, handler. */
export function registerRoutes(routes: readonly Route[], registry: Registry): Router {
  const router = Router({ caseSensitive: true });
  const methodsOf = new Map<string, string[]>();
  for (const route of routes) {
    const path = route.contract.path.replaceAll(/\{(\w+)\}/g, ":$1");
    methodsOf.set(path, [...(methodsOf.get(path) ?? []), route.contract.method.toUpperCase()]);
    router[route.contract.method](path, ...handlersOf(route, registry));
  }
  for (const [path, methods] of methodsOf) router.all(path, refuseMethod(methods));
  return router;
}

function refuseMethod(methods: readonly string[]): RequestHandler {
  return (req, res) => {
    res.set("Allow", methods.join(", "));
    throw refusal("method-not-allowed", `${req.method} cannot be done here; allowed: ${methods.join(", ")}.`);
  };
}

function handlersOf(route: Route, registry: Registry): RequestHandler[] {
  const { contract } = route;
  const authorise: RequestHandler = async (req, res, next) => {
    const caller = await registry.authenticate(req);
    permit(contract, caller);
    res.locals["caller"] = caller;
    next();
  };
  const read =
    contract.body?.kind === "multipart" ? receiveMultipart(contract.body, registry.store) : readJson;
  const answer: RequestHandler = async (req, res) => {
    const caller: Caller = res.locals["caller"];
    try {
      await respond(route, registry, { caller, req, res });
    } catch (error) {
      if (registry.check_answers && error instanceof Refusal) checkRefusal(contract, error);
      throw error;
    }
  };
  return contract.body ? [authorise, read, answer] : [authorise, answer];
}

/** Deny by default: only what the contract opens is open. */
function permit(contract: Contract, caller: Caller): void {
  if (contract.access === "open") return;
  if (caller.kind === "nobody")
    throw refusal("not-signed-in", "Sign in, or send a key in the Authorization header.");
  if (contract.access === "signed-in" || caller.permissions.has(contract.access)) return;
  throw refusal(
    "not-allowed",
    `This needs the permission ${contract.access}, which ${caller.name} does not have.`,
  );
}

interface Exchange {
  readonly caller: Caller;
  readonly req: Request;
  readonly res: Response;
}

async function respond(route: Route, registry: Registry, exchange: Exchange): Promise<void> {
  const { contract } = route;
  const { caller, req, res } = exchange;
  const input = {
    caller,
    params: contract.params ? validParams(contract.params, req.params) : undefined,
    query: contract.query ? validQuery(contract.query, req.query) : refuseQuery(req),
    body: contract.body ? validBody(contract.body.schema, req.body) : undefined,
    files: receivedFiles(req, contract),
    seen_version: contract.guard === "if-match" ? seenVersion(req) : 0,
  };
  const keyed = keyedRequest(contract, exchange, input);
  const earlier = keyed ? await recall(registry.reader, keyed) : null;
  if (earlier) {
    res.set("Idempotency-Replayed", "true");
    send(registry, contract, res, await route.recall(earlier.answer));
    return;
  }
  // Each part was checked by the contract's own schema just above.
  const checked = { ...input, once: keyed ? once(keyed) : null, req, res } as RouteInput<Contract>;
  try {
    send(registry, contract, res, await route.handle(checked));
  } catch (error) {
    // The same key came twice at once: the other request made the record, so its answer serves both.
    if (!keyed || !isKeyTaken(error)) throw error;
    const other = await recall(registry.reader, keyed);
    if (!other) throw error;
    send(registry, contract, res, await route.recall(other.answer));
  }
}

function refuseQuery(req: Request): undefined {
  const [name] = Object.keys(req.query);
  if (name !== undefined)
    throw refusal("parameter-unknown", `The parameter "${name}" is not known here.`, { field: name });
  return undefined;
}

function keyedRequest(
  contract: Contract,
  { caller, req }: Exchange,
  input: { body: unknown; files: Readonly<Record<string, { digest: string }>> },
): KeyedRequest | null {
  if (contract.guard !== "idempotency-key") return null;
  const key = req.get("Idempotency-Key");
  if (key === undefined)
    throw refusal("idempotency-required", "Send an Idempotency-Key header, unique for this record.");
  if (!KEY_PATTERN.test(key))
    throw refusal("request-invalid", "Idempotency-Key: expected 8 to 200 visible ASCII characters.", {
      field: "Idempotency-Key",
    });
  const digests = Object.fromEntries(Object.entries(input.files).map(([name, file]) => [name, file.digest]));
  return {
    actor: callerKey(caller, req.ip ?? ""),
    key,
    operation: contract.operationId,
    digest: requestDigest(req.path, input.body, digests),
  };
}

function seenVersion(req: Request): number {
  const header = req.get("If-Match");
  if (header === undefined) throw refusal("version-required", "Send If-Match with the ETag you read.");
  const version = /^(?:W\/)?"(\d{1,15})"$/.exec(header.trim())?.[1];
  if (version === undefined)
    throw refusal("version-stale", `If-Match: expected an ETag such as "3", got ${header}.`);
  return Number(version);
}

function send(registry: Registry, contract: Contract, res: Response, value: unknown): void {
  if (registry.check_answers) checkAnswer(contract, value);
  const { answer } = contract;
  res.set("Cache-Control", "no-store");
  if (answer.status === 204) {
    res.status(204).end();
  } else if ("media_type" in answer) {
    // `route` holds handlers of such contracts to this type.
    sendStream(res, value as StreamAnswer);
  } else {
    if (hasVersion(value)) res.set("ETag", `"${value.version}"`);
    res.status(answer.status).json(value);
  }
}

const hasVersion = (value: unknown): value is { version: number } =>
  typeof value === "object" && value !== null && "version" in value && typeof value.version === "number";

function sendStream(res: Response, answer: StreamAnswer): void {
  res.attachment(answer.file_name).type(answer.media_type);
  if (answer.inline)
    res.set("Content-Disposition", String(res.get("Content-Disposition")).replace(/^attachment/, "inline"));
  if (Buffer.isBuffer(answer.stream)) {
    res.send(answer.stream);
    return;
  }
  if (answer.size !== undefined) res.set("Content-Length", String(answer.size));
  answer.stream.on("error", (error) => res.destroy(error));
  answer.stream.pipe(res);
}
