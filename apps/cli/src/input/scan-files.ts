import { existsSync } from "node:fs";
import { dirname, join } from "node:path";
import { gunzipSync } from "node:zlib";
import type { Outcome } from "@beadroll/domain/faults/fault";
import { readScan } from "@beadroll/domain/measure/read/read-scan";
import type { LengthUnit, ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import { type InputFile, readInput } from "./read-input.ts";

/** Options that name a scan. */
export interface ScanOptions {
  readonly scan: string;
  readonly poses?: string;
  readonly units: LengthUnit;
}

/** The files of a scan as they came, and how the poses were found. */
export interface ScanFiles {
  readonly scan: InputFile;
  readonly poses: InputFile | null;
  /** A word for stderr when the poses were not named; empty otherwise. */
  readonly talk: string;
}

/** Largest size that a packed file may unfold to. */
const UNFOLDED_MAX_BYTES = 2 ** 30;
const POSES_BESIDE = ["poses.csv", "poses.csv.gz"];

/**
 * Reads the points of a scan; files are named by their paths in what is wrong with them.
 * @returns what the reader of packages/domain gives
 */
export function readPoints(scan: InputFile, poses: InputFile | null, units: LengthUnit): Outcome<ScanCloud> {
  return readScan({
    name: scan.path,
    bytes: scan.bytes,
    units,
    ...(poses && { poses: { name: poses.path, bytes: poses.bytes } }),
    gunzip: (bytes) => gunzipSync(bytes, { maxOutputLength: UNFOLDED_MAX_BYTES }),
  });
}

/** Whether a scan is profiles that lack their poses: the reader knows, whatever the file is called. */
function lacksPoses(scan: InputFile, units: LengthUnit): boolean {
  const outcome = readPoints(scan, null, units);
  return !outcome.ok && outcome.faults.some((fault) => fault.code === "scan-poses-missing");
}

/** Reads the files of a scan. Profiles whose poses are not named get the poses.csv that lies beside them. */
export async function readScanFiles(options: ScanOptions): Promise<ScanFiles> {
  const scan = await readInput(options.scan);
  if (options.poses !== undefined) return { scan, poses: await readInput(options.poses), talk: "" };
  const folder = dirname(options.scan);
  const beside = POSES_BESIDE.map((name) => join(folder, name)).find((path) => existsSync(path));
  if (beside === undefined || !lacksPoses(scan, options.units)) return { scan, poses: null, talk: "" };
  return { scan, poses: await readInput(beside), talk: `Poses taken from ${beside}` };
}
