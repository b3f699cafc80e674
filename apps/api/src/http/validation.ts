import type { Fault } from "@beadroll/domain/faults/fault";
import type { z } from "zod";
import { Refusal } from "./refusal.ts";

const MOST_FAULTS = 50;

const pointer = (path: readonly PropertyKey[]): string =>
  path.map((key) => `/${String(key).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");

const fieldOf = (path: readonly PropertyKey[]): { field: string } | Record<string, never> =>
  path.length > 0 ? { field: path.map(String).join(".") } : {};

function faultsOf(issue: z.core.$ZodIssue): Fault[] {
  if (issue.code === "unrecognized_keys")
    return issue.keys.map((key) => ({
      code: "request-invalid",
      detail: `"${key}" is not a field here.`,
      pointer: pointer([...issue.path, key]),
      field: key,
    }));
  const where = issue.path.length > 0 ? `${issue.path.map(String).join(".")}: ` : "";
  return [
    {
      code: "request-invalid",
      detail: `${where}${issue.message}`,
      pointer: pointer(issue.path),
      ...fieldOf(issue.path),
    },
  ];
}

/** A body that fits its schema. @throws Refusal naming every field that does not, 50 at most */
export function validBody<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value ?? {});
  if (parsed.success) return parsed.data;
  throw new Refusal(parsed.error.issues.flatMap(faultsOf).slice(0, MOST_FAULTS));
}

/** A query that fits its schema. @throws Refusal parameter-unknown or request-invalid, naming the parameter */
export function validQuery<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  throw new Refusal(
    parsed.error.issues.flatMap((issue): Fault[] =>
      issue.code === "unrecognized_keys"
        ? issue.keys.map((key) => ({
            code: "parameter-unknown",
            detail: `The parameter "${key}" is not known here.`,
            field: key,
          }))
        : [
            {
              code: "request-invalid",
              detail: `${issue.path.join(".")}: ${issue.message}`,
              ...fieldOf(issue.path),
            },
          ],
    ),
  );
}

/** Path parameters that fit their schema; those that cannot name nothing here. @throws Refusal not-found */
export function validParams<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  throw new Refusal([{ code: "not-found", detail: "Nothing here has that name." }]);
}
