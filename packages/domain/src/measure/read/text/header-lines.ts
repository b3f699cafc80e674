import { CR, LF, utf8Text } from "./bytes.ts";

/** Longer lines are no header: what follows is something else, such as a binary body. */
const MAX_LINE = 65_536;

/** Walks through the lines of a text header that a body of text or bytes follows. */
export class HeaderLines {
  /** 1-based line of the text that `next` gave. */
  line = 0;
  /** Where the next line begins. */
  at: number;
  readonly bytes: Uint8Array;

  constructor(bytes: Uint8Array, from = 0) {
    this.bytes = bytes;
    this.at = from;
  }

  /** The next line without its end and outer blanks; null at the end of the file. Ends with LF, CR LF or CR. */
  next(): string | null {
    const { bytes, at } = this;
    if (at >= bytes.length) return null;
    let end = at;
    const limit = Math.min(bytes.length, at + MAX_LINE);
    while (end < limit && bytes[end] !== LF && bytes[end] !== CR) end++;
    this.line++;
    this.at = bytes[end] === CR && bytes[end + 1] === LF ? end + 2 : end + 1;
    return utf8Text(bytes, at, end).trim();
  }
}

/** A whole number as a header writes it, 0 or more; null for anything else. */
export function wholeNumber(text: string | undefined): number | null {
  if (text === undefined || !/^\d{1,15}$/.test(text)) return null;
  return Number(text);
}
