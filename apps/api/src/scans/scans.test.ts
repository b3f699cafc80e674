import { decodeCloud } from "@beadroll/domain/measure/cloud/cloud-codec";
import type { PartPage } from "@beadroll/domain/schemas/part";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { aBeadScan, aCell, aPart, aScan } from "../testing/builders.ts";
import { startTestServer, type TestServer } from "../testing/test-server.ts";

let server: TestServer;
let cellPc: string;
let reader: string;
let part: PartPage;
let made = 0;

beforeAll(async () => {
  server = await startTestServer();
  const cell = await aCell(server);
  cellPc = await server.machine(["scans:write", "records:read"], cell.id);
  reader = await server.as("auditor");
  part = await aPart(server, 9);
});
afterAll(() => server.close());

const seamTag = (index: number): string => part.roll[index]?.tag ?? "";

interface Push {
  readonly scan?: Buffer;
  readonly name?: string;
  readonly poses?: Buffer;
  readonly fields?: Record<string, string>;
  readonly key?: string;
  readonly as?: string;
}

function push(
  tag: string,
  { scan = aScan(), name = "scan.xyz", poses, fields = {}, key, as = cellPc }: Push = {},
) {
  made += 1;
  const request = server.http
    .post(`/api/v1/seams/${tag}/scans`)
    .set("Authorization", as)
    .set("Idempotency-Key", key ?? `scan-test-key-${made}`)
    .attach("scan", scan, name);
  if (poses) request.attach("poses", poses, "poses.csv");
  for (const [field, value] of Object.entries(fields)) request.field(field, value);
  return request;
}

const rows = async () => ({
  scans: (await server.deps.db.reader("scans")).length,
  files: (await server.deps.db.reader("files")).length,
  entries: (await server.deps.db.reader("ledger_entries")).length,
});

describe("a scan of the finished bead", () => {
  const pushBead = (undercut_mm: number) =>
    push(seamTag(7), { scan: aBeadScan(undercut_mm), name: "bead.xyz", fields: { stage: "bead" } });

  it("is measured and judged by the seam's size and level, and leaves the fit-up's verdict alone", async () => {
    const pushed = await pushBead(0.9);
    expect(pushed.status).toBe(201);
    expect(pushed.body).toMatchObject({ stage: "bead", verdict: "hold" });
    const { result } = pushed.body;
    expect(result.requirement).toMatchObject({ edition: "2023" });
    expect(result.findings[0]).toMatchObject({ code: "5011", plate: "b", state: "not_met" });
    const again = await server.http.get(`/api/v1/scans/${pushed.body.id}`).set("Authorization", reader);
    expect(again.body).toEqual(pushed.body);
    const seam = await server.http.get(`/api/v1/seams/${seamTag(7)}`).set("Authorization", reader);
    expect(seam.body).toMatchObject({ verdict: null, state: "planned" });
  });

  it("shows its section with the toes, and has neither path nor fill", async () => {
    const pushed = await pushBead(0);
    const get = (what: string) =>
      server.http.get(`/api/v1/scans/${pushed.body.id}/${what}`).set("Authorization", reader);
    const section = await get("section?station_mm=20");
    expect(section.body).toMatchObject({ measured: true, root: expect.any(Array) });
    expect(section.body.toes).toHaveLength(2);
    for (const what of ["path", "path.csv", "fill"]) {
      const refused = await get(what);
      expect([refused.status, refused.body.type]).toEqual([409, expect.stringMatching(/scan-not-fitup$/)]);
    }
  });
});

describe("the points of a scan", () => {
  it("are given thinned, in the part frame, to whoever may read records", async () => {
    const pushed = await push(seamTag(6));
    const got = await server.http
      .get(`/api/v1/scans/${pushed.body.id}/cloud`)
      .set("Authorization", reader)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on("data", (chunk: Buffer) => chunks.push(chunk));
        response.on("end", () => done(null, Buffer.concat(chunks)));
      });
    expect([got.status, got.headers["content-type"]]).toEqual([200, "application/octet-stream"]);
    const { count, xyz_mm } = decodeCloud(new Uint8Array(got.body));
    expect([count, xyz_mm.length / 3]).toEqual([pushed.body.points, pushed.body.points]);
    expect(xyz_mm[1]).toBeCloseTo(99.6, 3);
  });
});

describe("advice from a scan", () => {
  it("is the corrected path as JSON and CSV, and the fill under the seam's procedure", async () => {
    const pushed = await push(seamTag(8));
    expect(pushed.status).toBe(201);
    const get = (what: string) =>
      server.http.get(`/api/v1/scans/${pushed.body.id}/${what}`).set("Authorization", reader);
    const path = await get("path");
    expect([path.status, path.body.frame, path.body.verdict]).toEqual([200, "part", pushed.body.verdict]);
    const measured = pushed.body.result.stations.filter((station: { measured: boolean }) => station.measured);
    expect(path.body.points).toHaveLength(measured.length);
    expect(path.body.notice).toMatch(/no command to a robot/);
    const csv = await get("path.csv");
    expect([csv.status, csv.headers["content-type"]]).toEqual([200, expect.stringMatching(/^text\/csv/)]);
    expect(csv.text.trimEnd().split("\n")).toHaveLength(measured.length + 2);
    const fill = await get("fill");
    expect(fill.status).toBe(200);
    expect(fill.body.nominal_area_mm2).toBeGreaterThan(0);
    expect(fill.body.stations.length).toBeGreaterThan(0);
    expect(fill.body.notice).toMatch(/never a command/);
    const unknown = "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77";
    const none = await server.http.get(`/api/v1/scans/${unknown}/path`).set("Authorization", reader);
    expect(none.status).toBe(404);
  });
});

describe("a scan that is pushed", () => {
  it("is measured, judged and linked to its seam", async () => {
    const answer = await push(seamTag(0), { fields: { part_tag: part.tag } });
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      seam_tag: seamTag(0),
      stage: "fitup",
      verdict: "within",
      received_from: expect.stringContaining("key"),
    });
    const measured = answer.body.result.stations.filter((station: { measured: boolean }) => station.measured);
    expect(measured.length).toBeGreaterThan(15);
    for (const station of measured) expect(Math.abs(station.lateral_mm)).toBeLessThan(0.05);
    const seam = await server.http.get(`/api/v1/seams/${seamTag(0)}`).set("Authorization", reader);
    expect(seam.body).toMatchObject({ state: "clear", verdict: "within" });
    expect(seam.body.scans[0].id).toBe(answer.body.id);
    expect(seam.body.ledger_seqs).toContain(answer.body.ledger_seq);
    expect(seam.body.strip.length).toBeGreaterThan(10);
  });

  it("finds the upright where it stands, 2.5 mm off, and says adapt", async () => {
    const answer = await push(seamTag(1), { scan: aScan(2.5) });
    expect(answer.body.verdict).toBe("adapt");
    expect(answer.body.result.summary.lateral_mm.max_abs).toBeCloseTo(2.5, 1);
  });

  it("is answered with the first record when the same files come again", async () => {
    const first = await push(seamTag(2));
    const before = await rows();
    const again = await push(seamTag(2));
    const replayed = await push(seamTag(2), { key: "scan-test-same-key" });
    expect([again.body.id, replayed.body.id]).toEqual([first.body.id, first.body.id]);
    expect(await rows()).toEqual(before);
  });

  it("gives its cross-section at a station", async () => {
    const scan = await push(seamTag(3), { scan: aScan(1) });
    const section = await server.http
      .get(`/api/v1/scans/${scan.body.id}/section?station_mm=20`)
      .set("Authorization", reader);
    expect(section.status).toBe(200);
    expect(section.body.measured).toBe(true);
    expect(section.body.root[0]).toBeCloseTo(1, 1);
    expect(section.body.kept.length).toBeGreaterThan(50);
  });

  it("keeps its bytes as they came", async () => {
    const scan = aScan(0.3);
    const answer = await push(seamTag(4), { scan });
    const bytes = await server.http
      .get(`/api/v1/files/${answer.body.file_digest}`)
      .set("Authorization", reader)
      .buffer(true)
      .parse((res, done) => {
        const chunks: Buffer[] = [];
        res.on("data", (chunk: Buffer) => chunks.push(chunk));
        res.on("end", () => done(null, Buffer.concat(chunks)));
      });
    expect(Buffer.compare(bytes.body, scan)).toBe(0);
  });
});

describe("a scan that cannot be used", () => {
  const text = (content: string) => Buffer.from(content);
  const ply = (vertices: number, body: Buffer) =>
    Buffer.concat([
      Buffer.from(
        `ply\nformat binary_little_endian 1.0\nelement vertex ${vertices}\nproperty float x\nproperty float y\nproperty float z\nend_header\n`,
      ),
      body,
    ]);
  const cases: [string, Push, number, string, Record<string, unknown>][] = [
    ["an empty file", { scan: text("") }, 422, "file-empty", { field: "scan" }],
    [
      "a PLY that is cut",
      { scan: ply(1000, Buffer.alloc(1200)), name: "cloud.ply" },
      422,
      "file-truncated",
      {},
    ],
    [
      "text in a number column",
      { scan: text("x_mm,y_mm,z_mm\n0,100,0\n1,hundred,0\n2,100,0\n"), name: "scan.csv" },
      422,
      "file-value-invalid",
      { line: 3 },
    ],
    [
      "a scan in inches declared as mm",
      {
        scan: text(
          aScan()
            .toString()
            .replaceAll(/-?\d+(\.\d+)?/g, (number) => (Number(number) / 25.4).toFixed(5)),
        ),
      },
      422,
      "scan-units-implausible",
      {},
    ],
    [
      "a seam of another part",
      { fields: { part_tag: "P-8K3F7Q2NA" } },
      422,
      "seam-of-other-part",
      { field: "part_tag" },
    ],
    [
      "a picture",
      { scan: Buffer.from([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0, 0, 13]), name: "x.png" },
      415,
      "file-format-unknown",
      {},
    ],
    ["an unknown field", { fields: { colour: "red" } }, 422, "request-invalid", { field: "colour" }],
    [
      "a stage that does not exist",
      { fields: { stage: "after" } },
      422,
      "request-invalid",
      { field: "stage" },
    ],
  ];

  it.each(cases)(
    "such as %s is refused with its place, and nothing is written",
    async (_name, sent, status, code, place) => {
      const before = await rows();
      const answer = await push(seamTag(7), sent);
      expect([answer.status, answer.body.errors?.[0]?.code], JSON.stringify(answer.body)).toEqual([
        status,
        code,
      ]);
      expect(answer.body.errors[0]).toMatchObject(place);
      expect(await rows()).toEqual(before);
    },
  );

  it("because it is 300 MB is refused in time to read why", async () => {
    const before = await rows();
    const boundary = "----beadroll-test";
    const head = `--${boundary}\r\nContent-Disposition: form-data; name="scan"; filename="huge.ply"\r\n\r\n`;
    const chunk = new Uint8Array(1024 * 1024);
    let sent = 0;
    const body = new ReadableStream<Uint8Array>({
      pull(controller) {
        if (sent === 0) controller.enqueue(new TextEncoder().encode(head));
        if (sent >= 300) controller.close();
        else controller.enqueue(chunk);
        sent += 1;
      },
    });
    const answer = await fetch(`${server.url}/api/v1/seams/${seamTag(7)}/scans`, {
      method: "POST",
      headers: {
        Authorization: cellPc,
        "Idempotency-Key": "scan-test-huge-file",
        "Content-Type": `multipart/form-data; boundary=${boundary}`,
      },
      body,
      duplex: "half",
    } as RequestInit & { duplex: "half" });
    expect(answer.status).toBe(413);
    expect(await answer.json()).toMatchObject({ errors: [{ code: "file-too-large", field: "scan" }] });
    expect(await rows()).toEqual(before);
  });

  it("because its tag is mistyped is refused before any look-up", async () => {
    const answer = await push("S-8K3F7Q2NA");
    expect([answer.status, answer.body.errors[0].code]).toEqual([422, "tag-invalid"]);
  });

  it("because the key has not the scope, or stands in another cell, is refused", async () => {
    const before = await rows();
    const other = await aCell(server);
    const without = await push(seamTag(7), { as: await server.machine(["passes:write"]) });
    const foreign = await push(seamTag(7), { fields: { cell_tag: other.tag } });
    expect([without.status, foreign.status]).toEqual([403, 403]);
    expect((await rows()).scans).toBe(before.scans);
  });
});
