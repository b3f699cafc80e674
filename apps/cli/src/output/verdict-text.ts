import type { Verdict } from "@beadroll/domain/schemas/scan-result";
import { type Look, type Style, styled } from "./look.ts";

/** Verdicts by shape and word, so that neither colour nor language is needed. */
const MARKS: Readonly<Record<Verdict, string>> = { within: "■", adapt: "▲", hold: "◆" };
const STYLES: Readonly<Record<Verdict, Style>> = { within: "green", adapt: "yellow", hold: "red" };

/** A verdict as shape and word. */
export function verdictText(verdict: Verdict, look: Look): string {
  return styled(`${MARKS[verdict]} ${verdict}`, look, "bold", STYLES[verdict]);
}

/** The shape that a reason carries: that of the verdict it leads to. */
export function reasonMark(level: "within" | "adapt", look: Look): string {
  const verdict = level === "adapt" ? "hold" : "adapt";
  return styled(MARKS[verdict], look, STYLES[verdict]);
}
