import type { Client, Exchange } from "@beadroll/client/transport";
import { pushPass, pushScan } from "@beadroll/domain/contract/seams.contract";
import { PassCreate, type PassRecord } from "@beadroll/domain/schemas/pass";
import { ScanCreate, type ScanPage } from "@beadroll/domain/schemas/scan";
import { DamagedEntry, type QueueEntry, requestKey, sha256 } from "./queue-entry.ts";

/** What the server answered to a push. */
export type Receipt =
  | { readonly kind: "scan"; readonly record: ScanPage; readonly is_repeat: boolean }
  | { readonly kind: "pass"; readonly record: PassRecord; readonly is_repeat: boolean };

/** The server's receipt names other bytes than were sent: what was sent is not safe there. */
export class WrongReceipt extends Error {}

interface SentPart {
  readonly name: string;
  readonly bytes: Blob;
}

function partOf(entry: QueueEntry, part: string): SentPart | undefined {
  const file = entry.files.find((one) => one.part === part);
  // A copy, because a Blob takes an ArrayBuffer of its own.
  return file && { name: file.name, bytes: new Blob([Uint8Array.from(file.bytes)]) };
}

function neededPart(entry: QueueEntry, part: string): SentPart {
  const file = partOf(entry, part);
  if (file === undefined) throw new DamagedEntry(`it holds no ${part}`);
  return file;
}

function checkDigest(entry: QueueEntry, part: string, named: string | null): void {
  const file = entry.files.find((one) => one.part === part);
  if (file !== undefined && sha256(file.bytes) !== named)
    throw new WrongReceipt(`The server's receipt names other bytes than those of ${file.name}.`);
}

const isRepeat = (answer: Exchange<unknown>, kept: string, sent: string | undefined): boolean =>
  answer.replayed || (sent !== undefined && Date.parse(kept) !== Date.parse(sent));

async function sendScan(client: Client, entry: QueueEntry): Promise<Receipt> {
  const poses = partOf(entry, "poses");
  const answer = await client.exchange(pushScan, {
    params: { tag: entry.seam },
    body: ScanCreate.parse(entry.fields),
    files: { scan: neededPart(entry, "scan"), ...(poses && { poses }) },
    idempotency_key: requestKey(entry),
  });
  const record = answer.data;
  checkDigest(entry, "scan", record.file_digest);
  checkDigest(entry, "poses", record.poses_digest);
  return { kind: "scan", record, is_repeat: isRepeat(answer, record.taken_at, entry.fields["taken_at"]) };
}

async function sendPass(client: Client, entry: QueueEntry): Promise<Receipt> {
  const answer = await client.exchange(pushPass, {
    params: { tag: entry.seam },
    body: PassCreate.parse(entry.fields),
    files: { log: neededPart(entry, "log") },
    idempotency_key: requestKey(entry),
  });
  const record = answer.data;
  checkDigest(entry, "log", record.file_digest);
  return { kind: "pass", record, is_repeat: isRepeat(answer, record.started_at, entry.fields["started_at"]) };
}

/**
 * Sends one entry and holds the receipt against the bytes sent.
 * @throws what the client throws, and WrongReceipt
 */
export function sendEntry(client: Client, entry: QueueEntry): Promise<Receipt> {
  return entry.kind === "scan" ? sendScan(client, entry) : sendPass(client, entry);
}
