import type { SeamModel } from "../../schemas/seam-model.ts";
import { type Face, type JointFaces, jointFaces } from "../joints/joint-faces.ts";
import type { SectionPoint } from "../joints/nominal-profile.ts";

/** One side of a finished weld: the parent face on which its metal ends. */
export interface BeadSide {
  readonly plate: "a" | "b";
  readonly face: Face;
  /** Thickness of the plate, mm. */
  readonly thickness_mm: number;
  /** Sign of the distance square to the face on its open side. */
  readonly open: 1 | -1;
  /** The face that begins where the parent face ends at a corner; null where it ends freely. */
  readonly lid: Face | null;
}

/** What a finished weld is measured against. */
export interface BeadJoint {
  readonly kind: "fillet" | "butt";
  readonly sides: readonly [BeadSide, BeadSide];
  /** Length of the nominal legs along the parent faces (butt: from the opening's edge), mm. */
  readonly reach_mm: number;
  /** The joint with only what stays visible beside the weld: what a section is placed by. */
  readonly visible: JointFaces;
}

/** Metal may end this far past the nominal toe and the parent face still be looked for beyond, mm. */
const PAST_TOE_MM = 3;

/** A butt weld overlaps the edges of its opening by about this on each side, mm. Common practice, no source. */
const OVERLAP_MM = 2;

/** Opening between two faces, radians: the angle of air that the weld fills. */
export function openingOf(a: Face, b: Face): number {
  const [al, an] = [Math.cos(a.direction_rad), Math.sin(a.direction_rad)];
  const [bl, bn] = [Math.cos(b.direction_rad), Math.sin(b.direction_rad)];
  return Math.acos(Math.max(-1, Math.min(1, al * bl + an * bn)));
}

/** On which side of a face a point lies. */
function sideOf(face: Face, [l, n]: SectionPoint): 1 | -1 {
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  return (n - face.near[1]) * c - (l - face.near[0]) * s >= 0 ? 1 : -1;
}

/** A face's stretch beyond the weld, as the two ends of a segment; null where nothing is left of it. */
function beyond(face: Face, from_mm: number): [SectionPoint, SectionPoint] | null {
  if (face.length_mm - from_mm < 1) return null;
  const share = from_mm / face.length_mm;
  const at: SectionPoint = [
    face.near[0] + share * (face.far[0] - face.near[0]),
    face.near[1] + share * (face.far[1] - face.near[1]),
  ];
  return [at, face.far];
}

/** The drawing with the weld's own place left out; plate A towards the root, plate B away from it. */
function visibleProfile(sides: BeadJoint["sides"], hidden_mm: number): JointFaces["profile"] {
  const outward = ({ face, lid }: BeadSide): SectionPoint[] => {
    const rest = beyond(face, hidden_mm);
    return [...(rest ?? []), ...(lid ? (rest ? [lid.far] : [lid.near, lid.far]) : [])];
  };
  return { plate_a: outward(sides[0]).reverse(), plate_b: outward(sides[1]) };
}

/** Both surfaces of a butt joint drawn up to each other: a filled joint shows no opening to be placed by. */
function onePlane([a, b]: BeadJoint["sides"]): JointFaces["profile"] {
  const middle: SectionPoint = [(a.face.near[0] + b.face.near[0]) / 2, (a.face.near[1] + b.face.near[1]) / 2];
  return { plate_a: [a.face.far, middle], plate_b: [middle, b.face.far] };
}

/**
 * The parent faces of a model's finished weld.
 * @param weld_size_mm nominal throat of a fillet weld, nominal thickness of a butt weld
 */
export function beadJoint(model: SeamModel, weld_size_mm: number): BeadJoint {
  const joint = jointFaces(model);
  const isButt = joint.kind === "butt";
  const index = isButt ? joint.longest : joint.root;
  const [a, b] = [joint.faces[index[0]], joint.faces[index[1]]];
  if (!a || !b) throw new RangeError(`${model.joint_type}: the joint has no two faces`);
  const lidOf = (plate: 0 | 1) => (isButt ? null : (joint.faces[joint.next[plate]] ?? null));
  const above = (face: Face): SectionPoint => [face.near[0], face.near[1] + 1];
  const { plate_a, plate_b } = model.section;
  const sides: BeadJoint["sides"] = [
    {
      plate: "a",
      face: a,
      thickness_mm: plate_a.thickness_mm,
      open: sideOf(a, isButt ? above(a) : b.far),
      lid: lidOf(0),
    },
    {
      plate: "b",
      face: b,
      thickness_mm: plate_b.thickness_mm,
      open: sideOf(b, isButt ? above(b) : a.far),
      lid: lidOf(1),
    },
  ];
  // The height of an isosceles triangle with this opening is z cos(opening / 2).
  const reach_mm = isButt ? OVERLAP_MM : weld_size_mm / Math.max(0.2, Math.cos(openingOf(a, b) / 2));
  const profile = isButt ? onePlane(sides) : visibleProfile(sides, reach_mm + 1);
  return {
    kind: isButt ? "butt" : "fillet",
    sides,
    reach_mm,
    // Nothing is known of the opening once it is filled: it does not count against a place.
    visible: { ...joint, kind: "meeting", profile },
  };
}

/** Where a side's parent face is looked for, from its near end outward, mm. */
export const parentFrom = (bead: BeadJoint): number => bead.reach_mm + PAST_TOE_MM;
