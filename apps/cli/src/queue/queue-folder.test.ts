import { mkdtemp, readdir, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import type { QueueEntry } from "./queue-entry.ts";
import { enqueue, idsIn, readHeader, readReason, readWaiting, setAside, settle } from "./queue-folder.ts";

let home: string;
const before = process.env["BEADROLL_HOME"];
beforeEach(async () => {
  home = await mkdtemp(join(tmpdir(), "beadroll-queue-"));
  process.env["BEADROLL_HOME"] = home;
});
afterEach(async () => {
  if (before === undefined) delete process.env["BEADROLL_HOME"];
  else process.env["BEADROLL_HOME"] = before;
  await rm(home, { recursive: true, force: true });
});

const anEntry = (text: string, queued_at: string): QueueEntry => ({
  kind: "pass",
  seam: "S-8K3F7Q2NS",
  fields: {},
  files: [{ part: "log", name: "pass.csv", bytes: new TextEncoder().encode(text) }],
  queued_at,
});

describe("the queue's folder", () => {
  it("keeps the order in which results came, also when the clock was set back", async () => {
    const ids = [
      await enqueue(anEntry("one", "2026-11-30T09:00:00.000Z")),
      await enqueue(anEntry("two", "2026-11-30T08:00:00.000Z")),
      await enqueue(anEntry("three", "2026-11-30T08:00:00.001Z")),
      await enqueue(anEntry("four", "2026-11-30T10:00:00.000Z")),
    ];
    expect(await idsIn("waiting")).toEqual(ids);
    expect(new Set(ids).size).toBe(4);
  });

  it("keeps a result once, under its first id", async () => {
    const first = await enqueue(anEntry("one", "2026-11-30T09:00:00.000Z"));
    expect(await enqueue(anEntry("one", "2026-11-30T11:00:00.000Z"))).toBe(first);
    expect((await readWaiting(first))?.queued_at).toBe("2026-11-30T09:00:00.000Z");
  });

  it("passes over what another process has not finished writing", async () => {
    await enqueue(anEntry("one", "2026-11-30T09:00:00.000Z"));
    await writeFile(join(home, "queue", "20261130100000000_S-8K3F7Q2NS_pass_00.push.77.tmp"), "half");
    expect((await idsIn("waiting")).length).toBe(1);
  });

  it("leaves no trace of what was settled, and settling twice is no fault", async () => {
    const id = await enqueue(anEntry("one", "2026-11-30T09:00:00.000Z"));
    await settle(id);
    await settle(id);
    expect(await readdir(join(home, "queue"))).toEqual([]);
    expect(await readWaiting(id)).toBeNull();
  });

  it("keeps a refused result with its reason, though two processes set it aside", async () => {
    const id = await enqueue(anEntry("one", "2026-11-30T09:00:00.000Z"));
    await setAside(id, { detail: "The seam is held." });
    await setAside(id, { detail: "The seam is held." });
    expect(await idsIn("waiting")).toEqual([]);
    expect(await idsIn("refused")).toEqual([id]);
    expect(await readReason(id)).toEqual({ detail: "The seam is held." });
    expect((await readHeader("refused", id)).header.files[0]?.name).toBe("pass.csv");
  });
});
