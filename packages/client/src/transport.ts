import type { AnswerOf, BodyInput, Contract, ParamsOf, QueryInput } from "@beadroll/domain/contract/contract";
import { Problem } from "@beadroll/domain/schemas/problem";
import { ApiProblem, UnexpectedAnswer, Unreachable } from "./api-problem.ts";

/** A file to send. */
export interface SentFile {
  readonly name: string;
  readonly bytes: Blob;
}

type Given<Key extends string, T> = [T] extends [undefined]
  ? { readonly [K in Key]?: never }
  : { readonly [K in Key]: T };
type GivenQuery<C extends Contract> = [QueryInput<C>] extends [undefined]
  ? { readonly query?: never }
  : { readonly query?: QueryInput<C> };

/** What a call carries: what its contract asks for, and nothing else. */
export type CallInput<C extends Contract> = Given<"params", ParamsOf<C>> &
  GivenQuery<C> &
  Given<"body", BodyInput<C>> & {
    readonly files?: Readonly<Record<string, SentFile>>;
    /** Makes a repeat of this call the same record; made up when absent. */
    readonly idempotency_key?: string;
    /** The version that was read, for operations guarded by If-Match. */
    readonly seen_version?: number;
    readonly signal?: AbortSignal;
  };

/** What a call gives: the answer of its contract, or bytes where the contract answers with a media type. */
export type CallAnswer<C extends Contract> = C["answer"] extends { media_type: string } ? Blob : AnswerOf<C>;

/** How a client reaches its server. */
export interface ClientOptions {
  /** Address of the server, without /api/v1. */
  readonly base_url: string;
  /** Token or key for the Authorization header; null for none. */
  readonly token: () => string | null;
  /** Called on a 401 that may be mended; true means: there is a new token, ask again once. */
  readonly renew?: () => Promise<boolean>;
  /** Milliseconds a call may take; no limit when absent. */
  readonly timeout_ms?: number;
  readonly fetch?: typeof fetch;
}

/** Calls operations of the API by their contracts. */
export interface Client {
  /**
   * @throws ApiProblem when the server refuses, Unreachable when nothing of it answers, UnexpectedAnswer when it answers
   *   beside the contract
   */
  call<const C extends Contract>(contract: C, input: CallInput<C>): Promise<CallAnswer<C>>;
}

type LooseInput = {
  readonly params?: unknown;
  readonly query?: unknown;
  readonly body?: unknown;
  readonly files?: Readonly<Record<string, SentFile>>;
  readonly idempotency_key?: string;
  readonly seen_version?: number;
  readonly signal?: AbortSignal;
};

const entriesOf = (value: unknown): [string, unknown][] =>
  typeof value === "object" && value !== null
    ? Object.entries(value).filter(([, item]) => item !== undefined)
    : [];

/** The address of an operation. @throws TypeError for a parameter that is missing */
export function addressOf(contract: Contract, input: LooseInput): string {
  const params = new Map(entriesOf(input.params));
  const path = contract.path.replaceAll(/\{(\w+)\}/g, (_all, name: string) => {
    const value = params.get(name);
    if (value === undefined) throw new TypeError(`${contract.operationId}: expected the parameter ${name}`);
    return encodeURIComponent(String(value));
  });
  const query = new URLSearchParams(entriesOf(input.query).map(([name, value]) => [name, String(value)]));
  const text = query.toString();
  return `/api/v1${path}${text ? `?${text}` : ""}`;
}

function formOf(input: LooseInput): FormData {
  const form = new FormData();
  for (const [name, value] of entriesOf(input.body)) form.set(name, String(value));
  for (const [name, file] of Object.entries(input.files ?? {})) form.set(name, file.bytes, file.name);
  return form;
}

function requestOf(contract: Contract, input: LooseInput, options: ClientOptions): RequestInit {
  const headers = new Headers({ Accept: "application/json" });
  const token = options.token();
  if (token !== null) headers.set("Authorization", `Bearer ${token}`);
  if (contract.guard === "idempotency-key")
    headers.set("Idempotency-Key", input.idempotency_key ?? globalThis.crypto.randomUUID());
  if (contract.guard === "if-match") headers.set("If-Match", `"${input.seen_version ?? 0}"`);
  const init: RequestInit = { method: contract.method.toUpperCase(), headers, credentials: "same-origin" };
  if (contract.body?.kind === "json") {
    headers.set("Content-Type", "application/json");
    init.body = JSON.stringify(input.body ?? {});
  }
  if (contract.body?.kind === "multipart") init.body = formOf(input);
  const signals = [
    input.signal,
    options.timeout_ms === undefined ? undefined : AbortSignal.timeout(options.timeout_ms),
  ];
  const given = signals.filter((signal) => signal !== undefined);
  if (given.length > 0) init.signal = AbortSignal.any(given);
  return init;
}

async function send(contract: Contract, input: LooseInput, options: ClientOptions): Promise<Response> {
  const ask = options.fetch ?? globalThis.fetch;
  try {
    return await ask(`${options.base_url}${addressOf(contract, input)}`, requestOf(contract, input, options));
  } catch (error) {
    // The caller's own abort is not a fault of the network.
    if (input.signal?.aborted) throw error;
    const cause =
      error instanceof Error
        ? error.cause instanceof Error
          ? error.cause.message
          : error.message
        : String(error);
    throw new Unreachable(`${options.base_url || "The server"} cannot be reached: ${cause}`, {
      cause: error,
    });
  }
}

async function refusalOf(answer: Response): Promise<ApiProblem | Unreachable> {
  const text = await answer.text();
  const retry = Number(answer.headers.get("Retry-After") ?? Number.NaN);
  if (answer.headers.get("Content-Type")?.includes("problem+json")) {
    const problem = Problem.safeParse(JSON.parse(text));
    if (problem.success) return new ApiProblem(problem.data, Number.isFinite(retry) ? retry : null);
  }
  return new Unreachable(`Something other than the server answered with ${answer.status}.`);
}

async function readAnswer(contract: Contract, answer: Response): Promise<unknown> {
  if (contract.answer.status === 204) return undefined;
  if ("media_type" in contract.answer) return answer.blob();
  let value: unknown;
  try {
    value = await answer.json();
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    throw new UnexpectedAnswer(contract.operationId, "the answer is no JSON");
  }
  const parsed = contract.answer.schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  throw new UnexpectedAnswer(
    contract.operationId,
    `/${issue?.path.join("/") ?? ""}: ${issue?.message ?? "does not fit"}`,
  );
}

/** A client of one server. It keeps nothing: tokens are the caller's. */
export function createClient(options: ClientOptions): Client {
  async function call(contract: Contract, input: LooseInput): Promise<unknown> {
    let answer = await send(contract, input, options);
    if (answer.status === 401 && contract.access !== "open" && (await options.renew?.()))
      answer = await send(contract, input, options);
    if (!answer.ok) throw await refusalOf(answer);
    return readAnswer(contract, answer);
  }
  // The contract's types say what `call` takes and gives; inside, it works from the contract's values.
  return { call: call as Client["call"] };
}
