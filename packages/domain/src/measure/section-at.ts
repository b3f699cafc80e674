import type { SectionView } from "../schemas/section-view.ts";
import type { FittedLine } from "./fit/line-fit.ts";
import type { Face, JointFaces } from "./joints/joint-faces.ts";
import { BLIND_WORDS } from "./judge/coverage-reasons.ts";
import type { MeasuredSeam } from "./seam/measure-seam.ts";
import { sliceAt } from "./seam/measure-slices.ts";
import { nearestSlice } from "./seam/nearest-slice.ts";
import type { SectionSlice } from "./section/face-fit.ts";
import type { SliceResult } from "./section/measure-slice.ts";

const MOST_KEPT = 4000;
const MOST_REJECTED = 2000;

/** Points within this many spreads of a face carry it; beyond, Tukey's weight is naught. */
const CARRIES = 4.685;

/** A point this far off everything is a spike, mm. */
const SPIKE_MM = 1;

/** Points this near to a face, but not carrying it, are its rounded edge or corner, mm. */
const EDGE_MM = 0.6;

type Point = [number, number];
type Why = SectionView["rejected"][number]["why"];

/** A point in a face's fitted axes: how far along it, and how far off it. */
function onFace(face: Face, fit: FittedLine, l: number, n: number) {
  const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
  const t = (l - face.near[0]) * c + (n - face.near[1]) * s;
  const d = (n - face.near[1]) * c - (l - face.near[0]) * s;
  const off = (d - fit.d_mm) * Math.cos(fit.angle_rad) - (t - fit.t_mm) * Math.sin(fit.angle_rad);
  return { t, off: Math.abs(off) };
}

function whyRejected(least: number, l: number, n: number, result: SliceResult | null): Why {
  if (!result) return "not_a_plate";
  const { lateral_mm, normal_mm } = result.at;
  if (least <= EDGE_MM) return "edge";
  if (result.tack && Math.hypot(l - lateral_mm, n - normal_mm) < 8) return "tack";
  if (least > SPIKE_MM) return "spike";
  return "not_a_plate";
}

/** Every point of the slice, as kept or as rejected with why. */
function sorted(slice: SectionSlice, joint: JointFaces, result: SliceResult | null) {
  const kept: Point[] = [];
  const rejected: { point: Point; why: Why }[] = [];
  for (let i = slice.from; i < slice.to; i++) {
    const [l, n] = [slice.l_mm[i]!, slice.n_mm[i]!];
    let [least, carried] = [Number.POSITIVE_INFINITY, false];
    joint.faces.forEach((face, f) => {
      const fit = result?.fits[f];
      if (!fit) return;
      const { t, off } = onFace(face, fit, l, n);
      if (t < -3 || t > face.length_mm + 30) return;
      least = Math.min(least, off);
      carried ||= off <= CARRIES * fit.scale_mm;
    });
    const point: Point = [l, n];
    if (carried) kept.push(point);
    else rejected.push({ point, why: whyRejected(least, l, n, result) });
  }
  return { kept: thinned(kept, MOST_KEPT), rejected: thinned(rejected, MOST_REJECTED) };
}

function thinned<T>(all: readonly T[], most: number): T[] {
  const every = Math.ceil(all.length / most);
  return every <= 1 ? [...all] : all.filter((_, i) => i % every === 0);
}

/** The fitted faces as segments, as long as the nominal ones or 15 mm. */
function plates(joint: JointFaces, result: SliceResult): SectionView["plates"] {
  return joint.faces.flatMap((face, f) => {
    const fit = result.fits[f];
    if (!fit) return [];
    const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
    const at = (t: number): Point => {
      const d = fit.d_mm + (t - fit.t_mm) * Math.tan(fit.angle_rad);
      return [face.near[0] + t * c - d * s, face.near[1] + t * s + d * c];
    };
    const shift =
      f < 2 ? result.at.lateral_mm * c + result.at.normal_mm * s : fit.t_mm - Math.min(7, face.length_mm / 2);
    return {
      plate: face.plate,
      from: at(shift),
      to: at(shift + Math.min(15, face.length_mm)),
      rms_mm: fit.scale_mm,
      points: fit.inliers,
    };
  });
}

/**
 * The cross-section nearest to a station: its points, kept or rejected with why, the fitted faces and the root.
 * Fitted by itself and with its neighbours' help as the evaluation does, not smoothed along the seam.
 * @param seam from {@link measureSeam}; measured once, it serves every station
 */
export function sectionAt(seam: MeasuredSeam, station_mm: number): SectionView {
  const { profile } = seam.joint;
  const outline = [profile.plate_a, profile.plate_b].map((line) => line.map(([l, n]): Point => [l, n]));
  const index = nearestSlice(seam.slices.at_mm, station_mm);
  const outcome = seam.outcomes[index];
  const result = outcome?.found ? outcome.result : null;
  const points =
    index < 0 ? { kept: [], rejected: [] } : sorted(sliceAt(seam.slices, index), seam.joint, result);
  return {
    station_mm: index < 0 ? station_mm : Math.round(seam.slices.at_mm[index]! * 1e3) / 1e3,
    measured: result !== null,
    why: outcome?.found ? null : BLIND_WORDS[outcome?.why ?? "no_points"],
    ...points,
    plates: result ? plates(seam.joint, result) : [],
    root: result ? [result.at.lateral_mm, result.at.normal_mm] : null,
    model: outline,
  };
}
