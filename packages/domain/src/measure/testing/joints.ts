import { type JointType, parseSeamModel, type SeamModel } from "../../schemas/seam-model.ts";
import type { Line } from "../fit/line-fit.ts";
import type { Face, JointFaces } from "../joints/joint-faces.ts";
import type { SectionPoint } from "../joints/nominal-profile.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import type { SectionSlice } from "../section/face-fit.ts";
import { cloudOf } from "./models.ts";
import { normalsFrom } from "./noise.ts";

const RAD = Math.PI / 180;

/** A straight seam along x with the lateral along y and the normal along z, its ends its only stations but for `step_mm`. */
export function jointModel(
  joint_type: JointType,
  section: object,
  { length_mm = 10, step_mm = length_mm }: { readonly length_mm?: number; readonly step_mm?: number } = {},
): SeamModel {
  const frame = { tangent: [1, 0, 0], lateral: [0, 1, 0], normal: [0, 0, 1] };
  const parsed = parseSeamModel({
    joint_type,
    seam: {
      length_mm,
      vertices: Array.from({ length: Math.round(length_mm / step_mm) + 1 }, (_, i) => ({
        station_mm: i * step_mm,
        point: [i * step_mm, 0, 0],
        ...frame,
      })),
    },
    section,
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

const plates = (a: number, b: number) => ({ plate_a: { thickness_mm: a }, plate_b: { thickness_mm: b } });

/** A common size of each joint. */
export const SECTIONS: Record<JointType, object> = {
  fillet_t: { plate_a: { thickness_mm: 12 }, plate_b: { thickness_mm: 6, height_mm: 20 } },
  corner_closed: { plate_a: { thickness_mm: 8 }, plate_b: { thickness_mm: 8, height_mm: 15 } },
  lap: plates(5, 6),
  corner_open: plates(8, 10),
  butt_v: { ...plates(10, 10), gap_mm: 2, groove_angle_deg: 60, root_face_mm: 2 },
  butt_half_v: { ...plates(10, 10), gap_mm: 2, groove_angle_deg: 45, root_face_mm: 2 },
  butt_square: { ...plates(4, 4), gap_mm: 2 },
};

/** Each plate moved as a whole: turn about the nominal root from lateral toward normal, then shift. */
export interface Moves {
  readonly a?: readonly [l_mm: number, n_mm: number, turn_deg: number];
  readonly b?: readonly [l_mm: number, n_mm: number, turn_deg: number];
}

/** Where a plate's move takes a point of the section. */
export function movedPoint(
  [l, n]: SectionPoint,
  [dl, dn, turn_deg]: readonly [number, number, number],
): SectionPoint {
  const [c, s] = [Math.cos(turn_deg * RAD), Math.sin(turn_deg * RAD)];
  return [l * c - n * s + dl, l * s + n * c + dn];
}

const moveOf = (face: Face, moves: Moves) => moves[face.plate] ?? ([0, 0, 0] as const);

/** A face of a moved plate, exactly, as a line in its own nominal axes through its root end. */
export function movedLine(face: Face, moves: Moves): Line {
  const move = moveOf(face, moves);
  const [l, n] = movedPoint(face.near, move);
  const [dl, dn] = [l - face.near[0], n - face.near[1]];
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  return { t_mm: dl * c + dn * s, d_mm: dn * c - dl * s, angle_rad: move[2] * RAD };
}

/** What a laser line over a joint shows. */
export interface Seen {
  readonly moves?: Moves;
  readonly noise_mm?: number;
  readonly spacing_mm?: number;
  readonly seed?: number;
  /** Faces are seen this far, mm. */
  readonly reach_mm?: number;
}

/** Points on a joint's faces, evenly spaced from the root end outward, with noise square to the face. */
export function pointsOn(joint: JointFaces, seen: Seen = {}): SectionPoint[] {
  const { moves = {}, noise_mm = 0.03, spacing_mm = 0.15, seed = 1, reach_mm = 20 } = seen;
  const normal = normalsFrom(seed);
  return joint.faces.flatMap((face) => {
    const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
    const count = Math.floor(Math.min(reach_mm, face.length_mm) / spacing_mm);
    return Array.from({ length: count }, (_, i): SectionPoint => {
      const t = (i + 0.5) * spacing_mm;
      const d = noise_mm * normal();
      return movedPoint([face.near[0] + t * c - d * s, face.near[1] + t * s + d * c], moveOf(face, moves));
    });
  });
}

/** Points as the one slice there is. */
export const sliceFrom = (points: readonly SectionPoint[]): SectionSlice => ({
  l_mm: Float64Array.from(points, ([l]) => l),
  n_mm: Float64Array.from(points, ([, n]) => n),
  from: 0,
  to: points.length,
});

/**
 * A scan of a straight joint along x, one profile every `pitch_mm`.
 * @param at the section's points at a place along it
 */
export function scanOf(
  length_mm: number,
  at: (x: number, index: number) => readonly SectionPoint[],
  pitch_mm = 1,
): ScanCloud {
  const profiles: number[] = [];
  const points = Array.from({ length: Math.floor(length_mm / pitch_mm) + 1 }, (_, index) => {
    const x = index * pitch_mm;
    return at(x, index).map(([l, n]): [number, number, number] => {
      profiles.push(index);
      return [x, l, n];
    });
  }).flat();
  return cloudOf(points, profiles);
}
