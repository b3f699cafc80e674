import type { z } from "zod";
import { formatFigure, fromMm, type LengthUnits } from "../units/length-units.ts";
import type { FieldRule } from "./schema-rules.ts";

/** What is needed to speak of a field's numbers: its unit, and the units of the screen. */
export interface FieldUnits {
  readonly unit: string | undefined;
  readonly units: LengthUnits;
}

/** The limit in force, as it stands under a number field: "3 to 40 mm", "more than 0 mm". */
export function limitWords(rule: FieldRule, scale: FieldUnits): string | undefined {
  const low = rule.minimum ?? rule.above;
  const high = rule.maximum ?? rule.below;
  const exactly = (value: number) => figure(value, scale);
  if (low === undefined && high === undefined) return undefined;
  if (high === undefined)
    return `${rule.above === undefined ? "at least" : "more than"} ${exactly(low ?? 0)}`;
  if (low === undefined) return `${rule.below === undefined ? "at most" : "less than"} ${exactly(high)}`;
  const start = rule.above === undefined ? bare(low, scale) : `more than ${bare(low, scale)}`;
  return `${start} to ${exactly(high)}`;
}

const TYPE_WORDS: Readonly<Record<string, string>> = {
  number: "Give a number.",
  int: "Give a whole number.",
  string: "Give this as text.",
  boolean: "Say yes or no.",
};

/** A fault that zod found in a field, in plain words that say what to do. */
export function issueWords(issue: z.core.$ZodIssue, isEmpty: boolean, scale: FieldUnits): string {
  if (isEmpty && issue.code !== "custom") return "Fill this in.";
  switch (issue.code) {
    case "too_small":
      return `${issue.inclusive === false ? "More than" : "At least"} ${sizeWords(issue.origin, Number(issue.minimum), scale)}.`;
    case "too_big":
      return `${issue.inclusive === false ? "Less than" : "At most"} ${sizeWords(issue.origin, Number(issue.maximum), scale)}.`;
    case "invalid_type":
      return TYPE_WORDS[issue.expected] ?? "This is not understood here.";
    case "invalid_value":
      return "Choose one from the list.";
    case "invalid_format":
      return issue.format === "date" ? "Give a day, such as 2026-11-30." : sentence(issue.message);
    case "unrecognized_keys":
      return "This is not expected here.";
    default:
      return sentence(issue.message);
  }
}

function sizeWords(origin: string, size: number, scale: FieldUnits): string {
  if (origin === "string") return `${size} characters`;
  if (origin === "array" || origin === "set") return size === 1 ? "one entry" : `${size} entries`;
  return figure(size, scale);
}

function figure(value: number, scale: FieldUnits): string {
  const { unit, units } = scale;
  if (unit === undefined) return bare(value, scale);
  const shown = unit === "mm" ? units : unit;
  return shown === "°" || shown === "%"
    ? `${bare(value, scale)}${shown === "%" ? " " : ""}${shown}`
    : `${bare(value, scale)} ${shown}`;
}

function bare(value: number, scale: FieldUnits): string {
  const isInches = scale.unit === "mm" && scale.units === "in";
  const shown = isInches ? fromMm(value, "in") : value;
  return formatFigure(Number(shown.toFixed(isInches ? 4 : 6)), decimalsOf(shown, isInches ? 4 : 6));
}

function decimalsOf(value: number, most: number): number {
  return (String(Number(value.toFixed(most))).split(".")[1] ?? "").length;
}

function sentence(message: string): string {
  const text = message.trim();
  return text === ""
    ? "This does not fit."
    : `${text.charAt(0).toUpperCase()}${text.slice(1).replace(/\.$/, "")}.`;
}
