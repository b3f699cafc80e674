import type { Line } from "../fit/line-fit.ts";
import type { JointFaces } from "./joint-faces.ts";

/** What one section says of the joint; a quantity that it cannot say is NaN. */
export interface JointAt {
  /** Root, mm in the nominal section frame: its deviation, since the nominal root is the origin. */
  readonly lateral_mm: number;
  readonly normal_mm: number;
  /** From the chain of sizes (a thickness or height taken off a far corner) or between constructed edges; may be negative. */
  readonly gap_mm: number;
  readonly mismatch_mm: number;
  /** Included angle less the model's, radians. */
  readonly angle_rad: number;
  /** Turn of each plate's longest face, radians. */
  readonly turn_a_rad: number;
  readonly turn_b_rad: number;
}

/** What the construction is made of: each face's fitted line, and where a plate shows only its edge, that edge. */
export interface JointLines {
  readonly lines: readonly (Line | null)[];
  /** Place of the surface's end along the surface face, mm, for plates of form `edge`; NaN where not seen. */
  readonly edges_mm: readonly [a: number, b: number];
}

/** A line in the section: a point of it and its unit direction. */
interface Ray {
  readonly l: number;
  readonly n: number;
  readonly dl: number;
  readonly dn: number;
}

function rayOf(joint: JointFaces, lines: readonly (Line | null)[], index: number): Ray | null {
  const face = joint.faces[index];
  const line = lines[index];
  if (!face || !line) return null;
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  const along = face.direction_rad + line.angle_rad;
  return {
    l: face.near[0] + line.t_mm * c - line.d_mm * s,
    n: face.near[1] + line.t_mm * s + line.d_mm * c,
    dl: Math.cos(along),
    dn: Math.sin(along),
  };
}

/** Distance from a ray's point along it to where it meets another; NaN where they are parallel. */
function reachTo(ray: Ray, other: Ray): number {
  const cross = ray.dl * other.dn - ray.dn * other.dl;
  if (Math.abs(cross) < 0.02) return Number.NaN;
  return ((other.l - ray.l) * other.dn - (other.n - ray.n) * other.dl) / cross;
}

const pointAt = (ray: Ray, by: number): readonly [number, number] => [
  ray.l + by * ray.dl,
  ray.n + by * ray.dn,
];

const turnOf = (lines: readonly (Line | null)[], index: number) => lines[index]?.angle_rad ?? Number.NaN;

function turns(joint: JointFaces, { lines }: JointLines): Pick<JointAt, "turn_a_rad" | "turn_b_rad"> {
  return { turn_a_rad: turnOf(lines, joint.longest[0]), turn_b_rad: turnOf(lines, joint.longest[1]) };
}

/** T, lap and corner: two faces meet in the root. */
function meeting(joint: JointFaces, given: JointLines): JointAt | null {
  const a = rayOf(joint, given.lines, joint.root[0]);
  const b = rayOf(joint, given.lines, joint.root[1]);
  if (!a || !b) return null;
  const [lateral_mm, normal_mm] = pointAt(a, reachTo(a, b));
  return {
    lateral_mm,
    normal_mm,
    gap_mm: chainGap(joint, given, lateral_mm, normal_mm),
    mismatch_mm: Number.NaN,
    angle_rad: turnOf(given.lines, joint.root[0]) - turnOf(given.lines, joint.root[1]),
    ...turns(joint, given),
  };
}

/** Gap as what is left of the way from the root to the plate's far corner when the plate's size is taken off. */
function chainGap(joint: JointFaces, given: JointLines, l_mm: number, n_mm: number): number {
  if (!joint.chain) return Number.NaN;
  const side = joint.chain.plate === "a" ? 0 : 1;
  const own = rayOf(joint, given.lines, joint.root[side]);
  const far = rayOf(joint, given.lines, joint.next[side]);
  if (!own || !far) return Number.NaN;
  const [cl, cn] = pointAt(own, reachTo(own, far));
  return (cl - l_mm) * own.dl + (cn - n_mm) * own.dn - joint.chain.size_mm;
}

/** The root edge of one plate of a butt joint, and its surface with a direction toward growing lateral. */
function rootEdge(joint: JointFaces, given: JointLines, side: 0 | 1) {
  const surfaceIndex = joint.form[side] === "edge" ? joint.root[side] : joint.next[side];
  const ray = rayOf(joint, given.lines, surfaceIndex);
  if (!ray) return null;
  const sign = side === 0 ? -1 : 1;
  const surface: Ray = { ...ray, dl: sign * ray.dl, dn: sign * ray.dn };
  const depth_mm = joint.depth_mm[side];
  const low: Ray = { ...surface, l: surface.l + depth_mm * surface.dn, n: surface.n - depth_mm * surface.dl };
  if (joint.form[side] === "edge") {
    const t_mm = given.lines[surfaceIndex]?.t_mm ?? Number.NaN;
    const [l, n] = pointAt(low, sign * (given.edges_mm[side] - t_mm));
    return { l, n, surface };
  }
  const bevel = rayOf(joint, given.lines, joint.root[side]);
  if (!bevel) return null;
  const [l, n] = pointAt(low, reachTo(low, bevel));
  return { l, n, surface };
}

/** Butt joints: the root is midway between the root edges. */
function butt(joint: JointFaces, given: JointLines): JointAt | null {
  const a = rootEdge(joint, given, 0);
  const b = rootEdge(joint, given, 1);
  if (!a || !b) return null;
  const lateral_mm = (a.l + b.l) / 2;
  const normal_mm = (a.n + b.n) / 2;
  const up: Ray = { l: lateral_mm, n: normal_mm, dl: -a.surface.dn, dn: a.surface.dl };
  return {
    lateral_mm,
    normal_mm,
    gap_mm: (b.l - a.l) * a.surface.dl + (b.n - a.n) * a.surface.dn,
    mismatch_mm: reachTo(up, b.surface) - reachTo(up, a.surface),
    angle_rad: turnOf(given.lines, joint.root[0]) - turnOf(given.lines, joint.root[1]),
    ...turns(joint, given),
  };
}

/**
 * Root, gap, mismatch and angle of a section from its faces.
 * @returns null where a face that the root needs is missing or two that should meet are parallel
 */
export function constructRoot(joint: JointFaces, given: JointLines): JointAt | null {
  const found = joint.kind === "butt" ? butt(joint, given) : meeting(joint, given);
  return found && Number.isFinite(found.lateral_mm + found.normal_mm) ? found : null;
}
