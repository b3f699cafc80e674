import { parseNumber } from "../number/parse-number.ts";
import { asciiText, BLANK, COMMA, CR, DOT, LF, MINUS, TAB, utf8Text } from "../text/bytes.ts";

/** What JSON can say. */
export type Json = null | boolean | number | string | readonly Json[] | { readonly [name: string]: Json };

/** Where and why bytes stop being JSON. */
export interface JsonFault {
  readonly byte: number;
  /** 1-based line. */
  readonly line: number;
  /** What stands there or is missing. */
  readonly why: string;
  /** True where the text ends too early. */
  readonly isCut: boolean;
}

/** Lists and objects inside one another; a scan needs four. */
const MAX_DEPTH = 64;

const QUOTE = 0x22;
const BACKSLASH = 0x5c;
const COLON = 0x3a;
const OPEN_LIST = 0x5b;
const CLOSE_LIST = 0x5d;
const OPEN_OBJECT = 0x7b;
const CLOSE_OBJECT = 0x7d;

/**
 * Reads JSON (RFC 8259) straight from bytes, so that the first fault has a place: the language's own reader
 * words its messages as the engine likes and mostly keeps the place to itself. Numbers may also be written as in
 * the text layouts (`+1`, `.5`); beyond a double's range they become infinite. Of a name that an object gives
 * twice, the last counts.
 * @param bytes UTF-8
 * @param from first byte
 */
export function readJson(bytes: Uint8Array, from: number): { value: Json } | { fault: JsonFault } {
  const reader = new JsonReader(bytes, from);
  const value = reader.read();
  return reader.fault === null && value !== undefined ? { value } : { fault: reader.fault! };
}

/** Reads one value after the other; `undefined` means that a fault is noted. */
class JsonReader {
  fault: JsonFault | null = null;
  #at: number;
  #depth = 0;
  readonly #from: number;
  readonly #bytes: Uint8Array;

  constructor(bytes: Uint8Array, from: number) {
    this.#bytes = bytes;
    this.#at = from;
    this.#from = from;
  }

  read(): Json | undefined {
    const value = this.#value();
    if (value === undefined) return undefined;
    return this.#peek() === undefined ? value : this.#refuse("the end");
  }

  #value(): Json | undefined {
    const byte = this.#peek();
    switch (byte) {
      case OPEN_LIST:
        return this.#nested(() => this.#list());
      case OPEN_OBJECT:
        return this.#nested(() => this.#object());
      case QUOTE:
        return this.#text();
      default:
        return this.#word();
    }
  }

  #nested(read: () => Json | undefined): Json | undefined {
    if (this.#depth >= MAX_DEPTH) return this.#refuse(`no more than ${MAX_DEPTH} lists inside one another`);
    this.#depth++;
    this.#at++;
    const value = read();
    this.#depth--;
    return value;
  }

  #list(): Json[] | undefined {
    const list: Json[] = [];
    if (this.#takes(CLOSE_LIST)) return list;
    for (;;) {
      const value = this.#value();
      if (value === undefined) return undefined;
      list.push(value);
      if (this.#takes(COMMA)) continue;
      return this.#takes(CLOSE_LIST) ? list : this.#refuse("a comma or ]");
    }
  }

  #object(): { [name: string]: Json } | undefined {
    const entries = new Map<string, Json>();
    if (this.#takes(CLOSE_OBJECT)) return {};
    for (;;) {
      if (this.#peek() !== QUOTE) return this.#refuse("a name in quotes");
      const name = this.#text();
      if (name === undefined) return undefined;
      if (!this.#takes(COLON)) return this.#refuse("a colon");
      const value = this.#value();
      if (value === undefined) return undefined;
      entries.set(name, value);
      if (this.#takes(COMMA)) continue;
      return this.#takes(CLOSE_OBJECT) ? Object.fromEntries(entries) : this.#refuse("a comma or }");
    }
  }

  #text(): string | undefined {
    const bytes = this.#bytes;
    const start = this.#at;
    let end = start + 1;
    while (end < bytes.length && bytes[end] !== QUOTE) end += bytes[end] === BACKSLASH ? 2 : 1;
    if (end >= bytes.length) {
      this.#at = bytes.length;
      return this.#refuse("the end of a text in quotes");
    }
    try {
      const text: unknown = JSON.parse(utf8Text(bytes, start, end + 1));
      this.#at = end + 1;
      return String(text);
    } catch (error) {
      if (error instanceof SyntaxError) return this.#refuse("a text without odd escapes or control signs");
      throw error;
    }
  }

  /** A number, `true`, `false` or `null`. */
  #word(): Json | undefined {
    const bytes = this.#bytes;
    const start = this.#at;
    let end = start;
    while (end < bytes.length && isWordByte(bytes[end]!)) end++;
    const value = parseNumber(bytes, start, end, DOT);
    if (!Number.isNaN(value)) {
      this.#at = end;
      return value;
    }
    const word = asciiText(bytes, start, Math.min(end, start + 400));
    const known = word === "null" ? null : word === "true" ? true : word === "false" ? false : undefined;
    if (known === undefined) {
      if (end >= bytes.length) this.#at = end;
      return this.#refuse("a value");
    }
    this.#at = end;
    return known;
  }

  /** The next byte that is no blank; undefined at the end. */
  #peek(): number | undefined {
    const bytes = this.#bytes;
    let byte = bytes[this.#at];
    while (byte === BLANK || byte === LF || byte === CR || byte === TAB) byte = bytes[++this.#at];
    return byte;
  }

  #takes(byte: number): boolean {
    if (this.#peek() !== byte) return false;
    this.#at++;
    return true;
  }

  #refuse(expected: string): undefined {
    const bytes = this.#bytes;
    const byte = this.#at;
    const isCut = byte >= bytes.length;
    const found = isCut
      ? "the text ends"
      : `"${utf8Text(bytes, byte, Math.min(bytes.length, byte + 12))}" stands`;
    let line = 1;
    for (let at = this.#from; at < byte && at < bytes.length; at++) if (bytes[at] === LF) line++;
    this.fault ??= { byte, line, why: `${found} where ${expected} was expected`, isCut };
  }
}

/** Letters, digits, sign and point: what numbers, `true`, `false` and `null` are made of. */
function isWordByte(byte: number): boolean {
  if (byte >= 0x30 && byte <= 0x39) return true;
  return (byte >= 0x61 && byte <= 0x7a) || byte === 0x45 || byte === 0x2b || byte === MINUS || byte === DOT;
}
