import { medianOf } from "../fit/median.ts";
import type { SectionPoints } from "./section-points.ts";

/** Profiles closer together than this are read as one slice. */
const FINEST_PITCH_MM = 0.5;

/** Width of a slice of a cloud that shows no profiles, and of the widest slice there is, mm. */
const CLOUD_SLICE_MM = 1;
const WIDEST_SLICE_MM = 2.5;

/** Resolution at which a cloud is searched for its profiles, mm. */
const GRAIN_MM = 0.1;

/** Cuts across the seam, in order along it: each the points of one profile, or of a short stretch of a cloud. */
export interface Slices {
  readonly count: number;
  /** Mean place of each slice's points along the seam, mm, growing. */
  readonly at_mm: Float64Array;
  /** Points of slice i are those from starts[i] to starts[i + 1]; length count + 1. */
  readonly starts: Int32Array;
  readonly l_mm: Float64Array;
  readonly n_mm: Float64Array;
  /** Usual distance from one slice to the next, mm; 0 with fewer than two. */
  readonly pitch_mm: number;
}

/** A place on a closed seam as the copy of it nearest to another; on an open one the place itself. */
const copyNear = (s_mm: number, to_mm: number, period_mm: number): number =>
  period_mm > 0 ? s_mm + period_mm * Math.round((to_mm - s_mm) / period_mm) : s_mm;

/** Mean place of each group of points, on the seam itself. */
function meansOf(points: SectionPoints, groups: Int32Array, count: number) {
  const { period_mm } = points;
  const firsts = new Float64Array(count).fill(Number.NaN);
  const sums = new Float64Array(count);
  const sizes = new Int32Array(count);
  for (let k = 0; k < points.count; k++) {
    const group = groups[k]!;
    if (sizes[group] === 0) firsts[group] = points.s_mm[k]!;
    sums[group]! += copyNear(points.s_mm[k]!, firsts[group]!, period_mm);
    sizes[group]! += 1;
  }
  const means_mm = sums.map((sum, group) => {
    const mean = sum / sizes[group]!;
    return period_mm > 0 ? mean - period_mm * Math.floor(mean / period_mm) : mean;
  });
  return { means_mm, sizes };
}

/** Profiles by their mean place, neighbours closer than the finest pitch joined. */
function slicesOfProfiles(points: SectionPoints, profiles: Int32Array): Int32Array {
  const most = largest(profiles);
  const { means_mm, sizes } = meansOf(points, profiles, most + 1);
  const order = Array.from(sizes.keys())
    .filter((profile) => sizes[profile]! > 0)
    .sort((a, b) => means_mm[a]! - means_mm[b]!);
  const groups = new Int32Array(most + 1);
  let group = -1;
  let begun_mm = Number.NEGATIVE_INFINITY;
  for (const profile of order) {
    const at_mm = means_mm[profile]!;
    if (at_mm - begun_mm >= FINEST_PITCH_MM * 0.999) {
      group += 1;
      begun_mm = at_mm;
    }
    groups[profile] = group;
  }
  const numbers = new Int32Array(profiles.length);
  for (let k = 0; k < numbers.length; k++) numbers[k] = groups[profiles[k]!]!;
  return numbers;
}

/** The largest of some whole numbers, none of them negative. */
function largest(numbers: Int32Array): number {
  let most = 0;
  for (let k = 0; k < numbers.length; k++) if (numbers[k]! > most) most = numbers[k]!;
  return most;
}

/** Runs of places with points, between places without any: the profiles of a cloud that was taken as profiles. */
function runsOf(filled: Uint8Array): [from: number, to: number][] {
  const runs: [number, number][] = [];
  let from = -1;
  for (let i = 0; i <= filled.length; i++) {
    if (filled[i]) {
      if (from < 0) from = i;
    } else if (from >= 0) {
      runs.push([from, i]);
      from = -1;
    }
  }
  return runs;
}

/** The grain of the seam that each point lies in, counted from the first, and how many grains there are. */
function grainsOf({ s_mm, count }: SectionPoints): { readonly grains: Int32Array; readonly bins: number } {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (let k = 0; k < count; k++) {
    const s = s_mm[k]!;
    if (s < least) least = s;
    if (s > most) most = s;
  }
  const grains = new Int32Array(count);
  for (let k = 0; k < count; k++) grains[k] = Math.floor((s_mm[k]! - least) / GRAIN_MM);
  return { grains, bins: Math.max(1, Math.ceil((most - least) / GRAIN_MM) + 1) };
}

/** A cloud's slices: its profiles where empty places part them, else even slices. */
function slicesOfCloud(points: SectionPoints): Int32Array {
  const { grains, bins } = grainsOf(points);
  const filled = new Uint8Array(bins);
  for (let k = 0; k < points.count; k++) filled[grains[k]!] = 1;
  const runs = runsOf(filled);
  const usual_mm = medianOf(runs.map(([from, to]) => to - from)) * GRAIN_MM;
  const parted = runs.length >= 3 && usual_mm <= CLOUD_SLICE_MM;
  const groupOf = new Int32Array(bins);
  let group = 0;
  let end = 0;
  for (const [from, to] of parted ? runs : ([[0, bins]] as const)) {
    const widest_mm = parted ? WIDEST_SLICE_MM : CLOUD_SLICE_MM;
    const parts = Math.max(1, Math.round(((to - from) * GRAIN_MM) / widest_mm));
    for (let i = from; i < to; i++)
      groupOf[i] = group + Math.min(parts - 1, Math.floor(((i - from) * parts) / (to - from)));
    group += parts;
    end = to;
  }
  groupOf.fill(group - 1, end);
  for (let k = 0; k < points.count; k++) grains[k] = groupOf[grains[k]!]!;
  return grains;
}

/**
 * Cuts the points of a scan into slices across the seam: one a profile (profiles under 0.5 mm apart joined), or, for
 * a cloud, one for each run of points between empty places, or slices of 1 mm where there are none such.
 */
export function slicesOf(points: SectionPoints): Slices {
  if (points.count === 0)
    return {
      count: 0,
      at_mm: new Float64Array(0),
      starts: new Int32Array(1),
      l_mm: points.l_mm,
      n_mm: points.n_mm,
      pitch_mm: 0,
    };
  const groups = points.profiles ? slicesOfProfiles(points, points.profiles) : slicesOfCloud(points);
  return sorted(points, groups);
}

function sorted(points: SectionPoints, groups: Int32Array): Slices {
  const most = largest(groups);
  const { means_mm, sizes } = meansOf(points, groups, most + 1);
  const present = Array.from(sizes.keys()).filter((group) => sizes[group]! > 0);
  const rank = new Int32Array(most + 1);
  const starts = new Int32Array(present.length + 1);
  present.forEach((group, i) => {
    rank[group] = i;
    starts[i + 1] = starts[i]! + sizes[group]!;
  });
  const { l_mm, n_mm } = inOrder(groups) ? points : reordered(points, groups, { rank, starts });
  const at_mm = Float64Array.from(present, (group) => means_mm[group]!);
  const steps = at_mm.slice(1).map((at, i) => at - at_mm[i]!);
  return {
    count: present.length,
    at_mm,
    starts,
    l_mm,
    n_mm,
    pitch_mm: steps.length > 0 ? medianOf(steps) : 0,
  };
}

/** Whether the points stand slice by slice already, as a scanner sends them. */
function inOrder(groups: Int32Array): boolean {
  for (let k = 1; k < groups.length; k++) if (groups[k]! < groups[k - 1]!) return false;
  return true;
}

/** The points slice by slice, within a slice in the order of the scan. */
function reordered(
  points: SectionPoints,
  groups: Int32Array,
  { rank, starts }: { readonly rank: Int32Array; readonly starts: Int32Array },
): { readonly l_mm: Float64Array; readonly n_mm: Float64Array } {
  const l_mm = new Float64Array(points.count);
  const n_mm = new Float64Array(points.count);
  const next = starts.slice(0, -1);
  for (let k = 0; k < points.count; k++) {
    const slice = rank[groups[k]!]!;
    const to = next[slice]!;
    next[slice] = to + 1;
    l_mm[to] = points.l_mm[k]!;
    n_mm[to] = points.n_mm[k]!;
  }
  return { l_mm, n_mm };
}
