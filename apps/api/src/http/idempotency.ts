import { createHash } from "node:crypto";
import { canonicalJson } from "@beadroll/domain/ledger/canonical-json";
import type { Knex } from "knex";
import { refusal } from "./refusal.ts";

/** Carried into a change, so that the answer is remembered in the transaction that made it. */
export interface Once {
  remember(trx: Knex.Transaction, at: string, answer: unknown): Promise<void>;
}

/** A request that carries an Idempotency-Key. */
export interface KeyedRequest {
  readonly actor: string;
  readonly key: string;
  readonly operation: string;
  readonly digest: string;
}

/** The digest that tells a repeat from another request under the same key. */
export function requestDigest(
  path: string,
  body: unknown,
  fileDigests: Readonly<Record<string, string>>,
): string {
  const text = canonicalJson(JSON.parse(JSON.stringify({ path, body: body ?? null, files: fileDigests })));
  return createHash("sha256").update(text).digest("hex");
}

interface Remembered {
  readonly operation: string;
  readonly request_digest: string;
  readonly answer: string;
}

/**
 * The answer that an earlier request with the same key had, if there was one.
 * @throws Refusal idempotency-mismatch when the key was used for something else
 */
export async function recall(db: Knex, request: KeyedRequest): Promise<{ answer: unknown } | null> {
  const found: Remembered | undefined = await db("idempotency_keys")
    .where({ actor: request.actor, key: request.key })
    .first("operation", "request_digest", "answer");
  if (found === undefined) return null;
  if (found.operation !== request.operation || found.request_digest !== request.digest)
    throw refusal(
      "idempotency-mismatch",
      `The Idempotency-Key "${request.key}" was used with another request.`,
    );
  return { answer: JSON.parse(found.answer) };
}

/** What a change needs to remember its answer under the request's key. */
export function once(request: KeyedRequest): Once {
  return {
    remember: async (trx, at, answer) => {
      await trx("idempotency_keys").insert({
        actor: request.actor,
        key: request.key,
        operation: request.operation,
        request_digest: request.digest,
        status: 201,
        answer: JSON.stringify(answer),
        created_at: at,
      });
    },
  };
}

/** Whether a change failed because its key was remembered meanwhile. */
export function isKeyTaken(error: unknown): boolean {
  return error instanceof Error && error.message.includes("UNIQUE constraint failed: idempotency_keys");
}
