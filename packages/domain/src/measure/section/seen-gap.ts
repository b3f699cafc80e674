import type { FittedLine } from "../fit/line-fit.ts";
import type { Face, JointFaces } from "../joints/joint-faces.ts";
import { faceEnd, type SectionSlice } from "./face-fit.ts";
import { meetingAlong, type SectionFit } from "./fit-section.ts";

/** Points within this many spreads of a face, and at least this near, are the face's when its end is looked for. */
const END_SPREADS = 4;
const END_BAND_MM = 0.12;

/** The other face is seen up to the root when its points begin within this many spacings, and this far, of it. */
const REACHES_SPACINGS = 2.5;
const REACHES_MM = 0.4;

/** How near to a fitted face a point is the face's own, mm. */
export const bandOf = (fit: FittedLine): number => Math.max(END_BAND_MM, END_SPREADS * fit.scale_mm);

/** A gap as the edge of the plate over it shows it. */
export interface SeenGap {
  /** Distance from the root to the edge, mm; where the gap is not open, the middle of what it may be. */
  readonly gap_mm: number;
  readonly u_mm: number;
  /** Whether an opening is plainly seen. If not, the gap is anything from naught to where the points begin. */
  readonly is_open: boolean;
  /** Where the edge's points begin, mm from the root. */
  readonly begins_mm: number;
}

/** Whether a face is seen up to the root: if metal covers both faces there, it is no gap that hides one of them. */
function reachesRoot(slice: SectionSlice, face: Face, fit: FittedLine, root_mm: number): boolean {
  const end = faceEnd(slice, face, fit, { band_mm: bandOf(fit), from_mm: root_mm - 8 });
  return end !== null && end.t_mm - root_mm <= REACHES_MM + REACHES_SPACINGS * end.spacing_mm;
}

/**
 * The gap of a T, lap or corner joint from where the points of the face above it begin.
 * The edge lies up to one spacing before the first point: half of it is taken off, u = spacing / √12 (rectangular).
 * @returns null where metal covers the root or a face is missing
 */
export function seenGap(slice: SectionSlice, joint: JointFaces, fits: SectionFit): SeenGap | null {
  if (joint.kind !== "meeting") return null;
  const side = joint.chain?.plate === "a" ? 0 : 1;
  const [index, other] = [joint.root[side], joint.root[1 - side]!];
  const [face, fit, otherFace, otherFit] = [joint.faces[index], fits[index], joint.faces[other], fits[other]];
  if (!face || !fit || !otherFace || !otherFit) return null;
  const root = meetingAlong(face, fit, otherFace, otherFit);
  const otherRoot = meetingAlong(otherFace, otherFit, face, fit);
  if (root === null || otherRoot === null || !reachesRoot(slice, otherFace, otherFit, otherRoot)) return null;
  // Points this near to the other face may be its own.
  const clear_mm = bandOf(otherFit);
  const end = faceEnd(slice, face, fit, { band_mm: bandOf(fit), from_mm: root + clear_mm });
  if (!end) return null;
  const begins_mm = end.t_mm - root;
  const is_open = begins_mm > clear_mm + 1.5 * end.spacing_mm;
  return is_open
    ? {
        gap_mm: begins_mm - end.spacing_mm / 2,
        u_mm: end.spacing_mm / Math.sqrt(12),
        is_open,
        begins_mm,
      }
    : { gap_mm: begins_mm / 2, u_mm: begins_mm / Math.sqrt(12), is_open, begins_mm };
}
