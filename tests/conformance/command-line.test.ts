import { execFile } from "node:child_process";
import { mkdtemp, readdir, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { ScanResult } from "@beadroll/domain/schemas/scan-result";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { freePort, runMain, type ServerProcess, startProcess } from "../processes/server-process.ts";
import { SHOP_PASSWORD, type SmallShop, setUpShop, smallModel, smallScan } from "../processes/small-shop.ts";

const BEADROLL = fileURLToPath(new URL("../../apps/cli/bin/beadroll.mjs", import.meta.url));

let folder: string;
let server: ServerProcess;
let port: number;
let shop: SmallShop;
let homes = 0;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "beadroll-cli-"));
  port = await freePort();
  const data = join(folder, "data");
  await runMain(data, ["--create-administrator", "chief"], { BEADROLL_ADMIN_PASSWORD: SHOP_PASSWORD });
  server = await startProcess(data, port);
  shop = await setUpShop(server.url, 8);
  await writeFile(join(folder, "model.json"), JSON.stringify(smallModel()));
  await writeFile(join(folder, "good.xyz"), smallScan(1));
  await writeFile(join(folder, "off.xyz"), smallScan(2, 2));
  await writeFile(join(folder, "far.xyz"), smallScan(3, 11.5));
}, 120_000);
afterAll(async () => {
  await server.kill();
  await rm(folder, { recursive: true, force: true });
});

interface Ran {
  readonly exit: number;
  readonly out: string;
  readonly err: string;
}

/** Runs the built command as a cell's computer does. */
function beadroll(args: readonly string[], env: Record<string, string> = {}): Promise<Ran> {
  return new Promise((resolve) => {
    const child = execFile(
      process.execPath,
      [BEADROLL, ...args],
      { env: { PATH: process.env["PATH"] ?? "", HOME: folder, ...env } },
      (_error, out, err) => resolve({ exit: child.exitCode ?? -1, out, err }),
    );
  });
}

const file = (name: string): string => join(folder, name);

/** A computer of its own: profile and queue in a fresh folder. */
function aComputer(key = shop.key, url = server.url): Record<string, string> {
  homes += 1;
  return { BEADROLL_HOME: join(folder, `home-${homes}`), BEADROLL_SERVER: url, BEADROLL_KEY: key };
}

const aLog = (current = 250): string =>
  `time_s,current_a,voltage_v,travel_mm_s\n${Array.from({ length: 50 }, (_, i) => `${i / 10},${i > 5 && i < 45 ? current : 0},28,6`).join("\n")}\n`;

describe("beadroll evaluate", () => {
  it("ends with 0 for within and adapt, and with 10 for hold", async () => {
    const run = async (name: string) =>
      (await beadroll(["evaluate", "--model", file("model.json"), "--scan", file(name)])).exit;
    expect([await run("good.xyz"), await run("off.xyz"), await run("far.xyz")]).toEqual([0, 0, 10]);
  });

  it("prints with --json the one documented object and nothing else", async () => {
    const ran = await beadroll([
      "evaluate",
      "--model",
      file("model.json"),
      "--scan",
      file("off.xyz"),
      "--json",
    ]);
    const result = ScanResult.parse(JSON.parse(ran.out));
    expect(result).toMatchObject({ verdict: "adapt", model: "small-t-joint" });
    expect(result.summary.lateral_mm?.max_abs).toBeCloseTo(2, 1);
  });

  it("gives results every so many millimetres when asked", async () => {
    const ran = await beadroll([
      "evaluate",
      "--model",
      file("model.json"),
      "--scan",
      file("good.xyz"),
      "--step",
      "5",
      "--json",
    ]);
    const stations: { station_mm: number }[] = JSON.parse(ran.out).stations;
    expect(stations.map((station) => station.station_mm)).toEqual([0, 5, 10, 15, 20]);
  });

  it.each([
    ["an empty file", "", "x.xyz", /x\.xyz: the file is empty/],
    [
      "a cut PLY",
      "ply\nformat binary_little_endian 1.0\nelement vertex 99\nproperty float x\nproperty float y\nproperty float z\nend_header\nabc",
      "x.ply",
      /byte/,
    ],
    ["text in a number column", "x_mm,y_mm,z_mm\n1,2,3\n1,two,3\n", "x.csv", /:3: .*two/],
    ["what is no scan at all", "\u0089PNG\r\n\u001a\n", "x.png", /x\.png/],
  ])("ends with 2 for %s, naming the place", async (_name, content, name, message) => {
    await writeFile(file(name), Buffer.from(content, "latin1"));
    const ran = await beadroll(["evaluate", "--model", file("model.json"), "--scan", file(name)]);
    expect([ran.exit, ran.out]).toEqual([2, ""]);
    expect(ran.err).toMatch(message);
  });

  it("ends with 2 for a scan in inches declared as mm, a missing file and a model that is none", async () => {
    const unnamed = smallScan(1).replace(/^.*\n/, "");
    const inches = unnamed.replaceAll(/-?\d+(\.\d+)?/g, (text) => (Number(text) / 25.4).toFixed(5));
    await writeFile(file("inches.xyz"), inches);
    const wrong = await beadroll(["evaluate", "--model", file("model.json"), "--scan", file("inches.xyz")]);
    expect([wrong.exit, /inch|unit/i.test(wrong.err)]).toEqual([2, true]);
    const right = await beadroll([
      "evaluate",
      "--model",
      file("model.json"),
      "--scan",
      file("inches.xyz"),
      "--units",
      "in",
    ]);
    expect(right.exit).toBe(0);
    expect(
      (await beadroll(["evaluate", "--model", file("model.json"), "--scan", file("none.xyz")])).exit,
    ).toBe(2);
    await writeFile(file("no-model.json"), '{"joint_type": "glued"}');
    const model = await beadroll(["evaluate", "--model", file("no-model.json"), "--scan", file("good.xyz")]);
    expect([model.exit, /joint_type/.test(model.err)]).toEqual([2, true]);
  });
});

describe("beadroll as a command", () => {
  it("ends with 2 for wrong usage, with 0 for help and version", async () => {
    const exits = [];
    for (const args of [
      ["weld"],
      ["evaluate"],
      ["evaluate", "--model", "m", "--scan", "s", "--units", "furlong"],
      ["--help"],
      ["push", "scan", "--help"],
      ["--version"],
    ])
      exits.push((await beadroll(args)).exit);
    expect(exits).toEqual([2, 2, 2, 0, 0, 0]);
  });
});

describe("beadroll enrol", () => {
  it("checks the key and keeps it for this user alone", async () => {
    const { BEADROLL_HOME = "" } = aComputer();
    const ran = await beadroll(["enrol", "--server", server.url, "--key", shop.key], { BEADROLL_HOME });
    expect([ran.exit, ran.out.includes("Cell PC")]).toEqual([0, true]);
    expect((await beadroll(["find", "FW-1", "--json"], { BEADROLL_HOME })).out).toContain("drawing");
  });

  it("ends with 40 for a key that is not known, 20 for a server that does not answer", async () => {
    const { BEADROLL_HOME = "" } = aComputer();
    const made = ["enrol", "--key", "brk_0000000000000000"];
    expect((await beadroll([...made, "--server", server.url], { BEADROLL_HOME })).exit).toBe(40);
    expect((await beadroll([...made, "--server", "http://127.0.0.1:9"], { BEADROLL_HOME })).exit).toBe(20);
    expect((await beadroll(["find", "x"], { BEADROLL_HOME })).exit).toBe(40);
  });
});

describe("beadroll push", () => {
  it("records a scan and answers with its verdict: 0 for within and adapt, 10 for hold", async () => {
    const computer = aComputer();
    const push = (seam: number, name: string) =>
      beadroll(
        [
          "push",
          "scan",
          "--seam",
          shop.seams[seam] ?? "",
          "--scan",
          file(name),
          "--part",
          shop.part,
          "--json",
        ],
        computer,
      );
    const [good, off, far] = [await push(0, "good.xyz"), await push(1, "off.xyz"), await push(2, "far.xyz")];
    expect([good.exit, off.exit, far.exit]).toEqual([0, 0, 10]);
    expect(JSON.parse(off.out)).toMatchObject({ seam_tag: shop.seams[1], verdict: "adapt" });
    expect((await beadroll(["queue", "list", "--json"], computer)).out).toBe('{"items":[],"refused":[]}\n');
  });

  it("records a pass with what its log says", async () => {
    await writeFile(file("pass.csv"), aLog());
    const ran = await beadroll(
      ["push", "pass", "--seam", shop.seams[0] ?? "", "--log", file("pass.csv")],
      aComputer(),
    );
    expect([ran.exit, /kJ\/mm/.test(ran.out)]).toEqual([0, true]);
  });

  it("is one record when the same result is pushed twice, from two computers too", async () => {
    const push = () =>
      beadroll(
        ["push", "scan", "--seam", shop.seams[3] ?? "", "--scan", file("good.xyz"), "--json"],
        aComputer(),
      );
    const [first, second] = [await push(), await push()];
    expect(JSON.parse(second.out).id).toBe(JSON.parse(first.out).id);
  });

  it("ends with 2 for a mistyped tag, before anything is sent", async () => {
    const ran = await beadroll(
      ["push", "scan", "--seam", "S-8K3F7Q2NA", "--scan", file("good.xyz")],
      aComputer(shop.key, "http://127.0.0.1:9"),
    );
    expect([ran.exit, /--seam/.test(ran.err)]).toEqual([2, true]);
  });

  it("ends with 30 for what the server refuses, and sets it aside with the reason", async () => {
    await writeFile(file("broken.csv"), "x_mm,y_mm,z_mm\n1,2,3\n1,two,3\n");
    const computer = aComputer();
    const ran = await beadroll(
      ["push", "scan", "--seam", shop.seams[4] ?? "", "--scan", file("broken.csv")],
      computer,
    );
    expect([ran.exit, /3: .*two/.test(ran.err)]).toEqual([30, true]);
    const kept = await readdir(join(computer["BEADROLL_HOME"] ?? "", "refused"));
    expect(kept.map((name) => name.split(".").slice(1).join(".")).sort()).toEqual(["push", "reason.json"]);
  });

  it("ends with 40 for a key without the scope, and keeps the result", async () => {
    const computer = aComputer(shop.reading_key);
    const ran = await beadroll(
      ["push", "scan", "--seam", shop.seams[4] ?? "", "--scan", file("good.xyz")],
      computer,
    );
    expect(ran.exit).toBe(40);
    expect(JSON.parse((await beadroll(["queue", "list", "--json"], computer)).out).items.length).toBe(1);
  });

  it("ends with 20 when the server cannot be reached, and delivers from the queue later", async () => {
    const away = aComputer(shop.key, "http://127.0.0.1:9");
    const ran = await beadroll(
      ["push", "scan", "--seam", shop.seams[5] ?? "", "--scan", file("off.xyz")],
      away,
    );
    expect(ran.exit).toBe(20);
    const sent = await beadroll(["queue", "send", "--json"], { ...away, BEADROLL_SERVER: server.url });
    expect([sent.exit, JSON.parse(sent.out).results[0].answer.verdict]).toEqual([0, "adapt"]);
    expect((await beadroll(["queue", "list", "--json"], away)).out).toBe('{"items":[],"refused":[]}\n');
  });
});

describe("beadroll find", () => {
  it("shows what it finds, and says when there is nothing", async () => {
    const found = await beadroll(["find", "frame", "0001"], aComputer());
    expect([found.exit, found.out.includes(shop.part)]).toEqual([0, true]);
    expect((await beadroll(["find", "nothing at all"], aComputer())).out).toContain("Nothing here");
  });
});
