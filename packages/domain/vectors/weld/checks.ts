import { readFileSync } from "node:fs";
import { z } from "zod";

const Check = z.object({
  id: z.string(),
  quantity: z.string(),
  inputs: z.record(z.string(), z.unknown()),
  expected: z.unknown(),
  tolerance: z.number(),
  unit: z.string(),
  source: z.string(),
});

const CHECKS = z
  .array(Check)
  .parse(JSON.parse(readFileSync(new URL("welding-checks.json", import.meta.url), "utf8")));

/** One value from outside, with what it was computed from. */
export interface WeldCheck {
  readonly id: string;
  readonly title: string;
  readonly expected: unknown;
  readonly tolerance: number;
  /** An input that must be a number. */
  readonly input: (name: string) => number;
  readonly value: (name: string) => unknown;
  /** The expected value where it must be a number. */
  readonly number: () => number;
}

/** The checks whose id begins with one of the prefixes, in the file's order; at least one each. */
export function weldChecks(...prefixes: string[]): WeldCheck[] {
  return prefixes.flatMap((prefix) => {
    const found = CHECKS.filter((check) => check.id.startsWith(prefix));
    if (found.length === 0) throw new RangeError(`no check begins with ${prefix}`);
    return found.map(asWeldCheck);
  });
}

/** The check with an id. */
export function weldCheck(id: string): WeldCheck {
  const found = CHECKS.find((check) => check.id === id);
  if (found === undefined) throw new RangeError(`no check ${id}`);
  return asWeldCheck(found);
}

function asWeldCheck({
  id,
  quantity,
  inputs,
  expected,
  tolerance,
  unit,
  source,
}: z.infer<typeof Check>): WeldCheck {
  const numberIn = (value: unknown, name: string): number => {
    if (typeof value !== "number") throw new TypeError(`${id}: ${name} is no number`);
    return value;
  };
  return {
    id,
    title: `${id}: ${quantity}, ${unit} (${source})`,
    expected,
    tolerance,
    input: (name) => numberIn(inputs[name], name),
    value: (name) => inputs[name],
    number: () => numberIn(expected, "expected"),
  };
}
