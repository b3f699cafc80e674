import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import {
  LOG_COLUMNS,
  type LogQuantity,
  type PassLog,
  REQUIRED_QUANTITIES,
  type Readings,
} from "./pass-log.ts";

/** A column of the file that is read: its name and place there, and what it means. */
export interface ReadColumn {
  readonly name: string;
  readonly place: number;
  readonly quantity: LogQuantity;
  readonly factor: number;
  readonly required: boolean;
}

/**
 * Which columns of a file are read.
 * @param names column names in the file's order; case and blanks around them do not matter
 * @param line  1-based line of the header, for the faults; absent for JSON
 * @returns the columns known, or every fault: none known, one missing, one quantity given twice
 */
export function chooseColumns(names: readonly string[], line?: number): Outcome<readonly ReadColumn[]> {
  const at = line === undefined ? {} : { line };
  const columns = names.flatMap((raw, place) => {
    const name = raw.trim().toLowerCase();
    const known = Object.hasOwn(LOG_COLUMNS, name) ? LOG_COLUMNS[name] : undefined;
    if (known === undefined) return [];
    return [{ name, place, ...known, required: REQUIRED_QUANTITIES.includes(known.quantity) }];
  });
  if (columns.length === 0) {
    const found = names.slice(0, 8).join(", ");
    const detail = `The header names no column of a pass log, such as time_s, current_a, voltage_v; it has: ${found}.`;
    return refused({ code: "file-header-invalid", detail, ...at });
  }
  const faults = [...missing(columns, at), ...doubled(columns, at)];
  return faults.length === 0 ? good(columns) : refused(...faults);
}

function missing(columns: readonly ReadColumn[], at: { line?: number }): Fault[] {
  return REQUIRED_QUANTITIES.filter(
    (quantity) => !columns.some((column) => column.quantity === quantity),
  ).map((quantity) => {
    const names = namesOf(quantity).join(" or ");
    return { code: "file-column-missing", detail: `The log has no column ${names}.`, field: quantity, ...at };
  });
}

function doubled(columns: readonly ReadColumn[], at: { line?: number }): Fault[] {
  return columns
    .filter((column, i) => columns.findIndex((other) => other.quantity === column.quantity) !== i)
    .map((column) => ({
      code: "file-header-invalid",
      detail: `The quantity ${column.quantity} is given more than once (${column.name}); keep one column of it.`,
      field: column.name,
      ...at,
    }));
}

function namesOf(quantity: LogQuantity): string[] {
  return Object.entries(LOG_COLUMNS)
    .filter(([, column]) => column.quantity === quantity)
    .map(([name]) => name);
}

/**
 * The log from its columns, already in the product's units and of one length.
 * @param arrays one array for each column of `columns`, in that order; current and voltage lose their sign here
 */
export function assembleLog(columns: readonly ReadColumn[], arrays: readonly Readings[]): PassLog {
  const of = (quantity: LogQuantity): Readings | null => {
    const i = columns.findIndex((column) => column.quantity === quantity);
    return arrays[i] ?? null;
  };
  const needed = (quantity: LogQuantity): Readings => {
    const readings = of(quantity);
    if (readings === null) throw new RangeError(`columns: expected ${quantity} among them`);
    return readings;
  };
  return {
    times_s: needed("time_s"),
    readings: {
      current_a: needed("current_a").map(Math.abs),
      voltage_v: needed("voltage_v").map(Math.abs),
      wire_feed_m_min: of("wire_feed_m_min"),
      travel_mm_s: of("travel_mm_s"),
      gas_l_min: of("gas_l_min"),
    },
    interpass_c: of("interpass_c"),
  };
}

/** The fault of a clock that runs backwards between two samples. */
export function clockFault(
  before_s: number,
  after_s: number,
  where: { line: number } | { field: string },
): Fault {
  return {
    code: "log-clock-reset",
    detail: `Time goes back from ${before_s} s to ${after_s} s: the clock was set, or two recordings were joined.`,
    ...where,
  };
}
