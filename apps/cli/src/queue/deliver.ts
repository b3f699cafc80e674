import { ApiProblem, UnexpectedAnswer, Unreachable } from "@beadroll/client/api-problem";
import type { Client } from "@beadroll/client/transport";
import { EXIT } from "../exit-codes.ts";
import type { Look } from "../output/look.ts";
import { type CommandOutcome, failure } from "../output/outcome.ts";
import { receiptExit, receiptText } from "../output/receipt-text.ts";
import {
  callerText,
  isAboutCaller,
  isPassing,
  refusalJson,
  refusalText,
  versionsDiffer,
} from "../server-client.ts";
import { DamagedEntry, type QueueEntry } from "./queue-entry.ts";
import { readWaiting, seamOf, setAside, settle } from "./queue-folder.ts";
import { type Receipt, sendEntry, WrongReceipt } from "./send-entry.ts";

/** What became of an entry: delivered and out of the queue, set aside, or still waiting. */
export interface Delivery {
  readonly id: string;
  readonly fate: "delivered" | "set-aside" | "waiting";
  /** What has to wait with it: its own seam, or everything because the cause is the server's. */
  readonly holds_back?: "seam" | "all";
  /** Why it waits. */
  readonly why?: string;
  readonly outcome: CommandOutcome;
}

/** What keeps an entry waiting: nothing of the server answered, or it did and the entry is not safe there yet. */
type Hindrance = ApiProblem | Unreachable | UnexpectedAnswer | WrongReceipt;

const isHindrance = (error: unknown): error is Hindrance =>
  error instanceof ApiProblem ||
  error instanceof Unreachable ||
  error instanceof UnexpectedAnswer ||
  error instanceof WrongReceipt;

function hindranceCode(error: Hindrance): string {
  if (error instanceof ApiProblem) return error.code;
  return error instanceof Unreachable ? "unreachable" : "unexpected-answer";
}

function hindranceText(error: Hindrance): string {
  if (error instanceof UnexpectedAnswer) return versionsDiffer(error);
  return error instanceof ApiProblem && isAboutCaller(error) ? callerText(error) : error.message;
}

/** Only a fault that this very entry provokes leaves room to believe that another would pass. */
const isOwnFault = (error: Hindrance): boolean =>
  error instanceof ApiProblem ? error.status === 500 : !(error instanceof Unreachable);

/** Where a person finds what was not delivered. */
export const keptText = (id: string): string =>
  `Kept in the queue, nothing is lost: ${id}\nIt goes with the next push of this seam, or now with: beadroll queue send`;

/** Not delivered, not lost. */
function waiting(id: string, error: Hindrance): Delivery {
  const why = hindranceText(error);
  const isCaller = error instanceof ApiProblem && isAboutCaller(error);
  const retry =
    error instanceof ApiProblem && error.retry_after_s !== null ? { retry_after_s: error.retry_after_s } : {};
  const json = { error: hindranceCode(error), detail: why, queued: id, ...retry };
  return {
    id,
    fate: "waiting",
    holds_back: isOwnFault(error) ? "seam" : "all",
    why,
    outcome: failure(isCaller ? EXIT.not_allowed : EXIT.queued, json, `${why}\n${keptText(id)}`),
  };
}

async function refused(id: string, error: ApiProblem): Promise<Delivery> {
  const json = refusalJson(error);
  const path = await setAside(id, json);
  const talk = `${refusalText(error)}\nSet aside with its reason: ${path}`;
  return { id, fate: "set-aside", outcome: failure(EXIT.refused, { ...json, set_aside: path }, talk) };
}

async function damaged(id: string, error: DamagedEntry): Promise<Delivery> {
  const json = { error: "queue-damaged", detail: `${id}: ${error.message}` };
  const path = await setAside(id, json);
  const talk = `This result was damaged on this computer's disk and is not sent: ${json.detail}\nSet aside: ${path}`;
  return { id, fate: "set-aside", outcome: failure(EXIT.failure, { ...json, set_aside: path }, talk) };
}

const received = (receipt: Receipt, look: Look): CommandOutcome => ({
  exit: receiptExit(receipt),
  json: receipt.record,
  text: receiptText(receipt, look),
});

async function attempt(id: string, client: Client, entry: QueueEntry, look: Look): Promise<Delivery> {
  const receipt = await sendEntry(client, entry);
  await settle(id);
  return { id, fate: "delivered", outcome: received(receipt, look) };
}

/** Sends what waits under an id and puts it where it belongs then; null when it waits no longer. */
export async function deliver(id: string, client: Client, look: Look): Promise<Delivery | null> {
  try {
    const entry = await readWaiting(id);
    return entry && (await attempt(id, client, entry, look));
  } catch (error) {
    if (error instanceof DamagedEntry) return damaged(id, error);
    if (error instanceof ApiProblem && !isPassing(error) && !isAboutCaller(error)) return refused(id, error);
    if (!isHindrance(error)) throw error;
    return waiting(id, error);
  }
}

/**
 * Delivers ids oldest first, in order per seam: a later result never overtakes an earlier one of its seam that has to wait.
 * Stops when the cause lies with the server or the key, which would keep every other one waiting too.
 */
export async function deliverInOrder(
  ids: readonly string[],
  client: Client,
  look: Look,
): Promise<Delivery[]> {
  const done: Delivery[] = [];
  const heldBack = new Set<string>();
  for (const id of ids) {
    if (heldBack.has(seamOf(id))) continue;
    const delivery = await deliver(id, client, look);
    if (delivery === null) continue;
    done.push(delivery);
    if (delivery.holds_back === "all") break;
    if (delivery.holds_back === "seam") heldBack.add(seamOf(id));
  }
  return done;
}

/** Ids of the same seam up to and with this one: they go first. */
export function upTo(id: string, waitingIds: readonly string[]): string[] {
  return waitingIds.filter((other) => seamOf(other) === seamOf(id) && other <= id);
}
