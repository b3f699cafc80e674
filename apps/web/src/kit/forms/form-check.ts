import type { z } from "zod";
import { type ProblemWords, problemFrom } from "../states/problem-words.ts";
import type { LengthUnits } from "../units/length-units.ts";
import { type FormValues, isEmptyValue, objectFrom } from "./form-values.ts";
import { issueWords } from "./rule-words.ts";
import type { SchemaRules } from "./schema-rules.ts";
import { unitOfName } from "./unit-names.ts";

/** What is wrong with each field, by its path; undefined where nothing is. */
export type FieldErrors = Readonly<Record<string, string | undefined>>;

/** What the schema makes of the values: the value to send, or what is wrong with which field. */
export type Judged<T> =
  | { readonly ok: true; readonly value: T; readonly errors: FieldErrors }
  | { readonly ok: false; readonly errors: FieldErrors };

/** What a form is judged by. */
export interface FormCheck<S extends z.ZodType> {
  readonly schema: S;
  readonly rules: SchemaRules;
  /** What stood in the fields at first. */
  readonly start: FormValues;
  readonly units: LengthUnits;
}

/** Holds a form's values against its schema; every wrong field is named, the first fault of each. */
export function judgeValues<S extends z.ZodType>(
  check: FormCheck<S>,
  values: FormValues,
): Judged<z.output<S>> {
  const { schema, rules, start, units } = check;
  const parsed = schema.safeParse(objectFrom(values, rules, start));
  if (parsed.success) return { ok: true, value: parsed.data, errors: {} };
  const errors: Record<string, string> = {};
  for (const issue of parsed.error.issues) {
    const path = issue.path.map(String).join(".");
    errors[path] ??= issueWords(issue, isEmptyValue(values[path]), { unit: unitOfName(path), units });
  }
  return { ok: false, errors };
}

/** Divides what the server refused: faults of fields that the form has, and the rest for a panel. */
export function problemFields(
  error: unknown,
  paths: readonly string[],
): { errors: FieldErrors; problem: ProblemWords | null } {
  const problem = problemFrom(error);
  const errors: Record<string, string> = {};
  const rest = problem.faults.filter((fault) => {
    if (fault.path === null || !paths.includes(fault.path)) return true;
    errors[fault.path] ??= fault.detail;
    return false;
  });
  const isAllAtFields = rest.length === 0 && problem.faults.length > 0;
  return { errors, problem: isAllAtFields ? null : { ...problem, faults: rest } };
}
