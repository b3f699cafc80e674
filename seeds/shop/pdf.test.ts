import { describe, expect, test } from "vitest";
import { certificatePdf } from "./certificates.ts";
import { LOTS } from "./lot-list.ts";
import { textPdf } from "./pdf.ts";

const textOf = (bytes: Uint8Array) => new TextDecoder().decode(bytes);

describe("a hand-written PDF", () => {
  test("has a table that points at each object's first byte", () => {
    const pdf = textOf(textPdf([{ text: "Heat H48812", size_pt: 12, above_pt: 0 }]));
    const offsets = [...pdf.matchAll(/^(\d{10}) 00000 n $/gm)].map((match) => Number(match[1]));
    expect(offsets).toHaveLength(5);
    for (const [i, offset] of offsets.entries()) {
      expect(pdf.slice(offset).startsWith(`${i + 1} 0 obj`)).toBe(true);
    }
    const table = Number(/startxref\n(\d+)\n%%EOF\n$/.exec(pdf)?.[1]);
    expect(pdf.slice(table).startsWith("xref\n0 6\n")).toBe(true);
  });

  test("states the length of its content", () => {
    const pdf = textOf(textPdf([{ text: "Yield (ReH) 389", size_pt: 10, above_pt: 4 }]));
    const content = /stream\n([\s\S]*)\nendstream/.exec(pdf)?.[1] ?? "";
    expect(pdf).toContain(`/Length ${content.length} `);
    expect(content).toContain("(Yield \\(ReH\\) 389) Tj");
  });

  test("refuses characters its font would show wrong", () => {
    expect(() => textPdf([{ text: "20 °C", size_pt: 10, above_pt: 0 }])).toThrow(RangeError);
  });
});

describe("certificates of the demo lots", () => {
  test("name the lot, the type, every value, and that they are invented", () => {
    for (const lot of LOTS) {
      const pdf = textOf(certificatePdf(lot, "2026-10-15"));
      expect(pdf).toContain(lot.number);
      expect(pdf).toContain(`Inspection document ${lot.certificate.type} to EN 10204`);
      for (const value of Object.values(lot.certificate.chemistry ?? {}))
        expect(pdf).toContain(` ${value}) Tj`);
      expect(pdf).toContain("Invented for demonstration");
    }
  });
});
