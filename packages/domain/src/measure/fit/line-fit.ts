import { medianInPlace } from "./median.ts";

/** Median absolute residual to standard deviation, normal noise. */
const MAD_TO_SIGMA = 1.482602;

/** Tukey's biweight: 95 % efficiency for normal noise. */
const TUKEY = 4.685;

/** Residual spreads below this are rounding, not noise: keeps the weights of exact data finite. */
const LEAST_SCALE_MM = 1e-3;

/** Noise changes little from round to round; the scale is held after these. */
const ROUNDS = 4;

/** A line in a plane: `d = offset + slope (t - t_mm)`, given by the point (t, offset) and its direction. */
export interface Line {
  /** A point of the line, mm: for a fit the weighted centroid of the points. */
  readonly t_mm: number;
  readonly d_mm: number;
  /** Direction against the t axis, radians, within ± π/2. */
  readonly angle_rad: number;
}

/** A line fitted to points. */
export interface FittedLine extends Line {
  /** Robust standard deviation of the residuals square to the line, mm. */
  readonly scale_mm: number;
  /** Points with a weight of at least a half: within about 2.5 scales. */
  readonly inliers: number;
  /** Sum of the weights. */
  readonly weight: number;
  /** Weighted sum of the squared distances along the line from the centroid, mm². */
  readonly spread_mm2: number;
}

/** Signed distance from a line, square to it, mm; positive on the side of growing d. */
export function distanceFrom(line: Line, t: number, d: number): number {
  return (d - line.d_mm) * Math.cos(line.angle_rad) - (t - line.t_mm) * Math.sin(line.angle_rad);
}

/**
 * Total least squares: the line through the weighted centroid that makes the squared distances square to it least.
 * Closed form angle = ½ atan2(2 Sxy, Sxx − Syy), Pearson 1901. Products are formed about the centroid.
 * @param weights absent: all 1
 * @returns null where the points have no direction (fewer than two, or all in one place)
 */
export function orthogonalLine(
  ts: Float64Array,
  ds: Float64Array,
  count: number,
  weights?: Float64Array,
): WeightedLine | null {
  let sum = 0;
  let t_mm = 0;
  let d_mm = 0;
  for (let i = 0; i < count; i++) {
    const w = weights ? weights[i]! : 1;
    sum += w;
    t_mm += w * ts[i]!;
    d_mm += w * ds[i]!;
  }
  if (!(sum > 0)) return null;
  return throughCentroid({ ts, ds, count }, { t_mm: t_mm / sum, d_mm: d_mm / sum, weight: sum }, weights);
}

interface Centroid {
  readonly t_mm: number;
  readonly d_mm: number;
  /** Sum of the weights. */
  readonly weight: number;
}

type WeightedLine = Line & { readonly weight: number; readonly spread_mm2: number };

/** The line that makes the squared distances least, once the centroid is known. */
function throughCentroid(
  { ts, ds, count }: Points,
  { t_mm, d_mm, weight }: Centroid,
  weights?: Float64Array,
): WeightedLine | null {
  let tt = 0;
  let td = 0;
  let dd = 0;
  for (let i = 0; i < count; i++) {
    const w = weights ? weights[i]! : 1;
    if (w === 0) continue;
    const t = ts[i]! - t_mm;
    const d = ds[i]! - d_mm;
    tt += w * t * t;
    td += w * t * d;
    dd += w * d * d;
  }
  if (!(tt + dd > 1e-12)) return null;
  const angle_rad = 0.5 * Math.atan2(2 * td, tt - dd);
  const spread_mm2 = (tt + dd) / 2 + Math.hypot((tt - dd) / 2, td);
  return { t_mm, d_mm, angle_rad, weight, spread_mm2 };
}

const scratch = { size: 0, weights: new Float64Array(0), residuals: new Float64Array(0) };

function room(count: number): typeof scratch {
  if (scratch.size < count) {
    scratch.size = 2 * count;
    scratch.weights = new Float64Array(scratch.size);
    scratch.residuals = new Float64Array(scratch.size);
  }
  return scratch;
}

/** Robust spread of the points about a line, those farther than `band_mm` left out. */
function scaleAbout(line: Line, { ts, ds, count }: Points, band_mm: number): number {
  const { residuals } = room(count);
  const { t_mm, d_mm } = line;
  // As distanceFrom, the turn found once for all points.
  const cos = Math.cos(line.angle_rad);
  const sin = Math.sin(line.angle_rad);
  let used = 0;
  for (let i = 0; i < count; i++) {
    const r = Math.abs((ds[i]! - d_mm) * cos - (ts[i]! - t_mm) * sin);
    if (r <= band_mm) residuals[used++] = r;
  }
  return used === 0
    ? LEAST_SCALE_MM
    : Math.max(LEAST_SCALE_MM, MAD_TO_SIGMA * medianInPlace(residuals, used));
}

interface Points {
  readonly ts: Float64Array;
  readonly ds: Float64Array;
  readonly count: number;
}

/** What weighs in about a line. */
interface Weighed extends Centroid {
  /** Points that weigh at least a half. */
  readonly inliers: number;
}

/** Tukey weights of the points about a line, and what they add up to. */
function weigh(line: Line, { ts, ds, count }: Points, scale_mm: number): Weighed {
  const { weights } = room(count);
  const cos = Math.cos(line.angle_rad);
  const sin = Math.sin(line.angle_rad);
  const by = 1 / (TUKEY * scale_mm);
  let inliers = 0;
  let weight = 0;
  let t_sum = 0;
  let d_sum = 0;
  for (let i = 0; i < count; i++) {
    const u = ((ds[i]! - line.d_mm) * cos - (ts[i]! - line.t_mm) * sin) * by;
    const rest = 1 - u * u;
    const w = rest > 0 ? rest * rest : 0;
    weights[i] = w;
    weight += w;
    t_sum += w * ts[i]!;
    d_sum += w * ds[i]!;
    if (rest > Math.SQRT1_2) inliers += 1;
  }
  return { inliers, weight, t_mm: t_sum / weight, d_mm: d_sum / weight };
}

/**
 * A line through points of which some are outliers: iteratively reweighted orthogonal least squares with Tukey's
 * biweight (c = 4.685) and a scale from the median absolute residual (times 1.4826).
 * @param start a line near the answer, as {@link consensusLine} gives; points beyond `band_mm` of it never count
 * @returns null where fewer than three points weigh in
 * Source: Huber and Ronchetti, Robust Statistics, chapter 7; constants as R's MASS::rlm.
 */
export function robustLine(points: Points, start: Line, band_mm: number): FittedLine | null {
  let line: Line & { weight?: number; spread_mm2?: number } = start;
  let scale_mm = scaleAbout(line, points, band_mm);
  let inliers = 0;
  for (let round = 0; round < ROUNDS; round++) {
    if (round > 0 && round < 3) scale_mm = scaleAbout(line, points, band_mm);
    const weighed = weigh(line, points, scale_mm);
    inliers = weighed.inliers;
    const next = inliers < 3 ? null : throughCentroid(points, weighed, room(0).weights);
    if (!next) return null;
    line = next;
  }
  return {
    t_mm: line.t_mm,
    d_mm: line.d_mm,
    angle_rad: line.angle_rad,
    scale_mm,
    inliers,
    weight: line.weight ?? 0,
    spread_mm2: line.spread_mm2 ?? 0,
  };
}

/**
 * A line of known direction through points of which some are outliers: its offset by Tukey's biweight.
 * @param start a line near the answer; points beyond `band_mm` of it never count
 * @param known direction of the line and its standard uncertainty, radians
 * @returns null where fewer than three points weigh in; the spread is that which gives the known uncertainty
 */
export function offsetLine(
  points: Points,
  start: Line,
  known: { readonly band_mm: number; readonly angle_rad: number; readonly u_rad: number },
): FittedLine | null {
  let line: Line = { ...start, angle_rad: known.angle_rad };
  let [scale_mm, inliers, weight] = [0, 0, 0];
  for (let round = 0; round < ROUNDS; round++) {
    if (round < 3) scale_mm = scaleAbout(line, points, known.band_mm);
    const weighed = weigh(line, points, scale_mm);
    ({ inliers, weight } = weighed);
    if (inliers < 3) return null;
    line = { t_mm: weighed.t_mm, d_mm: weighed.d_mm, angle_rad: known.angle_rad };
  }
  return { ...line, scale_mm, inliers, weight, spread_mm2: (scale_mm / Math.max(1e-5, known.u_rad)) ** 2 };
}
