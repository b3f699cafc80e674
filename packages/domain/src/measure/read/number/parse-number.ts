import { asciiText, DOT, MINUS, PLUS, ZERO } from "../text/bytes.ts";
import { divideLong } from "./divide-long.ts";

const LOWER_E = 0x65;
const UPPER_E = 0x45;

/** 10^0 to 10^22: the powers of ten that a double holds exactly. */
export const POWERS: Float64Array = Float64Array.from({ length: 23 }, (_, n) => Number(`1e${n}`));
export const MAX_POWER = 22;
/** Whole numbers below 2^53 are exact; a mantissa that reaches it may have been rounded on the way. */
export const EXACT_LIMIT: number = 2 ** 53;
/** Beyond this any exponent gives 0 or infinity, whatever the digits; keeps the sum a small integer. */
const EXPONENT_LIMIT = 100_000;

/**
 * The number that bytes spell, equal to `Number(text)` for every decimal number.
 * @param bytes US-ASCII digits: sign, digits, decimal mark, digits, `e`, exponent; no blanks
 * @param start first byte
 * @param end byte after the last
 * @param mark the decimal mark's byte: dot or comma
 * @returns the number; nan where the bytes are not a decimal number (also for `nan`, `inf` and nothing at all)
 *
 * Source: W. D. Clinger, How to read floating point numbers accurately (1990), the case in which mantissa and
 * power of ten are both exact, so that one division or multiplication rounds once; longer mantissas see
 * `divideLong`; the rest is left to Number(). Example: the bytes of `-14.331` give -14.331.
 */
export function parseNumber(bytes: Uint8Array, start: number, end: number, mark: number): number {
  let at = start;
  const sign = bytes[at];
  if (sign === MINUS || sign === PLUS) at++;
  const first = at;
  let mantissa = 0;
  let exponent = 0;
  for (; at < end; at++) {
    const digit = bytes[at]! - ZERO;
    if (digit < 0 || digit > 9) break;
    mantissa = mantissa * 10 + digit;
  }
  let digits = at - first;
  if (at < end && bytes[at] === mark) {
    const fraction = ++at;
    for (; at < end; at++) {
      const digit = bytes[at]! - ZERO;
      if (digit < 0 || digit > 9) break;
      mantissa = mantissa * 10 + digit;
    }
    exponent = fraction - at;
    digits -= exponent;
  }
  if (digits === 0) return Number.NaN;
  const digitsEnd = at;
  if (at < end) {
    const power = parseExponent(bytes, at, end);
    if (Number.isNaN(power)) return Number.NaN;
    exponent += power;
  }
  let size: number;
  if (mantissa < EXACT_LIMIT && exponent >= -MAX_POWER && exponent <= MAX_POWER) {
    size = exponent < 0 ? mantissa / POWERS[-exponent]! : mantissa * POWERS[exponent]!;
  } else {
    size = longNumber(bytes, first, digitsEnd, exponent);
    if (Number.isNaN(size)) return numberOfText(bytes, start, end, mark);
  }
  return sign === MINUS ? -size : size;
}

/** Exponent part from its `e` to `end`; nan where it is none. */
function parseExponent(bytes: Uint8Array, start: number, end: number): number {
  let at = start;
  if (bytes[at] !== LOWER_E && bytes[at] !== UPPER_E) return Number.NaN;
  at++;
  const sign = at < end ? bytes[at] : 0;
  if (sign === MINUS || sign === PLUS) at++;
  if (at >= end) return Number.NaN;
  let power = 0;
  for (; at < end; at++) {
    const digit = bytes[at]! - ZERO;
    if (digit < 0 || digit > 9) return Number.NaN;
    if (power < EXPONENT_LIMIT) power = power * 10 + digit;
  }
  return sign === MINUS ? -power : power;
}

/** Digits that the leading part of a long mantissa may have, so that it is exact, and the trailing part. */
const LEADING_DIGITS = 15;
const TRAILING_DIGITS = 7;

/** A number of 16 to 22 digits and a mark, times a power of ten from -22 to 0; nan where that is not certain. */
function longNumber(bytes: Uint8Array, start: number, end: number, exponent: number): number {
  if (exponent > 0 || exponent < -MAX_POWER) return Number.NaN;
  let leading = 0;
  let trailing = 0;
  let leadingDigits = 0;
  let trailingDigits = 0;
  for (let at = start; at < end; at++) {
    const digit = bytes[at]! - ZERO;
    if (digit < 0 || digit > 9) continue;
    if (leadingDigits < LEADING_DIGITS) {
      leading = leading * 10 + digit;
      if (leading > 0) leadingDigits++;
    } else {
      trailing = trailing * 10 + digit;
      trailingDigits++;
    }
  }
  if (trailingDigits > TRAILING_DIGITS) return Number.NaN;
  return divideLong(leading, POWERS[trailingDigits]!, trailing, POWERS[-exponent]!);
}

/** The slow, always right way, for text already known to be a decimal number. */
function numberOfText(bytes: Uint8Array, start: number, end: number, mark: number): number {
  const text = asciiText(bytes, start, end);
  return Number(mark === DOT ? text : text.replace(String.fromCharCode(mark), "."));
}
