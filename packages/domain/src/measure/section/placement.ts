import type { Line } from "../fit/line-fit.ts";
import type { Face } from "../joints/joint-faces.ts";

/** Where the joint lies in a section: the nominal one turned about the nominal root, then moved. */
export interface Placement {
  readonly l_mm: number;
  readonly n_mm: number;
  /** From lateral toward normal, radians. */
  readonly turn_rad: number;
}

/** Where a placement puts a face, as a line in that face's own nominal axes. */
export function placedLine(face: Face, { l_mm, n_mm, turn_rad }: Placement): Line {
  const [l, n] = face.near;
  const [cos, sin] = [Math.cos(turn_rad), Math.sin(turn_rad)];
  const dl = l * cos - n * sin + l_mm - l;
  const dn = l * sin + n * cos + n_mm - n;
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  return { t_mm: dl * c + dn * s, d_mm: dn * c - dl * s, angle_rad: turn_rad };
}
