import type { Certificate } from "@beadroll/domain/schemas/lot";
import type { ShopLot } from "./lot-list.ts";
import { type PdfLine, textPdf } from "./pdf.ts";

/** What each type of EN 10204:2004 states. */
const STATEMENTS: Record<Certificate["type"], string> = {
  "2.1": "The products supplied comply with the requirements of the order.",
  "2.2": "The products comply with the order; results are of non-specific inspection.",
  "3.1": "The products comply with the order; results are of specific inspection.",
  "3.2":
    "The products comply with the order; results of specific inspection, agreed with the purchaser's representative.",
};

const MECHANICAL_WORDS: Readonly<Record<string, string>> = {
  yield_mpa: "Yield strength ReH, MPa",
  tensile_mpa: "Tensile strength Rm, MPa",
  elongation_pct: "Elongation A, %",
  impact_j: "Impact energy KV, J (mean of three)",
};

const line = (text: string, size_pt = 10, above_pt = 5): PdfLine => ({ text, size_pt, above_pt });

/** Who issued a lot's certificate. */
export function issuerOf(lot: ShopLot): string {
  return lot.kind === "gas" ? lot.supplier : `${lot.supplier}, works laboratory`;
}

/** The certificate of a lot as the document that came with it. */
export function certificatePdf(lot: ShopLot, issued_on: string): Uint8Array {
  const { type, number, chemistry = {}, mechanical = {} } = lot.certificate;
  const elements = Object.entries(chemistry);
  const values = Object.entries(mechanical);
  return textPdf([
    line(lot.supplier, 18, 0),
    line(`Inspection document ${type} to EN 10204:2004`, 13, 8),
    line(`No. ${number}, issued on ${issued_on} by ${issuerOf(lot)}`),
    line(`${lot.kind === "wire" || lot.kind === "gas" ? "Lot" : "Heat"} ${lot.number}`, 12, 16),
    line(`Designation: ${lot.grade}`),
    line(`Size: ${lot.dimension}`),
    line(`Quantity: ${lot.quantity} ${lot.unit}`),
    ...(elements.length === 0 ? [] : [line("Chemical composition, percent by mass", 11, 16)]),
    ...elements.map(([element, share]) => line(`${element}   ${share}`)),
    ...(values.length === 0 ? [] : [line("Mechanical properties", 11, 16)]),
    ...values.map(([name, value]) => line(`${MECHANICAL_WORDS[name] ?? name}: ${value}`)),
    line(STATEMENTS[type], 10, 20),
    line("Invented for demonstration. No such company, product or test exists.", 8, 30),
  ]);
}
