import { deriveSeamState, type SeamFacts } from "@beadroll/domain/quality/seam-state";
import { describe, expect, test } from "vitest";
import type { DemoEvent } from "./demo-event.ts";
import { demoEvents } from "./demo-scenario.ts";
import { PARTS } from "./production/part-plan.ts";
import { DOUBTFUL_LOT, QUARANTINED_LOT } from "./shop/lot-list.ts";
import { procedureOf } from "./shop/procedures.ts";

const OPTIONS = { seed: 1, ends_at: "2026-12-01T14:00:00.000Z" };
const EVENTS = [...demoEvents(OPTIONS)];

const ofKind = <K extends DemoEvent["kind"]>(kind: K) =>
  EVENTS.filter((event): event is Extract<DemoEvent, { kind: K }> => event.kind === kind);

/** What is known of each seam at the end; a misfit stands for the verdict hold. */
function seamFacts(): SeamFacts[] {
  return PARTS.flatMap((part) =>
    part.product.seams.map(({ number }) => {
      const about = EVENTS.map((event, seq) => ({ event, seq })).filter(
        ({ event }) => "seam" in event && event.seam.part === part.ref && event.seam.number === number,
      );
      const scanned = about.some(({ event }) => event.kind === "scan");
      return {
        attempt: 1,
        verdict: scanned ? (number in part.held ? "hold" : "within") : null,
        pass_seqs: about.flatMap(({ event, seq }) => (event.kind === "pass" ? [seq] : [])),
        inspections: about.flatMap(({ event, seq }) =>
          event.kind === "inspection"
            ? [{ method: event.fields.method, result: event.fields.result, seq }]
            : [],
        ),
      };
    }),
  );
}

describe("the demo shop at the end of its five weeks", () => {
  test("has 43 parts with 598 seams, brackets built into frames", () => {
    expect(ofKind("part")).toHaveLength(43);
    expect(PARTS.reduce((sum, { product }) => sum + product.seams.length, 0)).toBe(598);
    expect(ofKind("part").filter(({ parent }) => parent !== null)).toHaveLength(12);
  });

  test("has seams in every state, most of them accepted", () => {
    const count: Record<string, number> = {};
    for (const facts of seamFacts()) {
      const { state } = deriveSeamState(facts);
      count[state] = (count[state] ?? 0) + 1;
    }
    expect(count).toEqual({ planned: 48, held: 24, clear: 44, welded: 91, accepted: 383, rejected: 8 });
  });

  test("welded nothing that is held, and inspected nothing that is not welded", () => {
    for (const facts of seamFacts()) {
      if (facts.verdict === "hold") expect(facts.pass_seqs).toEqual([]);
      for (const { seq } of facts.inspections)
        expect(seq).toBeGreaterThan(facts.pass_seqs.at(-1) ?? Infinity);
    }
  });

  test("scanned ten seams again after fitting them again, then welded them", () => {
    const again = ofKind("scan").filter(({ file }) => file.name.endsWith("fitup-2.ply"));
    expect(again).toHaveLength(10);
    for (const { seam, at } of again) {
      const passes = ofKind("pass").filter(
        (pass) => pass.seam.part === seam.part && pass.seam.number === seam.number,
      );
      expect(passes.length).toBeGreaterThan(0);
      for (const pass of passes) expect(pass.fields.started_at ?? "").toMatch(/Z$/);
      expect(passes.every((pass) => (pass.fields.started_at ?? "") > at)).toBe(true);
    }
  });

  test("never has a cell or an operator weld two seams at once", () => {
    for (const key of ["cell", "operator"] as const) {
      const until = new Map<string, string>();
      for (const pass of ofKind("pass")) {
        expect(pass.fields.started_at ?? "").toSatisfy(
          (start: string) => start >= (until.get(pass[key]) ?? ""),
        );
        until.set(pass[key], pass.at);
      }
    }
  });

  test("welds each pass with the wire of its process and gas on", () => {
    const processOfWire = (grade: string) =>
      grade.startsWith("G ") ? "135" : grade.includes(" M M21") ? "138" : "136";
    const grade = new Map(ofKind("lot").map(({ ref, fields }) => [ref, fields.grade]));
    const on = new Map<string, string>();
    for (const event of EVENTS) {
      if (event.kind === "mount") on.set(`${event.cell} ${event.fields.slot}`, event.lot);
      if (event.kind !== "pass") continue;
      const part = PARTS.find(({ ref }) => ref === event.seam.part);
      const seam = part?.product.seams.find(({ number }) => number === event.seam.number);
      const wire = grade.get(on.get(`${event.cell} wire`) ?? "") ?? "";
      expect(processOfWire(wire)).toBe(procedureOf(seam?.procedure ?? "").fields.process);
      expect(on.get(`${event.cell} gas`)).toBeDefined();
    }
  });

  test("changes one spool in the middle of a pass", () => {
    const during = ofKind("mount").filter((mount) =>
      ofKind("pass").some(
        (pass) => pass.cell === mount.cell && (pass.fields.started_at ?? "") < mount.at && mount.at < pass.at,
      ),
    );
    expect(during.map(({ lot }) => lot)).toEqual(["lot-W-3402"]);
  });

  test("builds in and mounts only lots that are released at that moment", () => {
    const state = new Map<string, string>();
    for (const event of EVENTS) {
      if (event.kind === "lot-state") state.set(event.lot, event.fields.state ?? "");
      if (event.kind === "piece" || event.kind === "mount")
        expect(state.get(event.lot), event.lot).toBe("released");
    }
    expect([...state].filter(([, last]) => last === "quarantined").map(([lot]) => lot)).toEqual([
      QUARANTINED_LOT,
    ]);
  });

  test("has the doubtful heat in several parts and the quarantined one in one", () => {
    const partsWith = (lot: string) =>
      new Set(ofKind("piece").flatMap((piece) => (piece.lot === lot ? [piece.part] : []))).size;
    expect(partsWith(DOUBTFUL_LOT)).toBe(7);
    expect(partsWith(QUARANTINED_LOT)).toBe(1);
  });

  test("has an operator who welded after the qualification lapsed and one whose right ends within days", () => {
    const until = (person: string) =>
      ofKind("qualification").find((held) => held.person === person)?.fields.valid_until ?? "";
    const late = ofKind("pass").filter(
      ({ operator, fields }) => (fields.started_at ?? "").slice(0, 10) > until(operator),
    );
    expect(new Set(late.map(({ operator }) => operator))).toEqual(new Set(["person-halvorsen"]));
    expect(late.length).toBeGreaterThanOrEqual(1);
    expect(late.length).toBeLessThanOrEqual(4);
    expect(until("person-castell") > OPTIONS.ends_at.slice(0, 10)).toBe(true);
    expect(until("person-castell") < "2026-12-15").toBe(true);
  });
});
