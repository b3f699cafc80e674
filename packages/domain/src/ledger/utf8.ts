/**
 * UTF-8 bytes of a text.
 * @param text well-formed UTF-16
 * @throws RangeError when it holds half a surrogate pair, which has no UTF-8 form
 * Source: RFC 3629, section 3.
 */
export function utf8(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length * 3);
  let end = 0;
  for (let i = 0; i < text.length; i++) {
    const code = text.codePointAt(i)!;
    if (code >= 0xd800 && code <= 0xdfff)
      throw new RangeError(`text: expected whole characters, got half of one at ${i}`);
    if (code > 0xffff) i++;
    end = writeCodePoint(bytes, end, code);
  }
  return bytes.slice(0, end);
}

/** Writes one code point into `bytes` at `at`; gives the place after it. */
function writeCodePoint(bytes: Uint8Array, at: number, code: number): number {
  if (code < 0x80) {
    bytes[at] = code;
    return at + 1;
  }
  const continuation = code < 0x800 ? 1 : code < 0x10000 ? 2 : 3;
  const lead = [0, 0xc0, 0xe0, 0xf0][continuation]!;
  bytes[at] = lead | (code >> (6 * continuation));
  for (let k = 1; k <= continuation; k++) bytes[at + k] = 0x80 | ((code >> (6 * (continuation - k))) & 0x3f);
  return at + continuation + 1;
}
