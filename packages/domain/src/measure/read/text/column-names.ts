import type { LengthUnit } from "../../scan-cloud.ts";
import { type FaultList, quoted } from "../fault-list.ts";

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
  readonly line: number;
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

function addMissing({ names, line }: ColumnHeader, base: string, faults: FaultList): void {
  const what = `column ${base} is missing; the columns are ${names.map(quoted).join(", ")}`;
  faults.add("file-column-missing", what, { line, field: base });
}

function addTwice({ line }: ColumnHeader, base: string, faults: FaultList): void {
  faults.add("file-header-invalid", `column ${base} stands there twice`, { line, field: base });
}

function checkUnit({ names, units, line }: ColumnHeader, column: number, faults: FaultList): void {
  const name = names[column]!;
  const { unit } = splitName(name);
  if (unit === null || unit === units) return;
  const what = `column ${quoted(name)} is in ${unit}, but the scan was declared in ${units}`;
  faults.add("scan-units-contradict", what, { line, field: name });
}
