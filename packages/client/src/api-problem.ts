import type { Problem } from "@beadroll/domain/schemas/problem";

/** The server refused: its problem document (RFC 9457). */
export class ApiProblem extends Error {
  readonly problem: Problem;
  /** Seconds after which trying again makes sense, where the server said so. */
  readonly retry_after_s: number | null;

  constructor(problem: Problem, retryAfterS: number | null) {
    super(problem.detail);
    this.name = "ApiProblem";
    this.problem = problem;
    this.retry_after_s = retryAfterS;
  }

  get status(): number {
    return this.problem.status;
  }

  /** The stable code of the kind of problem, e.g. `tag-invalid`. */
  get code(): string {
    return this.problem.type.split("#").at(-1) ?? "";
  }
}

/** Nothing that speaks for the server answered: no network, a proxy's page, a time-out. What was sent may have arrived. */
export class Unreachable extends Error {
  constructor(message: string, options?: ErrorOptions) {
    super(message, options);
    this.name = "Unreachable";
  }
}

/** The server answered beside its contract: another version, most likely. What was sent has arrived. */
export class UnexpectedAnswer extends Error {
  readonly operation_id: string;
  /** JSON pointer (RFC 6901) to the place in the answer; empty for the whole of it. */
  readonly pointer: string;

  constructor(operationId: string, pointer: string, what: string) {
    super(`${operationId}: the answer does not fit at ${pointer || "its root"}: ${what}`);
    this.name = "UnexpectedAnswer";
    this.operation_id = operationId;
    this.pointer = pointer;
  }
}
