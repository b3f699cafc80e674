import { EXIT } from "../exit-codes.ts";
import { columnsText } from "../output/columns.ts";
import { type Look, plain } from "../output/look.ts";
import type { CommandOutcome } from "../output/outcome.ts";
import { DamagedEntry } from "../queue/queue-entry.ts";
import { idsIn, readHeader, readReason } from "../queue/queue-folder.ts";

interface Item {
  readonly id: string;
  readonly kind: string;
  readonly seam: string;
  readonly queued_at: string;
  readonly bytes: number;
  readonly files: readonly string[];
}

async function itemOf(folder: "waiting" | "refused", id: string): Promise<Item> {
  try {
    const { header, size } = await readHeader(folder, id);
    const { kind, seam, queued_at, files } = header;
    return { id, kind, seam, queued_at, bytes: size, files: files.map((file) => file.name) };
  } catch (error) {
    if (!(error instanceof DamagedEntry)) throw error;
    return { id, kind: "damaged", seam: "", queued_at: "", bytes: 0, files: [] };
  }
}

const kilobytes = (bytes: number): string => `${Math.max(1, Math.round(bytes / 1024))} kB`;

const rowOf = (item: Item): string[] => [
  item.kind,
  item.seam,
  item.queued_at,
  kilobytes(item.bytes),
  item.files.join(", "),
  item.id,
];

const HEADS = ["kind", "seam", "since", "size", "files", "id"];

const detailOf = (reason: unknown): string =>
  typeof reason === "object" && reason !== null && "detail" in reason
    ? plain(String(reason.detail))
    : "no reason noted";

/** What waits to be sent, oldest first, and what the server refused. */
export async function listQueue(look: Look): Promise<CommandOutcome> {
  const items = await Promise.all((await idsIn("waiting")).map((id) => itemOf("waiting", id)));
  const refused = await Promise.all(
    (await idsIn("refused")).map(async (id) => ({
      ...(await itemOf("refused", id)),
      reason: await readReason(id),
    })),
  );
  const waitingText = items.length === 0 ? "The queue is empty." : columnsText(HEADS, items.map(rowOf), look);
  const refusedText = refused.map((item) => `  ${item.id}\n    ${detailOf(item.reason)}`);
  return {
    exit: EXIT.done,
    json: { items, refused },
    text: [
      waitingText,
      ...(refused.length > 0 ? ["", `Refused and set aside: ${refused.length}`, ...refusedText] : []),
    ].join("\n"),
  };
}
