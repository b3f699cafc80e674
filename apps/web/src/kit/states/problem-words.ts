import { Unreachable } from "@beadroll/client/api-problem";
import { FAULT_KINDS, type FaultCode } from "@beadroll/domain/faults/codes";
import { Problem } from "@beadroll/domain/schemas/problem";
import { pathOfPointer } from "../forms/json-pointer.ts";

/** One fault: where it is in words, where it is as a field's path, and what is wrong. */
export interface FaultWords {
  readonly place: string | null;
  readonly path: string | null;
  readonly detail: string;
}

/** What a fault panel says: what happened, each fault with its place, what is safe and what to do. */
export interface ProblemWords {
  readonly title: string;
  readonly detail: string;
  readonly faults: readonly FaultWords[];
  readonly safe: string;
  readonly todo: string;
  /** The request's id, for whoever reads the server's log. */
  readonly request_id: string | null;
}

const NOT_REACHED: ProblemWords = {
  title: "The server did not answer",
  detail: "The request left this screen and no answer came back.",
  faults: [],
  safe: "What is recorded is safe. What you typed here is kept on this screen.",
  todo: "Check the network, then try again.",
  request_id: null,
};

const UNKNOWN: ProblemWords = {
  title: "This part of the page failed",
  detail: "The program met something it was not written for.",
  faults: [],
  safe: "Nothing was changed by it.",
  todo: "Try again. If it comes back, tell your administrator what you did before it.",
  request_id: null,
};

/** The plain words for whatever was thrown: a problem document, a network fault, or a fault of ours. */
export function problemFrom(error: unknown): ProblemWords {
  const carried = error instanceof Error && "problem" in error ? error.problem : error;
  const parsed = Problem.safeParse(carried);
  if (parsed.success) return problemWords(parsed.data);
  if (error instanceof Unreachable) return NOT_REACHED;
  if (error instanceof TypeError && /fetch|network|load failed/i.test(error.message)) return NOT_REACHED;
  return UNKNOWN;
}

/** The plain words of a problem document (RFC 9457). */
export function problemWords(problem: Problem): ProblemWords {
  const code = problem.type.split("#").at(-1) ?? "";
  return {
    title: problem.title,
    detail: problem.detail,
    faults: problem.errors.map((fault) => ({
      place: placeOf(fault),
      path: fault.pointer === undefined ? null : pathOfPointer(fault.pointer),
      detail: fault.detail,
    })),
    safe: safeSentence(problem.status),
    todo: isFaultCode(code) ? FAULT_KINDS[code].help : UNKNOWN.todo,
    request_id: problem.instance,
  };
}

function isFaultCode(code: string): code is FaultCode {
  return Object.hasOwn(FAULT_KINDS, code);
}

function safeSentence(status: number): string {
  if (status === 401) return "Nothing was changed. What you typed here is kept on this screen.";
  if (status === 409 || status === 412) return "Nothing was overwritten. What you typed is still here.";
  return "Nothing was changed. What you typed is still here.";
}

function placeOf(fault: Problem["errors"][number]): string | null {
  const parts = [
    fault.line === undefined ? null : `line ${fault.line}`,
    fault.byte === undefined ? null : `byte ${fault.byte}`,
    fault.field ?? null,
    fault.station_mm === undefined ? null : `at ${fault.station_mm} mm`,
  ].filter((part) => part !== null);
  if (parts.length > 0) return parts.join(", ");
  return fault.pointer === undefined || fault.pointer === ""
    ? null
    : pathOfPointer(fault.pointer).replaceAll(".", ", ");
}
