import { open, readdir, readFile, rename, rm, stat } from "node:fs/promises";
import { join } from "node:path";
import { homeFolder } from "../home/home-folder.ts";
import { isSystemError, syncFolder, writeWhole } from "../home/write-whole.ts";
import {
  contentDigest,
  decodeEntry,
  decodeHeader,
  encodeEntry,
  type QueueEntry,
  type QueueHeader,
} from "./queue-entry.ts";

/** Folders of the queue: what waits, and what the server refused. */
export const FOLDERS = { waiting: "queue", refused: "refused" } as const;
type Folder = keyof typeof FOLDERS;

const SUFFIX = ".push";
/** Enough of a header for thousands of characters of names. */
const HEADER_BYTES = 65_536;
/** Digits of the digest in an id: two results of one shop that share them do not happen. */
const ID_DIGEST_LENGTH = 16;

const folderPath = (folder: Folder): string => join(homeFolder(), FOLDERS[folder]);
const pathOf = (folder: Folder, id: string, suffix = SUFFIX): string =>
  join(folderPath(folder), `${id}${suffix}`);

/** Ids in a folder, oldest first. */
export async function idsIn(folder: Folder): Promise<string[]> {
  try {
    const names = await readdir(folderPath(folder));
    return names
      .filter((name) => name.endsWith(SUFFIX))
      .map((name) => name.slice(0, -SUFFIX.length))
      .sort();
  } catch (error) {
    if (isSystemError(error) && error.code === "ENOENT") return [];
    throw error;
  }
}

/** The seam that an id is about: `<moment>_<seam>_<kind>_<digest>`. */
export const seamOf = (id: string): string => id.split("_")[1] ?? "";

/** The moment as the beginning of an id; later than every id before it, also when the clock was set back. */
function stampAfter(last: string | undefined, at: string): string {
  const stamp = BigInt(at.replaceAll(/\D/g, ""));
  const before = /^\d+/.exec(last ?? "")?.[0];
  return String(before !== undefined && BigInt(before) >= stamp ? BigInt(before) + 1n : stamp);
}

/** Puts a result into the queue and gives its id; it is on disk when this resolves. The same result waits once. */
export async function enqueue(entry: QueueEntry): Promise<string> {
  const digest = contentDigest(entry).slice(0, ID_DIGEST_LENGTH);
  const waiting = await idsIn("waiting");
  const twin = waiting.find((id) => id.endsWith(`_${digest}`));
  if (twin !== undefined) return twin;
  const id = [stampAfter(waiting.at(-1), entry.queued_at), entry.seam, entry.kind, digest].join("_");
  await writeWhole(pathOf("waiting", id), ...encodeEntry(entry));
  return id;
}

const isGone = (error: unknown): boolean => isSystemError(error) && error.code === "ENOENT";

/** What waits under an id; null when another process has just settled it. @throws DamagedEntry */
export async function readWaiting(id: string): Promise<QueueEntry | null> {
  try {
    return decodeEntry(await readFile(pathOf("waiting", id)));
  } catch (error) {
    if (isGone(error)) return null;
    throw error;
  }
}

/** The header and size of what stands under an id, without reading its files. @throws DamagedEntry */
export async function readHeader(folder: Folder, id: string): Promise<{ header: QueueHeader; size: number }> {
  const path = pathOf(folder, id);
  const file = await open(path, "r");
  try {
    const { bytesRead, buffer } = await file.read(Buffer.alloc(HEADER_BYTES), 0, HEADER_BYTES, 0);
    return { ...decodeHeader(buffer.subarray(0, bytesRead)), size: (await stat(path)).size };
  } finally {
    await file.close();
  }
}

/** Takes an entry out: the server has named its bytes in a receipt. */
export async function settle(id: string): Promise<void> {
  await rm(pathOf("waiting", id), { force: true });
  await syncFolder(folderPath("waiting"));
}

/** Sets an entry aside with the reason beside it; gives its path. The reason is on disk before the entry moves. */
export async function setAside(id: string, reason: unknown): Promise<string> {
  const path = pathOf("refused", id);
  await writeWhole(
    pathOf("refused", id, ".reason.json"),
    new TextEncoder().encode(`${JSON.stringify(reason, null, 2)}\n`),
  );
  try {
    await rename(pathOf("waiting", id), path);
  } catch (error) {
    // Another process sent it at the same moment, was refused too, and has moved it.
    if (!isGone(error)) throw error;
  }
  await syncFolder(folderPath("refused"));
  await syncFolder(folderPath("waiting"));
  return path;
}

/** Why an entry was refused, as it was noted; null when the note is gone or unreadable. */
export async function readReason(id: string): Promise<unknown> {
  try {
    return JSON.parse(await readFile(pathOf("refused", id, ".reason.json"), "utf8"));
  } catch (error) {
    if (isGone(error) || error instanceof SyntaxError) return null;
    throw error;
  }
}
