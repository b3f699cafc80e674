import { FAULT_KINDS } from "@beadroll/domain/faults/codes";
import type { Fault } from "@beadroll/domain/faults/fault";
import type { Problem } from "@beadroll/domain/schemas/problem";
import type { Response } from "express";

/** The problem document of a refusal. The first fault gives the kind; all are listed. */
export function problemOf(faults: readonly [Fault, ...Fault[]], requestId: string): Problem {
  const [first] = faults;
  const kind = FAULT_KINDS[first.code];
  return {
    type: `/docs/api/problems#${first.code}`,
    title: kind.title,
    status: kind.status,
    detail: first.detail,
    instance: requestId,
    errors: faults.map((fault) => ({ ...fault })),
  };
}

/** Answers with a problem document (RFC 9457). */
export function sendProblem(res: Response, faults: readonly [Fault, ...Fault[]]): void {
  const problem = problemOf(faults, String(res.locals["request_id"] ?? ""));
  res.status(problem.status).type("application/problem+json").send(JSON.stringify(problem));
}
