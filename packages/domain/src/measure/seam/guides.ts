import type { Line } from "../fit/line-fit.ts";
import { medianOf } from "../fit/median.ts";
import type { KnownDirection, SectionFit } from "../section/fit-section.ts";
import type { SliceOutcome } from "../section/measure-slice.ts";
import type { Slices } from "./slices.ts";

/** Neighbours whose faces show where a slice's should be, at most, and how near they must lie, mm. */
const GUIDES = 10;
const REACH_MM = 15;

/** A face's direction is taken from a neighbour only if it knows it this well, radians. */
const SURE_RAD = (0.8 * Math.PI) / 180;

/** Directions are never taken to be known better than this: plates are not that straight. */
const LEAST_U_RAD = (0.15 * Math.PI) / 180;

/** What the slices around one have in common. */
export interface Guides {
  /** Each face's line; null where too few show it. */
  readonly lines: readonly (Line | null)[];
  /** Each face's direction; null where too few know it. */
  readonly directions: readonly (KnownDirection | null)[];
}

function neighboursOf(slices: Slices, outcomes: readonly SliceOutcome[], index: number): SectionFit[] {
  const near: SectionFit[] = [];
  for (let by = 1; near.length < GUIDES && by < outcomes.length; by++) {
    let isBeyond = true;
    for (const k of [index - by, index + by]) {
      const one = outcomes[k];
      if (!one || Math.abs(slices.at_mm[k]! - slices.at_mm[index]!) > REACH_MM) continue;
      isBeyond = false;
      if (one.found) near.push(one.result.fits);
    }
    if (isBeyond) break;
  }
  return near;
}

const sureOf = (fit: { readonly scale_mm: number; readonly spread_mm2: number }) =>
  fit.scale_mm / Math.sqrt(Math.max(1e-9, fit.spread_mm2));

/** The lines and directions that the found slices around one show, per face. */
export function guidesFor(
  slices: Slices,
  outcomes: readonly SliceOutcome[],
  index: number,
  faces: number,
): Guides {
  const near = neighboursOf(slices, outcomes, index);
  const of = Array.from({ length: faces }, (_, f) => near.flatMap((fits) => fits[f] ?? []));
  const lines = of.map((fits): Line | null =>
    fits.length < 2
      ? null
      : {
          t_mm: 0,
          d_mm: medianOf(fits.map((fit) => fit.d_mm - fit.t_mm * Math.tan(fit.angle_rad))),
          angle_rad: medianOf(fits.map((fit) => fit.angle_rad)),
        },
  );
  const directions = of.map((fits): KnownDirection | null => {
    const angles = fits.filter((fit) => sureOf(fit) <= SURE_RAD).map((fit) => fit.angle_rad);
    if (angles.length < 3) return null;
    const angle_rad = medianOf(angles);
    const spread = 1.4826 * medianOf(angles.map((angle) => Math.abs(angle - angle_rad)));
    return { angle_rad, u_rad: Math.max(LEAST_U_RAD, spread) };
  });
  return { lines, directions };
}
