import { EXIT } from "../exit-codes.ts";
import { loadProfile } from "../home/profile.ts";
import type { Look } from "../output/look.ts";
import { type CommandOutcome, failure } from "../output/outcome.ts";
import { type Delivery, deliverInOrder, keptText, upTo } from "../queue/deliver.ts";
import type { QueueEntry } from "../queue/queue-entry.ts";
import { enqueue, idsIn } from "../queue/queue-folder.ts";
import { clientOf } from "../server-client.ts";

const lines = (...texts: readonly (string | undefined)[]): string => texts.filter(Boolean).join("\n");

/** What earlier results of the seam, sent on the way, had to say. */
const earlierTalk = (earlier: readonly Delivery[]): string[] =>
  earlier.map(({ id, outcome }) =>
    lines(`An earlier result of this seam went first, ${id}:`, outcome.text, outcome.talk),
  );

/** How the queue stands after a push. */
function leftTalk(count: number): string {
  if (count === 0) return "";
  const results = count === 1 ? "1 other result waits" : `${count} other results wait`;
  return `${results} in the queue; send with: beadroll queue send`;
}

/**
 * Records a result: into the queue first, then sent after the earlier ones of its seam. What is said is what came of this
 * one; when an earlier one has to wait, so does it.
 */
export async function pushResult(entry: QueueEntry, look: Look, talk = ""): Promise<CommandOutcome> {
  const client = clientOf(loadProfile());
  const id = await enqueue(entry);
  const deliveries = await deliverInOrder(upTo(id, await idsIn("waiting")), client, look);
  const own = deliveries.find((delivery) => delivery.id === id);
  if (own === undefined) return behind(id, deliveries, talk);
  const earlier = deliveries.filter((delivery) => delivery.id !== id);
  const left = own.fate === "waiting" ? "" : leftTalk((await idsIn("waiting")).length);
  return { ...own.outcome, talk: lines(talk, ...earlierTalk(earlier), own.outcome.talk, left) };
}

/** It waits because an earlier result of its seam does, or because another process is sending it at this moment. */
function behind(id: string, deliveries: readonly Delivery[], talk: string): CommandOutcome {
  const before = deliveries.filter((delivery) => delivery.fate !== "waiting");
  const blocking = deliveries.find((delivery) => delivery.fate === "waiting");
  const detail =
    blocking === undefined
      ? "Another beadroll is sending it at this moment."
      : `An earlier result of this seam has to wait: ${blocking.why}`;
  return failure(
    blocking?.outcome.exit ?? EXIT.queued,
    { error: "queued", detail, queued: id },
    lines(talk, ...earlierTalk(before), detail, keptText(id)),
  );
}
