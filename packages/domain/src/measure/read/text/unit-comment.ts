import type { LengthUnit } from "../../scan-cloud.ts";
import type { FaultList } from "../fault-list.ts";

/** `units: mm`, `unit = in`, `units in millimetres`; the bare word `in` counts only after a colon or equals sign. */
const UNIT =
  /\bunits?\s*(?:([:=])\s*|\s(?:are\s+)?(?:in\s+)?)"?(mm|cm|um|m|in|inch|inches|(?:milli|centi)?met(?:re|er)s?)\b/i;

const SHORT: Readonly<Record<string, string>> = {
  inch: "in",
  inches: "in",
  metre: "m",
  millimetre: "mm",
  centimetre: "cm",
};

/** The unit that a comment states in so many words; null where it states none. */
export function unitInComment(text: string): string | null {
  const match = UNIT.exec(text);
  if (match === null) return null;
  const word = match[2]!.toLowerCase().replace(/meters?$|metres$/, "metre");
  if (word === "in" && match[1] === undefined) return null;
  return SHORT[word] ?? word;
}

/** Notes a fault where a comment states another unit than the file was declared in. */
export function checkCommentUnit(
  text: string,
  line: number,
  { units, faults }: { readonly units: LengthUnit; readonly faults: FaultList },
): void {
  const unit = unitInComment(text);
  if (unit === null || unit === units) return;
  const what = `the comment states the unit ${unit}, but the file was declared in "${units}"`;
  faults.add("scan-units-contradict", what, { line, field: "units" });
}
