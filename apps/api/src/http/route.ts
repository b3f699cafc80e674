import type { Readable } from "node:stream";
import type { AnswerOf, BodyOf, Contract, ParamsOf, QueryOf } from "@beadroll/domain/contract/contract";
import type { Request, Response } from "express";
import type { Caller } from "../auth/caller.ts";
import type { Once } from "./idempotency.ts";
import type { ReceivedFile } from "./multipart.ts";

/** What a handler is given: checked input and who asks. */
export interface RouteInput<C extends Contract> {
  readonly caller: Caller;
  readonly params: ParamsOf<C>;
  readonly query: QueryOf<C>;
  readonly body: BodyOf<C>;
  readonly files: Readonly<Record<string, ReceivedFile>>;
  /** The version the caller saw, on operations guarded by If-Match. */
  readonly seen_version: number;
  readonly once: Once | null;
  readonly req: Request;
  readonly res: Response;
}

/** Bytes as an answer. */
export interface StreamAnswer {
  readonly stream: Readable | Buffer;
  readonly media_type: string;
  readonly file_name: string;
  readonly inline: boolean;
  readonly size?: number;
}

/** What a handler gives back: the answer's value, or bytes for an operation that answers with a media type. */
export type RouteAnswer<C extends Contract> = C["answer"] extends { schema: unknown }
  ? AnswerOf<C>
  : C["answer"] extends { media_type: string }
    ? StreamAnswer
    : undefined;

/** One operation with its handler, ready to be registered. */
export interface Route {
  readonly contract: Contract;
  // The exact input type is known only to `route`; the registry hands each handler what its contract promises.
  readonly handle: (input: RouteInput<Contract>) => Promise<unknown>;
  /** Turns what was remembered for a repeated request into the answer; the identity if absent. */
  readonly recall: (remembered: unknown) => Promise<unknown>;
}

/** Binds a handler to its contract. */
export function route<const C extends Contract>(
  contract: C,
  handle: (input: RouteInput<C>) => Promise<RouteAnswer<C>>,
  recall: (remembered: unknown) => Promise<unknown> = (remembered) => Promise.resolve(remembered),
): Route {
  return {
    contract,
    handle: (input) => handle(input as unknown as RouteInput<C>),
    recall,
  };
}
