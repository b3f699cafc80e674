import { EXIT } from "../exit-codes.ts";
import { loadProfile } from "../home/profile.ts";
import type { Look } from "../output/look.ts";
import type { CommandOutcome } from "../output/outcome.ts";
import { type Delivery, deliverInOrder, upTo } from "../queue/deliver.ts";
import type { QueueEntry } from "../queue/queue-entry.ts";
import { enqueue, idsIn } from "../queue/queue-folder.ts";
import { clientOf } from "../server-client.ts";

const lines = (...texts: readonly (string | undefined)[]): string => texts.filter(Boolean).join("\n");

/** What earlier results of the seam, sent on the way, had to say. */
const earlierTalk = (earlier: readonly Delivery[]): string[] =>
  earlier.map(({ id, outcome }) => lines(`Sent first, ${id}:`, outcome.text, outcome.talk));

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
  const earlier = deliveries.filter((delivery) => delivery.id !== id);
  const left = own?.fate === "waiting" ? "" : leftTalk((await idsIn("waiting")).length);
  if (own !== undefined)
    return { ...own.outcome, talk: lines(talk, ...earlierTalk(earlier), own.outcome.talk, left) };
  const blocking = deliveries.at(-1);
  const detail = blocking?.outcome.talk ?? "another beadroll is sending it at this moment";
  return {
    exit: blocking?.outcome.exit ?? EXIT.queued,
    json: { error: "queued", detail, queued: id },
    text: "",
    talk: lines(
      talk,
      ...earlierTalk(earlier),
      `Kept in the queue behind an earlier result of its seam: ${id}`,
    ),
  };
}
