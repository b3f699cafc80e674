import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type BuiltCommand, builtCommand } from "../testing/built-command.ts";
import { type RecordServer, startRecordServer } from "../testing/record-server.ts";

let command: BuiltCommand;
let server: RecordServer;
let env: Record<string, string>;

beforeAll(async () => {
  command = await builtCommand();
  server = await startRecordServer();
  env = { BEADROLL_SERVER: server.url, BEADROLL_KEY: server.key };
});
afterAll(async () => {
  await server.close();
  await command.remove();
});

const ID = "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77";
const find = (...words: string[]) => command.run(["find", ...words], { env });

describe("find", () => {
  it("shows kind, tag, title and detail in columns", async () => {
    server.found = [
      { kind: "part", tag: "P-A88Y3EP9H", id: ID, title: "Skid frame 0418", detail: "FW-2210 rev C" },
      { kind: "drawing", tag: null, id: ID, title: "FW-0418", detail: "Fächer\u001b[31m" },
    ];
    const ran = await find("0418");
    expect(ran).toMatchObject({ exit: 0, stderr: "" });
    expect(ran.stdout.split("\n")).toEqual([
      "kind     tag          title            detail",
      "part     P-A88Y3EP9H  Skid frame 0418  FW-2210 rev C",
      "drawing               FW-0418          Fächer [31m",
      "",
    ]);
  });

  it("gives programs the list", async () => {
    server.found = [{ kind: "cell", tag: "C-F0GT5KKGY", id: ID, title: "Cell 1", detail: "" }];
    expect(JSON.parse((await find("cell", "--json")).stdout)).toEqual({ items: server.found });
  });

  it("says so when nothing is found, which is no failure", async () => {
    server.found = [];
    expect(await find("skid", "frame")).toEqual({
      exit: 0,
      stdout: 'Nothing here is called "skid frame".\n',
      stderr: "",
    });
  });

  it("ends with 2 when there is nothing to look for", async () => {
    expect((await find(" ")).exit).toBe(2);
    expect((await find("x".repeat(201))).exit).toBe(2);
  });
});
