import type { PassRecord } from "@beadroll/domain/schemas/pass";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamPage } from "@beadroll/domain/schemas/seam";
import { describe, expect, it } from "vitest";
import { jointWords, lotsOfPass, qualificationWords, seamNumber, verdictSentence } from "./seam-words.ts";

const scan = (verdict: ScanResult["verdict"], text?: string) =>
  ({ verdict, reasons: text === undefined ? [] : [{ text }] }) as unknown as ScanResult;
const pass = (fields: Partial<PassRecord>) => fields as PassRecord;

describe("what a seam's page says", () => {
  it("names joints by type and size, and repairs by their number", () => {
    expect([jointWords("fillet_t", 5), jointWords("butt_v", 8)]).toEqual(["T, a5", "Butt V, s8"]);
    expect([seamNumber("S12", 1), seamNumber("S12", 3)]).toEqual(["S12", "S12R2"]);
  });

  it("gives a verdict with its first reason", () => {
    expect(verdictSentence(scan("hold", "Lateral 3.41 mm at 311 mm: above 3.00 mm"))).toBe(
      "Hold: Lateral 3.41 mm at 311 mm: above 3.00 mm",
    );
    expect(verdictSentence(scan("within"))).toMatch(/^Within/);
  });

  it("never calls an operator qualified without a qualification", () => {
    expect(qualificationWords(pass({ operator_name: null, operator_valid_until: null })).ok).toBe(false);
    expect(qualificationWords(pass({ operator_name: "Ilka Varga", operator_valid_until: null })).ok).toBe(
      false,
    );
    expect(
      qualificationWords(pass({ operator_name: "Ilka Varga", operator_valid_until: "2027-03-14" })),
    ).toEqual({
      ok: true,
      text: "qualified to 2027-03-14",
    });
  });

  it("lists both spools of a pass in which one was changed", () => {
    const page = {
      pass_lots: [
        { pass_id: "a", slot: "wire", lot_number: "W-1" },
        { pass_id: "a", slot: "wire", lot_number: "W-2" },
        { pass_id: "a", slot: "gas", lot_number: "G-1" },
        { pass_id: "b", slot: "wire", lot_number: "W-3" },
      ],
    } as SeamPage;
    expect(lotsOfPass(page, "a").map(({ slot, lots }) => [slot, lots.map((lot) => lot.lot_number)])).toEqual([
      ["wire", ["W-1", "W-2"]],
      ["gas", ["G-1"]],
    ]);
  });
});
