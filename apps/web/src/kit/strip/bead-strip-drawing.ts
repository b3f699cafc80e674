import { nearestIndex } from "../cursor/nearest-station.ts";
import { groupStations, type StripGroup, type StripStation, signOf } from "./strip-groups.ts";

/** The place a strip is drawn in, in CSS pixels. */
export interface StripSize {
  readonly width: number;
  readonly height: number;
  /** Free room left of station 0 and right of the last, so that a strip can share an axis with a plot. */
  readonly left?: number;
  readonly right?: number;
  /** Start and end of the seam; without it the first and last station. */
  readonly extent_mm?: readonly [number, number];
  /** Fewest pixels from ripple to ripple; closer stations are thinned. */
  readonly pitch?: number;
}

/** One ripple: flat from `x` to `x + width`, then half an ellipse. */
export interface RippleCommand {
  readonly kind: "ripple";
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly rx: number;
  readonly ry: number;
  /** Share of the limit, for the temper scale. */
  readonly share: number;
  /** Index of the station it shows. */
  readonly station: number;
  /** Stations nearby without data: its outline is dashed. */
  readonly partial: boolean;
}

/** A stretch without data. */
export interface GapCommand {
  readonly kind: "gap";
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export type StripCommand = RippleCommand | GapCommand;

const DEFAULT_PITCH = 5;
/** Share of the height that a ripple is tall; the rest is room to shift. */
const RIPPLE_SHARE = 0.66;
/** How round the end of a ripple is: half-width of its half ellipse to its half-height. */
const ROUNDNESS = 0.55;
/** Clear space between a gap's outline and the ripples beside it. */
const GAP_MARGIN = 1.5;

/**
 * A seam as a bead. From station to station one ripple, each over the next, shifted up for a positive and down for
 * a negative deviation by its share of the limit; stretches without data are gaps.
 * @param stations in ascending order of station_mm; fewer than one draws nothing
 * @returns commands in the order of painting: gaps first, then ripples from the seam's end to its start
 */
export function drawStrip(stations: readonly StripStation[], size: StripSize): StripCommand[] {
  const frame = stripFrame(stations, size);
  if (frame === null) return [];
  const groups = groupStations(
    stations,
    Math.max(1, frame.span / (size.pitch ?? DEFAULT_PITCH)),
    size.extent_mm,
  );
  const gaps: GapCommand[] = [];
  const ripples: RippleCommand[] = [];
  groups.forEach((group, index) => {
    if (group.worst === null) extendGaps(gaps, group, frame);
    else ripples.push(rippleOf(stations, group, frame, roundEnd(groups, index, frame)));
  });
  return [...gaps.map((gap) => insetGap(gap, frame)), ...ripples.reverse()];
}

/** Where things stand: a scale from station to x, and the sizes of a ripple. */
export interface StripFrame {
  readonly start_mm: number;
  readonly end_mm: number;
  readonly left: number;
  readonly span: number;
  readonly middle: number;
  readonly rx: number;
  readonly ry: number;
  readonly shift: number;
}

/** The scale of a strip, or null where there is nothing to draw or no room. */
export function stripFrame(stations: readonly StripStation[], size: StripSize): StripFrame | null {
  const first = stations[0];
  const last = stations.at(-1);
  if (first === undefined || last === undefined) return null;
  const ry = (size.height * RIPPLE_SHARE) / 2;
  const rx = ry * ROUNDNESS;
  const left = size.left ?? 1;
  const span = size.width - left - (size.right ?? rx + 1);
  if (span < 1) return null;
  const [start_mm, end_mm] = size.extent_mm ?? [first.station_mm, last.station_mm];
  return {
    start_mm,
    end_mm: end_mm > start_mm ? end_mm : start_mm + 1,
    left,
    span,
    middle: size.height / 2,
    rx,
    ry,
    shift: size.height / 2 - ry - 1,
  };
}

/** The x of a station. */
export function xOfStation(frame: StripFrame, station_mm: number): number {
  return frame.left + ((station_mm - frame.start_mm) / (frame.end_mm - frame.start_mm)) * frame.span;
}

/** The index of the station nearest to an x; stations in ascending order, at least one. */
export function stationAtX(frame: StripFrame, stations: readonly StripStation[], x: number): number {
  const station_mm = frame.start_mm + ((x - frame.left) / frame.span) * (frame.end_mm - frame.start_mm);
  return stationAt(stations, station_mm);
}

/** The index of the station nearest to a place along the seam. */
export function stationAt(stations: readonly StripStation[], station_mm: number): number {
  return nearestIndex(stations.length, (index) => stations[index]?.station_mm ?? 0, station_mm);
}

/** A ripple as an SVG path, which a canvas takes too. */
export function ripplePath(ripple: RippleCommand): string {
  const { x, y, width, rx, ry } = ripple;
  return `M${fix(x)} ${fix(y - ry)}h${fix(width)}a${fix(rx)} ${fix(ry)} 0 0 1 0 ${fix(2 * ry)}h${fix(-width)}z`;
}

function fix(value: number): number {
  return Math.round(value * 100) / 100;
}

function rippleOf(
  stations: readonly StripStation[],
  group: StripGroup,
  frame: StripFrame,
  rx: number,
): RippleCommand {
  const station = group.worst ?? group.first;
  const shown = stations[station];
  const share = Math.abs(shown?.share ?? 0);
  const sign = shown === undefined ? 0 : signOf(shown);
  const x = xOfStation(frame, group.start_mm);
  return {
    kind: "ripple",
    x,
    y: frame.middle - sign * Math.min(share, 1) * frame.shift,
    width: xOfStation(frame, group.end_mm) - x,
    rx,
    ry: frame.ry,
    share,
    station,
    partial: group.partial,
  };
}

/** The last ripple before a gap is rounded no further than a third into it, so that the gap stays seen. */
function roundEnd(groups: readonly StripGroup[], index: number, frame: StripFrame): number {
  let gap = 0;
  for (let next = index + 1; groups[next] !== undefined && groups[next]?.worst === null; next++) {
    const group = groups[next];
    if (group !== undefined) gap += xOfStation(frame, group.end_mm) - xOfStation(frame, group.start_mm);
  }
  const reachesEnd = index + 1 + countGaps(groups, index + 1) === groups.length;
  return gap === 0 || reachesEnd ? frame.rx : Math.min(frame.rx, gap / 3);
}

function countGaps(groups: readonly StripGroup[], from: number): number {
  let count = 0;
  while (groups[from + count]?.worst === null) count++;
  return count;
}

/** Adds a group to the gap it continues, or begins a new gap. */
function extendGaps(gaps: GapCommand[], group: StripGroup, frame: StripFrame): void {
  const x = xOfStation(frame, group.start_mm);
  const end = xOfStation(frame, group.end_mm);
  const before = gaps.at(-1);
  if (before !== undefined && Math.abs(before.x + before.width - x) < 1e-6) {
    gaps[gaps.length - 1] = { ...before, width: end - before.x };
    return;
  }
  gaps.push({ kind: "gap", x, y: frame.middle - frame.ry, width: end - x, height: 2 * frame.ry });
}

/** Draws a gap in from the ripples beside it. */
function insetGap(gap: GapCommand, frame: StripFrame): GapCommand {
  const isFirst = gap.x <= frame.left + 1e-6;
  const begin = isFirst ? gap.x + 0.5 : gap.x + Math.min(frame.rx, gap.width / 3) + GAP_MARGIN;
  const end = Math.max(begin + 1, gap.x + gap.width - GAP_MARGIN);
  return { ...gap, x: begin, width: end - begin };
}
