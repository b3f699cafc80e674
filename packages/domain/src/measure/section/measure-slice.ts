import type { BLIND_REASONS } from "../../schemas/scan-result.ts";
import type { FittedLine } from "../fit/line-fit.ts";
import type { JointAt } from "../joints/construct-root.ts";
import type { JointFaces } from "../joints/joint-faces.ts";
import { constructWithU, type JointWithU } from "../joints/joint-uncertainty.ts";
import { FEWEST_POINTS, faceEnd, type SectionSlice } from "./face-fit.ts";
import { meetingAlong, refit, type SectionFit } from "./fit-section.ts";
import { type TackReach, tackOver } from "./tack.ts";

export type BlindReason = (typeof BLIND_REASONS)[number];

/** A root that is less sure than this is no measurement, mm. */
const LEAST_SURE_MM = 0.5;

/** Points within this many spreads of a face, and at least this near, are the face's when its end is looked for. */
const END_SPREADS = 4;
const END_BAND_MM = 0.12;

/** One section, measured by itself. */
export interface SliceResult {
  readonly fits: SectionFit;
  readonly at: JointAt;
  readonly u: JointAt;
  /** Gap from the edge as it is seen, mm, and its uncertainty; NaN where no edge is seen. */
  readonly seen_gap_mm: number;
  readonly u_seen_gap_mm: number;
  /** Whether a gap is plainly seen: the face begins clear of the other one. If not, the seen gap is an upper bound. */
  readonly gap_is_open: boolean;
  readonly tack: boolean;
}

export type SliceOutcome =
  | { readonly found: true; readonly result: SliceResult }
  | { readonly found: false; readonly why: BlindReason };

const bandOf = (fit: FittedLine) => Math.max(END_BAND_MM, END_SPREADS * fit.scale_mm);

/** Ends of surfaces that are seen as edges only; the light's next point may lie anywhere in one spacing beyond. */
function edgesOf(slice: SectionSlice, joint: JointFaces, fits: SectionFit) {
  const edges: [number, number] = [Number.NaN, Number.NaN];
  const u_edges: [number, number] = [0, 0];
  for (const side of [0, 1] as const) {
    const index = joint.root[side];
    const face = joint.faces[index];
    const fit = fits[index];
    if (joint.kind !== "butt" || joint.form[side] !== "edge" || !face || !fit) continue;
    const end = faceEnd(slice, face, fit, { band_mm: bandOf(fit), from_mm: -8 });
    if (!end) continue;
    edges[side] = end.t_mm - end.spacing_mm / 2;
    u_edges[side] = end.spacing_mm / Math.sqrt(12);
  }
  return { edges, u_edges };
}

/** The gap of a meeting joint from where the points of the face above it begin. */
function seenGap(slice: SectionSlice, joint: JointFaces, fits: SectionFit, tack: boolean) {
  const none = { gap_mm: Number.NaN, u_mm: Number.NaN, is_open: false };
  if (joint.kind !== "meeting" || tack) return none;
  const side = joint.chain?.plate === "a" ? 0 : 1;
  const [index, other] = [joint.root[side], joint.root[1 - side]!];
  const [face, fit, otherFace, otherFit] = [joint.faces[index], fits[index], joint.faces[other], fits[other]];
  if (!face || !fit || !otherFace || !otherFit) return none;
  const root = meetingAlong(face, fit, otherFace, otherFit);
  if (root === null) return none;
  // Points this near to the other face may be its own.
  const clear_mm = bandOf(otherFit);
  const end = faceEnd(slice, face, fit, { band_mm: bandOf(fit), from_mm: root + clear_mm });
  if (!end) return none;
  const begins_mm = end.t_mm - root;
  return {
    gap_mm: begins_mm - end.spacing_mm / 2,
    u_mm: end.spacing_mm / Math.sqrt(12),
    is_open: begins_mm > clear_mm + 1.5 * end.spacing_mm,
  };
}

function whyNot(slice: SectionSlice, joint: JointFaces, fits: SectionFit): BlindReason {
  const size = slice.to - slice.from;
  if (size < 2 * FEWEST_POINTS) return "no_points";
  const missing = (side: 0 | 1) =>
    !fits[joint.root[side]] ||
    (joint.kind === "butt" && joint.form[side] === "bevel" && !fits[joint.next[side]]);
  if (missing(0))
    return fits.some((fit, i) => fit && joint.faces[i]?.plate === "a") ? "few_points_a" : "plate_a_not_found";
  if (missing(1))
    return fits.some((fit, i) => fit && joint.faces[i]?.plate === "b") ? "few_points_b" : "plate_b_not_found";
  return "root_not_seen";
}

/** The toe of a tack runs out onto the face: points this near to its metal are left out too, mm. */
const TOE_MM = 0.9;
const GUIDED_BAND_MM = 0.5;

function construct(slice: SectionSlice, joint: JointFaces, fits: SectionFit): JointWithU | null {
  const { edges, u_edges } = edgesOf(slice, joint, fits);
  return constructWithU(joint, fits, edges, u_edges);
}

/** Under a tack, the same from faces clear of its toe, where enough of them is left. */
function besideTack(slice: SectionSlice, joint: JointFaces, fits: SectionFit, reach: TackReach) {
  const clear = refit(slice, joint, fits, GUIDED_BAND_MM, [reach[0] + TOE_MM, reach[1] + TOE_MM]);
  const built = construct(slice, joint, clear);
  return built && { fits: clear, built };
}

/** The joint of one section from its fitted faces, or why it cannot be said. */
export function measureSlice(slice: SectionSlice, joint: JointFaces, fitted: SectionFit): SliceOutcome {
  const first = construct(slice, joint, fitted);
  if (!first) return { found: false, why: whyNot(slice, joint, fitted) };
  const tack = tackOver(slice, joint, fitted, first.at);
  const { fits, built } = (tack && besideTack(slice, joint, fitted, tack)) ?? { fits: fitted, built: first };
  if (Math.hypot(built.u.lateral_mm, built.u.normal_mm) > LEAST_SURE_MM)
    return { found: false, why: "root_not_seen" };
  const seen = seenGap(slice, joint, fits, tack !== null);
  return {
    found: true,
    result: {
      fits,
      ...built,
      seen_gap_mm: seen.gap_mm,
      u_seen_gap_mm: seen.u_mm,
      gap_is_open: seen.is_open,
      tack: tack !== null,
    },
  };
}
