import type { BEAD_QUANTITIES } from "../../schemas/bead-result.ts";
import { medianOf } from "../fit/median.ts";
import type { BeadFrame, BeadProfile } from "./bead-frame.ts";
import { SHARED_ERROR } from "./face-curve.ts";
import type { ParentFace } from "./parent-faces.ts";
import type { Toe } from "./toe.ts";

export type BeadQuantity = (typeof BEAD_QUANTITIES)[number];

/** A figure with its standard uncertainty, mm or degrees. */
export interface Figure {
  readonly value: number;
  readonly u: number;
  /** Towards smaller values, where that is surer: what is partly hidden can only be larger than what is seen of it. */
  readonly u_down?: number;
}

export type Figures = Partial<Readonly<Record<BeadQuantity, Figure>>>;

/** What a section's figures are worked out from. */
export interface BeadGeometry {
  readonly parents: readonly [ParentFace, ParentFace];
  readonly frame: BeadFrame;
  readonly profile: BeadProfile;
  readonly toes: readonly [Toe, Toe];
}

/** A place in the bead's frame, mm. */
export interface FacePoint {
  readonly u: number;
  readonly v: number;
}

/** Part of the noise that a height of the face keeps: a median of five (0.54 for normal noise) of shared errors. */
export const FACE_U = 0.54 * SHARED_ERROR;

/** A toe in the bead's frame. */
export function toeInFrame({ origin, u, v }: BeadFrame, { at: [l, n] }: Toe): FacePoint {
  const [dl, dn] = [l - origin[0], n - origin[1]];
  return { u: dl * u[0] + dn * u[1], v: dl * v[0] + dn * v[1] };
}

/** The weld's face between its toes, each height the median of five, in the bead's frame. */
export function faceBetween({ frame, profile, toes }: BeadGeometry): FacePoint[] {
  const [from, to] = [toeInFrame(frame, toes[0]).u, toeInFrame(frame, toes[1]).u];
  const face: FacePoint[] = [];
  for (let i = 0; i < profile.count; i++) {
    const u = profile.u_mm[i]!;
    if (u <= from || u >= to || profile.follows[i] === 0) continue;
    const around: number[] = [];
    for (let k = Math.max(0, i - 2); k <= Math.min(profile.count - 1, i + 2); k++)
      if (profile.follows[k] === 1 && profile.u_mm[k]! > from && profile.u_mm[k]! < to)
        around.push(profile.v_mm[k]!);
    face.push({ u, v: medianOf(around) });
  }
  return face;
}

/** Heights of the face over the straight line from toe to toe, mm. */
export function overChord(face: readonly FacePoint[], a: FacePoint, b: FacePoint): number[] {
  const [du, dv] = [b.u - a.u, b.v - a.v];
  const size = Math.hypot(du, dv);
  return face.map(({ u, v }) => ((v - a.v) * du - (u - a.u) * dv) / size);
}

/** An angle less sure than this is no measurement, degrees. */
const LEAST_SURE_DEG = 12;

/** What both kinds of weld say of their toes. A toe at a corner shows neither angle nor undercut. */
export function anglesAndUndercuts([a, b]: readonly [Toe, Toe]): Figures {
  const angle = ({ angle_deg, u_angle_deg }: Toe) => ({ value: angle_deg, u: u_angle_deg });
  const undercut = ({ undercut_mm, u_undercut_mm, u_undercut_down_mm }: Toe) => ({
    value: undercut_mm,
    u: u_undercut_mm,
    u_down: u_undercut_down_mm,
  });
  const isSure = ({ u_angle_deg }: Toe) => u_angle_deg <= LEAST_SURE_DEG;
  const isSeen = ({ angle_deg }: Toe) => Number.isFinite(angle_deg);
  return {
    ...(isSure(a) && { toe_angle_a_deg: angle(a) }),
    ...(isSure(b) && { toe_angle_b_deg: angle(b) }),
    ...(isSeen(a) && { undercut_a_mm: undercut(a) }),
    ...(isSeen(b) && { undercut_b_mm: undercut(b) }),
  };
}
