import { describe, expect, it } from "vitest";
import { entryFacts, writtenCells } from "./entry-writes.ts";

const body = {
  verdict: "adapt",
  attempt: 1,
  writes: [
    { table: "lots", key: { id: "1" }, before: { state: "received" }, after: { state: "released" } },
    { table: "pieces", key: { id: "2" }, after: { position: "Web plate", to_at: null } },
  ],
};

describe("a ledger entry", () => {
  it("shows what it wrote, with what stood there before", () => {
    expect(writtenCells(body)).toEqual([
      { table: "lots", column: "state", before: "received", after: "released" },
      { table: "pieces", column: "position", before: null, after: "Web plate" },
      { table: "pieces", column: "to_at", before: null, after: "nothing" },
    ]);
  });

  it("shows its facts beside the rows", () => {
    expect(entryFacts(body)).toEqual([
      { key: "verdict", value: "adapt" },
      { key: "attempt", value: "1" },
    ]);
  });

  it("that wrote no rows shows none", () => {
    expect(writtenCells({})).toEqual([]);
  });
});
