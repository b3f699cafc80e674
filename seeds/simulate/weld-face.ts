import type { JointSizes } from "../design/product.ts";
import type { JointState } from "./fit-up.ts";
import type { Face } from "./section.ts";

/** Part of a weld that is not as the rest of it. */
export interface Flaw {
  readonly from_mm: number;
  readonly to_mm: number;
  /** Depth of an undercut on the upright; 0 without one. */
  readonly undercut_mm: number;
  /** By how much the throat falls short of the rest. */
  readonly short_mm: number;
}

/** A finished fillet weld as it runs along its seam. */
export interface FilletWeld {
  /** Throat of the flat weld, mm. */
  readonly throat_mm: number;
  /** Height of the face over the line from toe to toe. */
  readonly bow_mm: number;
  /** Half the height of the ripple that the arc leaves. */
  readonly ripple_mm: number;
  readonly flaw: Flaw | null;
}

type Corner = readonly [l: number, n: number];

const REACH_MM = 60;
const RIPPLE_EVERY_MM = 2.4;
/** Width of an undercut on the upright. */
const UNDERCUT_MM = 1.7;
const ARC_PIECES = 24;

/** An undercut's floor, from the toe upward on the upright: a rounded dip into plate B. */
function dip(toe_mm: number, depth_mm: number): Corner[] {
  if (depth_mm <= 0) return [];
  return Array.from({ length: 11 }, (_, i): Corner => {
    const share = i / 10;
    return [depth_mm * Math.sin(Math.PI * share) ** 2, toe_mm + UNDERCUT_MM * share];
  });
}

/** The weld's face from the toe on plate A to that on plate B: an arc over its chord. */
function face(leg_mm: number, bow_mm: number): Corner[] {
  const chord_mm = Math.SQRT2 * leg_mm;
  return Array.from({ length: ARC_PIECES + 1 }, (_, i): Corner => {
    const share = i / ARC_PIECES;
    const over = 4 * bow_mm * share * (1 - share);
    const [l, n] = [-leg_mm * (1 - share), leg_mm * share];
    return [l - (over * leg_mm) / chord_mm, n + (over * leg_mm) / chord_mm];
  });
}

/**
 * Every face of steel of a finished T joint at a station, in the nominal section frame. The weld fills the root, so
 * that only what lies beside it is seen of the plates.
 */
export function finishedFaces(
  sizes: JointSizes,
  joint: JointState,
  weld: FilletWeld,
  station_mm: number,
): Face[] {
  const { flaw } = weld;
  const isFlawed = flaw !== null && station_mm >= flaw.from_mm && station_mm <= flaw.to_mm;
  const ripple = weld.ripple_mm * Math.sin((2 * Math.PI * station_mm) / RIPPLE_EVERY_MM);
  const throat_mm = weld.throat_mm + ripple - (isFlawed ? flaw.short_mm : 0);
  const leg_mm = Math.SQRT2 * throat_mm;
  const corners: Corner[] = [
    [-REACH_MM, 0],
    ...face(leg_mm, weld.bow_mm + ripple),
    ...dip(leg_mm, isFlawed ? flaw.undercut_mm : 0),
    [0, sizes.height_mm],
    [sizes.plate_b_mm, sizes.height_mm],
  ];
  const turn = (joint.turn_a_deg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)];
  const placed = corners.map(
    ([l, n]): Corner => [joint.lateral_mm + l * cos - n * sin, joint.normal_mm + l * sin + n * cos],
  );
  return placed.slice(1).map(([to_l, to_n], i) => {
    const [from_l, from_n] = placed[i] ?? [to_l, to_n];
    return { from_l, from_n, to_l, to_n };
  });
}
