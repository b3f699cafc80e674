import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import { type LengthUnit, mmFromInches } from "./length.ts";

const NUMBER = /^([+-]?)(\d+(?:[.,]\d*)?|[.,]\d+)$/;
/** A fraction of an inch as on a tape: `1/16`, `1 1/2`, `1-1/2`. */
const FRACTION = /^([+-]?)(?:(\d+)[ -])?(\d+)\/(\d+)$/;
const UNITS: Readonly<Record<string, LengthUnit>> = {
  mm: "mm",
  in: "in",
  inch: "in",
  inches: "in",
  '"': "in",
  "″": "in",
};

/**
 * Reads a length as people type it into a form: decimal comma or point, with or without unit (`mm`, `in`, `inch`, `"`),
 * and for inches also fractions such as `1 1/2`. There is no thousands separator: one comma or point is the decimal.
 * @param text        what was typed
 * @param defaultUnit the unit shown in the field, which a number without unit means
 * @returns the length in mm, or the fault `request-invalid` that says what was expected
 * Example: `parseLengthField("1,5", "mm")` is 1.5, `parseLengthField("0.06 in", "mm")` is 1.524.
 */
export function parseLengthField(text: string, defaultUnit: LengthUnit): Outcome<number> {
  const typed = text.trim().replace("−", "-");
  if (typed === "") return refused(unreadable("Nothing is typed here", defaultUnit));
  const [, amount = "", suffix = ""] = /^(.*?)\s*([a-z]+|"|″)?$/i.exec(typed) ?? [];
  const unit = suffix === "" ? defaultUnit : unitOf(suffix);
  if (unit === undefined) return refused(unreadable(`"${suffix}" is no unit known here`, defaultUnit));
  const value = decimalIn(amount) ?? (unit === "in" ? fractionIn(amount) : undefined);
  if (value === undefined) return refused(unreadable(`"${typed.slice(0, 40)}" is no length`, defaultUnit));
  return good(unit === "in" ? mmFromInches(value) : value);
}

function unitOf(suffix: string): LengthUnit | undefined {
  const name = suffix.toLowerCase();
  return Object.hasOwn(UNITS, name) ? UNITS[name] : undefined;
}

function decimalIn(text: string): number | undefined {
  const found = NUMBER.exec(text);
  if (found === null) return undefined;
  const value = Number(`${found[1]}${found[2]?.replace(",", ".")}`);
  return Number.isFinite(value) ? value + 0 : undefined;
}

function fractionIn(text: string): number | undefined {
  const [whole, sign, ones = "0", over, under] = FRACTION.exec(text) ?? [];
  if (whole === undefined || Number(under) === 0) return undefined;
  const value = Number(ones) + Number(over) / Number(under);
  return Number.isFinite(value) ? (sign === "-" ? -value : value) : undefined;
}

function unreadable(what: string, unit: LengthUnit): Fault {
  const example = unit === "mm" ? "1.5, 1,5 or 0.06 in" : "0.06, 1/16 or 1.5 mm";
  return { code: "request-invalid", detail: `${what}; type a number such as ${example}.` };
}
