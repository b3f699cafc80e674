import type { ExitCode } from "../exit-codes.ts";

/** What a verb gives: an exit code, what programs read and what people read. */
export interface CommandOutcome {
  readonly exit: ExitCode;
  /** Printed alone on stdout with --json. */
  readonly json: unknown;
  /** Printed on stdout without --json. */
  readonly text: string;
  /** Talk for stderr, in both cases. */
  readonly talk?: string;
}

/** What programs read when a verb did not do what was asked: one shape for every cause. */
export interface FailureJson {
  /** Stable code: of the fault registry, or `usage`, `unreachable`, `unexpected-answer`, `not-enrolled`, `internal`. */
  readonly error: string;
  readonly detail: string;
  /** Each fault with its place, where there are any. */
  readonly errors?: readonly unknown[];
  readonly [more: string]: unknown;
}

/** An outcome that is a failure: its talk for people on stderr, nothing on stdout but JSON. */
export function failure(exit: ExitCode, json: FailureJson, talk: string = json.detail): CommandOutcome {
  return { exit, json, text: "", talk };
}

/** Ends a verb early with what to say; thrown by steps, printed in the one place that prints. */
export class CommandStop extends Error {
  readonly outcome: CommandOutcome;

  constructor(outcome: CommandOutcome) {
    super(outcome.talk ?? outcome.text);
    this.outcome = outcome;
  }
}

/** Stops a verb. */
export function stop(...failed: Parameters<typeof failure>): never {
  throw new CommandStop(failure(...failed));
}
