import type { Procedure } from "@beadroll/domain/schemas/procedure";
import type { StateTone } from "../../kit/states/state-words.ts";

/** Look and word of a procedure's status. */
export const STATUS_LOOKS: Readonly<
  Record<Procedure["status"], { readonly tone: StateTone; readonly word: string }>
> = {
  draft: { tone: "attend", word: "Draft" },
  approved: { tone: "good", word: "Approved" },
  withdrawn: { tone: "none", word: "Withdrawn" },
};
