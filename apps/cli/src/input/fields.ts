import type { z } from "zod";
import { EXIT } from "../exit-codes.ts";
import { stop } from "../output/outcome.ts";

/** Fields as text, without those that are absent: as a form carries them. */
export type Fields = Readonly<Record<string, string>>;

/**
 * Holds the fields of a push against the schema that the server will hold them against, before they are kept: what waits in
 * the queue must not fail by its form. Stops with exit code 2, naming each option at fault.
 * @param options the option that gives each field
 */
export function checkFields(
  schema: z.ZodType,
  given: Readonly<Record<string, string | undefined>>,
  options: Readonly<Record<string, string>>,
): Fields {
  const fields = Object.fromEntries(
    Object.entries(given).flatMap(([name, value]) => (value === undefined ? [] : [[name, value]])),
  );
  const parsed = schema.safeParse(fields);
  if (parsed.success) return fields;
  const errors = parsed.error.issues.map((issue) => {
    const name = String(issue.path[0] ?? "");
    return { field: options[name] ?? name, detail: `${issue.message}, got "${fields[name] ?? ""}"` };
  });
  const lines = errors.map(({ field, detail }) => `${field}: ${detail}`);
  return stop(EXIT.usage, { error: "usage", detail: lines.join("; "), errors }, lines.join("\n"));
}
