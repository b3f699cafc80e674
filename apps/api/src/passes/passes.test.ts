import type { Cell } from "@beadroll/domain/schemas/cell";
import type { PartPage } from "@beadroll/domain/schemas/part";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { mountLot } from "../cells/cells.service.ts";
import { addQualification, createPerson } from "../people/people.service.ts";
import { aCell, aLog, aLot, aPart, aScan } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

let server: TestServer;
let cell: Cell;
let cellPc: string;
let inspector: string;
let part: PartPage;
let made = 0;

beforeAll(async () => {
  server = await startTestServer();
  cell = await aCell(server);
  cellPc = await server.machine(["scans:write", "passes:write", "records:read"], cell.id);
  inspector = await server.as("inspector");
  part = await aPart(server, 8);
});
afterAll(() => server.close());

const seamTag = (index: number): string => part.roll[index]?.tag ?? "";
const seamPage = async (tag: string) =>
  (await server.http.get(`/api/v1/seams/${tag}`).set("Authorization", inspector)).body;

function push(tag: string, log: Buffer, fields: Record<string, string> = {}) {
  made += 1;
  const request = server.http
    .post(`/api/v1/seams/${tag}/passes`)
    .set("Authorization", cellPc)
    .set("Idempotency-Key", `pass-test-key-${made}`)
    .attach("log", log, "pass.csv");
  for (const [field, value] of Object.entries(fields)) request.field(field, value);
  return request;
}

function inspect(tag: string, body: object) {
  made += 1;
  return server.http
    .post(`/api/v1/seams/${tag}/inspections`)
    .set("Authorization", inspector)
    .set("Idempotency-Key", `inspection-key-${made}`)
    .send(body);
}

describe("a pass that is pushed", () => {
  it("is reduced and held against the procedure", async () => {
    const answer = await push(seamTag(0), aLog(6), { started_at: "2026-11-30T10:00:00.000Z" });
    expect(answer.status).toBe(201);
    // 250 A x 28 V / 6.5 mm/s x 0.8 (EN 1011-1 for process 135) = 861.5 J/mm
    expect(answer.body.result.heat_input_kj_mm).toBeCloseTo(0.8615, 3);
    expect(answer.body.result.judgement.verdict).toBe("inside");
    expect(answer.body.procedure_name).toMatch(/^PB-135-\d+ rev 1$/);
    expect(await seamPage(seamTag(0))).toMatchObject({ state: "welded" });
  });

  it("gets the lots that were mounted while its arc burned, both when the spool changed in mid-pass", async () => {
    const first = await aLot(server, { kind: "wire", number: "W-1", grade: "G 42 4 M21 3Si1" });
    const second = await aLot(server, { kind: "wire", number: "W-2", grade: "G 42 4 M21 3Si1" });
    const never = await aLot(server, { kind: "wire", number: "W-3", grade: "G 42 4 M21 3Si1" });
    const mount = (lot_tag: string, at: string) =>
      mountLot(server.context, { cell_tag: cell.tag, slot: "wire", lot_tag, at });
    await mount(first.tag, "2026-11-30T10:00:00.000Z");
    await mount(second.tag, "2026-11-30T11:00:04.000Z");
    await mount(never.tag, "2026-11-30T11:30:00.000Z");
    await push(seamTag(1), aLog(6), { started_at: "2026-11-30T11:00:00.000Z" });
    const { pass_lots } = await seamPage(seamTag(1));
    expect(
      pass_lots.map((lot: { lot_number: string; from_at: string; to_at: string }) => [
        lot.lot_number,
        lot.from_at,
        lot.to_at,
      ]),
    ).toEqual([
      ["W-1", expect.stringMatching(/^2026-11-30T11:00:0[01]/), "2026-11-30T11:00:04.000Z"],
      ["W-2", "2026-11-30T11:00:04.000Z", expect.stringMatching(/^2026-11-30T11:00:07/)],
    ]);
  });

  it("names the operator with the qualification valid on that day", async () => {
    const person = await createPerson(server.context, { name: "Ilka Varga", job: "Welding operator" });
    await addQualification(server.context, person.tag, {
      standard: "ISO 14732",
      number: "Q-2214",
      process: "135",
      range: "Robot",
      issued_on: "2026-01-10",
      valid_until: "2026-11-29",
    });
    const before = await push(seamTag(2), aLog(5), {
      started_at: "2026-11-29T10:00:00.000Z",
      operator_tag: person.tag,
    });
    const after = await push(seamTag(2), aLog(4), {
      started_at: "2026-11-30T10:00:00.000Z",
      operator_tag: person.tag,
    });
    expect(before.body).toMatchObject({
      operator_name: "Ilka Varga",
      operator_valid_until: "2026-11-29",
      pass_number: 1,
    });
    expect(after.body).toMatchObject({ operator_valid_until: null, pass_number: 2 });
  });

  it("is one record however often the same log comes, and refused under a number that is taken", async () => {
    const first = await push(seamTag(3), aLog(6), { pass_number: "1" });
    const again = await push(seamTag(3), aLog(6), { pass_number: "1" });
    const other = await push(seamTag(3), aLog(7), { pass_number: "1" });
    expect(again.body.id).toBe(first.body.id);
    expect([other.status, other.body.errors[0].code]).toEqual([409, "conflict"]);
  });

  it.each([
    [
      "text in a number column",
      "time_s,current_a,voltage_v\n0,0,0\n1,250,28\n2,much,28\n3,0,0\n",
      "file-value-invalid",
      { line: 4 },
    ],
    [
      "a clock that runs backwards",
      "time_s,current_a,voltage_v\n0,0,0\n1,250,28\n0.5,250,28\n3,0,0\n",
      "log-clock-reset",
      { line: 4 },
    ],
    ["no arc in it", "time_s,current_a,voltage_v\n0,0,0\n1,0,0\n2,0,0\n", "log-no-arc", {}],
    ["no voltage", "time_s,current_a\n0,0\n1,250\n", "file-column-missing", {}],
  ])("with %s is refused with its place, and nothing is written", async (_name, log, code, place) => {
    const before = (await server.deps.db.reader("ledger_entries")).length;
    const answer = await push(seamTag(4), Buffer.from(log));
    expect([answer.status, answer.body.errors[0].code]).toEqual([422, code]);
    expect(answer.body.errors[0]).toMatchObject(place);
    expect((await server.deps.db.reader("ledger_entries")).length).toBe(before);
    expect((await seamPage(seamTag(4))).state).toBe("planned");
  });
});

describe("an inspection", () => {
  it("accepts a welded seam, and is stale once the seam is welded again", async () => {
    await push(seamTag(5), aLog(6));
    expect((await inspect(seamTag(5), { method: "VT", result: "accepted" })).status).toBe(201);
    expect((await seamPage(seamTag(5))).state).toBe("accepted");
    await push(seamTag(5), aLog(8));
    expect((await seamPage(seamTag(5))).state).toBe("welded");
  });

  it("that rejects needs to say what was seen", async () => {
    await push(seamTag(6), aLog(6));
    const silent = await inspect(seamTag(6), { method: "VT", result: "rejected" });
    expect([silent.status, silent.body.errors[0].pointer]).toEqual([422, "/note"]);
  });

  it("that rejects makes the next scan or pass the seam's second attempt", async () => {
    await inspect(seamTag(6), { method: "VT", result: "rejected", note: "Undercut 0.8 mm from 12 to 30 mm" });
    expect(await seamPage(seamTag(6))).toMatchObject({ state: "rejected", attempt: 1 });
    made += 1;
    await server.http
      .post(`/api/v1/seams/${seamTag(6)}/scans`)
      .set("Authorization", cellPc)
      .set("Idempotency-Key", `repair-scan-${made}`)
      .attach("scan", aScan(0.2), "scan.xyz")
      .expect(201);
    const repaired = await seamPage(seamTag(6));
    expect(repaired).toMatchObject({ state: "clear", attempt: 2 });
    expect(repaired.inspections[0]).toMatchObject({ attempt: 1, result: "rejected" });
  });

  it("of a seam that is not welded is refused", async () => {
    const answer = await inspect(seamTag(7), { method: "VT", result: "accepted" });
    expect([answer.status, answer.body.errors[0].code]).toEqual([409, "state-conflict"]);
  });
});
