import type { JointSizes } from "../design/product.ts";
import type { JointState } from "./fit-up.ts";

/** A straight face of steel in a cross-section, (lateral, normal) in mm. */
export interface Face {
  readonly from_l: number;
  readonly from_n: number;
  readonly to_l: number;
  readonly to_n: number;
}

type Corner = readonly [l: number, n: number];

/** Plates reach this far from the root: beyond every scanner's field of view. */
const REACH_MM = 60;
const RAD = Math.PI / 180;

/** Turns a plate's outline about its own origin and moves it into the section. */
function placed(corners: readonly Corner[], turn_deg: number, move: Corner): Corner[] {
  const [cos, sin] = [Math.cos(turn_deg * RAD), Math.sin(turn_deg * RAD)];
  return corners.map(([l, n]) => [move[0] + l * cos - n * sin, move[1] + l * sin + n * cos]);
}

function facesOf(corners: readonly Corner[]): Face[] {
  return corners.slice(1).map(([to_l, to_n], i) => {
    const [from_l, from_n] = corners[i] ?? [to_l, to_n];
    return { from_l, from_n, to_l, to_n };
  });
}

/** Outlines of both plates with their common root at the origin, nothing turned and no gap. */
function outlines(sizes: JointSizes): { a: Corner[]; b: Corner[] } {
  const { plate_a_mm, plate_b_mm, height_mm, groove_deg, root_face_mm } = sizes;
  const flat: Corner[] = [
    [-REACH_MM, 0],
    [REACH_MM, 0],
  ];
  switch (sizes.joint) {
    case "fillet_t":
      return {
        a: flat,
        b: [
          [0, height_mm],
          [0, 0],
          [plate_b_mm, 0],
          [plate_b_mm, height_mm],
          [0, height_mm],
        ],
      };
    case "lap":
      return {
        a: flat,
        b: [
          [REACH_MM, plate_b_mm],
          [0, plate_b_mm],
          [0, 0],
          [REACH_MM, 0],
        ],
      };
    case "corner_open":
      return {
        a: [
          [-REACH_MM, plate_a_mm],
          [0, plate_a_mm],
          [0, 0],
          [-REACH_MM, 0],
        ],
        b: [
          [0, -REACH_MM],
          [0, 0],
          [plate_b_mm, 0],
          [plate_b_mm, -REACH_MM],
        ],
      };
    case "butt_v": {
      const depth_mm = plate_a_mm - root_face_mm;
      const bevel_mm = depth_mm * Math.tan((groove_deg * RAD) / 2);
      const left: Corner[] = [
        [-REACH_MM, depth_mm],
        [-bevel_mm, depth_mm],
        [0, 0],
        [0, -root_face_mm],
        [-REACH_MM, -root_face_mm],
      ];
      return { a: left, b: left.map(([l, n]): Corner => [-l, n]) };
    }
  }
}

/** Where each plate's own origin lies for a root at the origin: the gap opens along one plate's face. */
function moves(sizes: JointSizes, joint: JointState): { a: Corner; b: Corner } {
  const { gap_mm, mismatch_mm } = joint;
  const upward = (turn_deg: number): Corner => [
    -gap_mm * Math.sin(turn_deg * RAD),
    gap_mm * Math.cos(turn_deg * RAD),
  ];
  switch (sizes.joint) {
    case "fillet_t":
    case "lap":
      return { a: [0, 0], b: upward(joint.turn_b_deg) };
    case "corner_open":
      return { a: upward(joint.turn_a_deg), b: [0, 0] };
    case "butt_v":
      return { a: [-gap_mm / 2, -mismatch_mm / 2], b: [gap_mm / 2, mismatch_mm / 2] };
  }
}

/** The slanting face of a tack weld across the root. */
function tackFace(sizes: JointSizes, leg_mm: number): Face {
  switch (sizes.joint) {
    case "fillet_t":
    case "lap":
      return { from_l: -leg_mm, from_n: 0, to_l: 0, to_n: leg_mm };
    case "corner_open":
      return { from_l: 0, from_n: leg_mm, to_l: leg_mm, to_n: 0 };
    case "butt_v": {
      const half_mm = sizes.gap_mm / 2 + leg_mm * Math.tan((sizes.groove_deg * RAD) / 2);
      return { from_l: -half_mm, from_n: leg_mm, to_l: half_mm, to_n: leg_mm };
    }
  }
}

/**
 * Every face of steel at a station, in the nominal section frame: the real joint, its root off the nominal one by the
 * joint's deviation.
 * @param withPlateB false beyond the end of plate B
 */
export function sectionFaces(sizes: JointSizes, joint: JointState, withPlateB: boolean): Face[] {
  const { a, b } = outlines(sizes);
  const move = moves(sizes, joint);
  const faces = [
    ...facesOf(placed(a, joint.turn_a_deg, move.a)),
    ...(withPlateB ? facesOf(placed(b, joint.turn_b_deg, move.b)) : []),
    ...(withPlateB && joint.tack_mm > 0 ? [tackFace(sizes, joint.tack_mm)] : []),
  ];
  const { lateral_mm, normal_mm } = joint;
  return faces.map(({ from_l, from_n, to_l, to_n }) => ({
    from_l: from_l + lateral_mm,
    from_n: from_n + normal_mm,
    to_l: to_l + lateral_mm,
    to_n: to_n + normal_mm,
  }));
}
