import type { Drawing, ModelSeam } from "@beadroll/domain/schemas/drawing";
import type { StateTone } from "../../kit/states/state-words.ts";

/** Look and word of a drawing's status. */
export const DRAWING_LOOKS: Readonly<
  Record<Drawing["status"], { readonly tone: StateTone; readonly word: string }>
> = {
  draft: { tone: "attend", word: "Draft" },
  current: { tone: "good", word: "Current" },
  superseded: { tone: "none", word: "Superseded" },
};

/** When a model seam is scanned. */
export const SCAN_RULE_WORDS: Readonly<Record<ModelSeam["scan_rule"], string>> = {
  always: "always",
  sample: "by sample",
  never: "never",
};
