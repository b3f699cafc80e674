import type { LengthUnit } from "../scan-cloud.ts";
import { FaultList } from "./fault-list.ts";
import type { OpenFile, ScanFile, ScanInput } from "./scan-input.ts";
import { isBlankText, isGzip } from "./sniff-format.ts";
import { afterByteOrderMark } from "./text/bytes.ts";

/** Bytes that a file may have, unpacked: 1 GiB. */
const MAX_BYTES = 2 ** 30;

/** Opens a file: unpacks it where it is packed, and notes as a fault that it is empty or cannot be unpacked. */
export function openFile(file: ScanFile, units: LengthUnit, gunzip: ScanInput["gunzip"]): OpenFile {
  const faults = new FaultList(file.name);
  const bytes = unpacked(file.bytes, gunzip, faults);
  const from = afterByteOrderMark(bytes);
  if (bytes.length > MAX_BYTES) {
    faults.add("file-too-large", `it has ${bytes.length} bytes, at most ${MAX_BYTES} are read`);
  } else if (!faults.any && isBlankText(bytes, from)) {
    faults.add("file-empty", bytes.length === 0 ? "it has no byte" : "it holds only blanks");
  }
  return { name: file.name.replace(/\.gz$/i, ""), bytes, from, units, faults };
}

function unpacked(bytes: Uint8Array, gunzip: ScanInput["gunzip"], faults: FaultList): Uint8Array {
  if (!isGzip(bytes)) return bytes;
  if (gunzip === undefined) {
    faults.add("file-compressed", "it is packed with gzip, which cannot be unpacked here", { byte: 0 });
    return bytes;
  }
  try {
    return gunzip(bytes);
  } catch (error) {
    // The unpacker is the caller's: whatever it throws says that these bytes are no whole gzip file.
    const why = error instanceof Error ? error.message : String(error);
    faults.add("file-truncated", `it is packed with gzip and cannot be unpacked: ${why}`, { byte: 0 });
    return bytes;
  }
}
