import { readdir, readFile, stat, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { mintTag } from "@beadroll/domain/tags/tag";
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { type BuiltCommand, builtCommand } from "../testing/built-command.ts";
import { aLog, aScan } from "../testing/joint.ts";
import { type RecordServer, startRecordServer } from "../testing/record-server.ts";

let command: BuiltCommand;
let server: RecordServer;
let env: Record<string, string>;
let made = 0;

beforeAll(async () => {
  command = await builtCommand();
  const { profiles, poses, cloud } = aScan();
  await writeFile(join(command.folder, "profiles.csv"), profiles);
  await writeFile(join(command.folder, "poses.csv"), poses);
  await writeFile(join(command.folder, "cloud.xyz"), cloud);
  await writeFile(join(command.folder, "pass-1.csv"), aLog());
  await writeFile(join(command.folder, "pass-2.csv"), aLog(260));
});
afterAll(() => command.remove());
beforeEach(async () => {
  server = await startRecordServer();
  // A home of its own for each test: what one leaves in the queue is no other's.
  made += 1;
  env = {
    BEADROLL_SERVER: server.url,
    BEADROLL_KEY: server.key,
    BEADROLL_HOME: join(command.home, `${made}`),
  };
});
afterEach(() => server.close());

const SEAM = "S-8K3F7Q2NS";
const OTHER_SEAM = mintTag("S", Uint8Array.of(1, 2, 3, 4, 5, 6, 7, 8));

const pushScan = (...more: string[]) =>
  command.run(["push", "scan", "--seam", SEAM, "--scan", "cloud.xyz", ...more], { env });
const pushPass = (log = "pass-1.csv", ...more: string[]) =>
  command.run(["push", "pass", "--seam", SEAM, "--log", log, ...more], { env });

const filesIn = async (folder: string): Promise<string[]> => {
  const path = join(env["BEADROLL_HOME"] ?? "", folder);
  return (await readdir(path).catch(() => [])).sort();
};

describe("a push that arrives", () => {
  it("says verdict and ledger entry, and leaves nothing in the queue", async () => {
    const ran = await pushScan();
    expect(ran).toMatchObject({ exit: 0, stderr: "" });
    expect(ran.stdout).toContain("■ within   scan of seam S-8K3F7Q2NS");
    expect(ran.stdout).toContain("recorded, ledger entry 412");
    expect(await filesIn("queue")).toEqual([]);
  });

  it("ends with 10 and the reasons when the verdict is hold", async () => {
    server.verdict = "hold";
    const ran = await pushScan();
    expect(ran.exit).toBe(10);
    expect(ran.stdout).toContain("◆ hold");
    expect(ran.stdout).toContain("◆ Gap 1.92 mm at 90 mm: above 1.50 mm");
  });

  it("gives programs the record and nothing else on stdout", async () => {
    const ran = await pushScan("--json");
    expect(JSON.parse(ran.stdout)).toMatchObject({ seam_tag: SEAM, verdict: "within", ledger_seq: 412 });
  });

  it("is one record however often it is given", async () => {
    await pushScan();
    const again = await pushScan();
    expect(again.exit).toBe(0);
    expect(again.stdout).toContain("already recorded");
    expect(server.records.length).toBe(1);
  });

  it("sends profiles with the poses that lie beside them, and says so", async () => {
    const ran = await command.run(["push", "scan", "--seam", SEAM, "--scan", "profiles.csv"], { env });
    expect(ran).toMatchObject({ exit: 0, stderr: "Poses taken from poses.csv\n" });
    expect(Object.keys(server.records[0]?.digests ?? {}).sort()).toEqual(["poses", "scan"]);
  });

  it("leaves poses alone that lie beside a cloud", async () => {
    await pushScan();
    expect(Object.keys(server.records[0]?.digests ?? {})).toEqual(["scan"]);
  });

  it("carries stage, unit, part and time as they were given, in UTC", async () => {
    const part = mintTag("P", Uint8Array.of(8, 7, 6, 5, 4, 3, 2, 1));
    const at = "2026-11-30T10:41:07+01:00";
    await pushScan("--stage", "bead", "--units", "in", "--part", part.toLowerCase(), "--taken-at", at);
    expect(server.records[0]?.fields).toEqual({
      stage: "bead",
      units: "in",
      part_tag: part,
      taken_at: "2026-11-30T09:41:07.000Z",
    });
  });

  it("says what a pass's log says, and what was outside", async () => {
    const ran = await pushPass("pass-1.csv", "--pass", "3", "--program", "SKID-S4 v12");
    expect(ran.exit).toBe(0);
    expect(ran.stdout).toContain(
      "Pass 3 of seam S-8K3F7Q2NS: 6.0 s of arc, 0.86 kJ/mm, outside PB-135-07 rev 2",
    );
    expect(ran.stdout).toContain("Travel speed was on average 6.50 mm/s");
    expect(server.records[0]?.fields["program"]).toBe("SKID-S4 v12");
  });
});

describe("a push that the server does not answer", () => {
  it("is kept whole, readable by this user alone, and ends with 20", async () => {
    await server.close();
    const ran = await pushScan("--json");
    expect(ran.exit).toBe(20);
    const [name] = await filesIn("queue");
    expect(JSON.parse(ran.stdout)).toMatchObject({
      error: "unreachable",
      queued: name?.replace(".push", ""),
    });
    const path = join(env["BEADROLL_HOME"] ?? "", "queue", name ?? "");
    expect((await stat(path)).mode & 0o777).toBe(0o600);
    const kept = await readFile(path);
    const scan = await readFile(join(command.folder, "cloud.xyz"));
    expect(Buffer.compare(kept.subarray(-scan.length), scan)).toBe(0);
  });

  it("waits once, however often it is given, with the time it was first given", async () => {
    await server.close();
    await pushScan();
    await pushScan();
    expect((await filesIn("queue")).length).toBe(1);
  });

  it("goes before the next of its seam", async () => {
    await server.close();
    await pushPass("pass-1.csv");
    server = await startRecordServer(Number(new URL(server.url).port));
    const ran = await pushPass("pass-2.csv");
    expect(ran.exit).toBe(0);
    expect(ran.stderr).toContain("An earlier result of this seam went first");
    expect(server.records.map((record) => record.names[0])).toEqual(["pass-1.csv", "pass-2.csv"]);
    expect(await filesIn("queue")).toEqual([]);
  });

  it("keeps the times of scan and pass at which they were pushed, not sent", async () => {
    await server.close();
    const before = Date.now();
    await pushScan();
    await pushPass();
    const after = Date.now();
    server = await startRecordServer(Number(new URL(server.url).port));
    await command.run(["queue", "send"], { env });
    const [scan, pass] = server.records;
    const takenAt = Date.parse(scan?.fields["taken_at"] ?? "");
    expect(takenAt).toBeGreaterThanOrEqual(before);
    expect(takenAt).toBeLessThanOrEqual(after);
    // The log lasts eight seconds and ended when it was pushed.
    const startedAt = Date.parse(pass?.fields["started_at"] ?? "");
    expect(startedAt).toBeGreaterThanOrEqual(before - 8000);
    expect(startedAt).toBeLessThanOrEqual(after - 8000);
  });

  it("is the same request when it is sent again: recorded once though the answer was lost", async () => {
    server.mishap = () => "cut-after-recording";
    const lost = await pushScan();
    expect(lost.exit).toBe(20);
    server.mishap = null;
    const ran = await command.run(["queue", "send"], { env });
    expect(ran).toMatchObject({ exit: 0, stderr: "" });
    expect(ran.stdout).toContain("1 sent, 0 waiting.");
    expect(server.records.length).toBe(1);
    expect(new Set(server.arrived.map((push) => push.key)).size).toBe(1);
  });

  it("survives the end of the process while it is under way", async () => {
    server.mishap = () => "never-answer";
    const child = command.start(["push", "scan", "--seam", SEAM, "--scan", "cloud.xyz"], { env });
    const ended = new Promise((resolve) => child.on("close", resolve));
    while (server.arrived.length === 0) await new Promise((resolve) => setTimeout(resolve, 10));
    child.kill("SIGKILL");
    await ended;
    server.mishap = null;
    expect((await command.run(["queue", "send"], { env })).exit).toBe(0);
    expect(server.records.length).toBe(1);
    expect(await filesIn("queue")).toEqual([]);
  });

  const silences = [
    ["a proxy's page", { page: 502 }, "Something other than the server"],
    ["a busy server", { problem: [503, "busy"], headers: { "Retry-After": "7" } }, "Detail of busy"],
    ["a rate limit", { problem: [429, "rate-limited"] }, "Detail of rate-limited"],
    ["a failure on the server", { problem: [500, "internal"] }, "Detail of internal"],
    ["a receipt that names other bytes", "other-bytes", "names other bytes"],
    ["an answer of another version", "another-version", "may differ in version"],
  ] as const;
  it.each(silences)("is kept after %s", async (_name, mishap, words) => {
    server.mishap = () => mishap;
    const ran = await pushScan();
    expect(ran.exit).toBe(20);
    expect(ran.stderr).toContain(words);
    expect((await filesIn("queue")).length).toBe(1);
  });
});

describe("a push that the server refuses", () => {
  it("is set aside with its reason and ends with 30", async () => {
    server.mishap = () => ({ problem: [409, "state-conflict"] });
    const ran = await pushScan("--json");
    expect(ran.exit).toBe(30);
    expect(ran.stderr).toContain(
      "The server refused: Title of state-conflict.\n  scan: Detail of state-conflict",
    );
    const { set_aside: path, ...said } = JSON.parse(ran.stdout);
    expect(said).toMatchObject({ error: "state-conflict", status: 409, request_id: "request-7" });
    expect((await stat(path)).size).toBeGreaterThan(1000);
    expect(JSON.parse(await readFile(path.replace(".push", ".reason.json"), "utf8"))).toEqual(said);
    expect(await filesIn("queue")).toEqual([]);
  });

  it("is kept when it is the key that is refused, and ends with 40", async () => {
    const ran = await command.run(["push", "scan", "--seam", SEAM, "--scan", "cloud.xyz"], {
      env: { ...env, BEADROLL_KEY: "brk_stale" },
    });
    expect(ran.exit).toBe(40);
    expect(ran.stderr).toContain("does not accept this computer's key");
    expect((await filesIn("queue")).length).toBe(1);
  });
});

describe("a push that cannot be meant", () => {
  const cases = [
    ["a mistyped tag", ["--seam", "S-8K3F7Q2N5", "--scan", "cloud.xyz"], "--seam: "],
    [
      "a tag with swapped neighbours",
      ["--seam", "S-8K3F7Q2SN", "--scan", "cloud.xyz"],
      "Did you mean S-8K3F7Q2NS?",
    ],
    ["the tag of something else", ["--seam", "P-8K3F7Q2NA", "--scan", "cloud.xyz"], "is the tag of a part"],
    ["a file that is not there", ["--seam", SEAM, "--scan", "lost.xyz"], "lost.xyz: there is no such file"],
    [
      "a time without its zone",
      ["--seam", SEAM, "--scan", "cloud.xyz", "--taken-at", "2026-11-30T09:41:07"],
      "--taken-at",
    ],
    [
      "a day that does not exist",
      ["--seam", SEAM, "--scan", "cloud.xyz", "--taken-at", "2026-02-30T09:41:07Z"],
      "--taken-at",
    ],
  ] as const;
  it.each(cases)("is stopped before anything is kept or sent: %s", async (_name, args, words) => {
    const ran = await command.run(["push", "scan", ...args, "--json"], { env });
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toContain(words);
    expect(JSON.parse(ran.stdout)).toHaveProperty("error");
    expect(server.arrived).toEqual([]);
    expect(await filesIn("queue")).toEqual([]);
  });

  it("names the option of a pass number that is none", async () => {
    const ran = await pushPass("pass-1.csv", "--pass", "first");
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toMatch(/^--pass: /);
  });

  it("ends with 40 on a computer that is not enrolled", async () => {
    const ran = await command.run(["push", "scan", "--seam", SEAM, "--scan", "cloud.xyz"], {
      env: { BEADROLL_HOME: env["BEADROLL_HOME"] ?? "" },
    });
    expect(ran.exit).toBe(40);
    expect(ran.stderr).toContain("beadroll enrol --server URL --key KEY");
  });
});

describe("the queue", () => {
  const pushOther = (log: string) =>
    command.run(["push", "pass", "--seam", OTHER_SEAM, "--log", log], { env });

  it("lists what waits, oldest first, and what was refused with its reason", async () => {
    server.mishap = () => ({ problem: [409, "state-conflict"] });
    await pushScan();
    await server.close();
    await pushPass("pass-1.csv");
    await pushOther("pass-2.csv");
    const ran = await command.run(["queue", "list", "--json"], { env });
    const { items, refused } = JSON.parse(ran.stdout);
    expect(items).toMatchObject([
      { kind: "pass", seam: SEAM, files: ["pass-1.csv"] },
      { kind: "pass", seam: OTHER_SEAM, files: ["pass-2.csv"] },
    ]);
    expect(refused).toMatchObject([{ kind: "scan", reason: { error: "state-conflict" } }]);
    const read = await command.run(["queue"], { env });
    expect(read.stdout).toMatch(/^kind {2}seam {9}since/);
    expect(read.stdout).toContain("Refused and set aside: 1");
    expect(read.stdout).toContain("Detail of state-conflict");
  });

  it("says when it is empty", async () => {
    expect(await command.run(["queue"], { env })).toMatchObject({ exit: 0, stdout: "The queue is empty.\n" });
    expect((await command.run(["queue", "send"], { env })).stdout).toBe("The queue is empty.\n");
  });

  it("lets no later result of a seam overtake an earlier one, and no seam wait for another", async () => {
    await server.close();
    await pushPass("pass-1.csv");
    await pushPass("pass-2.csv");
    await pushOther("pass-1.csv");
    server = await startRecordServer(Number(new URL(server.url).port));
    server.mishap = (push) => (push.seam === SEAM ? { problem: [500, "internal"] } : null);
    const ran = await command.run(["queue", "send", "--json"], { env });
    expect(ran.exit).toBe(20);
    expect(server.arrived.map(({ seam, names }) => [seam, names[0]])).toEqual([
      [SEAM, "pass-1.csv"],
      [OTHER_SEAM, "pass-1.csv"],
    ]);
    expect(JSON.parse(ran.stdout).waiting).toBe(2);
    const later = await pushPass("pass-2.csv");
    expect(later.exit).toBe(20);
    expect(later.stderr).toContain("An earlier result of this seam has to wait: Detail of internal");
  });

  it("asks no further once the server is silent", async () => {
    await server.close();
    await pushPass("pass-1.csv");
    await pushOther("pass-1.csv");
    const ran = await command.run(["queue", "send", "--json"], { env });
    expect(ran.exit).toBe(20);
    expect(JSON.parse(ran.stdout).results.length).toBe(1);
  });

  it("sets aside what the disk has damaged, and sends the rest", async () => {
    await server.close();
    await pushPass("pass-1.csv");
    await pushOther("pass-1.csv");
    const [first] = await filesIn("queue");
    const path = join(env["BEADROLL_HOME"] ?? "", "queue", first ?? "");
    const bytes = await readFile(path);
    bytes[bytes.length - 10] = (bytes[bytes.length - 10] ?? 0) ^ 1;
    await writeFile(path, bytes);
    server = await startRecordServer(Number(new URL(server.url).port));
    const ran = await command.run(["queue", "send"], { env });
    expect(ran.exit).toBe(1);
    expect(ran.stderr).toContain("the bytes of pass-1.csv are not what was put into the queue");
    expect(server.records.map((record) => record.seam)).toEqual([OTHER_SEAM]);
    expect(await filesIn("refused")).toHaveLength(2);
  });

  it("makes one record when the same result is pushed twice at once", async () => {
    const runs = await Promise.all([pushScan(), pushScan(), pushScan()]);
    for (const { exit } of runs) expect([0, 20]).toContain(exit);
    await command.run(["queue", "send"], { env });
    expect(server.records.length).toBe(1);
    expect(await filesIn("queue")).toEqual([]);
  });

  it("says plainly when this computer cannot keep anything, and ends with 1", async () => {
    await writeFile(join(command.folder, "no-folder"), "");
    const ran = await command.run(["push", "scan", "--seam", SEAM, "--scan", "cloud.xyz"], {
      env: { ...env, BEADROLL_HOME: join(command.folder, "no-folder") },
    });
    expect(ran.exit).toBe(1);
    expect(ran.stderr).toMatch(/^.*no-folder.*: not a directory\n$/);
    expect(server.arrived).toEqual([]);
  });
});
