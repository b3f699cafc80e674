import { type Outcome, refused } from "../faults/fault.ts";
import type { PassLog } from "./pass-log.ts";
import { readPassLogCsv } from "./read-pass-log-csv.ts";
import { readPassLogJson } from "./read-pass-log-json.ts";

/** Larger logs are refused: an hour at 500 Hz, or three minutes at 10 kHz, with five columns is smaller. */
export const PASS_LOG_BYTES_MAX = 64 * 1024 * 1024;

/** A file as it came. */
export interface LogFile {
  /** Name as sent; used in messages only, the content tells the format. */
  readonly name: string;
  readonly bytes: Uint8Array;
}

/**
 * Reads a weld log, CSV or JSON, as docs/formats/pass-log.md describes it: columns by name and unit, separated by
 * comma, semicolon or tab, decimal comma where the comma does not separate, `#` comments, UTF-8 with or without mark.
 * Columns that are not known are passed over. Units are converted here and nowhere else.
 * @returns the log, or up to 20 faults with line and column: `file-empty`, `file-format-unknown`, `file-too-large`,
 *   `file-header-invalid`, `file-column-missing`, `file-value-invalid`, `file-truncated`, `log-clock-reset`
 */
export function readPassLog({ name, bytes }: LogFile): Outcome<PassLog> {
  if (bytes.length > PASS_LOG_BYTES_MAX) {
    const detail = `${name} has ${bytes.length} bytes; a pass log may have up to ${PASS_LOG_BYTES_MAX}.`;
    return refused({ code: "file-too-large", detail });
  }
  const text = latin1(withoutMark(bytes));
  if (text.trim() === "") return refused({ code: "file-empty", detail: `${name} has no content.` });
  if (text.includes("\u0000")) {
    const detail = `${name} is no text in UTF-8: a pass log is CSV or JSON.`;
    return refused({ code: "file-format-unknown", detail });
  }
  return /^\s*[{[]/.test(text) ? readPassLogJson(text) : readPassLogCsv(text, fromUtf8);
}

/** Without the byte order mark that some programs put before UTF-8. */
function withoutMark(bytes: Uint8Array): Uint8Array {
  return bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? bytes.subarray(3) : bytes;
}

/** One UTF-16 unit a byte: all that is read from a log is ASCII, and this is the fastest way to it. */
function latin1(bytes: Uint8Array): string {
  const parts: string[] = [];
  for (let at = 0; at < bytes.length; at += 8192) {
    parts.push(String.fromCharCode(...bytes.subarray(at, at + 8192)));
  }
  return parts.join("");
}

/** A cell as a person sees it; bytes that are no UTF-8 stay as they are. */
function fromUtf8(cell: string): string {
  if (!/[\u0080-\u00ff]/.test(cell)) return cell;
  const escaped = cell.replace(/[%\u0080-\u00ff]/g, (byte) => `%${byte.charCodeAt(0).toString(16)}`);
  try {
    return decodeURIComponent(escaped);
  } catch (error) {
    if (error instanceof URIError) return cell;
    throw error;
  }
}
