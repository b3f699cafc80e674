import type { FormValues } from "./form-values.ts";

/** What somebody typed and did not send, kept in this browser so that a sign-out or a crash loses nothing. */
export interface Draft {
  readonly saved_at: string;
  readonly values: FormValues;
}

/** The part of the browser's storage that drafts need. */
export type DraftStorage = Pick<Storage, "getItem" | "setItem" | "removeItem">;

const keyOf = (name: string) => `beadroll.draft.${name}`;

/** The draft kept under a name; null where there is none or it cannot be read. */
export function readDraft(storage: DraftStorage, name: string): Draft | null {
  try {
    const kept: unknown = JSON.parse(storage.getItem(keyOf(name)) ?? "null");
    return isDraft(kept) ? kept : null;
  } catch {
    return null; // Storage is refused, or the text was written by something else.
  }
}

/** Keeps a draft. Answers whether it was kept: storage may be full or refused. */
export function writeDraft(storage: DraftStorage, name: string, draft: Draft): boolean {
  try {
    storage.setItem(keyOf(name), JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

/** Forgets a draft, once its content was sent or thrown away. */
export function dropDraft(storage: DraftStorage, name: string): void {
  try {
    storage.removeItem(keyOf(name));
  } catch {
    // Storage is refused: there was no draft either.
  }
}

function isDraft(value: unknown): value is Draft {
  return (
    typeof value === "object" &&
    value !== null &&
    "saved_at" in value &&
    typeof value.saved_at === "string" &&
    "values" in value &&
    typeof value.values === "object" &&
    value.values !== null &&
    !Array.isArray(value.values)
  );
}
