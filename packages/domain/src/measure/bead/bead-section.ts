import type { BEAD_BLIND_REASONS } from "../../schemas/bead-result.ts";
import { medianOf } from "../fit/median.ts";
import { FEWEST_POINTS, type SectionSlice } from "../section/face-fit.ts";
import type { Placement } from "../section/placement.ts";
import { type BeadFrame, beadFrame, beadProfile, overParent } from "./bead-frame.ts";
import { type BeadGeometry, type Figures, faceBetween } from "./bead-geometry.ts";
import type { BeadJoint } from "./bead-joint.ts";
import { buttFigures } from "./butt-figures.ts";
import { filletFigures } from "./fillet-figures.ts";
import { type ParentFace, parentFace, refitParent } from "./parent-faces.ts";
import { toeOn } from "./toe.ts";

export type BeadBlindReason = (typeof BEAD_BLIND_REASONS)[number];

/** One section of a finished weld, measured by itself. */
export interface BeadSection extends BeadGeometry {
  readonly figures: Figures;
}

export type BeadOutcome =
  | { readonly found: true; readonly section: BeadSection }
  | { readonly found: false; readonly why: BeadBlindReason };

/** Beyond the toes this much of the parent faces is looked at, mm. */
const BESIDE_MM = 12;

/** Half the width of a butt joint's opening at its surface as drawn; 0 for a fillet, mm. */
const halfOpening = ({ kind, sides: [a, b] }: BeadJoint): number =>
  kind === "butt" ? Math.abs(b.face.near[0] - a.face.near[0]) / 2 : 0;

/** What stands this far over or under both plates belongs to the weld: standard deviations, and never less, mm. */
const OFF_SIGMAS = 4;
const OFF_MM = 0.15;

/** Fewer points off the plates than this show no weld to centre on. */
const FEWEST_OFF = 8;

/**
 * Along flush plates a butt weld may lie anywhere: the frame is moved to the middle of what stands off both plates.
 */
function onItsWeld(
  slice: SectionSlice,
  frame: BeadFrame,
  parents: readonly [ParentFace, ParentFace],
  reach_mm: number,
): BeadFrame {
  const noise_mm = Math.max(parents[0].fit.scale_mm, parents[1].fit.scale_mm);
  const off_mm = Math.max(OFF_MM, OFF_SIGMAS * noise_mm);
  const { u_mm, l_mm, n_mm, count, follows } = beadProfile(slice, frame, reach_mm, noise_mm);
  const off: number[] = [];
  for (let i = 0; i < count; i++) {
    if (follows[i] === 0) continue;
    const heights = parents.map((parent) => Math.abs(overParent(parent, l_mm[i]!, n_mm[i]!).h_mm));
    if (Math.min(...heights) > off_mm) off.push(u_mm[i]!);
  }
  if (off.length < FEWEST_OFF) return frame;
  const by_mm = medianOf(off);
  const { origin, u } = frame;
  return { ...frame, origin: [origin[0] + by_mm * u[0], origin[1] + by_mm * u[1]] };
}

/** Frame and toes from two parent faces; why they cannot be said where they cannot. */
function geometryOf(
  slice: SectionSlice,
  bead: BeadJoint,
  parents: readonly [ParentFace, ParentFace],
): BeadGeometry | BeadBlindReason {
  const frame = beadFrame(bead.kind, parents[0], parents[1]);
  if (!frame) return "root_not_found";
  const noise_mm = Math.max(parents[0].fit.scale_mm, parents[1].fit.scale_mm);
  const reach_mm = halfOpening(bead) + 2 * bead.reach_mm + BESIDE_MM;
  const centred = bead.kind === "butt" ? onItsWeld(slice, frame, parents, reach_mm) : frame;
  const profile = beadProfile(slice, centred, reach_mm, noise_mm);
  const [a, b] = [toeOn(profile, parents[0], 0), toeOn(profile, parents[1], 1)];
  if (!a) return "toe_a_not_found";
  if (!b) return "toe_b_not_found";
  return { parents, frame: centred, profile, toes: [a, b] };
}

/** A weld with fewer points on its face than this is not seen. */
const FEWEST_ON_FACE = 6;

/** A toe that is less sure than this is no measurement, mm. */
const LEAST_SURE_MM = 0.5;

/**
 * The finished weld in one section: its parent faces beside it, its toes on them, and the figures that follow.
 * @param placement where the joint is expected, within about 2 mm and 6 degrees
 * @param seed of the consensus draws
 */
export function measureBeadSection(
  slice: SectionSlice,
  bead: BeadJoint,
  placement: Placement,
  seed: number,
): BeadOutcome {
  if (slice.to - slice.from < 2 * FEWEST_POINTS) return { found: false, why: "no_points" };
  const a = parentFace(slice, bead, 0, placement, seed);
  if (!a) return { found: false, why: "plate_a_not_found" };
  const b = parentFace(slice, bead, 1, placement, seed + 3);
  if (!b) return { found: false, why: "plate_b_not_found" };
  const first = geometryOf(slice, bead, [a, b]);
  if (typeof first === "string") return { found: false, why: first };
  const again = geometryOf(slice, bead, [
    refitParent(slice, a, first.toes[0].clear_mm),
    refitParent(slice, b, first.toes[1].clear_mm),
  ]);
  const geometry = typeof again === "string" ? first : again;
  const face = faceBetween(geometry);
  const isFillet = bead.kind === "fillet";
  if (face.length < FEWEST_ON_FACE && !isFillet) return { found: false, why: "face_not_seen" };
  const figures = isFillet ? filletFigures(geometry, face) : buttFigures(geometry, face);
  if (!figures) return { found: false, why: "face_not_seen" };
  const isUnsure = geometry.toes.some(({ u_t_mm }) => u_t_mm > LEAST_SURE_MM);
  return isUnsure ? { found: false, why: "ambiguous" } : { found: true, section: { ...geometry, figures } };
}
