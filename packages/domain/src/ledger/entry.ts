import { z } from "zod";
import { canonicalBytes, type JsonValue } from "./canonical-json.ts";
import { leafHash } from "./merkle-tree.ts";
import type { HashFunction } from "./sha256.ts";

const LONGEST_NAME = 200;

/** One thing recorded in the ledger. Its canonical JSON is what is hashed, so no field may be added unversioned. */
export const LedgerEntry = z
  .strictObject({
    seq: z.int().min(0).meta({
      description: "Place in the ledger, from 0, without gaps; also the leaf's index",
      example: 412,
    }),
    at: z
      .string()
      .regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}\.\d{3}Z$/)
      .meta({
        description: "When it was appended, RFC 3339 in UTC with milliseconds",
        example: "2026-11-30T09:41:07.250Z",
      }),
    actor: z.string().min(1).max(LONGEST_NAME).meta({ description: "Who did it", example: "user i.varga" }),
    action: z
      .string()
      .min(1)
      .max(LONGEST_NAME)
      .meta({ description: "What was done", example: "scan.record" }),
    subjects: z
      .array(z.string().min(1).max(LONGEST_NAME))
      .meta({ description: "Tags or ids of what it is about", example: ["S-8K3F7Q2NS"] }),
    body: z
      .record(z.string(), z.json())
      .meta({ description: "What was recorded", example: { verdict: "adapt", file_digest: "9f86d081" } }),
  })
  .meta({ id: "LedgerEntry" });
export type LedgerEntry = z.infer<typeof LedgerEntry>;

/** An entry before it is checked: any members that JSON can say. */
export interface LedgerEntryInput {
  readonly seq: number;
  readonly at: string;
  readonly actor: string;
  readonly action: string;
  readonly subjects: readonly string[];
  readonly body: { readonly [name: string]: JsonValue };
}

/**
 * The bytes of an entry that are hashed: its canonical JSON (RFC 8785) in UTF-8.
 * @throws RangeError or TypeError when the body holds what JSON cannot say
 */
export function entryBytes(entry: LedgerEntryInput): Uint8Array {
  const { seq, at, actor, action, subjects, body } = entry;
  return canonicalBytes({ seq, at, actor, action, subjects, body });
}

/** The entry's leaf hash, H(0x00 ‖ canonical bytes). Source: RFC 9162, 2.1.1; RFC 8785. */
export function entryLeaf(entry: LedgerEntryInput, hash: HashFunction): Uint8Array {
  return leafHash(entryBytes(entry), hash);
}
