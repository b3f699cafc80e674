import type { FittedLine, Line } from "../fit/line-fit.ts";
import type { Face, JointFaces } from "../joints/joint-faces.ts";
import { type FaceSearch, fitFace, type SectionSlice } from "./face-fit.ts";
import { type Placement, placedLine } from "./placement.ts";

/** First look: faces may stand this far from where the placed model puts them (gap, hi-lo, turned plates), mm. */
const WIDE_BAND_MM = 2.5;
/** Second look, about the first fit, mm. */
const NARROW_BAND_MM = 0.8;

/** Faces are fitted at most this far from their root end: plates are flat near the root, seldom beyond, mm. */
const WINDOW_MM = 15;

/** Corners are rounded by the width of the laser line; points this near to one belong to no face, mm. */
const CORNER_MM = 0.7;

/** What a section is fitted from: its points, its joint, and where the joint is expected. */
export interface SliceInput {
  readonly slice: SectionSlice;
  readonly joint: JointFaces;
  /** Within about 2 mm and 6 degrees. */
  readonly placement: Placement;
}

/** The fitted faces of one section, in the order of the joint's faces; null where one was not found. */
export type SectionFit = readonly (FittedLine | null)[];

/** Where a line in one face's axes meets a line in another's, along the first; null where they are parallel. */
export function meetingAlong(face: Face, line: Line, other: Face, otherLine: Line): number | null {
  const [cos, sin] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  const along = face.direction_rad + line.angle_rad;
  const across = other.direction_rad + otherLine.angle_rad;
  const [oc, os] = [Math.cos(other.direction_rad), Math.sin(other.direction_rad)];
  const pl = face.near[0] + line.t_mm * cos - line.d_mm * sin;
  const pn = face.near[1] + line.t_mm * sin + line.d_mm * cos;
  const ql = other.near[0] + otherLine.t_mm * oc - otherLine.d_mm * os;
  const qn = other.near[1] + otherLine.t_mm * os + otherLine.d_mm * oc;
  const cross = Math.cos(along) * Math.sin(across) - Math.sin(along) * Math.cos(across);
  if (Math.abs(cross) < 0.05) return null;
  const by = ((ql - pl) * Math.sin(across) - (qn - pn) * Math.cos(across)) / cross;
  return line.t_mm + by * Math.cos(line.angle_rad);
}

/** The face that a face meets at its root end, and at its far end; -1 where it ends freely. */
function neighbours(joint: JointFaces, index: number): { near: number; far: number } {
  const side = joint.faces[index]?.plate === "a" ? 0 : 1;
  const [root, next] = [joint.root[side], joint.next[side]];
  if (index === root) {
    const opposite = joint.kind === "meeting" ? joint.root[1 - side]! : -1;
    return { near: opposite, far: next };
  }
  return { near: index === next ? root : next, far: -1 };
}

const margin = (face: Face) => Math.min(CORNER_MM, 0.15 * face.length_mm);

/** The stretch of a face that is clear of its corners, from what was fitted first. */
function clearStretch(
  { joint, placement }: SliceInput,
  lines: readonly (Line | null)[],
  index: number,
): readonly [from: number, to: number] | null {
  const face = joint.faces[index];
  const line = lines[index];
  if (!face || !line) return null;
  const { near, far } = neighbours(joint, index);
  const from =
    near >= 0
      ? (meetingOf(joint, lines, index, near) ?? 0) + margin(face)
      : far >= 0
        ? freeEnd(face, meetingOf(joint, lines, index, far))
        : placedLine(face, placement).t_mm + EDGE_DOUBT_MM;
  return [from, Math.min(endOf(joint, lines, index), from + WINDOW_MM)];
}

/** A bevel ends freely at its root edge: its length from the corner it makes with the surface, and a little more, mm. */
const freeEnd = (face: Face, corner_mm: number | null): number =>
  corner_mm === null ? Number.NEGATIVE_INFINITY : corner_mm - face.length_mm - BEYOND_EDGE_MM;
const BEYOND_EDGE_MM = 1.5;

/** Where a surface ends at an edge is only expected, not fitted: its points are taken from a little past it, mm. */
const EDGE_DOUBT_MM = 1;

/** Where a face ends, clear of its far corner. */
function endOf(joint: JointFaces, lines: readonly (Line | null)[], index: number): number {
  const face = joint.faces[index];
  if (!face) return 0;
  if (!face.far_is_corner) return face.length_mm + 5;
  return (meetingOf(joint, lines, index, neighbours(joint, index).far) ?? face.length_mm) - margin(face);
}

function meetingOf(
  joint: JointFaces,
  lines: readonly (Line | null)[],
  index: number,
  other: number,
): number | null {
  const [face, line, otherFace, otherLine] = [
    joint.faces[index],
    lines[index],
    joint.faces[other],
    lines[other],
  ];
  return face && line && otherFace && otherLine ? meetingAlong(face, line, otherFace, otherLine) : null;
}

/**
 * Fits every face of a joint to the points of one section.
 * @param seed of the consensus draws
 */
export function fitSection(input: SliceInput, seed: number): SectionFit {
  const { slice, joint, placement } = input;
  const first = joint.faces.map((face, index) => {
    const line = placedLine(face, placement);
    const begin_mm = line.t_mm + (joint.kind === "butt" && index < 2 ? -3 : Math.min(0.5, margin(face)));
    const reach_mm = face.far_is_corner ? Math.min(face.length_mm, WINDOW_MM) : WINDOW_MM;
    const to_mm = line.t_mm + reach_mm + (face.far_is_corner ? 1 : 5);
    const search: FaceSearch = { line, band_mm: WIDE_BAND_MM, from_mm: begin_mm, to_mm, seed: seed + index };
    return fitFace(slice, face, search);
  });
  return refit(input, refit(input, first, NARROW_BAND_MM), NARROW_BAND_MM);
}

/** What is known when faces are fitted again. */
export interface RefitOptions {
  /** Up to where each plate's root face is covered by a tack, mm along it. */
  readonly covered_mm?: readonly [a: number, b: number];
  /** Directions taken as known, one a face; null where the face shows its own. */
  readonly known?: readonly (KnownDirection | null)[];
}

/** A face's direction against the model's, and its standard uncertainty, radians. */
export interface KnownDirection {
  readonly angle_rad: number;
  readonly u_rad: number;
}

const CLEAR = [Number.NEGATIVE_INFINITY, Number.NEGATIVE_INFINITY] as const;

/**
 * Fits every face again near lines that are known already, clear of the corners they make.
 */
export function refit(
  input: SliceInput,
  lines: readonly (Line | null)[],
  band_mm: number,
  { covered_mm = CLEAR, known = [] }: RefitOptions = {},
): SectionFit {
  const { slice, joint } = input;
  return joint.faces.map((face, index) => {
    const line = lines[index];
    const stretch = clearStretch(input, lines, index);
    if (!line || !stretch) return null;
    const from_mm = index < 2 ? Math.max(stretch[0], covered_mm[index as 0 | 1]) : stretch[0];
    const to_mm = Math.min(stretch[1] + from_mm - stretch[0], endOf(joint, lines, index));
    const direction = known[index];
    return fitFace(slice, face, { line, band_mm, from_mm, to_mm, ...(direction && { known: direction }) });
  });
}
