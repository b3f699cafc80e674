import { find as findContract } from "@beadroll/domain/contract/records.contract";
import { EXIT } from "../exit-codes.ts";
import { loadProfile } from "../home/profile.ts";
import { columnsText } from "../output/columns.ts";
import type { Look } from "../output/look.ts";
import { type CommandOutcome, stop } from "../output/outcome.ts";
import { asking, clientOf } from "../server-client.ts";

/** As the operation has it. */
const LONGEST = 200;
const HEADS = ["kind", "tag", "title", "detail"];

/** Searches tags, serials, heats, lots, names, drawings and orders. */
export async function find(words: readonly string[], look: Look): Promise<CommandOutcome> {
  const q = words.join(" ").trim();
  if (q.length === 0 || q.length > LONGEST)
    return stop(EXIT.usage, {
      error: "usage",
      detail: `Expected 1 to ${LONGEST} characters to look for, got ${q.length}.`,
    });
  const { items } = await asking(() => clientOf(loadProfile()).call(findContract, { query: { q } }));
  const rows = items.map(({ kind, tag, title, detail }) => [kind, tag ?? "", title, detail]);
  return {
    exit: EXIT.done,
    json: { items },
    text: rows.length === 0 ? `Nothing here is called "${q}".` : columnsText(HEADS, rows, look),
  };
}
