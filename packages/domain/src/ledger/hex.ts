/** Bytes as lower-case hex digits, two a byte. */
export function toHex(bytes: Uint8Array): string {
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, "0")).join("");
}

/**
 * Bytes from hex digits of either case.
 * @throws RangeError for an odd number of digits or anything that is no hex digit
 */
export function fromHex(text: string): Uint8Array {
  if (!/^(?:[0-9a-fA-F]{2})*$/.test(text))
    throw new RangeError(`text: expected pairs of hex digits, got "${text}"`);
  return Uint8Array.from({ length: text.length / 2 }, (_, i) =>
    Number.parseInt(text.slice(2 * i, 2 * i + 2), 16),
  );
}

/** Whether two byte strings are the same, length included. Hashes are compared whole, never a part of them. */
export function sameBytes(a: Uint8Array, b: Uint8Array): boolean {
  return a.length === b.length && a.every((byte, i) => byte === b[i]);
}
