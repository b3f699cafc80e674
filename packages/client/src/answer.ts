import type { Contract } from "@beadroll/domain/contract/contract";
import { Problem } from "@beadroll/domain/schemas/problem";
import type { z } from "zod";
import { ApiProblem, UnexpectedAnswer, Unreachable } from "./api-problem.ts";

const mediaType = (answer: Response): string =>
  (answer.headers.get("Content-Type") ?? "").split(";")[0]?.trim().toLowerCase() ?? "";

/** An answer that no Beadroll server gave: a proxy's page, a portal's, another program's. */
function fromAnother(answer: Response): Unreachable {
  const kind = mediaType(answer) || "no content type";
  return new Unreachable(`Something other than the server answered with ${answer.status}, ${kind}.`);
}

function jsonOf(text: string): { value: unknown } | null {
  try {
    return { value: JSON.parse(text) };
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}

function retryAfter(answer: Response): number | null {
  const header = answer.headers.get("Retry-After")?.trim() ?? "";
  return /^\d{1,9}$/.test(header) ? Number(header) : null;
}

/** The body of an answer: bytes where the contract answers with a media type, text otherwise. */
export function bodyOf(contract: Contract, answer: Response): Promise<string | Blob> {
  return answer.ok && "media_type" in contract.answer ? answer.blob() : answer.text();
}

/** What an answer that is no success means: the server's own refusal, or silence of the server. */
export function refusalOf(answer: Response, body: string | Blob): ApiProblem | Unreachable {
  const moved = answer.headers.get("Location");
  if (answer.type === "opaqueredirect" || (answer.status >= 300 && answer.status < 400))
    return new Unreachable(
      `The server sends on to another address${moved === null ? "" : `, ${moved}`}: use that one.`,
    );
  const isProblem = mediaType(answer) === "application/problem+json" && typeof body === "string";
  const json = isProblem ? jsonOf(body) : null;
  const problem = json && Problem.safeParse(json.value);
  return problem?.success ? new ApiProblem(problem.data, retryAfter(answer)) : fromAnother(answer);
}

const pointerTo = (path: readonly PropertyKey[]): string =>
  path.map((key) => `/${String(key).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");

/** Takes a key out of what stands at `path`; the value is our own copy. */
function removeKeys(value: unknown, path: readonly PropertyKey[], keys: readonly string[]): void {
  let at = value;
  for (const step of path) at = (at as Record<PropertyKey, unknown>)[step];
  for (const key of keys) delete (at as Record<string, unknown>)[key];
}

/**
 * Reads a value by its schema. Keys that the schema does not know are left out: a newer server may say more, and a cell's
 * computer is rarely upgraded on the same day.
 */
function readValue(schema: z.ZodType, value: unknown): z.ZodSafeParseResult<unknown> {
  const first = schema.safeParse(value);
  if (first.success) return first;
  const known = structuredClone(value);
  for (const issue of first.error.issues) {
    if (issue.code === "unrecognized_keys") removeKeys(known, issue.path, issue.keys);
  }
  return schema.safeParse(known);
}

/** A good answer as its contract has it. @throws UnexpectedAnswer naming the place that does not fit */
export function readAnswer(contract: Contract, answer: Response, body: string | Blob): unknown {
  if (contract.answer.status === 204) return undefined;
  if ("media_type" in contract.answer) return body;
  if (mediaType(answer) !== "application/json" || typeof body !== "string") throw fromAnother(answer);
  const json = jsonOf(body);
  if (json === null) throw new UnexpectedAnswer(contract.operationId, "", "the answer is no JSON");
  const parsed = readValue(contract.answer.schema, json.value);
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  throw new UnexpectedAnswer(
    contract.operationId,
    pointerTo(issue?.path ?? []),
    issue?.message ?? "does not fit",
  );
}
