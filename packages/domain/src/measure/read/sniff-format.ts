import { isPcdLine } from "./pcd/pcd-header.ts";
import { asciiText, CR, LF, TAB } from "./text/bytes.ts";

/** What a file's content says it is. */
export type ScanFormat = "ply" | "pcd" | "json" | "table" | "gzip" | "utf16" | "unknown";

/** Bytes looked at to tell text from bytes, and a PCD header from a table. */
const SNIFFED = 4096;
const FIRST_PRINTABLE = 0x20;

/** True for a file that begins as gzip does (RFC 1952, section 2.3.1). */
export function isGzip(bytes: Uint8Array): boolean {
  return bytes[0] === 0x1f && bytes[1] === 0x8b;
}

/**
 * Finds the format of a file: from its first bytes, and from the ending of its name where these say nothing.
 * @param from where the content begins, after a byte order mark
 */
export function sniffFormat(name: string, bytes: Uint8Array, from: number): ScanFormat {
  if (isGzip(bytes)) return "gzip";
  if ((bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff)) return "utf16";
  const text = asciiText(bytes, from, Math.min(bytes.length, from + SNIFFED));
  if (/^ply\s*[\r\n]/.test(text)) return "ply";
  if (isPcd(text)) return "pcd";
  const ending = /\.(\w+)$/.exec(name)?.[1]?.toLowerCase();
  if (ending === "ply" || ending === "pcd") return ending;
  if (!isText(bytes, from)) return "unknown";
  if (ending === "json" || /^\s*[{[]/.test(text)) return "json";
  return "table";
}

/** True where the first line that is no comment is one of a PCD header. */
function isPcd(text: string): boolean {
  for (const line of text.split(/\r\n|\r|\n/)) {
    if (isPcdLine(line)) return true;
    if (line.trim() !== "" && !line.startsWith("#")) return false;
  }
  return false;
}

function isText(bytes: Uint8Array, from: number): boolean {
  for (let at = from; at < bytes.length && at < from + SNIFFED; at++) {
    const byte = bytes[at]!;
    if (byte < FIRST_PRINTABLE && byte !== TAB && byte !== LF && byte !== CR) return false;
  }
  return true;
}

/** True where the content is only blanks and line ends. */
export function isBlankText(bytes: Uint8Array, from: number): boolean {
  for (let at = from; at < bytes.length; at++) {
    const byte = bytes[at]!;
    if (byte !== FIRST_PRINTABLE && byte !== TAB && byte !== LF && byte !== CR) return false;
  }
  return true;
}
