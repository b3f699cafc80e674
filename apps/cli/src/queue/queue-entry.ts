import { createHash } from "node:crypto";
import { z } from "zod";
import type { Fields } from "../input/fields.ts";

/** A file inside a push, under the name of its part in the request. */
export interface QueuedFile {
  readonly part: string;
  readonly name: string;
  readonly bytes: Uint8Array;
}

/** A result on its way to the server. Its file in the queue is this, whole (docs/formats/queue.md). */
export interface QueueEntry {
  readonly kind: "scan" | "pass";
  readonly seam: string;
  readonly fields: Fields;
  readonly files: readonly QueuedFile[];
  /** When it was accepted here, by this computer's clock. */
  readonly queued_at: string;
}

const Header = z.object({
  format: z.literal("beadroll-push-1"),
  kind: z.enum(["scan", "pass"]),
  seam: z.string(),
  fields: z.record(z.string(), z.string()),
  files: z.array(
    z.object({ part: z.string(), name: z.string(), size: z.int().min(0), sha256: z.string().length(64) }),
  ),
  queued_at: z.string(),
});

/** What an entry says of itself in its first line. */
export type QueueHeader = z.infer<typeof Header>;

/** A queue file that is not what was written; nothing of it may be sent. */
export class DamagedEntry extends Error {}

const NEWLINE = 10;

/** SHA-256, hex. */
export const sha256 = (bytes: Uint8Array | string): string =>
  createHash("sha256").update(bytes).digest("hex");

const fileDigests = ({ files }: QueueEntry): string[][] =>
  files.map(({ part, bytes }) => [part, sha256(bytes)]).sort();

/** What a result is: seam, kind, stage and bytes. The same result waits once, whenever and however often it is given. */
export function contentDigest(entry: QueueEntry): string {
  return sha256(JSON.stringify([entry.kind, entry.seam, entry.fields["stage"] ?? "", fileDigests(entry)]));
}

/**
 * The Idempotency-Key of an entry: its content and the fields sent with it, so that every attempt to send it is one request.
 * Given again later, with another time, it is another request, which the server answers with the first record by its bytes.
 */
export function requestKey(entry: QueueEntry): string {
  return sha256(JSON.stringify([contentDigest(entry), Object.entries(entry.fields).sort()]));
}

/** An entry as the pieces of its file: one line of JSON, then the files' bytes one after the other. */
export function encodeEntry(entry: QueueEntry): Uint8Array[] {
  const header: QueueHeader = {
    format: "beadroll-push-1",
    kind: entry.kind,
    seam: entry.seam,
    fields: entry.fields,
    files: entry.files.map(({ part, name, bytes }) => ({
      part,
      name,
      size: bytes.length,
      sha256: sha256(bytes),
    })),
    queued_at: entry.queued_at,
  };
  return [new TextEncoder().encode(`${JSON.stringify(header)}\n`), ...entry.files.map(({ bytes }) => bytes)];
}

/** The first line of a queue file, from its beginning. @throws DamagedEntry when it is none */
export function decodeHeader(bytes: Uint8Array): { header: QueueHeader; length: number } {
  const end = bytes.indexOf(NEWLINE);
  if (end < 0) throw new DamagedEntry("its first line does not end");
  try {
    const text = new TextDecoder("utf-8", { fatal: true }).decode(bytes.subarray(0, end));
    return { header: Header.parse(JSON.parse(text)), length: end + 1 };
  } catch (error) {
    if (!(error instanceof SyntaxError || error instanceof TypeError || error instanceof z.ZodError))
      throw error;
    throw new DamagedEntry("its first line is no header of a push", { cause: error });
  }
}

/** The entry that a file holds. @throws DamagedEntry when a byte of it is not what was written */
export function decodeEntry(bytes: Uint8Array): QueueEntry {
  const { header, length } = decodeHeader(bytes);
  let offset = length;
  const files = header.files.map(({ part, name, size, sha256: digest }) => {
    const content = bytes.subarray(offset, offset + size);
    offset += size;
    if (sha256(content) !== digest)
      throw new DamagedEntry(`the bytes of ${name} are not what was put into the queue`);
    return { part, name, bytes: content };
  });
  if (offset !== bytes.length) throw new DamagedEntry("bytes follow after its last file");
  const { kind, seam, fields, queued_at } = header;
  return { kind, seam, fields, files, queued_at };
}
