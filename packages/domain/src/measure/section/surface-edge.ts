import type { FittedLine } from "../fit/line-fit.ts";
import type { Face, JointFaces } from "../joints/joint-faces.ts";
import { alongFace, type SectionSlice } from "./face-fit.ts";
import { bandOf } from "./seen-gap.ts";

/** How far from where it is expected a surface's edge is looked for, mm. */
const SEARCH_MM = 5;

/** An opening is at least this share of the nominal gap, and this many spacings, wide. */
const OPEN_SHARE = 0.4;
const OPEN_SPACINGS = 3;

/** Where a surface ends at its root side, mm along the face, with its standard uncertainty. */
export interface SurfaceEdge {
  readonly t_mm: number;
  readonly u_mm: number;
}

/** Free stretches along a face with at least some width, from the root side outward. */
function openings(ts: Float64Array, least_mm: number): { from: number; to: number }[] {
  const found: { from: number; to: number }[] = [];
  for (let i = 1; i < ts.length; i++)
    if (ts[i]! - ts[i - 1]! >= least_mm) found.push({ from: ts[i - 1]!, to: ts[i]! });
  return found;
}

/**
 * The edge of a plate that shows only its surface: the far side of the opening nearest to where it is expected.
 * The steel may end anywhere up to one spacing before its first point, of which half is taken off, and one return at an
 * edge is easily lost: u = spacing / √3, rectangular over one spacing either way.
 * @param expected_mm where the placed model has the edge, mm along the face
 * @returns null where there is no opening near
 */
export function surfaceEdge(
  slice: SectionSlice,
  joint: JointFaces,
  { face, fit, expected_mm }: { readonly face: Face; readonly fit: FittedLine; readonly expected_mm: number },
): SurfaceEdge | null {
  const reach_mm = SEARCH_MM + joint.gap_mm;
  const ts = alongFace(slice, face, {
    line: fit,
    band_mm: bandOf(fit),
    from_mm: expected_mm - reach_mm,
    to_mm: expected_mm + SEARCH_MM,
  });
  if (ts.length < 6) return null;
  const steps = Array.from(ts.subarray(1), (t, i) => t - ts[i]!).sort((a, b) => a - b);
  const spacing_mm = Math.max(1e-3, steps[steps.length >> 1] ?? 0);
  const least_mm = Math.max(OPEN_SHARE * joint.gap_mm, OPEN_SPACINGS * spacing_mm);
  // Where the other plate is out of line its points are not on this surface: the first point then follows an opening.
  const before = { from: ts[0]! - reach_mm, to: ts[0]! };
  const best = [before, ...openings(ts, least_mm)].reduce((a, b) =>
    Math.abs(b.to - expected_mm) < Math.abs(a.to - expected_mm) ? b : a,
  );
  if (Math.abs(best.to - expected_mm) > SEARCH_MM) return null;
  return { t_mm: best.to - spacing_mm / 2, u_mm: spacing_mm / Math.sqrt(3) };
}
