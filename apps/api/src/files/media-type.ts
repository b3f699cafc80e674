import { createReadStream } from "node:fs";

const SIGNATURES: ReadonlyArray<readonly [media_type: string, bytes: readonly number[]]> = [
  ["application/pdf", [0x25, 0x50, 0x44, 0x46, 0x2d]],
  ["image/png", [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]],
  ["image/jpeg", [0xff, 0xd8, 0xff]],
];

/** The media type that a file's first bytes show: PDF, PNG or JPEG; null for anything else, whatever it calls itself. */
export async function documentType(path: string): Promise<string | null> {
  let head = Buffer.alloc(0);
  for await (const chunk of createReadStream(path, { end: 15 })) head = Buffer.concat([head, chunk]);
  const found = SIGNATURES.find(([, bytes]) => bytes.every((byte, index) => head[index] === byte));
  return found?.[0] ?? null;
}
