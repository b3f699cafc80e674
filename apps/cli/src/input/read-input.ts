import { readFile } from "node:fs/promises";
import { EXIT } from "../exit-codes.ts";
import { isSystemError } from "../home/write-whole.ts";
import { stopOnFaults } from "../output/fault-text.ts";
import { stop } from "../output/outcome.ts";

/** A file given on the command line. */
export interface InputFile {
  readonly path: string;
  /** Its name without folders: what the record keeps. */
  readonly name: string;
  readonly bytes: Uint8Array;
}

const WORDS: Readonly<Record<string, string>> = {
  ENOENT: "there is no such file",
  EISDIR: "it is a folder, not a file",
  EACCES: "this user may not read it",
};

/** Reads a file; one that is not there, cannot be read or is empty stops the verb with exit code 2. */
export async function readInput(path: string): Promise<InputFile> {
  let bytes: Uint8Array;
  try {
    bytes = await readFile(path);
  } catch (error) {
    if (!isSystemError(error)) throw error;
    const detail = `${path}: ${WORDS[error.code ?? ""] ?? error.message}`;
    return stop(EXIT.usage, { error: "file-unreadable", detail });
  }
  if (bytes.length === 0)
    return stopOnFaults([{ code: "file-empty", detail: `${path}: the file is empty` }], [path]);
  return { path, name: path.split(/[\\/]/).at(-1) ?? path, bytes };
}
