import type { SLOTS } from "@beadroll/domain/schemas/cell";
import type { FloorCell } from "@beadroll/domain/schemas/floor";
import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { StateTone } from "../../kit/states/state-mark.tsx";

/** A cell that sent something within this time is at work: welding a long seam sends nothing meanwhile. */
const AT_WORK_MS = 20 * 60_000;
const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MS = 24 * HOUR_MS;

export const SLOT_WORDS: Readonly<Record<(typeof SLOTS)[number], string>> = {
  wire: "Wire",
  gas: "Gas",
  flux: "Flux",
};

/** What a cell's state is, as far as its records tell; nobody types it in. */
export interface CellState {
  readonly tone: StateTone;
  readonly word: string;
}

/** A cell's state in a word or two: what stops it first, then what is missing, then whether it is at work. */
export function cellState(floor: FloorCell, now_ms: number): CellState {
  const held = floor.latest.filter(({ state }) => state === "held").length;
  if (held > 0) return { tone: "stop", word: held === 1 ? "1 seam held" : `${held} seams held` };
  const missing = missingWords(floor);
  if (missing !== null) return { tone: "attend", word: missing };
  if (floor.last_event_at === null) return { tone: "none", word: "Nothing sent yet" };
  const quiet_ms = now_ms - Date.parse(floor.last_event_at);
  return quiet_ms < AT_WORK_MS ? { tone: "good", word: "At work" } : { tone: "plain", word: "Quiet" };
}

/** What has to be mounted to weld and is not; null when wire, and gas or flux, are there. */
export function missingWords({ mounts }: Pick<FloorCell, "mounts">): string | null {
  const has = (slot: string) => mounts.some((mount) => mount.slot === slot);
  const isShielded = has("gas") || has("flux");
  if (!has("wire") && !isShielded) return "Nothing mounted";
  if (!has("wire")) return "No wire mounted";
  return isShielded ? null : "No gas mounted";
}

/** How long ago, as people say it; "just now" also for a clock that runs ahead. */
export function sinceWords(at: string, now_ms: number): string {
  const ago_ms = now_ms - Date.parse(at);
  if (ago_ms < MINUTE_MS) return "just now";
  if (ago_ms < HOUR_MS) return `${Math.floor(ago_ms / MINUTE_MS)} min ago`;
  if (ago_ms < DAY_MS) return `${Math.floor(ago_ms / HOUR_MS)} h ago`;
  const days = Math.floor(ago_ms / DAY_MS);
  return days === 1 ? "1 day ago" : `${days} days ago`;
}

/** What the last record of a seam says, for somebody who stands at the cell. */
export function lastRecordWords({ state, verdict }: Pick<SeamRow, "state" | "verdict">): string {
  switch (state) {
    case "planned":
      return "Not scanned yet.";
    case "held":
      return "Somebody decides before this seam is welded.";
    case "clear":
      return verdict === "adapt" ? "Scanned: the path has to follow the joint." : "Scanned: the path serves.";
    case "welded":
      return "Welded; it waits for its inspection.";
    case "accepted":
      return "Inspected and accepted.";
    case "rejected":
      return "Inspected and rejected; it is to be repaired.";
    case "repair":
      return "Being repaired.";
    case "released":
      return "Its part is released.";
  }
}
