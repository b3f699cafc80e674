import { readFile, stat, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { type BuiltCommand, builtCommand } from "../testing/built-command.ts";
import { type RecordServer, startRecordServer } from "../testing/record-server.ts";

let command: BuiltCommand;
let server: RecordServer;

beforeAll(async () => {
  command = await builtCommand();
});
afterAll(() => command.remove());
beforeEach(async () => {
  server = await startRecordServer();
});
afterEach(() => server.close());

const profile = (): string => join(command.home, "profile.json");
const enrol = (...args: string[]) => command.run(["enrol", ...args]);

describe("enrol", () => {
  it("keeps server and key, readable by this user alone, once the server knows the key", async () => {
    const ran = await enrol("--server", `${server.url}/`, "--key", server.key);
    expect(ran).toMatchObject({ exit: 0, stderr: "" });
    expect(ran.stdout).toContain("as Cell 2 PC, cell C-F0GT5KKGY");
    expect(JSON.parse(await readFile(profile(), "utf8"))).toEqual({ server: server.url, key: server.key });
    expect((await stat(profile())).mode & 0o777).toBe(0o600);
    expect((await stat(command.home)).mode & 0o777).toBe(0o700);
  });

  it("reads the key from standard input, so that it stands in no process list", async () => {
    const ran = await command.run(["enrol", "--server", server.url, "--key", "-", "--json"], {
      stdin: `${server.key}\n`,
    });
    expect(ran.exit).toBe(0);
    expect(JSON.parse(ran.stdout)).toMatchObject({ name: "Cell 2 PC", cell_tag: "C-F0GT5KKGY" });
    expect(ran.stdout).not.toContain(server.key);
  });

  it("keeps what it had when the server does not know the key, and ends with 40", async () => {
    await enrol("--server", server.url, "--key", server.key);
    const before = await readFile(profile(), "utf8");
    const ran = await enrol("--server", server.url, "--key", "brk_unknown");
    expect(ran.exit).toBe(40);
    expect(ran.stderr).toContain("does not accept this computer's key");
    expect(await readFile(profile(), "utf8")).toBe(before);
  });

  it("ends with 20 when nobody answers", async () => {
    await server.close();
    const ran = await enrol("--server", server.url, "--key", server.key, "--json");
    expect(ran.exit).toBe(20);
    expect(JSON.parse(ran.stdout)).toMatchObject({ error: "unreachable" });
  });

  const wrong = [
    [
      "an address without http",
      ["--server", "weld.example", "--key", "brk_x"],
      "--server: expected an address",
    ],
    ["an address with a name in it", ["--server", "http://me@weld.example", "--key", "brk_x"], "--server: "],
    ["a key of two words", ["--server", "http://weld.example", "--key", "brk x"], "--key: expected one word"],
  ] as const;
  it.each(wrong)("ends with 2 for %s", async (_name, args, words) => {
    const ran = await enrol(...args);
    expect(ran).toMatchObject({ exit: 2, stdout: "" });
    expect(ran.stderr).toContain(words);
  });
});

describe("the profile in force", () => {
  it("is what the environment says before what was kept", async () => {
    await enrol("--server", server.url, "--key", server.key);
    expect((await command.run(["find", "0418"])).exit).toBe(0);
    const other = await command.run(["find", "0418"], { env: { BEADROLL_KEY: "brk_other" } });
    expect(other.exit).toBe(40);
    const misspelt = await command.run(["find", "0418"], { env: { BEADROLL_SERVER: "weld" } });
    expect(misspelt).toMatchObject({ exit: 2, stdout: "" });
    expect(misspelt.stderr).toContain("BEADROLL_SERVER: expected an address");
  });

  it("is refused with the way out when its file is damaged", async () => {
    await enrol("--server", server.url, "--key", server.key);
    await writeFile(profile(), '{"server": 7');
    const ran = await command.run(["find", "0418"]);
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toContain("run beadroll enrol again");
  });
});
