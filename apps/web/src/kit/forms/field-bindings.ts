import type { LengthUnits } from "../units/length-units.ts";
import type { FieldErrors } from "./form-check.ts";
import { type FormValues, isEmptyValue } from "./form-values.ts";
import { limitWords } from "./rule-words.ts";
import { type FieldRule, ruleAt, type SchemaRules } from "./schema-rules.ts";
import { unitOfName } from "./unit-names.ts";

/** What a field takes from its form: spread it into the field. */
export interface FieldBinding<T> {
  readonly name: string;
  readonly value: T;
  readonly onChange: (value: T) => void;
  readonly error: string | undefined;
  readonly optional: boolean;
}

/** The fields of a form by path; each with what its schema says of it. */
export interface FieldBindings {
  text(path: string): FieldBinding<string> & { readonly maxLength: number | undefined };
  number(
    path: string,
  ): FieldBinding<number | null> & { readonly unit: string | undefined; readonly limit: string | undefined };
  choice<T extends string>(path: string, options: readonly T[]): FieldBinding<T | "">;
  flag(path: string): FieldBinding<boolean>;
  /** What is typed here is never kept as a draft. */
  secret(path: string): FieldBinding<string>;
}

/** What bindings need of the form they belong to. */
export interface BindingSource {
  readonly rules: SchemaRules;
  readonly values: FormValues;
  readonly errors: FieldErrors;
  readonly units: LengthUnits;
  readonly change: (path: string, value: unknown) => void;
  readonly keepSecret: (path: string) => void;
}

/** Ties fields to a form's values, rules and errors. */
export function fieldBindings(source: BindingSource): FieldBindings {
  const { rules, values, units } = source;
  const bind = <T>(path: string, value: T, rule: FieldRule = ruleAt(rules, path)): FieldBinding<T> => ({
    name: path,
    value,
    onChange: (next: T) => source.change(path, next),
    error: source.errors[path],
    optional: !rule.required || rule.nullable,
  });
  return {
    text(path) {
      const rule = ruleAt(rules, path);
      return { ...bind(path, textOf(values[path]), rule), maxLength: rule.maxLength };
    },
    number(path) {
      const rule = ruleAt(rules, path);
      const value = values[path];
      const unit = unitOfName(path);
      const number = typeof value === "number" ? value : null;
      return { ...bind<number | null>(path, number, rule), unit, limit: limitWords(rule, { unit, units }) };
    },
    choice<T extends string>(path: string, options: readonly T[]) {
      return bind<T | "">(path, options.find((option) => option === values[path]) ?? "");
    },
    flag: (path) => bind(path, values[path] === true),
    secret(path) {
      source.keepSecret(path);
      return bind(path, textOf(values[path]));
    },
  };
}

function textOf(value: unknown): string {
  return isEmptyValue(value) ? "" : String(value);
}
