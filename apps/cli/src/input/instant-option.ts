import { z } from "zod";
import { EXIT } from "../exit-codes.ts";
import { stop } from "../output/outcome.ts";

const WithZone = z.iso.datetime({ offset: true });

/** An instant with its zone, as the record keeps it: UTC with milliseconds. Stops with exit code 2 for anything else. */
export function instantOption(option: string, text: string): string {
  if (WithZone.safeParse(text).success) return new Date(text).toISOString();
  const detail = `${option}: expected an instant with its zone, such as 2026-11-30T09:41:07Z or 2026-11-30T10:41:07+01:00, got "${text}"`;
  return stop(EXIT.usage, { error: "usage", detail });
}
