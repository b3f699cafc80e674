import * as contracts from "@beadroll/domain/contract/records.contract";
import type { StoredFile } from "@beadroll/domain/schemas/file";
import { changeContext, type Deps } from "../deps.ts";
import type { ReceivedFile } from "../http/multipart.ts";
import { refusal } from "../http/refusal.ts";
import { type Route, route } from "../http/route.ts";
import { type ChangeContext, change } from "../ledger/change.ts";
import { recordFile } from "./files.store.ts";
import { documentType } from "./media-type.ts";

const COLUMNS = ["digest", "name", "media_type", "size", "created_at"];

async function storeDocument(deps: Deps, context: ChangeContext, file: ReceivedFile): Promise<StoredFile> {
  const media_type = await documentType(deps.store.pathOf(file.digest));
  if (media_type === null)
    throw refusal("file-type-refused", `"${file.name}" is no PDF, PNG or JPEG.`, { field: "file" });
  return change(context, "file.store", async (trx) => {
    await recordFile(trx, context.caller, { ...file, media_type });
    const value: StoredFile = await trx.read("files").where({ digest: file.digest }).first(COLUMNS);
    return { value, subjects: [file.digest] };
  });
}

/** Stored files by their digest. */
export function fileRoutes(deps: Deps): Route[] {
  return [
    route(contracts.uploadFile, (input) => {
      const { file } = input.files;
      if (!file) throw refusal("request-invalid", 'The file part "file" is missing.', { field: "file" });
      return storeDocument(deps, changeContext(deps, input), file);
    }),
    route(contracts.getFile, async ({ params, res }) => {
      const file: StoredFile | undefined = await deps.db
        .reader("files")
        .where({ digest: params.digest })
        .first(COLUMNS);
      if (file === undefined) throw refusal("not-found", "No stored file has that digest.");
      // Uploaded content is never run by the browser: no scripts, no frames of ours around it.
      res.set("Content-Security-Policy", "sandbox; default-src 'none'; style-src 'unsafe-inline'");
      return {
        stream: deps.store.read(file.digest),
        media_type: file.media_type,
        file_name: file.name,
        size: file.size,
        inline: ["application/pdf", "image/png", "image/jpeg"].includes(file.media_type),
      };
    }),
  ];
}
