import { distanceFrom } from "../fit/line-fit.ts";
import { medianOf } from "../fit/median.ts";
import type { SectionSlice } from "../section/face-fit.ts";
import { meetingAlong } from "../section/fit-section.ts";
import { putInOrder } from "./in-order.ts";
import type { ParentFace } from "./parent-faces.ts";
import { followers } from "./spikes.ts";

type Vector = readonly [l: number, n: number];

/** The axes in which a bead is a height over a width: u from plate A to plate B, v out of the metal. */
export interface BeadFrame {
  /** The root of a fillet weld, where the parent faces meet; of a butt weld the middle between its edges. */
  readonly origin: Vector;
  readonly u: Vector;
  readonly v: Vector;
  /** Angle of air between the parent faces, radians: π of flush plates. */
  readonly opening_rad: number;
  /** Outward directions along the parent faces, in the section. */
  readonly along: readonly [a: Vector, b: Vector];
}

function outward({ side, fit }: ParentFace): Vector {
  const angle = side.face.direction_rad + fit.angle_rad;
  return [Math.cos(angle), Math.sin(angle)];
}

function openNormal({ side, fit }: ParentFace): Vector {
  const angle = side.face.direction_rad + fit.angle_rad;
  return [-side.open * Math.sin(angle), side.open * Math.cos(angle)];
}

/** A place on a parent face, in the section. */
export function onParent({ side, fit }: ParentFace, t_mm: number): Vector {
  const { near, direction_rad } = side.face;
  const d = fit.d_mm + (t_mm - fit.t_mm) * Math.tan(fit.angle_rad);
  const [c, s] = [Math.cos(direction_rad), Math.sin(direction_rad)];
  return [near[0] + t_mm * c - d * s, near[1] + t_mm * s + d * c];
}

/** How far along a parent face a point lies, and how high over it on the open side, mm. */
export function overParent({ side, fit }: ParentFace, l: number, n: number): { t_mm: number; h_mm: number } {
  const { near, direction_rad } = side.face;
  const [c, s] = [Math.cos(direction_rad), Math.sin(direction_rad)];
  const t_mm = (l - near[0]) * c + (n - near[1]) * s;
  const d = (n - near[1]) * c - (l - near[0]) * s;
  return { t_mm, h_mm: side.open * distanceFrom(fit, t_mm, d) };
}

/** The frame of a bead between two parent faces; null where they should meet and do not. */
export function beadFrame(kind: "fillet" | "butt", a: ParentFace, b: ParentFace): BeadFrame | null {
  const along = [outward(a), outward(b)] as const;
  const [na, nb] = [openNormal(a), openNormal(b)];
  const size = Math.hypot(na[0] + nb[0], na[1] + nb[1]);
  if (size < 0.2) return null;
  const v: Vector = [(na[0] + nb[0]) / size, (na[1] + nb[1]) / size];
  const right: Vector = [v[1], -v[0]];
  const toB = (along[1][0] - along[0][0]) * right[0] + (along[1][1] - along[0][1]) * right[1];
  const u: Vector = toB >= 0 ? right : [-right[0], -right[1]];
  const opening_rad = Math.acos(
    Math.max(-1, Math.min(1, along[0][0] * along[1][0] + along[0][1] * along[1][1])),
  );
  if (kind === "fillet") {
    const t_mm = meetingAlong(a.side.face, a.fit, b.side.face, b.fit);
    return t_mm === null ? null : { origin: onParent(a, t_mm), u, v, opening_rad, along };
  }
  const [pa, pb] = [onParent(a, 0), onParent(b, 0)];
  return { origin: [(pa[0] + pb[0]) / 2, (pa[1] + pb[1]) / 2], u, v, opening_rad, along };
}

/** A section's points in a bead's frame, by growing u. */
export interface BeadProfile {
  readonly u_mm: Float64Array;
  readonly v_mm: Float64Array;
  /** In the section again. */
  readonly l_mm: Float64Array;
  readonly n_mm: Float64Array;
  readonly count: number;
  /** 1 where a point follows those about it, 0 where it is a spike or a ghost. */
  readonly follows: Uint8Array;
  /** Usual distance between points, mm. */
  readonly spacing_mm: number;
}

/**
 * The points within reach of a bead, ordered across it.
 * @param reach_mm half width, mm
 */
export function beadProfile(
  slice: SectionSlice,
  { origin, u, v }: BeadFrame,
  reach_mm: number,
  noise_mm: number,
): BeadProfile {
  const size = slice.to - slice.from;
  const columns = [0, 1, 2, 3].map(() => new Float64Array(size));
  const [us, vs, ls, ns] = columns as [Float64Array, Float64Array, Float64Array, Float64Array];
  let count = 0;
  for (let i = slice.from; i < slice.to; i++) {
    const [l, n] = [slice.l_mm[i]!, slice.n_mm[i]!];
    const [dl, dn] = [l - origin[0], n - origin[1]];
    const at_u = dl * u[0] + dn * u[1];
    const at_v = dl * v[0] + dn * v[1];
    if (Math.abs(at_u) > reach_mm || Math.abs(at_v) > reach_mm) continue;
    us[count] = at_u;
    vs[count] = at_v;
    ls[count] = l;
    ns[count] = n;
    count += 1;
  }
  putInOrder(us, [vs, ls, ns], count);
  const [u_mm, v_mm] = [us.subarray(0, count), vs.subarray(0, count)];
  const steps = u_mm.subarray(1).map((at, i) => at - u_mm[i]!);
  return {
    u_mm,
    v_mm,
    l_mm: ls.subarray(0, count),
    n_mm: ns.subarray(0, count),
    count,
    follows: followers(u_mm, v_mm, count, noise_mm),
    spacing_mm: steps.length > 0 ? Math.max(1e-3, medianOf(steps)) : 1e-3,
  };
}
