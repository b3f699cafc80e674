import { describe, expect, test } from "vitest";
import { canonicalJson, parseCanonicalJson } from "./canonical-json.ts";
import { entryBytes, entryLeaf, LedgerEntry, type LedgerEntryInput } from "./entry.ts";
import { toHex } from "./hex.ts";
import { sha256 } from "./sha256.ts";

const anEntry = (changes: Partial<LedgerEntryInput> = {}): LedgerEntryInput => ({
  seq: 412,
  at: "2026-11-30T09:41:07.250Z",
  actor: "user i.varga",
  action: "scan.record",
  subjects: ["S-8K3F7Q2NS"],
  body: { verdict: "adapt", gap_mm: 1.5 },
  ...changes,
});

describe("a ledger entry", () => {
  test("has one text, whatever the order its members were written in", () => {
    expect(Buffer.from(entryBytes(anEntry())).toString()).toBe(
      '{"action":"scan.record","actor":"user i.varga","at":"2026-11-30T09:41:07.250Z",' +
        '"body":{"gap_mm":1.5,"verdict":"adapt"},"seq":412,"subjects":["S-8K3F7Q2NS"]}',
    );
    const other = anEntry({ body: { gap_mm: 1.5, verdict: "adapt" } });
    expect(toHex(entryLeaf(other, sha256))).toBe(toHex(entryLeaf(anEntry(), sha256)));
  });

  test("reads back from its text through the schema", () => {
    const read = parseCanonicalJson(canonicalJson(anEntry()));
    expect(read.ok && LedgerEntry.parse(read.value)).toEqual(anEntry());
  });

  test.each([
    ["place", { seq: 413 }],
    ["time", { at: "2026-11-30T09:41:07.251Z" }],
    ["actor", { actor: "user i.vargo" }],
    ["action", { action: "scan.recorded" }],
    ["subjects", { subjects: [] }],
    ["body", { body: { verdict: "adapt", gap_mm: 1.51 } }],
  ])("gets another leaf hash when its %s changes", (_, change) => {
    expect(toHex(entryLeaf(anEntry(change), sha256))).not.toBe(toHex(entryLeaf(anEntry(), sha256)));
  });

  test("ignores what a row carries beside the entry", () => {
    const row = { ...anEntry(), leaf_hash: "00" };
    expect(toHex(entryLeaf(row, sha256))).toBe(toHex(entryLeaf(anEntry(), sha256)));
  });

  test.each([
    ["a negative place", { seq: -1 }],
    ["a time without milliseconds", { at: "2026-11-30T09:41:07Z" }],
    ["a time with an offset", { at: "2026-11-30T09:41:07.250+01:00" }],
    ["no actor", { actor: "" }],
    ["an unknown member", { note: "x" }],
  ])("is refused by the schema with %s", (_, change) => {
    expect(LedgerEntry.safeParse({ ...anEntry(), ...change }).success).toBe(false);
  });
});
