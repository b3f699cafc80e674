import type { Part } from "@beadroll/domain/schemas/part";
import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { StateName } from "../../kit/states/state-words.ts";

const plural = (count: number, one: string, many = `${one}s`) => `${count} ${count === 1 ? one : many}`;

type Tally = Part["seams"];

/** A part in one state: the worst of its seams', or accepted once all are. */
export function partState(tally: Tally): StateName {
  if (tally.held > 0) return "held";
  if (tally.rejected > 0) return "rejected";
  if (tally.total > 0 && tally.accepted === tally.total) return "accepted";
  if (tally.welded > 0 && tally.planned + tally.clear === 0) return "welded";
  return tally.planned === tally.total ? "planned" : "clear";
}

/** How a part's state looks: as its seams' states do, but plainly "In work" where "clear" would say too much. */
export function partLook(tally: Tally): { state: StateName } | { tone: "plain"; word: string } {
  const state = partState(tally);
  return state === "clear" ? { tone: "plain", word: "In work" } : { state };
}

/** `14 seams: 1 held, 9 accepted, 4 planned`. */
export function tallyWords(tally: Tally): string {
  const parts = (
    [
      ["held", tally.held],
      ["rejected", tally.rejected],
      ["welded", tally.welded],
      ["clear", tally.clear],
      ["accepted", tally.accepted],
      ["planned", tally.planned],
    ] as const
  ).flatMap(([word, count]) => (count > 0 ? [`${count} ${word}`] : []));
  return `${plural(tally.total, "seam")}${parts.length > 0 ? `: ${parts.join(", ")}` : ""}`;
}

/** A deed that the part waits for, with the seams it is for. */
export interface Waiting {
  /** For one seam and for several. */
  readonly one: string;
  readonly many: string;
  readonly tone: "stop" | "attend" | "plain";
  readonly seams: readonly SeamRow[];
}

/** What must be done with a part now, most urgent first. */
export function waitingFor(roll: readonly SeamRow[]): Waiting[] {
  const of = (...states: SeamRow["state"][]) => roll.filter((seam) => states.includes(seam.state));
  const all: Waiting[] = [
    {
      one: "waits for the welding coordinator's decision",
      many: "wait for the welding coordinator's decision",
      tone: "stop",
      seams: of("held"),
    },
    { one: "is to be repaired", many: "are to be repaired", tone: "stop", seams: of("rejected") },
    { one: "is in repair", many: "are in repair", tone: "attend", seams: of("repair") },
    { one: "is to be inspected", many: "are to be inspected", tone: "plain", seams: of("welded") },
    { one: "may be welded", many: "may be welded", tone: "plain", seams: of("clear") },
    { one: "is to be scanned", many: "are to be scanned", tone: "plain", seams: of("planned") },
  ];
  return all.filter((one) => one.seams.length > 0);
}
