import type { JointAt } from "../joints/construct-root.ts";
import type { JointFaces } from "../joints/joint-faces.ts";
import type { SectionSlice } from "./face-fit.ts";
import type { SectionFit } from "./fit-section.ts";

/** Metal this far off both faces and this near the root lies in the groove, mm. */
const OFF_FACES_MM = 0.35;
const NEAR_ROOT_MM = 6;

/** Ghosts and spatter are a few points; a tack is a surface. */
const FEWEST_POINTS = 5;
const FEWEST_SHARE = 0.025;

/** How far a tack's metal reaches along each plate's root face, mm from that face's root end. */
export type TackReach = readonly [a_mm: number, b_mm: number];

/**
 * Metal over the root: points in the open side of the groove, off both faces, near the root. The faces beside a tack
 * are still seen, so the root under it can be constructed.
 * @returns how far it reaches along both root faces; null where there is none
 */
export function tackOver(
  slice: SectionSlice,
  joint: JointFaces,
  fits: SectionFit,
  at: JointAt,
): TackReach | null {
  const [a, b] = joint.root.map((index, side) => {
    const face = joint.faces[index];
    // The open side is to the right of plate A's outward direction and to the left of plate B's.
    const sign = side === 0 ? -1 : 1;
    // A plate that shows only its edge bounds the groove by the edge's face, square to its surface.
    const isEdge = joint.kind === "butt" && joint.form[side as 0 | 1] === "edge";
    const along =
      (face?.direction_rad ?? 0) + (fits[index]?.angle_rad ?? 0) + (isEdge ? (sign * Math.PI) / 2 : 0);
    return { dl: Math.cos(along), dn: Math.sin(along), sign, near: face?.near ?? [0, 0] };
  });
  if (!a || !b) return null;
  const edge_mm = joint.kind === "butt" ? Math.max(0, at.gap_mm) / 2 : 0;
  let over = 0;
  const reach: [number, number] = [0, 0];
  for (let i = slice.from; i < slice.to; i++) {
    const l = slice.l_mm[i]! - at.lateral_mm;
    const n = slice.n_mm[i]! - at.normal_mm;
    if (l * l + n * n > NEAR_ROOT_MM * NEAR_ROOT_MM) continue;
    const offA = a.sign * (n * a.dl - (l + edge_mm) * a.dn);
    const offB = b.sign * (n * b.dl - (l - edge_mm) * b.dn);
    if (offA < OFF_FACES_MM || offB < OFF_FACES_MM) continue;
    over += 1;
    reach[0] = Math.max(reach[0], (l + edge_mm) * a.dl + n * a.dn);
    reach[1] = Math.max(reach[1], (l - edge_mm) * b.dl + n * b.dn);
  }
  if (over < Math.max(FEWEST_POINTS, FEWEST_SHARE * (slice.to - slice.from))) return null;
  // Measured from the root as it is; the faces' own axes begin at the nominal one.
  const shift = (side: { dl: number; dn: number; near: readonly number[] }, edge: number) =>
    (at.lateral_mm + edge - side.near[0]!) * side.dl + (at.normal_mm - side.near[1]!) * side.dn;
  return [reach[0] + shift(a, -edge_mm), reach[1] + shift(b, edge_mm)];
}
