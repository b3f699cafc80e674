import { createHash, randomUUID } from "node:crypto";
import { createReadStream, createWriteStream } from "node:fs";
import { mkdir, open, rename, rm, stat } from "node:fs/promises";
import { dirname, join } from "node:path";
import { type Readable, Transform } from "node:stream";
import { pipeline } from "node:stream/promises";

/** Bytes taken in: their digest and size. */
export interface KeptBytes {
  readonly digest: string;
  readonly size: number;
}

/** Where files are kept, by SHA-256. The bytes of an address never change, so keeping twice is keeping once. */
export interface FileStore {
  /** Streams bytes in; they are durable when this resolves. */
  keep(bytes: Readable): Promise<KeptBytes>;
  /** The bytes of an address. @throws Error with code ENOENT when there are none */
  read(digest: string): Readable;
  /** Path of the bytes on this machine, for worker threads. */
  pathOf(digest: string): string;
}

async function syncFolder(path: string): Promise<void> {
  const folder = await open(path, "r");
  try {
    await folder.sync();
  } finally {
    await folder.close();
  }
}

async function exists(path: string): Promise<boolean> {
  try {
    await stat(path);
    return true;
  } catch (error) {
    if (error instanceof Error && "code" in error && error.code === "ENOENT") return false;
    throw error;
  }
}

/** A store in a folder: `ab/abcdef…`, written whole (temporary file, fsync, rename, fsync of the folder). */
export function folderStore(root: string): FileStore {
  const incoming = join(root, "incoming");
  const pathOf = (digest: string): string => join(root, digest.slice(0, 2), digest);

  async function settle(temporary: string, digest: string): Promise<void> {
    const path = pathOf(digest);
    if (await exists(path)) return;
    await mkdir(dirname(path), { recursive: true });
    await rename(temporary, path);
    await syncFolder(dirname(path));
  }

  return {
    pathOf,
    read: (digest) => createReadStream(pathOf(digest)),
    keep: async (bytes) => {
      await mkdir(incoming, { recursive: true });
      const temporary = join(incoming, randomUUID());
      const hash = createHash("sha256");
      let size = 0;
      const meter = new Transform({
        transform(chunk: Buffer, _encoding, done) {
          hash.update(chunk);
          size += chunk.length;
          done(null, chunk);
        },
      });
      try {
        await pipeline(bytes, meter, createWriteStream(temporary, { flush: true }));
        const digest = hash.digest("hex");
        await settle(temporary, digest);
        return { digest, size };
      } finally {
        await rm(temporary, { force: true });
      }
    },
  };
}
