import type { Caller } from "../auth/caller.ts";
import { actorName } from "../auth/caller.ts";
import type { ReceivedFile } from "../http/multipart.ts";
import type { ChangeTrx } from "../ledger/change.ts";

/** Records a kept file; the same bytes are recorded once, under the name they first came with. */
export async function recordFile(trx: ChangeTrx, caller: Caller, file: ReceivedFile): Promise<void> {
  const known: unknown = await trx.read("files").where({ digest: file.digest }).first("digest");
  if (known !== undefined) return;
  await trx.insert("files", {
    digest: file.digest,
    name: file.name,
    media_type: file.media_type,
    size: file.size,
    created_at: trx.at,
    created_by: actorName(caller),
  });
}
