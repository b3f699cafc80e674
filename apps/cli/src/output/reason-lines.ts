import type { VerdictReason } from "@beadroll/domain/schemas/scan-result";
import { type Look, plain } from "./look.ts";
import { reasonMark } from "./verdict-text.ts";

/** The reasons of a verdict, one a line, those that hold the seam first. */
export function reasonLines(reasons: readonly VerdictReason[], look: Look): string[] {
  const ordered = [...reasons].sort((a, b) => Number(b.level === "adapt") - Number(a.level === "adapt"));
  return ordered.map((reason) => `  ${reasonMark(reason.level, look)} ${plain(reason.text)}`);
}
