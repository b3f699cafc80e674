import { expect, it } from "vitest";
import { type DraftStorage, dropDraft, readDraft, writeDraft } from "./draft-store.ts";

function storage(): DraftStorage & { readonly kept: Map<string, string> } {
  const kept = new Map<string, string>();
  return {
    kept,
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, value) => void kept.set(key, value),
    removeItem: (key) => void kept.delete(key),
  };
}

const DRAFT = {
  saved_at: "2026-11-30T08:12:00.000Z",
  values: { number: "H48812", thickness_mm: 12, note: "" },
};

it("brings back what was typed, form by form", () => {
  const store = storage();
  expect(writeDraft(store, "lot-new", DRAFT)).toBe(true);
  expect(readDraft(store, "lot-new")).toEqual(DRAFT);
  expect(readDraft(store, "part-new")).toBeNull();
});

it("forgets it once it is sent", () => {
  const store = storage();
  writeDraft(store, "lot-new", DRAFT);
  dropDraft(store, "lot-new");
  expect(readDraft(store, "lot-new")).toBeNull();
  expect(store.kept.size).toBe(0);
});

it("has no draft where the kept text is none, rather than fail", () => {
  const store = storage();
  for (const text of ["", "{", "null", "[]", '{"values":[]}', '{"saved_at":1,"values":{}}', '"x"']) {
    store.kept.set("beadroll.draft.lot-new", text);
    expect(readDraft(store, "lot-new")).toBeNull();
  }
});

it("says that it could not keep a draft where storage is full or refused", () => {
  const refuse = () => {
    throw new Error("quota");
  };
  const store: DraftStorage = { getItem: refuse, setItem: refuse, removeItem: refuse };
  expect(writeDraft(store, "lot-new", DRAFT)).toBe(false);
  expect(readDraft(store, "lot-new")).toBeNull();
  expect(() => dropDraft(store, "lot-new")).not.toThrow();
});
