import { existsSync, readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";

const besideTheRepository = fileURLToPath(new URL("../../../../shared", import.meta.url));

/**
 * Text of a reference file that is kept outside this repository because its licence or size keeps it out.
 * @param path below the shared folder, e.g. `reference/vectors/jcs/documents.json`
 * @returns undefined, with one line on the console, where the folder is absent
 */
export function readShared(path: string): string | undefined {
  const file = `${process.env["BEADROLL_SHARED"] ?? besideTheRepository}/${path}`;
  if (existsSync(file)) return readFileSync(file, "utf8");
  console.error(`passed over: ${path} is not here (set BEADROLL_SHARED to the folder that holds it)`);
  return undefined;
}

/**
 * Bytes of a file that is kept outside this repository, as `readShared` gives its text.
 * @param path below the shared folder, e.g. `data/scans/02-butt-v-hilo/cloud.ply`
 * @returns undefined, with one line on the console, where the folder is absent
 */
export function readSharedBytes(path: string): Uint8Array | undefined {
  const file = `${process.env["BEADROLL_SHARED"] ?? besideTheRepository}/${path}`;
  if (existsSync(file)) return new Uint8Array(readFileSync(file));
  console.error(`passed over: ${path} is not here (set BEADROLL_SHARED to the folder that holds it)`);
  return undefined;
}
