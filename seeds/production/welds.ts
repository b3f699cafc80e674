import type { Ref } from "../demo-event.ts";
import type { SeamDesign } from "../design/product.ts";
import type { Random } from "../random.ts";
import type { FilletWeld, Flaw } from "../simulate/weld-face.ts";

/** Flaws that a scan of the finished weld can show, as the inspections of the scenario tell them. */
const FLAWS: Readonly<Record<string, Flaw>> = {
  "part-0412 S9": { from_mm: 210, to_mm: 270, undercut_mm: 0.9, short_mm: 0 },
};

/** A finished fillet as the robot leaves it: a little more than asked, with a slight bow. */
export function weldFor(part: Ref, seam: SeamDesign, random: Random): FilletWeld {
  return {
    throat_mm: seam.weld_size_mm + random.between(0.3, 0.6),
    bow_mm: random.between(0.2, 0.7),
    ripple_mm: 0.04,
    flaw: FLAWS[`${part} ${seam.number}`] ?? null,
  };
}

/** Whether a finished weld is one that its scan has to hold. */
export const isFlawed = (part: Ref, number: string): boolean => FLAWS[`${part} ${number}`] !== undefined;
