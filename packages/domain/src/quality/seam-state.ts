import type { InspectionResult } from "../schemas/inspection.ts";
import type { Verdict } from "../schemas/scan-result.ts";
import type { SeamState } from "../schemas/seam.ts";

/** One inspection, as far as the state needs it. */
export interface InspectionFact {
  readonly method: string;
  readonly result: InspectionResult;
  /** Its place in the ledger: cells' and people's clocks differ, the ledger's order does not. */
  readonly seq: number;
}

/** What is known of a seam's current attempt. */
export interface SeamFacts {
  /** 1, or 2 and more after repairs. */
  readonly attempt: number;
  /** Verdict of the attempt's latest fit-up scan; null without one. */
  readonly verdict: Verdict | null;
  /** The first reason of that verdict, as a sentence; null where it has none. */
  readonly verdict_reason?: string | null;
  /** Ledger places of the attempt's passes, ascending. */
  readonly pass_seqs: readonly number[];
  /** The attempt's inspections, ascending by ledger place. */
  readonly inspections: readonly InspectionFact[];
}

/** A state and the sentence that says why. */
export interface StateWithReason {
  readonly state: SeamState;
  readonly reason: string;
}

/** The latest inspection of each method since the last pass: welding again makes earlier ones stale. */
function standing(facts: SeamFacts): InspectionFact[] {
  const lastPass = facts.pass_seqs.at(-1) ?? -1;
  const byMethod = new Map<string, InspectionFact>();
  for (const inspection of facts.inspections) {
    if (inspection.seq > lastPass) byMethod.set(inspection.method, inspection);
  }
  return [...byMethod.values()];
}

function beforeWelding(facts: SeamFacts): StateWithReason {
  const why = facts.verdict_reason ? `: ${facts.verdict_reason}` : "";
  if (facts.verdict === "hold") return { state: "held", reason: `The fit-up scan's verdict is hold${why}.` };
  if (facts.verdict !== null)
    return { state: "clear", reason: `The fit-up scan's verdict is ${facts.verdict}${why}.` };
  if (facts.attempt > 1) return { state: "repair", reason: `Repair ${facts.attempt - 1} has begun.` };
  return { state: "planned", reason: "Nothing is recorded yet." };
}

/**
 * The state of a seam, from the facts of its current attempt alone: inspections since the last pass decide, else
 * passes, else the fit-up scan.
 */
export function deriveSeamState(facts: SeamFacts): StateWithReason {
  const inspections = standing(facts);
  const rejected = inspections.find((inspection) => inspection.result === "rejected");
  if (rejected) return { state: "rejected", reason: `Rejected by ${rejected.method}.` };
  if (facts.pass_seqs.length === 0) return beforeWelding(facts);
  if (inspections.length > 0)
    return { state: "accepted", reason: `Accepted by ${inspections.map((i) => i.method).join(", ")}.` };
  const runs = facts.pass_seqs.length === 1 ? "1 pass" : `${facts.pass_seqs.length} passes`;
  const held = facts.verdict === "hold" ? " It was welded although its fit-up scan said hold." : "";
  return { state: "welded", reason: `${runs} recorded, not inspected since.${held}` };
}
