import { spawnSync } from "node:child_process";
import { copyFile, mkdir } from "node:fs/promises";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { EXIT, EXIT_MEANINGS } from "./exit-codes.ts";
import { type BuiltCommand, builtCommand } from "./testing/built-command.ts";

let command: BuiltCommand;
beforeAll(async () => {
  command = await builtCommand();
});
afterAll(() => command.remove());

describe("beadroll", () => {
  it("prints its version", async () => {
    expect(await command.run(["--version"])).toEqual({ exit: 0, stdout: "0.1.0\n", stderr: "" });
  });

  it("explains its exit codes, and that it is no safety function", async () => {
    const { exit, stdout } = await command.run(["--help"]);
    expect(exit).toBe(0);
    for (const code of Object.values(EXIT)) expect(stdout).toContain(`  ${code}  ${EXIT_MEANINGS[code]}`);
    expect(stdout).toContain("It is no safety function");
  });

  const verbs = [
    ["evaluate"],
    ["enrol"],
    ["push", "scan"],
    ["push", "pass"],
    ["queue", "list"],
    ["queue", "send"],
    ["find"],
  ];
  it.each(verbs.map((verb) => ({ verb: verb.join(" ") })))("shows an example of $verb", async ({ verb }) => {
    const { exit, stdout, stderr } = await command.run([...verb.split(" "), "--help"]);
    expect(exit).toBe(0);
    expect(stderr).toBe("");
    expect(stdout).toMatch(new RegExp(`\\n {2}beadroll ${verb.replace(" list", "")}`));
  });

  const wrong = [
    { name: "no verb", args: [] },
    { name: "a verb that is none", args: ["weld"] },
    { name: "an option that is none", args: ["find", "x", "--loud"] },
    { name: "half a verb", args: ["push"] },
    { name: "an option without its value", args: ["evaluate", "--model"] },
  ];
  it.each(wrong)("ends with 2 for $name, with help on stderr", async ({ args }) => {
    const ran = await command.run(args);
    expect(ran).toMatchObject({ exit: 2, stdout: "" });
    expect(ran.stderr.length).toBeGreaterThan(10);
  });

  it("answers wrong usage in JSON where JSON was asked for", async () => {
    const { exit, stdout } = await command.run(["find", "--json"]);
    expect(exit).toBe(2);
    expect(JSON.parse(stdout)).toEqual({ error: "usage", detail: "missing required argument 'text'" });
  });

  it("says how to build it when it is not built", async () => {
    const launcher = join(command.folder, "unbuilt/bin/beadroll.mjs");
    await mkdir(join(command.folder, "unbuilt/bin"), { recursive: true });
    await copyFile(fileURLToPath(new URL("../bin/beadroll.mjs", import.meta.url)), launcher);
    const ran = spawnSync(process.execPath, [launcher, "--version"], { encoding: "utf8" });
    expect(ran.status).toBe(1);
    expect(ran.stderr).toContain("run `npm start` or `npm run build` once");
  });
});
