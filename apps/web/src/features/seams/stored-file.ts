import { getFile } from "@beadroll/domain/contract/records.contract";
import { api } from "../../app/client.ts";
import { toast } from "../../kit/states/announcements.ts";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { saveFile } from "../../kit/tables/save-file.ts";

/** Fetches a stored file with the session's token and hands it to the browser to save. */
export async function saveStoredFile(digest: string, name: string): Promise<void> {
  try {
    saveFile(await api.call(getFile, { params: { digest } }), name);
  } catch (error) {
    toast(`${name} could not be fetched. ${problemFrom(error).title}.`, "attend");
  }
}
