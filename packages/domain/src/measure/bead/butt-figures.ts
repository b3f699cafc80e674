import { onParent, overParent } from "./bead-frame.ts";
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

/**
 * Figures of a butt weld seen from its face side, mm:
 * - width: from toe to toe
 * - excess: the face's highest place over the straight line from toe to toe; underfill: its deepest under it
 * - mismatch: height of B's surface over A's along A's normal, in the middle of the weld; + where B stands proud
 */
export function buttFigures(geometry: BeadGeometry, face: readonly FacePoint[]): Figures {
  const { frame, toes, parents } = geometry;
  const noise_mm = Math.max(parents[0].fit.scale_mm, parents[1].fit.scale_mm);
  const [a, b] = [toeInFrame(frame, toes[0]), toeInFrame(frame, toes[1])];
  const heights = overChord(face, a, b);
  const toe = (which: 0 | 1) => heightU(parents[which].fit, toes[which].t_mm);
  const u_height = Math.hypot(FACE_U * noise_mm, 0.5 * Math.hypot(toe(0), toe(1)));
  const middle_t = overParent(parents[1], frame.origin[0], frame.origin[1]).t_mm;
  const [l, n] = onParent(parents[1], middle_t);
  const over = overParent(parents[0], l, n);
  return {
    width_mm: { value: Math.hypot(b.u - a.u, b.v - a.v), u: Math.hypot(toes[0].u_t_mm, toes[1].u_t_mm) },
    excess_mm: { value: Math.max(0, ...heights), u: u_height },
    underfill_mm: { value: Math.max(0, ...heights.map((height) => -height)), u: u_height },
    mismatch_mm: {
      value: over.h_mm,
      u: Math.hypot(heightU(parents[0].fit, over.t_mm), heightU(parents[1].fit, middle_t)),
    },
    ...anglesAndUndercuts(toes),
  };
}
