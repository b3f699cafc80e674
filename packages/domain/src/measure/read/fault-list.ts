import type { FaultCode } from "../../faults/codes.ts";
import type { Fault } from "../../faults/fault.ts";

/** Faults named at most, over all files of one scan; reading stops when there are so many. */
export const MAX_FAULTS = 10;

/** Longest piece of a file that a fault quotes, in characters. */
const MAX_QUOTE = 40;

/** Where in a file a fault was found. */
export type FaultPlace = Omit<Fault, "code" | "detail">;

/** Collects what is wrong with one file, each fault beginning with the file's name and the place. */
export class FaultList {
  readonly faults: Fault[] = [];
  readonly file: string;

  constructor(file: string) {
    this.file = file;
  }

  /** True when no further fault is wanted. */
  get full(): boolean {
    return this.faults.length >= MAX_FAULTS;
  }

  get any(): boolean {
    return this.faults.length > 0;
  }

  /**
   * Adds one fault, unless the list is full.
   * @param what a sentence without the place, e.g. `column z_mm holds "abc" where a number was expected`
   */
  add(code: FaultCode, what: string, place: FaultPlace = {}): void {
    if (this.full) return;
    this.faults.push({ code, detail: `${this.file}${comma(place)}: ${what}`, ...place });
  }

  /** The list as a refusal. */
  refusal(): { ok: false; faults: readonly Fault[] } {
    return { ok: false, faults: this.faults };
  }
}

function comma(place: FaultPlace): string {
  const words = placeWords(place);
  return words === "" ? "" : `, ${words}`;
}

/** A place as a sentence names it; empty where there is none. */
export function placeWords({ line, byte, pointer }: FaultPlace): string {
  if (line !== undefined) return `line ${line}`;
  if (byte !== undefined) return `byte ${byte}`;
  return pointer ?? "";
}

/** A piece of a file as a fault quotes it: short, printable, in double quotes. */
export function quoted(text: string): string {
  const cut = text.length > MAX_QUOTE ? `${text.slice(0, MAX_QUOTE)}…` : text;
  return `"${cut.replace(/[\p{Cc}\p{Cf}\p{Cs}]/gu, "·")}"`;
}
