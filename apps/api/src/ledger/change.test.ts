import { createHash } from "node:crypto";
import { canonicalJson } from "@beadroll/domain/ledger/canonical-json";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { aCell, aLot, aPart } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";
import { change } from "./change.ts";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

interface Entry {
  seq: number;
  at: string;
  actor: string;
  action: string;
  subjects: string;
  body: string;
  leaf_hash: Buffer;
}
const ledger = (): Promise<Entry[]> => server.deps.db.reader("ledger_entries").orderBy("seq");

describe("a change", () => {
  it("appends one entry, in order and without gaps", async () => {
    const before = (await ledger()).length;
    await aCell(server);
    await aCell(server);
    const entries = await ledger();
    expect(entries.length).toBe(before + 2);
    expect(entries.map((entry) => entry.seq)).toEqual(entries.map((_, index) => index));
  });

  it("is hashed as RFC 9162 and RFC 8785 say, recomputed here by hand", async () => {
    await aCell(server);
    const [entry] = (await ledger()).slice(-1);
    if (!entry) throw new Error("no entry");
    const { seq, at, actor, action } = entry;
    const text = `{"action":${JSON.stringify(action)},"actor":${JSON.stringify(actor)},"at":"${at}","body":${entry.body},"seq":${seq},"subjects":${entry.subjects}}`;
    const leaf = createHash("sha256")
      .update(Buffer.concat([Buffer.from([0]), Buffer.from(text)]))
      .digest("hex");
    expect(entry.leaf_hash.toString("hex")).toBe(leaf);
  });

  it("shows in the ledger every row it wrote, with what stood there before", async () => {
    const lot = await aLot(server);
    const [entry] = (await ledger()).slice(-1);
    expect(JSON.parse(entry?.body ?? "")).toEqual({
      writes: [
        {
          table: "lots",
          key: { id: lot.id },
          before: { version: 1, state: "received" },
          after: { version: 2, state: "released" },
        },
      ],
    });
  });

  it("names the part and all its seams when a part is started", async () => {
    const part = await aPart(server, 3);
    const [entry] = (await ledger()).slice(-1);
    expect(JSON.parse(entry?.subjects ?? "")).toEqual([part.tag, ...part.roll.map((seam) => seam.tag)]);
  });

  it("leaves nothing behind when it fails half way", async () => {
    const before = canonicalJson((await ledger()).map((entry) => entry.seq));
    const cells = await server.deps.db.reader("cells").count({ n: "*" }).first();
    const failing = change(server.context, "test.fail", async (trx) => {
      await trx.insert("cells", {
        id: trx.newId(),
        tag: trx.newTag("C"),
        name: "Half a cell",
        robot: "r",
        power_source: "p",
        scanner: "s",
        scanner_accuracy_mm: 0.1,
        created_at: trx.at,
      });
      throw new Error("the power went");
    });
    await expect(failing).rejects.toThrow("the power went");
    expect(canonicalJson((await ledger()).map((entry) => entry.seq))).toBe(before);
    expect(await server.deps.db.reader("cells").count({ n: "*" }).first()).toEqual(cells);
  });

  it("cannot be changed or taken away afterwards", async () => {
    await aCell(server);
    const { writer } = server.deps.db;
    await expect(
      writer("ledger_entries").where({ seq: 0 }).update({ actor: "someone else" }),
    ).rejects.toThrow("append-only");
    await expect(writer("ledger_entries").where({ seq: 0 }).delete()).rejects.toThrow("append-only");
  });
});
