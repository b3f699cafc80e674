import { temperColour } from "@beadroll/domain/quality/temper";
import type { Strip } from "@beadroll/domain/schemas/seam";
import { type Look, tinted } from "./look.ts";

const BLOCKS = "▁▂▃▄▅▆▇█";

function ripple(share: number | null, look: Look): string {
  if (share === null) return "·";
  const size = Math.abs(share);
  const height = Math.min(BLOCKS.length - 1, Math.floor(size * BLOCKS.length));
  return tinted(size > 1 ? "!" : BLOCKS.charAt(height), look, temperColour(size));
}

/**
 * A bead strip in one line: the higher the block, the more of the limit is used; `!` is beyond it, `·` not measured.
 * On a terminal with 24-bit colours in the temper scale too.
 */
export function stripText(strip: Strip, look: Look): string {
  return strip.map((share) => ripple(share, look)).join("");
}

/** The line under a strip: where it begins and ends. */
export function stripScale(columns: number, length_mm: number): string {
  const end = `${length_mm.toFixed(1)} mm`;
  return `0${" ".repeat(Math.max(1, columns - 1 - end.length))}${end}`;
}
