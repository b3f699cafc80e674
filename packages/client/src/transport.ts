import type { Contract } from "@beadroll/domain/contract/contract";
import { bodyOf, readAnswer, refusalOf } from "./answer.ts";
import { Unreachable } from "./api-problem.ts";
import type { CallAnswer, CallInput, LooseInput } from "./call-input.ts";
import { addressOf, requestOf } from "./request.ts";

/** How a client reaches its server. */
export interface ClientOptions {
  /** Address of the server, without /api/v1; empty for the page's own. */
  readonly base_url: string;
  /** Token or key for the Authorization header; null for none. */
  readonly token: () => string | null;
  /** Called on a 401 that may be mended; true means: there is a new token, ask again once. */
  readonly renew?: () => Promise<boolean>;
  /** Milliseconds a call may take, the answer's body included; no limit when absent. */
  readonly timeout_ms?: number;
  readonly fetch?: typeof fetch;
  /** Makes Idempotency-Keys; 128 random bits from the platform when absent. */
  readonly new_key?: () => string;
}

/** An answer with what its headers say. */
export interface Exchange<T> {
  readonly data: T;
  /** Version of what was answered, for If-Match; null where there is none. */
  readonly etag: string | null;
  /** Whether this is the answer of an earlier request under the same Idempotency-Key. */
  readonly replayed: boolean;
}

/**
 * Calls operations of the API by their contracts.
 * Both reject with ApiProblem when the server refuses, Unreachable when nothing of it answers, UnexpectedAnswer when it
 * answers beside the contract, and with the signal's own reason when the caller aborts.
 */
export interface Client {
  call<const C extends Contract>(contract: C, input: CallInput<C>): Promise<CallAnswer<C>>;
  exchange<const C extends Contract>(contract: C, input: CallInput<C>): Promise<Exchange<CallAnswer<C>>>;
}

/** The words of the deepest cause: fetch itself only says that it failed. */
function causeOf(error: unknown): string {
  let deepest = error;
  while (deepest instanceof Error && deepest.cause instanceof Error) deepest = deepest.cause;
  if (!(deepest instanceof Error)) return String(deepest);
  // Some causes, a refused connection to two addresses among them, carry only a code.
  return deepest.message || ("code" in deepest ? String(deepest.code) : deepest.name);
}

/** A key of 128 random bits. Not crypto.randomUUID: browsers keep that from pages served over plain HTTP, as in many a shop. */
function randomKey(): string {
  const bytes = globalThis.crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, "0")).join("");
}

/** Runs a step that talks over the network; what fails there is silence of the server. */
async function overNetwork<T>(step: () => Promise<T>, input: LooseInput, base_url: string): Promise<T> {
  try {
    return await step();
  } catch (error) {
    const isNetwork = error instanceof TypeError || (error instanceof DOMException && !input.signal?.aborted);
    if (!isNetwork) throw error;
    const why =
      error instanceof DOMException && error.name === "TimeoutError"
        ? "it did not answer in time"
        : causeOf(error);
    throw new Unreachable(`${base_url || "The server"} cannot be reached: ${why}`, { cause: error });
  }
}

/** A client of one server. It keeps nothing: tokens are the caller's. */
export function createClient(options: ClientOptions): Client {
  const { base_url } = options;
  const ask = options.fetch ?? ((address: string, init: RequestInit) => globalThis.fetch(address, init));
  const newKey = options.new_key ?? randomKey;

  function send(contract: Contract, input: LooseInput): Promise<Response> {
    const address = `${base_url.replace(/\/+$/, "")}${addressOf(contract, input)}`;
    const init = requestOf(contract, input, { token: options.token(), timeout_ms: options.timeout_ms });
    return overNetwork(() => ask(address, init), input, base_url);
  }

  async function exchange(contract: Contract, given: LooseInput): Promise<Exchange<unknown>> {
    // One key for both attempts: the first may have arrived.
    const isKeyed = contract.guard === "idempotency-key";
    const input = isKeyed ? { ...given, idempotency_key: given.idempotency_key ?? newKey() } : given;
    let answer = await send(contract, input);
    if (answer.status === 401 && contract.access !== "open" && (await options.renew?.())) {
      await answer.body?.cancel();
      answer = await send(contract, input);
    }
    const last = answer;
    const body = await overNetwork(() => bodyOf(contract, last), input, base_url);
    if (!last.ok) throw refusalOf(last, body);
    return {
      data: readAnswer(contract, last, body),
      etag: last.headers.get("ETag"),
      replayed: last.headers.get("Idempotency-Replayed") === "true",
    };
  }

  async function call(contract: Contract, input: LooseInput): Promise<unknown> {
    return (await exchange(contract, input)).data;
  }

  // The contract's types say what the calls take and give; inside, they work from the contract's values.
  return { call: call as Client["call"], exchange: exchange as Client["exchange"] };
}
