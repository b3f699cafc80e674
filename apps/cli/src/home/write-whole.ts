import { mkdir, open, rename, rm } from "node:fs/promises";
import { dirname } from "node:path";
import { EXIT } from "../exit-codes.ts";
import { stop } from "../output/outcome.ts";

/** An error of the operating system, with its code. */
export const isSystemError = (error: unknown): error is NodeJS.ErrnoException =>
  error instanceof Error && "syscall" in error;

/** Makes a folder's entries durable. Windows has no such call: there a rename is as durable as it gets. */
export async function syncFolder(path: string): Promise<void> {
  if (process.platform === "win32") return;
  const folder = await open(path, "r");
  try {
    await folder.sync();
  } finally {
    await folder.close();
  }
}

async function writeTemporary(path: string, chunks: readonly Uint8Array[]): Promise<void> {
  const file = await open(path, "w", 0o600);
  try {
    for (const chunk of chunks) await file.writeFile(chunk);
    await file.sync();
  } finally {
    await file.close();
  }
}

/**
 * Writes a file whole and durably: temporary beside it, synchronised, renamed, the folder synchronised after it. Other
 * users cannot read it. Stops the verb with exit code 1 when the disk does not take it; nothing is half written then.
 */
export async function writeWhole(path: string, ...chunks: readonly Uint8Array[]): Promise<void> {
  const folder = dirname(path);
  const temporary = `${path}.${process.pid}.tmp`;
  try {
    await mkdir(folder, { recursive: true, mode: 0o700 });
    await writeTemporary(temporary, chunks);
    await rename(temporary, path);
    await syncFolder(folder);
  } catch (error) {
    if (!isSystemError(error)) throw error;
    await rm(temporary, { force: true });
    stop(EXIT.failure, { error: "not-kept", detail: `${path} cannot be written: ${error.message}` });
  }
}
