import { EXIT, type ExitCode } from "../exit-codes.ts";
import { loadProfile } from "../home/profile.ts";
import type { Look } from "../output/look.ts";
import type { CommandOutcome } from "../output/outcome.ts";
import { type Delivery, deliverInOrder } from "../queue/deliver.ts";
import { idsIn } from "../queue/queue-folder.ts";
import { clientOf } from "../server-client.ts";

/** Of several results the one that needs somebody most, worst first. */
const WORST: readonly ExitCode[] = [EXIT.not_allowed, EXIT.queued, EXIT.failure, EXIT.refused, EXIT.hold];

const worstExit = (deliveries: readonly Delivery[]): ExitCode =>
  WORST.find((code) => deliveries.some(({ outcome }) => outcome.exit === code)) ?? EXIT.done;

const jsonOf = ({ id, fate, outcome }: Delivery): unknown => ({
  id,
  fate,
  exit: outcome.exit,
  answer: outcome.json,
});

/** Sends what waits, oldest first. */
export async function sendQueue(look: Look): Promise<CommandOutcome> {
  const client = clientOf(loadProfile());
  const ids = await idsIn("waiting");
  const deliveries = await deliverInOrder(ids, client, look);
  const sent = deliveries.filter((delivery) => delivery.fate === "delivered");
  const still = (await idsIn("waiting")).length;
  const talk = deliveries
    .filter((delivery) => delivery.fate !== "delivered")
    .map(({ outcome }) => outcome.talk ?? "");
  const summary = ids.length === 0 ? "The queue is empty." : `${sent.length} sent, ${still} waiting.`;
  return {
    exit: worstExit(deliveries),
    json: { results: deliveries.map(jsonOf), waiting: still },
    text: [...sent.map(({ outcome }) => outcome.text), summary].join("\n"),
    talk: talk.join("\n"),
  };
}
