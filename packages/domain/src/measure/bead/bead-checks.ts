import type { BeadRequirement } from "../../schemas/bead-requirement.ts";
import type { BeadQuantity, Figure, Figures } from "./bead-geometry.ts";
import type { BeadJoint } from "./bead-joint.ts";

/** One imperfection of ISO 5817 that a scan of the weld's face can measure. */
export interface BeadCheck {
  /** Number in ISO 6520-1. */
  readonly code: string;
  readonly plate?: "a" | "b";
  readonly unit: "mm" | "deg";
  /** What is held against the limit, from a section's figures; null where the section does not show it. */
  readonly measure: (figures: Figures, requirement: BeadRequirement) => Figure | null;
  /** Thickness that the limit depends on, mm. */
  readonly t_mm: number;
  /** True where 0 means that nothing shows, not that a size of 0 was measured. */
  readonly shows: boolean;
}

const own =
  (quantity: BeadQuantity) =>
  (figures: Figures): Figure | null =>
    figures[quantity] ?? null;

const size = ({ value, u }: Figure): Figure => ({ value: Math.abs(value), u });

/** The checks of a weld: those of its toes, then those of a fillet or a butt weld. */
export function beadChecks({ kind, sides }: BeadJoint): BeadCheck[] {
  const thinner_mm = Math.min(sides[0].thickness_mm, sides[1].thickness_mm);
  const toes = sides.flatMap(({ plate, thickness_mm }): BeadCheck[] => [
    {
      code: "5011",
      plate,
      unit: "mm",
      measure: own(`undercut_${plate}_mm`),
      t_mm: thickness_mm,
      shows: true,
    },
    {
      code: "505",
      plate,
      unit: "deg",
      measure: own(`toe_angle_${plate}_deg`),
      t_mm: thickness_mm,
      shows: false,
    },
  ]);
  const check = (code: string, measure: BeadCheck["measure"], shows = false): BeadCheck => ({
    code,
    unit: "mm",
    measure,
    t_mm: thinner_mm,
    shows,
  });
  if (kind === "butt")
    return [
      ...toes,
      check("502", own("excess_mm")),
      check("511", own("underfill_mm"), true),
      check("5071", ({ mismatch_mm }) => (mismatch_mm ? size(mismatch_mm) : null)),
    ];
  return [
    ...toes,
    check("503", own("convexity_mm")),
    check("512", own("asymmetry_mm")),
    // Too small: what the throat lacks; too large: what the face stands higher than asked.
    check("5213", ({ throat_mm }, { weld_size_mm }) =>
      throat_mm ? { value: weld_size_mm - throat_mm.value, u: throat_mm.u } : null,
    ),
    check("5214", ({ throat_actual_mm }, { weld_size_mm }) =>
      throat_actual_mm ? { value: throat_actual_mm.value - weld_size_mm, u: throat_actual_mm.u } : null,
    ),
  ];
}
