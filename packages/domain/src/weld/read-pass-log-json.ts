import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import { assembleLog, chooseColumns, clockFault, type ReadColumn } from "./log-columns.ts";
import { LOG_FAULTS_MAX, type PassLog } from "./pass-log.ts";

/**
 * Reads a pass log from JSON text: one object with an array of numbers a column.
 * Numbers missing in a column that is not required are `null`.
 */
export function readPassLogJson(text: string): Outcome<PassLog> {
  const parsed = parseObject(text);
  if (!parsed.ok) return parsed;
  const names = Object.keys(parsed.value);
  const chosen = chooseColumns(names);
  if (!chosen.ok) return chosen;
  const faults: Fault[] = [];
  const arrays = chosen.value.map((column) => readColumn(parsed.value[names[column.place]!], column, faults));
  const lengths = new Set(arrays.map((array) => array.length));
  if (faults.length === 0 && lengths.size > 1) faults.push(lengthsFault(chosen.value, arrays));
  if (faults.length > 0) return refused(...faults.slice(0, LOG_FAULTS_MAX));
  const [count = 0] = lengths;
  if (count < 2) {
    const detail = `A log needs two samples at least; this has ${count}.`;
    return refused({ code: count === 0 ? "file-empty" : "file-truncated", detail });
  }
  const log = assembleLog(chosen.value, arrays);
  const back = log.times_s.findIndex((time, i) => i > 0 && time < log.times_s[i - 1]!);
  if (back > 0) return refused(clockFault(log.times_s[back - 1]!, log.times_s[back]!, { field: "time_s" }));
  return good(log);
}

function parseObject(text: string): Outcome<Record<string, unknown>> {
  try {
    const value: unknown = JSON.parse(text);
    if (isRecord(value)) return good(value);
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    if (text.trimEnd().endsWith("}")) {
      return refused({ code: "file-format-unknown", detail: `The file is no JSON: ${error.message}.` });
    }
    return refused({
      code: "file-truncated",
      detail: "The JSON ends before its last brace: the file was cut.",
    });
  }
  return refused({
    code: "file-format-unknown",
    detail: "The JSON is no object with an array for each column.",
  });
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

function readColumn(value: unknown, column: ReadColumn, faults: Fault[]): Float64Array {
  const field = column.name;
  if (!Array.isArray(value)) {
    faults.push({ code: "file-value-invalid", detail: `Expected an array of numbers in ${field}.`, field });
    return new Float64Array(0);
  }
  const items: readonly unknown[] = value;
  return Float64Array.from(items, (item, i) => {
    if (typeof item === "number" && Number.isFinite(item)) return item * column.factor;
    if ((item !== null || column.required) && faults.length < LOG_FAULTS_MAX) {
      const what = JSON.stringify(item).slice(0, 40);
      const detail = `Expected a number in ${field}, value ${i + 1}, got ${what}.`;
      faults.push({ code: "file-value-invalid", detail, field, pointer: `/${field}/${i}` });
    }
    return Number.NaN;
  });
}

function lengthsFault(columns: readonly ReadColumn[], arrays: readonly Float64Array[]): Fault {
  const lengths = columns.map((column, i) => `${column.name} ${arrays[i]!.length}`).join(", ");
  return { code: "file-truncated", detail: `The columns have different lengths: ${lengths}.` };
}
