import { ApiProblem, UnexpectedAnswer, Unreachable } from "@beadroll/client/api-problem";
import { type Client, createClient } from "@beadroll/client/transport";
import { EXIT } from "./exit-codes.ts";
import type { Profile } from "./home/profile.ts";
import { exitOfCode, faultLine } from "./output/fault-text.ts";
import { CommandStop, type FailureJson, failure } from "./output/outcome.ts";

/** Long enough for a large scan over a slow line, short enough that a cell does not stand. */
const TIMEOUT_MS = 60_000;

/** A client that signs with this computer's key. */
export function clientOf(profile: Profile): Client {
  return createClient({ base_url: profile.server, token: () => profile.key, timeout_ms: TIMEOUT_MS });
}

/** A refusal as programs read it. */
export function refusalJson({ code, problem }: ApiProblem): FailureJson {
  const { detail, errors, instance, status } = problem;
  return { error: code, detail, errors, status, request_id: instance };
}

/** A refusal as people read it: what kind, then each fault on its line. */
export function refusalText({ problem }: ApiProblem): string {
  const faults = problem.errors.length > 0 ? problem.errors : [{ code: "", detail: problem.detail }];
  // The schema leaves absent places undefined; a shown fault leaves them out.
  const lines = faults.map((fault) => faultLine(JSON.parse(JSON.stringify(fault))));
  return [`The server refused: ${problem.title}.`, ...lines.map((line) => `  ${line}`)].join("\n");
}

/** Words for a key that the server does not accept: its own are for people who sign in. */
export function callerText(error: ApiProblem): string {
  return error.status === 401
    ? "The server does not accept this computer's key. Enrol again with a valid one: beadroll enrol"
    : refusalText(error);
}

/** Whether the server refused because of who asks, not because of what was sent. */
export const isAboutCaller = (error: ApiProblem): boolean => exitOfCode(error.code) === EXIT.not_allowed;

/** Whether the server itself was at fault or overloaded: the same request may pass later. */
export const isPassing = (error: ApiProblem): boolean => error.status >= 500 || error.status === 429;

/** Runs a verb that only asks: a refusal or a silent server stops it with what to say. */
export async function asking<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof ApiProblem) {
      const exit = isAboutCaller(error) ? EXIT.not_allowed : isPassing(error) ? EXIT.queued : EXIT.refused;
      const talk = isAboutCaller(error) ? callerText(error) : refusalText(error);
      throw new CommandStop(failure(exit, refusalJson(error), talk));
    }
    if (error instanceof Unreachable)
      throw new CommandStop(failure(EXIT.queued, { error: "unreachable", detail: error.message }));
    if (error instanceof UnexpectedAnswer)
      throw new CommandStop(
        failure(EXIT.failure, { error: "unexpected-answer", detail: versionsDiffer(error) }),
      );
    throw error;
  }
}

/** What an answer beside the contract means to a person. */
export const versionsDiffer = (error: UnexpectedAnswer): string =>
  `The server's answer is not understood; server and beadroll may differ in version. ${error.message}`;
