import type { PartPage } from "@beadroll/domain/schemas/part";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { aCell, aLot, aPart } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

let server: TestServer;
let reader: string;
let part: PartPage;

beforeAll(async () => {
  server = await startTestServer();
  reader = await server.as("auditor");
  part = await aPart(server, 2);
  await aLot(server, { number: "H48812" });
  await aCell(server);
});
afterAll(() => server.close());

const find = async (q: string) =>
  (await server.http.get("/api/v1/find").query({ q }).set("Authorization", reader)).body.items;

describe("the one search", () => {
  it("finds a thing by its tag however it is typed", async () => {
    const seam = part.roll[0]?.tag ?? "";
    for (const typed of [
      seam,
      seam.toLowerCase(),
      seam.replace("-", " "),
      `http://weld.example/T/${seam}`,
      seam.replaceAll("0", "O"),
    ])
      expect(
        (await find(typed)).map((item: { tag: string }) => item.tag),
        typed,
      ).toEqual([seam]);
  });

  it("finds parts by serial, name and order, lots by number, people and cells by name", async () => {
    expect((await find(part.serial))[0]).toMatchObject({ kind: "part", tag: part.tag });
    expect((await find(`test frame ${part.serial}`))[0]).toMatchObject({ kind: "part", tag: part.tag });
    expect(await find("41-22")).toContainEqual(expect.objectContaining({ kind: "part", tag: part.tag }));
    expect((await find("h488"))[0]).toMatchObject({ kind: "lot", title: "H48812" });
    expect((await find("cell 0"))[0]).toMatchObject({ kind: "cell" });
    expect((await find("Test frame"))[0]).toMatchObject({ kind: "drawing" });
  });

  it("finds nothing where there is nothing", async () => {
    expect(await find("no such thing")).toEqual([]);
    expect(await find("%")).toEqual([]);
  });
});

describe("a tag", () => {
  it("leads to the page of what it is of", async () => {
    const answer = await server.http
      .get(`/api/v1/tags/${part.tag.toLowerCase()}`)
      .set("Authorization", reader);
    expect(answer.body).toMatchObject({ kind: "part", page: `/parts/${part.tag}` });
  });

  it("that is mistyped is refused with the place of doubt, before any look-up", async () => {
    const swapped = part.tag.replace(/(.)(.)$/, "$2$1");
    const answer = await server.http
      .get(`/api/v1/tags/${swapped === part.tag ? "P-000000000" : swapped}`)
      .set("Authorization", reader);
    expect([answer.status, answer.body.errors[0].code]).toEqual([422, "tag-invalid"]);
  });

  it("on a label in upper case opens the page's address", async () => {
    const answer = await server.http.get(`/T/${part.tag}`);
    expect([answer.status, answer.headers["location"]]).toEqual([302, `/t/${part.tag}`]);
  });
});
