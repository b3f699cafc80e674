import { writeFile } from "node:fs/promises";
import { join } from "node:path";
import { gzipSync } from "node:zlib";
import { BeadResult } from "@beadroll/domain/schemas/bead-result";
import { ScanResult } from "@beadroll/domain/schemas/scan-result";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type BuiltCommand, builtCommand } from "../testing/built-command.ts";
import { aBead, aModel, aScan } from "../testing/joint.ts";

let command: BuiltCommand;
const write = (name: string, content: string | Uint8Array): Promise<void> =>
  writeFile(join(command.folder, name), content);
const evaluate = (...args: string[]) => command.run(["evaluate", "--model", "model.json", ...args]);

beforeAll(async () => {
  command = await builtCommand();
  const { profiles, poses, cloud } = aScan(0.02);
  await write("model.json", JSON.stringify(aModel()));
  await write("profiles.csv", profiles);
  await write("poses.csv", poses);
  await write("cloud.xyz", cloud);
  await write("off.xyz", aScan(2.5).cloud);
  await write("half.xyz", aScan(0, 12).cloud);
});
afterAll(() => command.remove());

describe("evaluate", () => {
  it("ends with 0 for a joint on its model, and says so by shape and word", async () => {
    const ran = await evaluate("--scan", "cloud.xyz");
    expect(ran).toMatchObject({ exit: 0, stderr: "" });
    expect(ran.stdout).toMatch(/^■ within {3}test-t-joint {3}fillet t, 40\.0 mm, \d+ points\n/);
    expect(ran.stdout).toMatch(/\n {2}[▁▂▃▄▅▆▇█]{21}\n/);
    expect(ran.stdout).toMatch(/ {2}lateral mm +0\.0\d\d/);
    expect(ran.stdout).toContain("21 of 21 stations measured (100.0 %)");
  });

  it("ends with 0 for a joint that the path has to follow, naming what and where", async () => {
    const ran = await evaluate("--scan", "off.xyz");
    expect(ran.exit).toBe(0);
    expect(ran.stdout).toMatch(/^▲ adapt/);
    expect(ran.stdout).toMatch(/\n {2}▲ .*2\.5/);
  });

  it("ends with 10 where too little was measured, and draws what is missing as missing", async () => {
    const ran = await evaluate("--scan", "half.xyz");
    expect(ran.exit).toBe(10);
    expect(ran.stdout).toMatch(/^◆ hold/);
    expect(ran.stdout).toMatch(/\n {2}[▁▂▃▄▅▆▇█]+·+\n/);
  });

  it("prints one JSON value of the published shape, and nothing else", async () => {
    const ran = await evaluate("--scan", "off.xyz", "--json");
    expect(ran.exit).toBe(0);
    const result = ScanResult.parse(JSON.parse(ran.stdout));
    expect(result.verdict).toBe("adapt");
    expect(result.summary.lateral_mm?.max_abs).toBeCloseTo(2.5, 1);
  });

  it("uses no colour where nobody watches", async () => {
    const ran = await evaluate("--scan", "off.xyz");
    expect(ran.stdout).not.toContain("\u001b");
  });

  it("takes the poses that lie beside profiles, saying so on stderr", async () => {
    const ran = await evaluate("--scan", "profiles.csv", "--json");
    expect(ran).toMatchObject({ exit: 0, stderr: "Poses taken from poses.csv\n" });
    const named = await evaluate("--scan", "profiles.csv", "--poses", "poses.csv", "--json");
    expect(named).toEqual({ ...ran, stderr: "" });
  });

  it("reads packed files as if they were not", async () => {
    const { profiles, poses } = aScan(0.02);
    await write("profiles.csv.gz", gzipSync(profiles));
    await write("poses.csv.gz", gzipSync(poses));
    const packed = await evaluate("--scan", "profiles.csv.gz", "--poses", "poses.csv.gz", "--json");
    const plain = await evaluate("--scan", "profiles.csv", "--poses", "poses.csv", "--json");
    expect(packed).toEqual(plain);
  });
});

describe("evaluate of what cannot be read", () => {
  it("names file, line and column of each fault, on one line each", async () => {
    const lines = aScan().profiles.split("\n");
    lines[4] = "0,abc,3";
    lines[9] = "0,1";
    await write("bad.csv", lines.join("\n"));
    const ran = await evaluate("--scan", "bad.csv", "--poses", "poses.csv");
    expect(ran).toMatchObject({ exit: 2, stdout: "" });
    const [first, second, ...rest] = ran.stderr.trimEnd().split("\n");
    expect(first).toMatch(/^bad\.csv:5: x_mm: .*"abc"/);
    expect(second).toMatch(/^bad\.csv:10: /);
    expect(rest).toEqual([]);
  });

  it("tells a fault of the poses from one of the scan", async () => {
    await write("bad-poses.csv", "station_mm,px_mm,py_mm,pz_mm,qw,qx,qy,qz\n0,0,100,50,none,0,0,1\n");
    const ran = await evaluate("--scan", "profiles.csv", "--poses", "bad-poses.csv");
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toMatch(/^bad-poses\.csv:2: qw: /);
  });

  it("names the place in a model that cannot be used", async () => {
    const { seam, ...rest } = aModel();
    await write("bad-model.json", JSON.stringify({ ...rest, seam: { ...seam, length_mm: -1 } }));
    const ran = await command.run(["evaluate", "--model", "bad-model.json", "--scan", "cloud.xyz", "--json"]);
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toMatch(/^bad-model\.json: \/seam\/length_mm: /);
    expect(JSON.parse(ran.stdout)).toMatchObject({
      error: "model-invalid",
      errors: [{ file: "bad-model.json", pointer: "/seam/length_mm" }],
    });
  });

  const cases = [
    ["a model that is no JSON", ["--model", "cloud.xyz", "--scan", "cloud.xyz"], "cloud.xyz: it is no JSON"],
    [
      "a scan that is not there",
      ["--model", "model.json", "--scan", "lost.ply"],
      "lost.ply: there is no such file",
    ],
    ["a folder for a scan", ["--model", "model.json", "--scan", "."], ".: it is a folder"],
    ["an empty scan", ["--model", "model.json", "--scan", "empty.xyz"], "empty.xyz: the file is empty"],
    ["profiles without poses", ["--model", "model.json", "--scan", "alone/profiles.csv"], "poses"],
    ["a step of nothing", ["--model", "model.json", "--scan", "cloud.xyz", "--step", "0"], "above 0"],
    ["a unit nobody uses", ["--model", "model.json", "--scan", "cloud.xyz", "--units", "ft"], "mm, in, m"],
    ["no scan at all", ["--model", "model.json"], "--scan <file>"],
  ] as const;
  it.each(cases)("ends with 2 for %s", async (_name, args, words) => {
    const { mkdir } = await import("node:fs/promises");
    await mkdir(join(command.folder, "alone"), { recursive: true });
    await write("alone/profiles.csv", aScan().profiles);
    await write("empty.xyz", "");
    const ran = await command.run(["evaluate", ...args, "--json"]);
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toContain(words);
    expect(JSON.parse(ran.stdout)).toHaveProperty("detail");
  });
});

describe("evaluate --stage bead", () => {
  beforeAll(async () => {
    await write("bead.xyz", aBead());
    await write("cut.xyz", aBead({ undercut_mm: 0.9 }));
    const weld = { weld_size_mm: 5, quality_level: "B" };
    await write("with-weld.json", JSON.stringify({ ...aModel(), weld }));
  });
  const asked = ["--stage", "bead", "--size", "5", "--level", "C"];

  it("measures the finished weld and ends with 0 where it keeps its level", async () => {
    const ran = await evaluate("--scan", "bead.xyz", ...asked);
    expect(ran).toMatchObject({ exit: 0, stderr: "" });
    expect(ran.stdout).toMatch(/^■ within {3}test-t-joint {3}finished fillet t/);
    expect(ran.stdout).toMatch(/ {2}leg A mm +7\.20 +7\.20 +7\.20/);
  });

  it("ends with 10 and names the imperfection where it does not", async () => {
    const ran = await evaluate("--scan", "cut.xyz", ...asked, "--json");
    expect(ran.exit).toBe(10);
    const result = BeadResult.parse(JSON.parse(ran.stdout));
    const [worst] = result.findings;
    expect(worst).toMatchObject({ code: "5011", plate: "b", state: "not_met", limit: 0.5 });
    expect(worst?.value).toBeCloseTo(0.9, 1);
  });

  it("judges by what the model says of the weld, and refuses to guess where nothing does", async () => {
    const model = await command.run([
      "evaluate",
      ...["--model", "with-weld.json", "--scan", "bead.xyz", "--stage", "bead", "--json"],
    ]);
    expect(BeadResult.parse(JSON.parse(model.stdout)).requirement).toEqual({
      weld_size_mm: 5,
      quality_level: "B",
      edition: "2023",
    });
    const ran = await evaluate("--scan", "bead.xyz", "--stage", "bead");
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toMatch(/--size and --level/);
  });
});
