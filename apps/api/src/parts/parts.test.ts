import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { patchDrawing } from "../drawings/drawings.service.ts";
import { aDrawing, aLot, aPart } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";
import { createPart } from "./parts.service.ts";

let server: TestServer;
let quality: string;
let made = 0;

beforeAll(async () => {
  server = await startTestServer();
  quality = await server.as("quality");
});
afterAll(() => server.close());

const post = (path: string, body: object) => {
  made += 1;
  return server.http
    .post(`/api/v1${path}`)
    .set("Authorization", quality)
    .set("Idempotency-Key", `parts-test-${made}`)
    .send(body);
};
const get = (path: string) => server.http.get(`/api/v1${path}`).set("Authorization", quality);

describe("a part that is started", () => {
  it("has its seams planned from the drawing, in welding sequence, each with a tag", async () => {
    const drawing = await aDrawing(server, 3);
    const answer = await post("/parts", { drawing_id: drawing.id, serial: "0418", order_no: "41-2207" });
    expect(answer.status).toBe(201);
    expect(answer.body.name).toBe("Test frame 0418");
    expect(answer.body.seams).toMatchObject({ total: 3, planned: 3 });
    const roll: { number: string; state: string; tag: string }[] = answer.body.roll;
    expect(roll.map(({ number, state }) => [number, state])).toEqual([
      ["S1", "planned"],
      ["S2", "planned"],
      ["S3", "planned"],
    ]);
    for (const { tag } of roll) expect(tag).toMatch(/^S-[0-9A-HJKMNP-TV-Z]{9}$/);
  });

  it("is refused under a serial that the drawing has, and to a drawing that is not current", async () => {
    const drawing = await aDrawing(server, 1);
    await createPart(server.context, { drawing_id: drawing.id, serial: "0001" });
    const twin = await post("/parts", { drawing_id: drawing.id, serial: "0001" });
    expect([twin.status, twin.body.errors[0]]).toEqual([
      409,
      expect.objectContaining({ code: "conflict", field: "serial" }),
    ]);
    await patchDrawing(server.context, drawing.id, { status: "superseded" }, drawing.version);
    const old = await post("/parts", { drawing_id: drawing.id, serial: "0002" });
    expect([old.status, old.body.errors[0].code]).toEqual([409, "state-conflict"]);
  });

  it("is shown in the part it is built into", async () => {
    const parent = await aPart(server, 1);
    const drawing = await aDrawing(server, 1);
    const child = await post("/parts", { drawing_id: drawing.id, serial: "0007", parent_tag: parent.tag });
    expect(child.body.parent_tag).toBe(parent.tag);
    expect((await get(`/parts/${parent.tag}`)).body.contents).toEqual([
      { tag: child.body.tag, name: child.body.name },
    ]);
  });
});

describe("a piece", () => {
  it("is replaced by the next at its position, and the old link stays on the record", async () => {
    const part = await aPart(server, 1);
    const [first, second] = [await aLot(server), await aLot(server)];
    await post(`/parts/${part.tag}/pieces`, { position: "Web plate", lot_tag: first.tag });
    await post(`/parts/${part.tag}/pieces`, { position: "Web plate", lot_tag: second.tag });
    const { pieces, went_in } = (await get(`/parts/${part.tag}`)).body;
    expect(
      pieces.map((piece: { lot_tag: string; to_at: string | null }) => [piece.lot_tag, piece.to_at === null]),
    ).toEqual([
      [second.tag, true],
      [first.tag, false],
    ]);
    expect(went_in).toMatchObject([{ role: "Web plate", tag: second.tag }]);
  });

  it("is refused from a lot that is quarantined, or of wire", async () => {
    const part = await aPart(server, 1);
    const lot = await aLot(server);
    await server.http
      .patch(`/api/v1/lots/${lot.tag}`)
      .set("Authorization", quality)
      .set("If-Match", `"${lot.version}"`)
      .send({ state: "quarantined" })
      .expect(200);
    const wire = await aLot(server, { kind: "wire" });
    for (const tag of [lot.tag, wire.tag]) {
      const answer = await post(`/parts/${part.tag}/pieces`, { position: "Web plate", lot_tag: tag });
      expect([answer.status, answer.body.errors[0].code]).toEqual([409, "state-conflict"]);
    }
  });
});

describe("the list of parts", () => {
  it("is filtered and sorted as asked", async () => {
    const drawing = await aDrawing(server, 1);
    for (const serial of ["0103", "0101", "0102", "0990"])
      await createPart(server.context, { drawing_id: drawing.id, serial, order_no: "77-1" });
    const serials = async (query: string) =>
      (await get(`/parts?${query}`)).body.items.map((part: { serial: string }) => part.serial);
    expect(await serials(`drawing_id=${drawing.id}&sort=serial`)).toEqual(["0101", "0102", "0103", "0990"]);
    expect(await serials(`drawing_id=${drawing.id}&sort=-serial&serial=01`)).toEqual([
      "0103",
      "0102",
      "0101",
    ]);
    expect((await serials("order_no=77-1")).length).toBe(4);
    expect(await serials(`drawing_id=${drawing.id}&with=held`)).toEqual([]);
    expect((await serials(`drawing_id=${drawing.id}&with=planned`)).length).toBe(4);
  });
});
