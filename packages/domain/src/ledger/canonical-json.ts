import { good, type Outcome, refused } from "../faults/fault.ts";
import { utf8 } from "./utf8.ts";

/** What JSON can say. */
export type JsonValue =
  | null
  | boolean
  | number
  | string
  | readonly JsonValue[]
  | { readonly [name: string]: JsonValue };

/** Deeper nesting is refused rather than left to exhaust the stack. */
const DEEPEST = 256;

/**
 * The one canonical text of a JSON value: members sorted by UTF-16 code units, numbers as ECMAScript prints them,
 * no blanks, no Unicode normalisation.
 * @param value JSON data; members that are `undefined` are left out, as JSON.stringify leaves them out
 * @returns text whose UTF-8 bytes are what gets hashed
 * @throws RangeError for NaN, an infinity, half a surrogate pair, or nesting deeper than 256
 * @throws TypeError for what JSON cannot say (bigint, function, Date, undefined in an array, …); both name the place
 *   as a JSON pointer
 * Source: RFC 8785, section 3.2. Example: `canonicalJson({ b: 1e21, a: "€" })` is `{"a":"€","b":1e+21}`.
 */
export function canonicalJson(value: unknown): string {
  return written(value, [], 0);
}

/** UTF-8 bytes of the canonical text; see `canonicalJson`. */
export function canonicalBytes(value: unknown): Uint8Array {
  return utf8(canonicalJson(value));
}

/**
 * Reads a text that must already be canonical: what a record pack holds and an auditor hashes.
 * @returns the value, or the fault that the text is no JSON or not in canonical form (other member order, blanks,
 *   duplicate members, a number written another way)
 */
export function parseCanonicalJson(text: string): Outcome<JsonValue> {
  let value: JsonValue;
  try {
    value = JSON.parse(text);
    if (canonicalJson(value) === text) return good(value);
  } catch (error) {
    if (!(error instanceof SyntaxError || error instanceof RangeError)) throw error;
    return refused({ code: "proof-invalid", detail: `The entry is not canonical JSON: ${error.message}.` });
  }
  return refused({
    code: "proof-invalid",
    detail: "The entry is JSON but not in the canonical form of RFC 8785, so its hash would not be its own.",
  });
}

type Path = (string | number)[];

function written(value: unknown, path: Path, depth: number): string {
  if (depth > DEEPEST) throw new RangeError(`${place(path)}: expected nesting up to ${DEEPEST}`);
  if (value === null || typeof value === "boolean") return String(value);
  if (typeof value === "number") return writtenNumber(value, path);
  if (typeof value === "string") return writtenString(value, path);
  if (Array.isArray(value))
    return `[${value.map((item, i) => written(item, [...path, i], depth + 1)).join(",")}]`;
  if (isPlainObject(value)) return writtenObject(value, path, depth);
  throw new TypeError(`${place(path)}: expected JSON data, got ${describeType(value)}`);
}

function writtenObject(value: Record<string, unknown>, path: Path, depth: number): string {
  // Without a comparison function, sort compares UTF-16 code units, which is the order RFC 8785, 3.2.3 asks for.
  const names = Object.keys(value)
    .filter((name) => value[name] !== undefined)
    .sort();
  const members = names.map(
    (name) => `${writtenString(name, path)}:${written(value[name], [...path, name], depth + 1)}`,
  );
  return `{${members.join(",")}}`;
}

function writtenNumber(value: number, path: Path): string {
  if (!Number.isFinite(value)) throw new RangeError(`${place(path)}: expected a finite number, got ${value}`);
  return String(value);
}

function writtenString(value: string, path: Path): string {
  // With the u flag only unpaired halves match: whole pairs are read as one character.
  if (/\p{Surrogate}/u.test(value)) {
    throw new RangeError(`${place(path)}: expected whole characters, got half a surrogate pair`);
  }
  return JSON.stringify(value);
}

function isPlainObject(value: unknown): value is Record<string, unknown> {
  if (typeof value !== "object" || value === null) return false;
  const prototype: unknown = Object.getPrototypeOf(value);
  return prototype === null || Object.getPrototypeOf(prototype) === null;
}

function describeType(value: unknown): string {
  return typeof value === "object" && value !== null ? value.constructor.name : typeof value;
}

/** The place as a JSON pointer (RFC 6901), `""` being the whole value. */
function place(path: Path): string {
  const tokens = path.map((token) => `/${String(token).replaceAll("~", "~0").replaceAll("/", "~1")}`);
  return `"${tokens.join("")}"`;
}
