import type { Line } from "./line-fit.ts";

/** Where a line is looked for. */
export interface LineSearch {
  /** Half the width of the direction window about the t axis, radians. */
  readonly turn_rad: number;
  /** Inlier band, mm. */
  readonly band_mm: number;
  readonly trials: number;
  /** Seed of the draws: from the content, so that the same scan always gives the same answer. */
  readonly seed: number;
}

/** Points scored in a trial: enough to rank lines, so that a dense section costs no more than a sparse one. */
const SCORED_POINTS = 160;

/** Marsaglia's xorshift, 32 bits. */
export function drawsFrom(seed: number): () => number {
  let state = seed | 0 || 0x9e3779b9 | 0;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 4294967296;
  };
}

/** Points scored between two looks at whether a line can still win. */
const BLOCK = 16;

/** A hair, so that rounding never gives up a line that would just have won. */
const HAIR = 1e-9;

/** A line through two points as it is scored: `d = offset + slope t`. */
interface Drawing {
  readonly slope: number;
  readonly offset_mm: number;
}

/**
 * How well a line through two points explains the rest: truncated squared distances, so that near beats far.
 * @param least what it must do better than: a line that cannot any more is given up
 * @returns 0 to 1; 0 for a line given up
 */
function support({ ts, ds, count }: Drawn, line: Drawing, band_mm: number, least: number): number {
  const every = Math.max(1, Math.floor(count / SCORED_POINTS));
  const { slope, offset_mm } = line;
  // The distance square to the line is the one along d times the cosine of its direction.
  const by = 1 / (band_mm * band_mm * (1 + slope * slope));
  const needed = (least * count) / every - HAIR;
  let score = 0;
  for (let from = 0; from < count; from += BLOCK * every) {
    // Every point still to come counts one at most.
    if (score + (count - from) / every + 1 < needed) return 0;
    const to = Math.min(count, from + BLOCK * every);
    for (let i = from; i < to; i += every) {
      const off = ds[i]! - offset_mm - slope * ts[i]!;
      const rest = 1 - off * off * by;
      if (rest > 0) score += rest;
    }
  }
  return (score * every) / count;
}

interface Drawn {
  readonly ts: Float64Array;
  readonly ds: Float64Array;
  readonly count: number;
}

/**
 * The line that most of the points agree on, drawn from pairs of them (RANSAC with truncated loss), its direction
 * kept within a window about the t axis.
 * @returns the line and the share of the points in its band; null where no pair lies in the window
 * Source: Fischler and Bolles 1981; Torr and Zisserman 2000 for the loss.
 */
export function consensusLine(
  ts: Float64Array,
  ds: Float64Array,
  count: number,
  search: LineSearch,
): { readonly line: Line; readonly share: number } | null {
  if (count < 3) return null;
  const points = { ts, ds, count };
  const draw = drawsFrom(search.seed);
  const steepest = Math.tan(search.turn_rad);
  let best = { at: -1, slope: 0 };
  let share = 0;
  for (let trial = 0; trial < search.trials; trial++) {
    const i = Math.floor(draw() * count);
    const j = Math.floor(draw() * count);
    const run = ts[j]! - ts[i]!;
    const rise = ds[j]! - ds[i]!;
    // Two neighbours give no direction: noise of the band's size would turn the line out of its window.
    if (Math.abs(run) < 4 * search.band_mm || Math.abs(rise) > steepest * Math.abs(run)) continue;
    const slope = rise / run;
    const line = { slope, offset_mm: ds[i]! - slope * ts[i]! };
    const score = support(points, line, search.band_mm, share);
    if (score <= share) continue;
    share = score;
    best = { at: i, slope };
  }
  if (best.at < 0) return null;
  return { line: { t_mm: ts[best.at]!, d_mm: ds[best.at]!, angle_rad: Math.atan(best.slope) }, share };
}
