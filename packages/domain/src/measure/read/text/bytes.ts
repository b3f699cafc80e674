/** Byte values of the characters that text scans are made of (US-ASCII). */
export const TAB = 0x09;
export const LF = 0x0a;
export const CR = 0x0d;
export const BLANK = 0x20;
export const HASH = 0x23;
export const PLUS = 0x2b;
export const COMMA = 0x2c;
export const MINUS = 0x2d;
export const DOT = 0x2e;
export const SLASH = 0x2f;
export const ZERO = 0x30;
export const SEMICOLON = 0x3b;

const CHUNK = 8192;

/** Bytes as text, one character a byte: right for ASCII, harmless for the rest. */
export function asciiText(bytes: Uint8Array, start: number, end: number): string {
  let text = "";
  for (let at = start; at < end; at += CHUNK) {
    text += String.fromCharCode(...bytes.subarray(at, Math.min(end, at + CHUNK)));
  }
  return text;
}

/** Bytes as UTF-8 text; as one character a byte where they are no UTF-8. */
export function utf8Text(bytes: Uint8Array, start: number, end: number): string {
  const ascii = asciiText(bytes, start, end);
  try {
    return decodeURIComponent(ascii.replace(/[%\u0080-\u00ff]/g, (c) => `%${c.charCodeAt(0).toString(16)}`));
  } catch (error) {
    if (error instanceof URIError) return ascii;
    throw error;
  }
}

/** Place of the first byte after a UTF-8 byte order mark, 0 where there is none. */
export function afterByteOrderMark(bytes: Uint8Array): number {
  return bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? 3 : 0;
}
