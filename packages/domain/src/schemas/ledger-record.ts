import { z } from "zod";
import { digest, instant } from "./quantities.ts";

/** A ledger entry as the API shows it. */
export const LedgerRecord = z
  .object({
    seq: z.int().meta({ description: "Place in the ledger, from 0", example: 412 }),
    at: instant("When it was appended"),
    actor: z.string().meta({ description: "Who did it", example: "user i.varga" }),
    action: z.string().meta({ description: "What was done", example: "scan.record" }),
    subjects: z.array(z.string()).meta({ description: "Tags or ids of what it is about" }),
    body: z.record(z.string(), z.unknown()).meta({ description: "What was recorded" }),
    leaf_hash: digest("Leaf hash (RFC 9162) of the canonical entry (RFC 8785)"),
  })
  .meta({ id: "LedgerRecord" });
export type LedgerRecord = z.infer<typeof LedgerRecord>;
