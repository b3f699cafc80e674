import type { PassRecord } from "@beadroll/domain/schemas/pass";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamPage, SeamState } from "@beadroll/domain/schemas/seam";
import type { JointType } from "@beadroll/domain/schemas/seam-model";

const JOINTS: Readonly<Record<JointType, string>> = {
  fillet_t: "T",
  lap: "Lap",
  corner_open: "Corner",
  corner_closed: "Corner",
  butt_v: "Butt V",
  butt_half_v: "Butt half V",
  butt_square: "Butt square",
};

/** A joint with its size: `T, a5`; butt welds by their depth s (ISO 2553). */
export function jointWords(joint: JointType, size_mm: number): string {
  return `${JOINTS[joint]}, ${joint.startsWith("butt") ? "s" : "a"}${size_mm}`;
}

/** A seam's number with its attempt: `S12`, and `S12R1` once repaired. */
export const seamNumber = (number: string, attempt: number): string =>
  attempt > 1 ? `${number}R${attempt - 1}` : number;

/** What a verdict means for whoever reads it. */
const VERDICT_WORDS: Readonly<Record<ScanResult["verdict"], string>> = {
  within: "Within: the nominal path serves.",
  adapt: "Adapt: the path has to follow the joint; everything is inside what may be followed.",
  hold: "Hold: somebody has to decide before this seam is welded.",
};

/** A scan's verdict in one sentence: its first reason, or what the verdict means. */
export function verdictSentence({ verdict, reasons }: ScanResult): string {
  const [first] = reasons;
  if (first === undefined || verdict === "within") return VERDICT_WORDS[verdict];
  return `${verdict === "hold" ? "Hold" : "Adapt"}: ${first.text}`;
}

/** What is to be done now, by a seam's state. */
const NEXT_STEPS: Readonly<Record<SeamState, string>> = {
  planned: "Scan the fit-up.",
  held: "The welding coordinator decides: fit up again and scan again, or allow it.",
  clear: "Prove the path dry, then weld.",
  welded: "Inspect the seam against its quality level.",
  accepted: "Nothing. The seam is accepted.",
  rejected: "Repair it: the next scan or pass begins the repair.",
  repair: "Scan the prepared repair.",
  released: "Nothing. The part is released.",
};

/** What is to be done with a seam now. */
export const nextStep = (state: SeamState): string => NEXT_STEPS[state];

/** The qualification an operator welded under, or that there was none. */
export function qualificationWords(pass: PassRecord): { readonly ok: boolean; readonly text: string } {
  if (pass.operator_name === null) return { ok: false, text: "operator not named" };
  if (pass.operator_valid_until === null) return { ok: false, text: "no valid qualification on that day" };
  return { ok: true, text: `qualified to ${pass.operator_valid_until}` };
}

/** Lots of a pass by slot: `W-3391, then W-3402` when a spool was changed while the arc burned. */
export function lotsOfPass(page: SeamPage, passId: string): { slot: string; lots: SeamPage["pass_lots"] }[] {
  const bySlot = new Map<string, SeamPage["pass_lots"]>();
  for (const lot of page.pass_lots) {
    if (lot.pass_id === passId) bySlot.set(lot.slot, [...(bySlot.get(lot.slot) ?? []), lot]);
  }
  return [...bySlot].map(([slot, lots]) => ({ slot, lots }));
}
