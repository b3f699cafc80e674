import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { mountLot } from "../cells/cells.service.ts";
import { addCertificate } from "../lots/lots.service.ts";
import { addPiece } from "../parts/parts.service.ts";
import { addQualification, createPerson } from "../people/people.service.ts";
import { aCell, aLog, aLot, aPart, aScan } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

let server: TestServer;
let paths: string[];
let quality: string;
let administrator: string;

/** One of everything, so that each list and page has something to show. */
beforeAll(async () => {
  server = await startTestServer();
  quality = await server.as("quality");
  administrator = await server.as("administrator");
  const { context } = server;
  const part = await aPart(server, 2);
  const cell = await aCell(server);
  const plate = await aLot(server);
  const wire = await aLot(server, { kind: "wire" });
  const person = await createPerson(context, { name: "Ilka Varga", job: "Welding operator" });
  await addQualification(context, person.tag, {
    standard: "ISO 14732",
    number: "Q-1",
    process: "135",
    range: "Robot",
    issued_on: "2026-01-01",
    valid_until: "2028-12-31",
  });
  await addCertificate(context, plate.tag, {
    type: "3.1",
    number: "A-1",
    issuer: "Works",
    issued_on: "2026-10-01",
    chemistry: { C: 0.16 },
  });
  await addPiece(context, part.tag, { position: "Web plate", lot_tag: plate.tag });
  await mountLot(context, {
    cell_tag: cell.tag,
    slot: "wire",
    lot_tag: wire.tag,
    at: "2026-01-01T00:00:00.000Z",
  });
  const key = await server.machine(["scans:write", "passes:write"], cell.id);
  const seam = part.roll[0]?.tag ?? "";
  const push = (what: string, name: string, bytes: Buffer) =>
    server.http
      .post(`/api/v1/seams/${seam}/${what}`)
      .set("Authorization", key)
      .set("Idempotency-Key", `pages-test-${what}`)
      .attach(name, bytes, `${name}.csv`)
      .field(what === "passes" ? { operator_tag: person.tag } : {})
      .expect(201);
  await push("scans", "scan", aScan(2.2));
  await push("passes", "log", aLog());
  const modelSeam = await server.deps.db.reader("model_seams").first("id", "drawing_id", "procedure_id");
  paths = [
    "/floor",
    "/cells",
    `/cells/${cell.tag}`,
    "/mounts",
    `/mounts?cell_tag=${cell.tag}`,
    "/parts",
    `/parts/${part.tag}`,
    "/seams",
    "/seams?state=welded&verdict=adapt",
    `/seams/${seam}`,
    "/lots",
    "/lots?kind=wire&number=H",
    `/lots/${plate.tag}`,
    `/lots/${wire.tag}`,
    "/drawings",
    "/drawings?status=current",
    `/drawings/${modelSeam.drawing_id}`,
    `/model-seams/${modelSeam.id}`,
    `/model-seams/${modelSeam.id}/model`,
    "/procedures",
    `/procedures/${modelSeam.procedure_id}`,
    "/people",
    `/people/${person.tag}`,
    "/find?q=0",
    `/tags/${seam}`,
    "/ledger-entries",
    `/ledger-entries?subject=${seam}&action=pass.record`,
    "/ledger-entries/0",
    "/me",
  ];
});
afterAll(() => server.close());

describe("every list and page", () => {
  it("answers as its contract says", async () => {
    for (const path of paths) {
      const answer = await server.http.get(`/api/v1${path}`).set("Authorization", quality);
      expect(answer.status, `${path}: ${JSON.stringify(answer.body)}`).toBe(200);
    }
    for (const path of ["/users", "/keys"])
      expect((await server.http.get(`/api/v1${path}`).set("Authorization", administrator)).status, path).toBe(
        200,
      );
  });

  it("shows on the floor what the cell did and what waits", async () => {
    const { body } = await server.http.get("/api/v1/floor").set("Authorization", quality);
    expect(body.cells[0].today).toMatchObject({ scans: 1 });
    expect(body.cells[0].latest.length).toBe(1);
    expect(body.cells[0].mounts[0].slot).toBe("wire");
    expect([body.held_count, body.to_inspect_count]).toEqual([0, 1]);
  });

  it("counts for a lot the seams it is in: of the whole part as a piece, of the pass as wire", async () => {
    const lots = await server.deps.db.reader("lots").orderBy("kind").select("tag");
    const counts: number[] = [];
    for (const { tag } of lots)
      counts.push(
        (await server.http.get(`/api/v1/lots/${tag}`).set("Authorization", quality)).body.seam_count,
      );
    expect(counts).toEqual([2, 1]);
  });
});
