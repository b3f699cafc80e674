import type { FaultCode } from "./codes.ts";

/** One thing wrong with what came from outside: a file, a field, a record. */
export interface Fault {
  readonly code: FaultCode;
  /** One sentence a person can act on, naming what was found and what was expected. */
  readonly detail: string;
  /** JSON pointer (RFC 6901) into a request body. */
  readonly pointer?: string;
  /** 1-based line of a text file. */
  readonly line?: number;
  /** 0-based byte offset of a binary file. */
  readonly byte?: number;
  readonly field?: string;
  readonly station_mm?: number;
}

/** What a step that reads the world gives back: a value, or every fault found up to a stated number. */
export type Outcome<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly faults: readonly Fault[] };

/** A good outcome. */
export function good<T>(value: T): Outcome<T> {
  return { ok: true, value };
}

/** A refused outcome with its faults; at least one. */
export function refused(...faults: readonly Fault[]): { ok: false; faults: readonly Fault[] } {
  return { ok: false, faults };
}
