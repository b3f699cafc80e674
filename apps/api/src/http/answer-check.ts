import { isDeepStrictEqual } from "node:util";
import type { Contract } from "@beadroll/domain/contract/contract";
import { problemsOf } from "./contract-problems.ts";
import type { Refusal } from "./refusal.ts";

/**
 * Holds an answer to its contract, and so to the OpenAPI document made from it. On in tests only, where every answer
 * passes through it.
 * @throws Error naming the operation and what does not conform
 */
export function checkAnswer(contract: Contract, value: unknown): void {
  if (!("schema" in contract.answer)) return;
  const sent: unknown = JSON.parse(JSON.stringify(value));
  const parsed = contract.answer.schema.safeParse(sent);
  if (!parsed.success)
    throw new Error(
      `${contract.operationId} answers beside its schema: ${JSON.stringify(parsed.error.issues)}`,
    );
  // Parsing drops keys the schema does not know, so a difference is a key that is not documented.
  if (!isDeepStrictEqual(JSON.parse(JSON.stringify(parsed.data)), sent))
    throw new Error(`${contract.operationId} answers with more than its schema has`);
}

/** Holds a refusal to the problems its contract names. @throws Error naming the operation and the code */
export function checkRefusal(contract: Contract, refused: Refusal): void {
  const known: ReadonlySet<string> = new Set(problemsOf(contract));
  for (const { code } of refused.faults)
    if (!known.has(code))
      throw new Error(`${contract.operationId} refuses with ${code}, which its contract does not name`);
}
