import { LotCreate } from "@beadroll/domain/schemas/lot";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { judgeValues, problemFields } from "./form-check.ts";
import { objectFrom } from "./form-values.ts";
import { pathOfPointer } from "./json-pointer.ts";
import { limitWords } from "./rule-words.ts";
import { ruleAt, schemaRules } from "./schema-rules.ts";
import { unitOfName } from "./unit-names.ts";

const Piece = z.strictObject({
  position: z.string().min(1).max(20),
  thickness_mm: z.number().min(3).max(40),
  gap_mm: z.number().positive().max(5).optional(),
  note: z.string().nullable(),
  count: z.int().min(1),
  welded_on: z.iso.date().optional(),
  chemistry: z.record(z.string(), z.number().min(0)).optional(),
  marks: z.array(z.strictObject({ station_mm: z.number() })).optional(),
});
const RULES = schemaRules(Piece);
const MM = { unit: "mm", units: "mm" } as const;

const judge = (values: Record<string, unknown>) =>
  judgeValues({ schema: Piece, rules: RULES, start: {}, units: "mm" }, values);
const whole = { position: "Web", thickness_mm: 12, note: "", count: 2 };

describe("rules from a schema", () => {
  it("know what must be filled in, what may be left empty, and the limits", () => {
    expect(ruleAt(RULES, "thickness_mm")).toMatchObject({
      required: true,
      minimum: 3,
      maximum: 40,
      type: "number",
    });
    expect(ruleAt(RULES, "gap_mm")).toMatchObject({ required: false, above: 0, maximum: 5 });
    expect(ruleAt(RULES, "position")).toMatchObject({ required: true, maxLength: 20 });
    expect(ruleAt(RULES, "note")).toMatchObject({ required: true, nullable: true });
  });

  it("reach into records and lists", () => {
    expect(ruleAt(RULES, "chemistry.C")).toMatchObject({ minimum: 0, type: "number" });
    expect(ruleAt(RULES, "marks.0.station_mm")).toMatchObject({ required: true, type: "number" });
  });

  it("do not take the computer's largest number for a limit of a count", () => {
    expect(limitWords(ruleAt(RULES, "count"), { unit: undefined, units: "mm" })).toBe("at least 1");
  });

  it("read a resource's own schema", () => {
    const rules = schemaRules(LotCreate);
    expect(ruleAt(rules, "kind").options).toContain("plate");
    expect(ruleAt(rules, "thickness_mm")).toMatchObject({ required: false, nullable: true, above: 0 });
    expect(ruleAt(rules, "number")).toMatchObject({ required: true });
  });
});

describe("the limit under a field", () => {
  it("says both ends, one end, or nothing", () => {
    expect(limitWords(ruleAt(RULES, "thickness_mm"), MM)).toBe("3 to 40 mm");
    expect(limitWords(ruleAt(RULES, "gap_mm"), MM)).toBe("more than 0 to 5 mm");
    expect(limitWords(ruleAt(RULES, "marks.0.station_mm"), MM)).toBeUndefined();
  });

  it("follows the units of the screen", () => {
    expect(limitWords(ruleAt(RULES, "thickness_mm"), { unit: "mm", units: "in" })).toBe(
      "0.1181 to 1.5748 in",
    );
  });

  it("takes a field's unit from its name", () => {
    expect(unitOfName("thickness_mm")).toBe("mm");
    expect(unitOfName("heat_input_kj_mm")).toBe("kJ/mm");
    expect(unitOfName("travel_mm_s")).toBe("mm/s");
    expect(unitOfName("torch_angle_deg")).toBe("°");
    expect(unitOfName("supplier")).toBeUndefined();
  });
});

describe("a form's values", () => {
  it("become the object to send: what is empty is absent, or null where the schema wants null", () => {
    expect(judge(whole)).toMatchObject({
      ok: true,
      value: { position: "Web", thickness_mm: 12, note: null, count: 2 },
    });
    expect(objectFrom({ ...whole, gap_mm: null, welded_on: "" }, RULES)).not.toHaveProperty("gap_mm");
  });

  it("clear what stood there at the start with null, and leave out what never stood there", () => {
    const rules = schemaRules(LotCreate);
    expect(objectFrom({ thickness_mm: null }, rules)).toEqual({});
    expect(objectFrom({ thickness_mm: null }, rules, { thickness_mm: 12 })).toEqual({ thickness_mm: null });
  });

  it("place fields inside records and lists by their path", () => {
    expect(
      objectFrom({ "chemistry.C": 0.16, "marks.0.station_mm": 5, "marks.1.station_mm": 9 }, RULES),
    ).toEqual({
      chemistry: { C: 0.16 },
      marks: [{ station_mm: 5 }, { station_mm: 9 }],
      note: undefined,
    });
  });

  it("are faulted field by field, all at once, in plain words", () => {
    const { ok, errors } = judge({
      position: " ",
      thickness_mm: 2,
      gap_mm: 0,
      note: null,
      count: 1.5,
      welded_on: "soon",
    });
    expect(ok).toBe(false);
    expect(errors).toMatchObject({
      position: "Fill this in.",
      thickness_mm: "At least 3 mm.",
      gap_mm: "More than 0 mm.",
      count: "Give a whole number.",
      welded_on: "Give a day, such as 2026-11-30.",
    });
    expect(judge({ ...whole, position: "x".repeat(21) }).errors["position"]).toBe("At most 20 characters.");
    expect(judge({ ...whole, thickness_mm: undefined }).errors["thickness_mm"]).toBe("Fill this in.");
  });
});

describe("what the server refused", () => {
  const problem = {
    type: "/docs/api/problems#request-invalid",
    title: "The request does not fit",
    status: 422,
    detail: "2 fields do not fit.",
    instance: "r1",
    errors: [
      { code: "request-invalid", detail: "This heat is known already.", pointer: "/number" },
      { code: "request-invalid", detail: "The lot is on hold.", pointer: "/lot" },
    ],
  };

  it("stands at its field where the form has it, and above the button where it has not", () => {
    const { errors, problem: rest } = problemFields(problem, ["number"]);
    expect(errors).toEqual({ number: "This heat is known already." });
    expect(rest?.faults.map((fault) => fault.detail)).toEqual(["The lot is on hold."]);
  });

  it("needs no panel where every fault stands at a field", () => {
    expect(problemFields(problem, ["number", "lot"]).problem).toBeNull();
  });

  it("reads pointers with escaped signs", () => {
    expect(pathOfPointer("/chemistry/C~1N~0")).toBe("chemistry.C/N~");
    expect(pathOfPointer("")).toBe("");
  });
});
