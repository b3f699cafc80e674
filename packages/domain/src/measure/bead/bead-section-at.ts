import type { SectionView } from "../../schemas/section-view.ts";
import { nearestSlice } from "../seam/nearest-slice.ts";
import { onParent } from "./bead-frame.ts";
import type { BeadBlindReason, BeadSection } from "./bead-section.ts";
import type { MeasuredBead } from "./measure-bead.ts";
import type { ParentFace } from "./parent-faces.ts";
import { across } from "./toe.ts";

type Point = [number, number];

const MOST_KEPT = 4000;
const MOST_REJECTED = 2000;

/** The parent faces are drawn for this far past the toes, mm. */
const BESIDE_MM = 8;

const WORDS: Readonly<Record<BeadBlindReason, string>> = {
  no_points: "no points here",
  plate_a_not_found: "plate A not found beside the weld",
  plate_b_not_found: "plate B not found beside the weld",
  root_not_found: "the plates do not meet",
  toe_a_not_found: "the weld's toe on plate A not found",
  toe_b_not_found: "the weld's toe on plate B not found",
  face_not_seen: "too much of the weld's face hidden",
  ambiguous: "contradicted by the sections beside it",
  beyond_end: "beyond the end of the scan",
};

function thinned<T>(all: readonly T[], most: number): T[] {
  const every = Math.ceil(all.length / most);
  return every <= 1 ? [...all] : all.filter((_, i) => i % every === 0);
}

function plateOf(parent: ParentFace, toe_mm: number, from_mm: number): SectionView["plates"][number] {
  const to_mm = Math.min(parent.end_mm, toe_mm + BESIDE_MM);
  const [from, to] = [onParent(parent, from_mm), onParent(parent, to_mm)];
  return {
    plate: parent.side.plate,
    from: [from[0], from[1]],
    to: [to[0], to[1]],
    rms_mm: parent.fit.scale_mm,
    points: parent.fit.inliers,
  };
}

/** A section's points, its parent faces from the root (butt: the toe) outward, and its toes. */
function drawn({ profile, parents, toes, frame }: BeadSection, isFillet: boolean) {
  const kept: Point[] = [];
  const rejected: SectionView["rejected"] = [];
  const used = new Set(
    ([0, 1] as const).flatMap((which) => [...across(profile, parents[which], which).index]),
  );
  for (let i = 0; i < profile.count; i++) {
    const point: Point = [profile.l_mm[i]!, profile.n_mm[i]!];
    if (profile.follows[i] === 1 || used.has(i)) kept.push(point);
    else rejected.push({ point, why: "spike" });
  }
  const from = (which: 0 | 1): number => {
    const { side } = parents[which];
    if (!isFillet) return toes[which].t_mm;
    const [l, n] = [frame.origin[0] - side.face.near[0], frame.origin[1] - side.face.near[1]];
    return l * Math.cos(side.face.direction_rad) + n * Math.sin(side.face.direction_rad);
  };
  return {
    kept: thinned(kept, MOST_KEPT),
    rejected: thinned(rejected, MOST_REJECTED),
    plates: ([0, 1] as const).map((which) => plateOf(parents[which], toes[which].t_mm, from(which))),
    root: isFillet ? ([frame.origin[0], frame.origin[1]] as Point) : null,
    toes: toes.map(({ at }): Point => [at[0], at[1]]),
  };
}

/**
 * The cross-section of a finished weld nearest to a station: its points, parent faces, root and toes.
 * @param measured from {@link measureBead}; measured once, it serves every station
 */
export function beadSectionAt(measured: MeasuredBead, station_mm: number): SectionView {
  const { slices, outcomes, bead } = measured;
  const { profile } = bead.visible;
  const model = [profile.plate_a, profile.plate_b].map((line) => line.map(([l, n]): Point => [l, n]));
  const index = nearestSlice(slices.at_mm, station_mm);
  const outcome = outcomes[index];
  const at_mm = index < 0 ? station_mm : Math.round(slices.at_mm[index]! * 1e3) / 1e3;
  if (outcome?.found)
    return {
      station_mm: at_mm,
      measured: true,
      why: null,
      model,
      ...drawn(outcome.section, bead.kind === "fillet"),
    };
  const points: SectionView["rejected"] = [];
  if (index >= 0)
    for (let i = slices.starts[index]!; i < slices.starts[index + 1]!; i++)
      points.push({ point: [slices.l_mm[i]!, slices.n_mm[i]!], why: "not_a_plate" });
  return {
    station_mm: at_mm,
    measured: false,
    why: WORDS[outcome?.why ?? "no_points"],
    kept: [],
    rejected: thinned(points, MOST_REJECTED),
    plates: [],
    root: null,
    model,
  };
}
