import { medianOf } from "../fit/median.ts";
import {
  anglesAndUndercuts,
  type BeadGeometry,
  FACE_U,
  type FacePoint,
  type Figures,
  overChord,
  toeInFrame,
} from "./bead-geometry.ts";
import { heightU } from "./toe.ts";

/** The face's height over the root is taken from its points within this of the bisector, mm. */
const MIDDLE_MM = 0.7;

/** Legs shorter than this are no weld: the faces run on to the root, mm. */
const NO_WELD_MM = 0.8;

/** Largest part of a stretch that lies between sections: how far the face is seen beside a toe, mm. */
function holeIn(face: readonly FacePoint[], a: FacePoint, b: FacePoint): number {
  const places = [a.u, ...face.map(({ u }) => u), b.u];
  return Math.max(...places.slice(1).map((u, i) => u - places[i]!));
}

/** Part of a face that may be hidden before its figures are no longer said. */
const HIDDEN_SHARE = 0.35;

/**
 * Figures of a fillet weld, mm:
 * - leg: from the root, where the parent faces meet, to the toe, along the parent face (ISO 17659)
 * - throat: height of the largest isosceles triangle inside the weld, its point at the root (ISO 2553)
 * - actual throat: from the root to the weld's face, along the bisector of the parent faces
 * - convexity, concavity: the face's highest place over, deepest under the straight line from toe to toe
 * - width: from toe to toe; asymmetry: difference of the legs
 * @returns null where too much of the face is hidden
 */
export function filletFigures(geometry: BeadGeometry, face: readonly FacePoint[]): Figures | null {
  const { frame, toes, parents } = geometry;
  const noise_mm = Math.max(parents[0].fit.scale_mm, parents[1].fit.scale_mm);
  const sine = Math.max(0.2, Math.sin(frame.opening_rad));
  const half = frame.opening_rad / 2;
  const leg = (which: 0 | 1) => {
    const [l, n] = toes[which].at;
    const along = frame.along[which];
    return (l - frame.origin[0]) * along[0] + (n - frame.origin[1]) * along[1];
  };
  const rootOn = (which: 0 | 1) => {
    const { side, fit } = parents[which];
    const [l, n] = [frame.origin[0] - side.face.near[0], frame.origin[1] - side.face.near[1]];
    const t_mm = l * Math.cos(side.face.direction_rad) + n * Math.sin(side.face.direction_rad);
    return heightU(fit, t_mm);
  };
  const [u_a, u_b] = [rootOn(0), rootOn(1)];
  // Where two lines meet is unsure along each by what the other is unsure square to itself.
  const u_root = [
    Math.hypot(u_b, u_a * Math.cos(frame.opening_rad)),
    Math.hypot(u_a, u_b * Math.cos(frame.opening_rad)),
  ].map((u) => u / sine);
  const legs = [leg(0), leg(1)];
  if (Math.max(...legs) < NO_WELD_MM) return noWeld(noise_mm);
  const [a, b] = [toeInFrame(frame, toes[0]), toeInFrame(frame, toes[1])];
  const width = Math.hypot(b.u - a.u, b.v - a.v);
  if (face.length < 6 || holeIn(face, a, b) > HIDDEN_SHARE * width) return null;
  const legU = (which: 0 | 1) => Math.hypot(toes[which].u_t_mm, u_root[which]!);
  const u_root_v = Math.hypot(u_a, u_b) / (2 * Math.max(0.2, Math.sin(half)));
  const u_face = Math.hypot(FACE_U * noise_mm, u_root_v);
  const lowest = Math.min(...face.map(({ v }) => v));
  const throat = Math.min(lowest, a.v, b.v);
  const isToe = throat < lowest;
  const u_toe_v = Math.cos(half) * Math.max(legU(0), legU(1));
  const middle = face.filter(({ u }) => Math.abs(u) <= MIDDLE_MM).map(({ v }) => v);
  const heights = overChord(face, a, b);
  const u_chord = Math.hypot(
    FACE_U * noise_mm,
    0.5 * Math.hypot(toes[0].u_t_mm, toes[1].u_t_mm) * Math.sin(half),
  );
  return {
    leg_a_mm: { value: legs[0]!, u: legU(0) },
    leg_b_mm: { value: legs[1]!, u: legU(1) },
    throat_mm: { value: Math.max(0, throat), u: isToe ? Math.hypot(u_toe_v, u_root_v) : u_face },
    ...(middle.length > 0 && {
      throat_actual_mm: { value: Math.max(0, medianOf(middle)), u: u_face },
    }),
    convexity_mm: { value: Math.max(0, ...heights), u: u_chord },
    concavity_mm: { value: Math.max(0, ...heights.map((height) => -height)), u: u_chord },
    width_mm: { value: width, u: Math.hypot(toes[0].u_t_mm, toes[1].u_t_mm) },
    asymmetry_mm: { value: Math.abs(legs[0]! - legs[1]!), u: Math.hypot(legU(0), legU(1)) },
    ...anglesAndUndercuts(toes),
  };
}

/** The faces run on to the root: there is no weld here. */
function noWeld(noise_mm: number): Figures {
  const none = { value: 0, u: noise_mm };
  return { leg_a_mm: none, leg_b_mm: none, throat_mm: none, throat_actual_mm: none };
}
