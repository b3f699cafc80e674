import { refusal } from "../http/refusal.ts";

/** Keeps one person's change from undoing another's. @throws Refusal version-stale */
export function refuseStale(record: { readonly version: number }, seen: number): void {
  if (record.version !== seen)
    throw refusal(
      "version-stale",
      `The record is at version ${record.version}; you changed version ${seen}.`,
    );
}
