import type { BLIND_REASONS } from "../../schemas/scan-result.ts";
import type { JointAt } from "../joints/construct-root.ts";
import type { JointFaces } from "../joints/joint-faces.ts";
import { constructWithU, type JointWithU } from "../joints/joint-uncertainty.ts";
import { FEWEST_POINTS, type SectionSlice } from "./face-fit.ts";
import { type RefitOptions, refit, type SectionFit, type SliceInput } from "./fit-section.ts";
import { type Placement, placedLine } from "./placement.ts";
import { type SeenGap, seenGap } from "./seen-gap.ts";
import { surfaceEdge } from "./surface-edge.ts";
import { type TackReach, tackOver } from "./tack.ts";

export type BlindReason = (typeof BLIND_REASONS)[number];

/** A root that is less sure than this is no measurement, mm. */
const LEAST_SURE_MM = 0.5;

/** One section, measured by itself. */
export interface SliceResult {
  readonly fits: SectionFit;
  readonly at: JointAt;
  readonly u: JointAt;
  /** The gap as its edge is seen; null where it is covered or no edge is found. */
  readonly seen_gap: SeenGap | null;
  readonly tack: boolean;
}

export type SliceOutcome =
  | { readonly found: true; readonly result: SliceResult }
  | { readonly found: false; readonly why: BlindReason };

/** Edges of plates that show only their surface. */
function edgesOf(slice: SectionSlice, joint: JointFaces, fits: SectionFit, placement: Placement) {
  const edges: [number, number] = [Number.NaN, Number.NaN];
  const u_edges: [number, number] = [0, 0];
  for (const side of [0, 1] as const) {
    const index = joint.root[side];
    const face = joint.faces[index];
    const fit = fits[index];
    if (joint.kind !== "butt" || joint.form[side] !== "edge" || !face || !fit) continue;
    const edge = surfaceEdge(slice, joint, { face, fit, expected_mm: placedLine(face, placement).t_mm });
    if (!edge) continue;
    edges[side] = edge.t_mm;
    u_edges[side] = edge.u_mm;
  }
  return { edges, u_edges };
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

/** An edge is seen only where a tack's metal stays this far below it, mm. */
const EDGE_CLEAR_MM = 0.5;

function construct({ slice, joint, placement }: SliceInput, fits: SectionFit): JointWithU | null {
  const { edges, u_edges } = edgesOf(slice, joint, fits, placement);
  return constructWithU(joint, fits, edges, u_edges);
}

/** Under a tack, the same from faces clear of its toe, where enough of them is left. */
function besideTack(input: SliceInput, fits: SectionFit, reach: TackReach, known: RefitOptions["known"]) {
  const clear = refit(input, fits, GUIDED_BAND_MM, {
    covered_mm: [reach[0] + TOE_MM, reach[1] + TOE_MM],
    ...(known && { known }),
  });
  const built = construct(input, clear);
  return built && { fits: clear, built };
}

/** Whether a tack reaches up to an edge that the root is found from: nothing beside it shows where that edge is. */
function hidesEdge(joint: JointFaces, reach: TackReach): boolean {
  return ([0, 1] as const).some(
    (side) =>
      joint.kind === "butt" &&
      joint.form[side] === "edge" &&
      reach[side] > joint.depth_mm[side] - EDGE_CLEAR_MM,
  );
}

/**
 * The joint of one section from its fitted faces, or why it cannot be said.
 * @param known directions that the sections beside give, for faces that show too little of their own
 */
export function measureSlice(
  input: SliceInput,
  fitted: SectionFit,
  known?: RefitOptions["known"],
): SliceOutcome {
  const { slice, joint } = input;
  const first = construct(input, fitted);
  if (!first) return { found: false, why: whyNot(slice, joint, fitted) };
  const tack = tackOver(slice, joint, fitted, first.at);
  if (tack && hidesEdge(joint, tack)) return { found: false, why: "root_not_seen" };
  const { fits, built } = (tack && besideTack(input, fitted, tack, known)) ?? { fits: fitted, built: first };
  if (Math.hypot(built.u.lateral_mm, built.u.normal_mm) > LEAST_SURE_MM)
    return { found: false, why: "root_not_seen" };
  const seen_gap = tack ? null : seenGap(slice, joint, fits);
  return { found: true, result: { fits, ...built, seen_gap, tack: tack !== null } };
}
