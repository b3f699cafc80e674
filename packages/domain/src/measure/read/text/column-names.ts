import type { LengthUnit } from "../../scan-cloud.ts";
import { type FaultList, type FaultPlace, quoted } from "../fault-list.ts";

/** A column that a reader needs. */
export interface WantedColumn {
  /** Name without unit, lower case. */
  readonly base: string;
  /** False for a pure number, such as a part of a quaternion. */
  readonly isLength: boolean;
}

const UNIT = "(mm|cm|dm|um|µm|m|in|inch|ft)";
const WITH_SUFFIX = new RegExp(`^(.+?)_${UNIT}$`);
const WITH_BRACKETS = new RegExp(`^(.+?)[ _]*[[(] *${UNIT} *[\\])]$`);

/** A column's name taken apart: `X_mm`, `x [mm]` and `x(mm)` are all x in mm; `x` names no unit. */
export function splitName(name: string): { readonly base: string; readonly unit: string | null } {
  const plain = name
    .replace(/^"(.*)"$/, "$1")
    .trim()
    .toLowerCase();
  const match = WITH_BRACKETS.exec(plain) ?? WITH_SUFFIX.exec(plain);
  if (match === null) return { base: plain, unit: null };
  return { base: match[1]!.trim(), unit: match[2] === "inch" ? "in" : match[2]! };
}

/** True where some column has this name, whatever its unit. */
export function hasColumn(names: readonly string[], base: string): boolean {
  return names.some((name) => splitName(name).base === base);
}

/** Names of columns, the unit they are declared in, and where they stand. */
export interface ColumnHeader {
  readonly names: readonly string[];
  readonly units: LengthUnit;
  readonly place: FaultPlace;
  /** What the format calls a column. */
  readonly noun: "column" | "property" | "field";
}

/**
 * Places of the wanted columns.
 * @returns one index a wanted column, or null with every fault noted: a column missing or there twice, a unit in
 *   a name that contradicts the unit declared
 */
export function findColumns(
  header: ColumnHeader,
  wanted: readonly WantedColumn[],
  faults: FaultList,
): number[] | null {
  const before = faults.faults.length;
  const parts = header.names.map(splitName);
  const found = wanted.map(({ base, isLength }) => {
    const first = parts.findIndex((part) => part.base === base);
    if (first < 0) addMissing(header, base, faults);
    else if (parts.some((part, i) => i > first && part.base === base)) addTwice(header, base, faults);
    else if (isLength) checkUnit(header, first, faults);
    return first;
  });
  return faults.faults.length > before ? null : found;
}

function addMissing({ names, noun, place }: ColumnHeader, base: string, faults: FaultList): void {
  const what = `${noun} ${base} is missing; there are ${names.map(quoted).join(", ") || "none"}`;
  faults.add("file-column-missing", what, { ...place, field: base });
}

function addTwice({ noun, place }: ColumnHeader, base: string, faults: FaultList): void {
  faults.add("file-header-invalid", `${noun} ${base} stands there twice`, { ...place, field: base });
}

function checkUnit({ names, units, noun, place }: ColumnHeader, column: number, faults: FaultList): void {
  const name = names[column]!;
  const { unit } = splitName(name);
  if (unit === null || unit === units) return;
  const what = `${noun} ${quoted(name)} is in ${unit}, but the file was declared in "${units}"`;
  faults.add("scan-units-contradict", what, { ...place, field: name });
}
