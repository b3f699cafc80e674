import { createHash } from "node:crypto";
import { KEY_SCOPES, type Permission, permissionsOf } from "@beadroll/domain/auth/permissions";
import { CellCreate, MountCreate } from "@beadroll/domain/schemas/cell";
import { DrawingCreate, ModelSeamCreate } from "@beadroll/domain/schemas/drawing";
import { InspectionCreate } from "@beadroll/domain/schemas/inspection";
import { CertificateCreate, LotCreate, LotPatch } from "@beadroll/domain/schemas/lot";
import { PartCreate, PieceCreate } from "@beadroll/domain/schemas/part";
import { PassCreate } from "@beadroll/domain/schemas/pass";
import { PersonCreate, QualificationCreate } from "@beadroll/domain/schemas/person";
import { ProcedureCreate, ProcedurePatch } from "@beadroll/domain/schemas/procedure";
import { ScanCreate } from "@beadroll/domain/schemas/scan";
import { ApiKeyCreate, UserCreate } from "@beadroll/domain/schemas/user";
import { describe, expect, test } from "vitest";
import { DEMO_ACCOUNTS, DEMO_KEYS } from "./demo-accounts.ts";
import { type DemoEvent, SETUP_ACTOR } from "./demo-event.ts";
import { demoEvents } from "./demo-scenario.ts";

const OPTIONS = { seed: 1, ends_at: "2026-12-01T14:00:00.000Z" };
const EVENTS = [...demoEvents(OPTIONS)];

type Kind = DemoEvent["kind"];
const ofKind = <K extends Kind>(kind: K) =>
  EVENTS.filter((event): event is Extract<DemoEvent, { kind: K }> => event.kind === kind);

const ID = "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77";
const TAG = "L-8H2K5T9QM";

/** Parses an event's payload with the API's own schema, references filled in as the loader does. */
function parsePayload(event: DemoEvent): unknown {
  switch (event.kind) {
    case "person":
      return PersonCreate.parse(event.fields);
    case "qualification":
      return QualificationCreate.parse(event.fields);
    case "user":
      return UserCreate.parse({ ...event.fields, person_id: ID });
    case "key":
      return ApiKeyCreate.parse({ ...event.fields, cell_id: ID });
    case "cell":
      return CellCreate.parse(event.fields);
    case "procedure":
      return ProcedureCreate.parse(event.fields);
    case "procedure-approval":
      return ProcedurePatch.parse(event.fields);
    case "drawing":
      return DrawingCreate.parse(event.fields);
    case "model-seam":
      return ModelSeamCreate.parse({ ...event.fields, procedure_id: ID });
    case "lot":
      return LotCreate.parse(event.fields);
    case "lot-state":
      return LotPatch.parse(event.fields);
    case "certificate":
      return CertificateCreate.parse({ ...event.fields, file_digest: "0".repeat(64) });
    case "part":
      return PartCreate.parse({ ...event.fields, drawing_id: ID });
    case "piece":
      return PieceCreate.parse({ ...event.fields, lot_tag: TAG });
    case "mount":
      return MountCreate.parse({ ...event.fields, lot_tag: TAG });
    case "scan":
      return ScanCreate.parse(event.fields);
    case "pass":
      return PassCreate.parse(event.fields);
    case "inspection":
      return InspectionCreate.parse(event.fields);
    default:
      return event satisfies never;
  }
}

/** Names that an event refers to. */
function refersTo(event: DemoEvent): string[] {
  const single = ["person", "cell", "procedure", "drawing", "lot", "part", "parent", "operator"] as const;
  const seam = "seam" in event ? [event.seam.part, `${event.seam.part} ${event.seam.number}`] : [];
  const named = single.flatMap((key) => {
    const value: unknown = Reflect.get(event, key);
    return typeof value === "string" ? [value] : [];
  });
  return [...named, ...seam];
}

const NEEDED: Readonly<Record<Kind, Permission>> = {
  person: "people:write",
  qualification: "people:write",
  user: "users:manage",
  key: "keys:manage",
  cell: "cells:write",
  procedure: "procedures:write",
  "procedure-approval": "procedures:write",
  drawing: "drawings:write",
  "model-seam": "drawings:write",
  lot: "lots:write",
  "lot-state": "lots:write",
  certificate: "lots:write",
  part: "parts:write",
  piece: "parts:write",
  mount: "mounts:write",
  scan: "scans:write",
  pass: "passes:write",
  inspection: "inspections:write",
};

describe("the demo scenario as a stream", () => {
  test("is the same, byte for byte, for the same seed and end", () => {
    const digest = (events: Iterable<DemoEvent>) => {
      const hash = createHash("sha256");
      for (const event of events) {
        hash.update(
          JSON.stringify(event, (_, value) => (value instanceof Uint8Array ? value.length : value)),
        );
        if ("file" in event) hash.update(event.file.bytes);
      }
      return hash.digest("hex");
    };
    const first = digest(EVENTS);
    expect(digest(demoEvents(OPTIONS))).toBe(first);
    expect(digest(demoEvents({ ...OPTIONS, seed: 2 }))).not.toBe(first);
  });

  test("runs forward in time and ends where it is told to", () => {
    for (const [i, event] of EVENTS.entries()) {
      if (i > 0) expect(event.at >= (EVENTS[i - 1]?.at ?? "")).toBe(true);
    }
    const last_ms = Date.parse(EVENTS.at(-1)?.at ?? "");
    expect(last_ms).toBeLessThanOrEqual(Date.parse(OPTIONS.ends_at));
    expect(Date.parse(OPTIONS.ends_at) - last_ms).toBeLessThan(20 * 60_000);
  });

  test("ends rightly at any time of the week", () => {
    for (const ends_at of [
      "2026-11-29T03:10:00.000Z",
      "2026-12-05T23:59:59.999Z",
      "2027-03-01T00:00:00.000Z",
    ]) {
      let before = "";
      for (const event of demoEvents({ seed: 3, ends_at })) {
        expect(event.at >= before && event.at <= ends_at).toBe(true);
        before = event.at;
      }
    }
  });

  test("has payloads that the API's schemas take", () => {
    for (const event of EVENTS)
      expect(() => parsePayload(event), `${event.kind} at ${event.at}`).not.toThrow();
  });

  test("refers only to what was made before", () => {
    const made = new Set<string>();
    const seamsOf = new Map<string, string[]>();
    for (const event of EVENTS) {
      for (const ref of refersTo(event)) expect(made, `${event.kind} at ${event.at}`).toContain(ref);
      if ("ref" in event) {
        expect(made).not.toContain(event.ref);
        made.add(event.ref);
      }
      if (event.kind === "model-seam") {
        seamsOf.set(event.drawing, [...(seamsOf.get(event.drawing) ?? []), event.fields.number]);
      }
      if (event.kind === "part") {
        for (const number of seamsOf.get(event.drawing) ?? []) made.add(`${event.ref} ${number}`);
      }
    }
  });

  test("lets only those act who have an account or key by then, and the right to it", () => {
    const may = new Map<string, ReadonlySet<string>>();
    for (const event of EVENTS) {
      if (event.by !== SETUP_ACTOR)
        expect([...(may.get(event.by) ?? [])], event.by).toContain(NEEDED[event.kind]);
      if (event.kind === "user") may.set(event.fields.login, new Set(permissionsOf(event.fields.roles)));
      if (event.kind === "key") may.set(event.fields.name, new Set(event.fields.scopes));
    }
    expect(EVENTS.filter(({ by }) => by === SETUP_ACTOR).map(({ kind }) => kind)).toEqual(["person", "user"]);
  });

  test("never gives the same file twice", () => {
    const digests = EVENTS.flatMap((event) =>
      "file" in event ? [createHash("sha256").update(event.file.bytes).digest("hex")] : [],
    );
    expect(new Set(digests).size).toBe(digests.length);
  });

  test("keeps its scans small: 150 kB each, 350 kB of a finished weld, 60 MB in all", () => {
    const sizes = (stage: "fitup" | "bead") =>
      ofKind("scan").flatMap(({ fields, file }) => (fields.stage === stage ? file.bytes.length : []));
    expect(Math.max(...sizes("fitup"))).toBeLessThan(150_000);
    expect(Math.max(...sizes("bead"))).toBeLessThan(350_000);
    const all = [...sizes("fitup"), ...sizes("bead")];
    expect(all.reduce((sum, size) => sum + size, 0)).toBeLessThan(60e6);
  });
});

describe("the demo's accounts and keys", () => {
  test("cover every role, with passwords of ten characters or more", () => {
    const roles = new Set(DEMO_ACCOUNTS.flatMap(({ roles: held }) => held));
    expect(roles.size).toBe(7);
    for (const { password } of DEMO_ACCOUNTS) expect(password.length).toBeGreaterThanOrEqual(10);
    expect(new Set(DEMO_ACCOUNTS.map(({ login }) => login)).size).toBe(DEMO_ACCOUNTS.length);
  });

  test("have one key a cell, of 32 Crockford symbols", () => {
    for (const { secret } of DEMO_KEYS) expect(secret).toMatch(/^brk_[0-9A-HJKMNP-TV-Z]{32}$/);
    expect(ofKind("key").map(({ secret }) => secret)).toEqual(DEMO_KEYS.map(({ secret }) => secret));
    for (const { fields } of ofKind("key")) expect(KEY_SCOPES).toEqual(expect.arrayContaining(fields.scopes));
  });
});
