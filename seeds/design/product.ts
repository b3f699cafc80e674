import type { DrawingCreate, ModelSeamCreate } from "@beadroll/domain/schemas/drawing";
import type { SeamLimits } from "@beadroll/domain/schemas/seam-model";
import type { Ref } from "../demo-event.ts";
import type { SeamLine } from "./seam-line.ts";

/** Joints that the shop welds. */
export type ShopJoint = "fillet_t" | "lap" | "butt_v" | "corner_open";

/** Sizes of a joint's section, mm and degrees. */
export interface JointSizes {
  readonly joint: ShopJoint;
  readonly plate_a_mm: number;
  readonly plate_b_mm: number;
  /** Height of an upright above plate A. */
  readonly height_mm: number;
  readonly gap_mm: number;
  readonly groove_deg: number;
  readonly root_face_mm: number;
}

/** A seam as the shop's designers drew it. */
export interface SeamDesign extends JointSizes {
  readonly number: string;
  readonly title: string;
  readonly line: SeamLine;
  readonly weld_size_mm: number;
  readonly quality_level: ModelSeamCreate["quality_level"];
  readonly procedure: Ref;
  /** Weld runs it takes. */
  readonly passes: number;
  readonly limits: SeamLimits;
  /** Plate B ends where the seam ends, so that a scan can see the ends. */
  readonly ends_free: boolean;
}

/** A drawing with its seams in welding sequence. */
export interface ProductDesign {
  readonly ref: Ref;
  readonly fields: DrawingCreate;
  /** What the robot programs of this product begin with. */
  readonly program: string;
  readonly seams: readonly SeamDesign[];
}

/** Limits for fillets and laps: the arc bridges what is within, the path follows what is inside adapt. */
export const FILLET_LIMITS: SeamLimits = {
  within: { lateral_mm: 0.8, normal_mm: 0.8, gap_mm: 0.8, angle_deg: 3 },
  adapt: { lateral_mm: 3, normal_mm: 2, gap_mm: 1.5, angle_deg: 6 },
  coverage_share: 0.9,
  longest_blind_mm: 15,
};

/** Limits for prepared butts and open corners, where the gap decides about the root. */
export const GROOVE_LIMITS: SeamLimits = {
  within: { lateral_mm: 0.8, normal_mm: 0.8, gap_mm: 0.8, mismatch_mm: 0.8, angle_deg: 4 },
  adapt: { lateral_mm: 3, normal_mm: 2, gap_mm: 1.6, mismatch_mm: 1.6, angle_deg: 8 },
  coverage_share: 0.9,
  longest_blind_mm: 15,
};

type Drawn = Pick<SeamDesign, "number" | "title" | "line">;
type Welded = Pick<SeamDesign, "weld_size_mm" | "quality_level" | "procedure">;

/** A T joint: upright of a thickness on a base. */
export function tJoint(
  drawn: Drawn,
  plates: readonly [a_mm: number, b_mm: number, height_mm: number],
  welded: Welded,
): SeamDesign {
  const [plate_a_mm, plate_b_mm, height_mm] = plates;
  return {
    ...drawn,
    ...welded,
    ...{ joint: "fillet_t", plate_a_mm, plate_b_mm, height_mm, gap_mm: 0, groove_deg: 0, root_face_mm: 0 },
    passes: 1,
    limits: FILLET_LIMITS,
    ends_free: false,
  };
}

/** A lap joint: a plate lying on another. */
export function lapJoint(
  drawn: Drawn,
  plates: readonly [a_mm: number, b_mm: number],
  welded: Welded,
): SeamDesign {
  return { ...tJoint(drawn, [plates[0], plates[1], plates[1]], welded), joint: "lap" };
}

/** An open corner: plate A's end above plate B's end. */
export function openCorner(
  drawn: Drawn,
  plates: readonly [a_mm: number, b_mm: number],
  welded: Welded,
): SeamDesign {
  return {
    ...tJoint(drawn, [plates[0], plates[1], plates[1]], welded),
    joint: "corner_open",
    passes: 2,
    limits: GROOVE_LIMITS,
  };
}

/** A V butt of equal plates: groove of 60 degrees, root face 2, gap 2. */
export function vButt(drawn: Drawn, plate_mm: number, welded: Welded): SeamDesign {
  return {
    ...tJoint(drawn, [plate_mm, plate_mm, plate_mm], welded),
    ...{ joint: "butt_v", gap_mm: 2, groove_deg: 60, root_face_mm: 2 },
    passes: 3,
    limits: GROOVE_LIMITS,
  };
}
