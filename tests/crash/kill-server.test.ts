import { createHash } from "node:crypto";
import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { freePort, runMain, type ServerProcess, startProcess } from "../processes/server-process.ts";
import { ask, SHOP_PASSWORD, setUpShop, signIn, smallScan } from "../processes/small-shop.ts";

const SEAMS = 24;
const KILLS = 4;
const PUSHERS = 3;

let dataDir: string;
let port: number;
let server: ServerProcess;

beforeAll(async () => {
  dataDir = await mkdtemp(join(tmpdir(), "beadroll-crash-"));
  port = await freePort();
  await runMain(dataDir, ["--create-administrator", "chief"], { BEADROLL_ADMIN_PASSWORD: SHOP_PASSWORD });
  server = await startProcess(dataDir, port);
}, 120_000);
afterAll(async () => {
  await server.kill();
  await rm(dataDir, { recursive: true, force: true });
});

interface Acknowledged {
  readonly id: string;
  readonly digest: string;
}

/** Pushes one scan; null when the server went away before it answered. */
async function push(key: string, seam: string, number: number): Promise<Acknowledged | null> {
  const text = smallScan(number);
  const form = new FormData();
  form.set("scan", new Blob([text]), `scan-${number}.xyz`);
  try {
    const answer = await fetch(`${server.url}/api/v1/seams/${seam}/scans`, {
      method: "POST",
      headers: { Authorization: `Bearer ${key}`, "Idempotency-Key": `crash-push-${number}` },
      body: form,
    });
    const value: { id: string; detail?: string } = await answer.json();
    if (answer.status !== 201) throw new Error(`push ${number}: ${answer.status} ${value.detail}`);
    return { id: value.id, digest: createHash("sha256").update(text).digest("hex") };
  } catch (error) {
    if (error instanceof TypeError || error instanceof SyntaxError) return null;
    throw error;
  }
}

describe("a server that is killed in the middle of pushes", () => {
  it("has every acknowledged record after its restart, whole, and none half", async () => {
    const { key, seams } = await setUpShop(server.url, SEAMS);
    const acknowledged: Acknowledged[] = [];
    const lost: number[] = [];
    let number = 0;
    for (let round = 0; round <= KILLS; round += 1) {
      let stop = false;
      const pushers = Array.from({ length: PUSHERS }, async () => {
        while (!stop) {
          number += 1;
          const mine = number;
          const answer = await push(key, seams[mine % seams.length] ?? "", mine);
          if (answer) acknowledged.push(answer);
          else {
            lost.push(mine);
            return;
          }
        }
      });
      await new Promise((resolve) => setTimeout(resolve, 600 + ((round * 397) % 500)));
      if (round < KILLS) await server.kill();
      stop = true;
      await Promise.all(pushers);
      if (round < KILLS) server = await startProcess(dataDir, port);
    }
    // What was not acknowledged is sent again under its key, as a cell's computer does.
    for (const mine of lost) {
      const answer = await push(key, seams[mine % seams.length] ?? "", mine);
      if (answer) acknowledged.push(answer);
    }
    const token = await signIn(server.url, "auditor");
    for (const { id, digest } of acknowledged) {
      const scan = await ask(server.url, token, { path: `/scans/${id}` });
      expect(scan["file_digest"]).toBe(digest);
      const kept = await readFile(join(dataDir, "files", digest.slice(0, 2), digest));
      expect(createHash("sha256").update(kept).digest("hex")).toBe(digest);
    }
    const seqs: number[] = [];
    const scanEntries: string[] = [];
    let cursor = "";
    do {
      const page = await ask(server.url, token, { path: `/ledger-entries?limit=500${cursor}` });
      for (const entry of page["items"] as { seq: number; action: string; body: { file: string } }[]) {
        seqs.push(entry.seq);
        if (entry.action === "scan.record") scanEntries.push(entry.body.file);
      }
      cursor = page["next_cursor"] ? `&cursor=${page["next_cursor"]}` : "";
    } while (cursor);
    expect(seqs).toEqual(seqs.map((_, index) => seqs.length - 1 - index));
    expect(new Set(acknowledged.map(({ id }) => id)).size).toBe(number);
    expect(scanEntries.length).toBe(number);
    expect(new Set(scanEntries).size).toBe(number);
    console.log(
      `${number} scans pushed, ${KILLS} kills, ${lost.length} pushes cut and sent again, ${seqs.length} ledger entries`,
    );
    expect(number).toBeGreaterThan(20);
  });
});
