import { ruleAt, type SchemaRules } from "./schema-rules.ts";

/** What a form holds: a value for each field by its path, steps divided by points. */
export type FormValues = Readonly<Record<string, unknown>>;

/** Whether a field counts as not filled in. */
export function isEmptyValue(value: unknown): boolean {
  return value === undefined || value === null || (typeof value === "string" && value.trim() === "");
}

/**
 * The object that a form stands for. What is empty is left out; it is null where the schema takes null and not nothing,
 * or takes null and the field held something at the start: a change that clears it. The schema judges the rest.
 */
export function objectFrom(values: FormValues, rules: SchemaRules, start: FormValues = {}): unknown {
  const object: Record<string, unknown> = {};
  for (const [path, value] of Object.entries(values)) {
    const rule = ruleAt(rules, path);
    if (!isEmptyValue(value)) place(object, path.split("."), value);
    else if (rule.nullable && (rule.required || !isEmptyValue(start[path])))
      place(object, path.split("."), null);
  }
  return object;
}

function place(holder: Record<string, unknown> | unknown[], steps: readonly string[], value: unknown): void {
  const [step = "", ...rest] = steps;
  if (rest.length === 0) {
    setAt(holder, step, value);
    return;
  }
  const present: unknown = Array.isArray(holder) ? holder[Number(step)] : holder[step];
  const next = isHolder(present) ? present : /^\d+$/.test(rest[0] ?? "") ? [] : {};
  setAt(holder, step, next);
  place(next, rest, value);
}

function setAt(holder: Record<string, unknown> | unknown[], step: string, value: unknown): void {
  if (Array.isArray(holder)) holder[Number(step)] = value;
  else holder[step] = value;
}

function isHolder(value: unknown): value is Record<string, unknown> | unknown[] {
  return typeof value === "object" && value !== null;
}
