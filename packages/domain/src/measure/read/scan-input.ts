import type { LengthUnit } from "../scan-cloud.ts";
import type { FaultList } from "./fault-list.ts";

/** A file as it came: its name, for messages and as a hint, and its bytes. */
export interface ScanFile {
  readonly name: string;
  readonly bytes: Uint8Array;
}

/** A scan as it came, with what the files themselves do not say. */
export interface ScanInput extends ScanFile {
  /** Unit of every length in the scan. */
  readonly units: LengthUnit;
  /** Poses of the profiles; needed by profiles that do not carry them, passed over by a cloud. */
  readonly poses?: ScanFile | undefined;
  /** Unit of every length in the poses; the scan's where it is absent. */
  readonly poses_units?: LengthUnit | undefined;
  /** Unpacks gzip (RFC 1952) and throws where it cannot; without it a packed file is refused. */
  readonly gunzip?: ((bytes: Uint8Array) => Uint8Array) | undefined;
}

/** A file being read: unpacked, with the faults found in it so far. */
export interface OpenFile {
  readonly name: string;
  readonly bytes: Uint8Array;
  /** Where the content begins: after a byte order mark. */
  readonly from: number;
  readonly units: LengthUnit;
  readonly faults: FaultList;
}
