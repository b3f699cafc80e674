/** One station of a seam as the strip draws it. */
export interface StripStation {
  readonly station_mm: number;
  /** False where nothing could be measured; then there is no deviation and no share. */
  readonly measured: boolean;
  /** Share of the limit used; beyond 1 it is beyond the limit. Without a deviation its sign is the deviation's. */
  readonly share?: number | null | undefined;
  /** Signed deviation in the strip's unit, where it is known here; lists only know the share. */
  readonly deviation?: number | null | undefined;
}

/** Which way a station lies: 1, -1, or 0 on the model. */
export function signOf(station: StripStation): number {
  return Math.sign(station.deviation ?? station.share ?? 0);
}

/** Neighbouring stations that are drawn as one ripple or as one piece of a gap. */
export interface StripGroup {
  readonly start_mm: number;
  readonly end_mm: number;
  /** The station that stands for the group: its worst; null where the group is a gap. */
  readonly worst: number | null;
  /** Indices of the stations it holds, first and last. */
  readonly first: number;
  readonly last: number;
  /** Some of the group's stations were not measured, though a ripple is drawn. */
  readonly partial: boolean;
}

/** Whether a station has numbers to draw. */
export function isDrawable(station: StripStation): boolean {
  return station.measured && Number.isFinite(station.share);
}

/**
 * Divides stations, in order of station_mm, into at most `most` groups of neighbours. A group shows its worst
 * station, so that thinning never hides what is beyond the limit; it is a gap where half of it or more was not
 * measured, unless something measured in it is beyond the limit.
 * @param stations in ascending order of station_mm
 * @param most     1 and more; how many ripples there is room for
 * @param extent_mm start and end of the seam; without it the first and last station
 */
export function groupStations(
  stations: readonly StripStation[],
  most: number,
  extent_mm?: readonly [number, number],
): StripGroup[] {
  if (!(most >= 1)) throw new RangeError(`most: expected 1 or more, got ${most}`);
  const count = Math.min(stations.length, Math.floor(most));
  const edges = groupEdges(stations, count, extent_mm);
  const groups: StripGroup[] = [];
  for (let group = 0; group < count; group++) {
    const first = Math.ceil((group * stations.length) / count);
    const last = Math.ceil(((group + 1) * stations.length) / count) - 1;
    groups.push({
      start_mm: edges[group] ?? 0,
      end_mm: edges[group + 1] ?? 0,
      first,
      last,
      ...worstOf(stations, first, last),
    });
  }
  return groups;
}

/** Borders between groups, halfway between the last station of one and the first of the next. */
function groupEdges(
  stations: readonly StripStation[],
  count: number,
  extent_mm?: readonly [number, number],
): number[] {
  const edges = [extent_mm?.[0] ?? stations[0]?.station_mm ?? 0];
  for (let group = 1; group < count; group++) {
    const first = Math.ceil((group * stations.length) / count);
    const before = stations[first - 1]?.station_mm ?? 0;
    const after = stations[first]?.station_mm ?? 0;
    edges.push((before + after) / 2);
  }
  edges.push(extent_mm?.[1] ?? stations.at(-1)?.station_mm ?? 0);
  return edges;
}

function worstOf(
  stations: readonly StripStation[],
  first: number,
  last: number,
): { worst: number | null; partial: boolean } {
  let worst: number | null = null;
  let worstShare = -1;
  let unmeasured = 0;
  for (let index = first; index <= last; index++) {
    const station = stations[index];
    if (station === undefined || !isDrawable(station)) {
      unmeasured++;
      continue;
    }
    const share = Math.abs(station.share ?? 0);
    if (share > worstShare) {
      worst = index;
      worstShare = share;
    }
  }
  const isGap = worst === null || (unmeasured * 2 >= last - first + 1 && worstShare <= 1);
  return { worst: isGap ? null : worst, partial: !isGap && unmeasured > 0 };
}
