import type { FittedLine, Line } from "../fit/line-fit.ts";
import type { Face } from "../joints/joint-faces.ts";
import { faceEnd, fitFace, type SectionSlice } from "../section/face-fit.ts";
import { type Placement, placedLine } from "../section/placement.ts";
import { type BeadJoint, type BeadSide, parentFrom } from "./bead-joint.ts";

/** Parent faces are fitted over this much beyond the weld: plates are flat so far, mm. */
const WINDOW_MM = 16;

/** First look about where the model puts the face, then about the first fit, mm. */
const WIDE_BAND_MM = 3;
const NARROW_BAND_MM = 0.6;

/** The corner of a plate is rounded; points this near to it carry no face, mm. */
const CORNER_MM = 0.6;

/** A parent face as it is found beside the weld. */
export interface ParentFace {
  readonly side: BeadSide;
  readonly fit: FittedLine;
  /** Where the face ends at a corner, mm along it; infinite where it runs on. */
  readonly end_mm: number;
  /** Turn of the face round the corner against the model, radians; null where there is none. */
  readonly lid_rad: number | null;
  /** True where nothing of the face is left and it is taken from the face round the corner, square as drawn. */
  readonly from_lid: boolean;
}

/** The line of a face in the axes of another one, both in the same section. */
function inAxesOf(face: Face, other: Face, line: Line): Line {
  const [oc, os] = [Math.cos(other.direction_rad), Math.sin(other.direction_rad)];
  const l = other.near[0] + line.t_mm * oc - line.d_mm * os;
  const n = other.near[1] + line.t_mm * os + line.d_mm * oc;
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  const [dl, dn] = [l - face.near[0], n - face.near[1]];
  return { t_mm: dl * c + dn * s, d_mm: dn * c - dl * s, angle_rad: line.angle_rad };
}

/** The face round the corner with the place where it ends, in the section. */
function lidOf(slice: SectionSlice, side: BeadSide, placement: Placement, seed: number) {
  const { lid } = side;
  if (!lid) return null;
  const line = placedLine(lid, placement);
  const fit = fitFace(slice, lid, {
    line,
    band_mm: WIDE_BAND_MM,
    from_mm: line.t_mm + 2,
    to_mm: line.t_mm + WINDOW_MM,
    seed,
  });
  const end =
    fit && faceEnd(slice, lid, fit, { band_mm: 4 * fit.scale_mm, from_mm: line.t_mm - PAST_CORNER_MM });
  return fit && end ? { lid, fit, end_mm: end.t_mm } : null;
}

/** The corner is looked for from a little before where it is expected, mm. */
const PAST_CORNER_MM = 4;

/**
 * The parent face of one side, from its points beyond the weld; where the weld covers it up to its corner, from the
 * face round the corner: as far off as drawn, and square to it as drawn.
 */
export function parentFace(
  slice: SectionSlice,
  bead: BeadJoint,
  which: 0 | 1,
  placement: Placement,
  seed: number,
): ParentFace | null {
  const side = bead.sides[which];
  const { face } = side;
  const line = placedLine(face, placement);
  const lid = lidOf(slice, side, placement, seed + 1);
  const corner_mm = lid
    ? inAxesOf(face, lid.lid, { ...lid.fit, t_mm: lid.end_mm, d_mm: onLine(lid.fit, lid.end_mm) })
    : null;
  const end_mm = corner_mm ? corner_mm.t_mm : face.far_is_corner ? line.t_mm + face.length_mm : Infinity;
  const from_mm = Math.min(line.t_mm + parentFrom(bead), end_mm - CORNER_MM - LEFT_MM);
  const to_mm = Math.min(from_mm + WINDOW_MM, end_mm - CORNER_MM);
  const seen = fitFace(slice, face, { line, band_mm: WIDE_BAND_MM, from_mm, to_mm, seed });
  const found = seen && { side, fit: seen, end_mm, lid_rad: lid?.fit.angle_rad ?? null, from_lid: false };
  if ((found && knowsDirection(seen)) || !lid || !corner_mm) return found;
  const drawn: Line = { t_mm: corner_mm.t_mm, d_mm: corner_mm.d_mm, angle_rad: lid.fit.angle_rad };
  const square = fitFace(slice, face, {
    line: drawn,
    band_mm: SQUARE_BAND_MM,
    from_mm: end_mm - CORNER_MM - LEFT_MM,
    to_mm,
    known: { angle_rad: drawn.angle_rad, u_rad: SQUARE_RAD },
  });
  const rest = { side, end_mm, lid_rad: lid.fit.angle_rad };
  if (square) return { ...rest, fit: square, from_lid: false };
  return { ...rest, fit: { ...lid.fit, ...drawn, scale_mm: lid.fit.scale_mm }, from_lid: true };
}

/** What is left of a nearly covered face is looked for in this much of it before its corner, mm. */
const LEFT_MM = 2.5;

/** It lies within this of where the face round the corner puts it, mm. */
const SQUARE_BAND_MM = 0.8;

/** An edge is square to its plate within about this. Common practice, no source. */
const SQUARE_RAD = Math.PI / 180;

/** Whether a face shows its own direction better than it is known from the drawing. */
const knowsDirection = ({ scale_mm, spread_mm2 }: FittedLine): boolean =>
  scale_mm / Math.sqrt(Math.max(1e-9, spread_mm2)) < SQUARE_RAD / 2;

const onLine = (line: Line, t_mm: number): number =>
  line.d_mm + (t_mm - line.t_mm) * Math.tan(line.angle_rad);

/** A parent face fitted again, now that it is known where the weld's metal ends on it. */
export function refitParent(slice: SectionSlice, parent: ParentFace, toe_mm: number): ParentFace {
  if (parent.from_lid) return parent;
  const to_mm = Math.min(toe_mm + WINDOW_MM, parent.end_mm - CORNER_MM);
  const fit = fitFace(slice, parent.side.face, {
    line: parent.fit,
    band_mm: NARROW_BAND_MM,
    from_mm: Math.min(toe_mm + CLEAR_MM, to_mm - 2),
    to_mm,
  });
  if (fit && knowsDirection(fit)) return { ...parent, fit };
  if (parent.lid_rad === null) return parent;
  const square = fitFace(slice, parent.side.face, {
    line: parent.fit,
    band_mm: NARROW_BAND_MM,
    from_mm: Math.min(toe_mm + NEAR_MM, to_mm - 1),
    to_mm,
    known: { angle_rad: parent.lid_rad, u_rad: SQUARE_RAD },
  });
  return square ? { ...parent, fit: square } : parent;
}

const NEAR_MM = 0.4;

/** An undercut beside the toe is no parent face: the fit keeps clear of it, mm. */
const CLEAR_MM = 1.5;
