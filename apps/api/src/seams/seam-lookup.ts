import type { SeamState } from "@beadroll/domain/schemas/seam";
import type { Knex } from "knex";
import { refusal } from "../http/refusal.ts";
import type { ChangeTrx } from "../ledger/change.ts";
import { tagOf } from "../tags/tag-lookup.ts";

/** A seam as services need it before they record something of it. */
export interface SeamHandle {
  readonly id: string;
  readonly tag: string;
  readonly part_id: string;
  readonly part_tag: string;
  readonly model_seam_id: string;
  readonly attempt: number;
  readonly state: SeamState;
}

/** A seam by its tag. @throws Refusal tag-invalid, not-found */
export async function readSeamHandle(db: Knex, tagText: string): Promise<SeamHandle> {
  const tag = tagOf("S", tagText);
  const seam: SeamHandle | undefined = await db("seams")
    .join("parts", "parts.id", "seams.part_id")
    .where({ "seams.tag": tag })
    .first(
      "seams.id",
      "seams.tag",
      "seams.part_id",
      "parts.tag as part_tag",
      "seams.model_seam_id",
      "seams.attempt",
      "seams.state",
    );
  if (seam === undefined) throw refusal("not-found", `No seam here has the tag ${tag}.`);
  return seam;
}

/** Refuses a record for a seam on another part than the cell believes. @throws Refusal seam-of-other-part */
export function refuseOtherPart(seam: SeamHandle, partTag: string | undefined): void {
  if (partTag === undefined) return;
  const expected = tagOf("P", partTag, "part_tag");
  if (expected !== seam.part_tag)
    throw refusal("seam-of-other-part", `Seam ${seam.tag} is on part ${seam.part_tag}, not on ${expected}.`, {
      field: "part_tag",
    });
}

/**
 * The attempt that a new scan or pass belongs to. After a rejection the next one begins a repair: the same seam,
 * one attempt on.
 */
export async function attemptFor(trx: ChangeTrx, seam: SeamHandle): Promise<number> {
  if (seam.state !== "rejected") return seam.attempt;
  const attempt = seam.attempt + 1;
  await trx.update("seams", { id: seam.id }, { attempt });
  await trx.derive("seams", seam.id, {
    verdict: null,
    largest_mm: null,
    heat_input_kj_mm: null,
    strip: null,
  });
  return attempt;
}
