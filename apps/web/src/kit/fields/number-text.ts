import { parseLengthField } from "@beadroll/domain/units/length-field";
import type { LengthUnits } from "../units/length-units.ts";

/** A number as read from what somebody typed; refused with words that help. */
export type NumberReading =
  | { readonly ok: true; readonly value: number | null }
  | { readonly ok: false; readonly words: string };

const PLAIN = /^[+-]?(\d+\.?\d*|\.\d+)$/;

const refuse = (words: string): NumberReading => ({ ok: false, words });

/**
 * A number as people type it: comma or point for the decimals, a true minus sign, spaces between thousands.
 * Nothing typed is null. A text with both comma and point is refused, as it can be read in two ways.
 */
export function readNumber(text: string): NumberReading {
  const typed = text
    .trim()
    .replaceAll("−", "-")
    .replaceAll(/[\s\u00A0\u202F](?=\d{3}(\D|$))/g, "");
  if (typed === "") return { ok: true, value: null };
  if (typed.includes(",") && typed.includes(".")) {
    return refuse("Use one decimal sign only, a comma or a point.");
  }
  const plain = typed.replace(",", ".");
  if (!PLAIN.test(plain)) return refuse("This is not a number.");
  return { ok: true, value: Number(plain) };
}

/**
 * A length in mm from what somebody typed, in the units of the screen unless the text names its own:
 * `12,5`, `12.5 mm`, `0.5 in`, `1/2"`, `1 3/8 in`. Nothing typed is null.
 */
export function readLength(text: string, units: LengthUnits): NumberReading {
  if (text.trim() === "") return { ok: true, value: null };
  const read = parseLengthField(text, units);
  return read.ok ? read : refuse(read.faults[0]?.detail ?? "This is no length.");
}

/** A number as it stands in a field: without needless zeros, decimals by point. */
export function numberText(value: number | null, decimals = 6): string {
  return value === null ? "" : String(Number(value.toFixed(decimals)));
}
