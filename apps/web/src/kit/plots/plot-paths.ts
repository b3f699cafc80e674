import { pixelOf, type Scale } from "./plot-frame.ts";

/** A quantity along the seam: null where it was not measured. */
export type Values = readonly (number | null)[];

/** The scales of one plot. */
export interface PlotScales {
  readonly x: Scale;
  readonly y: Scale;
}

/** A stretch of stations, first and last index. */
export interface Stretch {
  readonly first: number;
  readonly last: number;
}

/** The stretches in which every station has a value. */
export function measuredStretches(values: Values): Stretch[] {
  return stretches(values, (value) => value !== null && value !== undefined);
}

/** The stretches without values. */
export function blindStretches(values: Values): Stretch[] {
  return stretches(values, (value) => value === null || value === undefined);
}

function stretches(values: Values, holds: (value: number | null | undefined) => boolean): Stretch[] {
  const found: Stretch[] = [];
  let first = -1;
  for (let index = 0; index <= values.length; index++) {
    const isIn = index < values.length && holds(values[index]);
    if (isIn && first < 0) first = index;
    if (!isIn && first >= 0) {
      found.push({ first, last: index - 1 });
      first = -1;
    }
  }
  return found;
}

/** The line through the values as an SVG path; broken where nothing was measured, a lone station is a dot. */
export function linePath(stations_mm: readonly number[], values: Values, scales: PlotScales): string {
  return measuredStretches(values)
    .map(({ first, last }) => {
      const points = pointsOf(stations_mm, values, { first, last }, scales);
      return first === last ? `M${points}h0.01` : `M${points}`;
    })
    .join("");
}

/**
 * The area between two lists as an SVG path; nothing where either has no value. For an uncertainty band and for
 * the smallest and largest of each bucket of a log.
 */
export function bandPath(
  stations_mm: readonly number[],
  low: Values,
  high: Values,
  scales: PlotScales,
): string {
  const both = low.map((value, index) => (value === null ? null : (high[index] ?? null)));
  return measuredStretches(both)
    .map((stretch) => {
      const over = pointsOf(stations_mm, high, stretch, scales);
      const back = pointsOf(stations_mm, low, stretch, scales).split("L").reverse().join("L");
      return `M${over}L${back}z`;
    })
    .join("");
}

function pointsOf(
  stations_mm: readonly number[],
  values: Values,
  stretch: Stretch,
  scales: PlotScales,
): string {
  const points: string[] = [];
  for (let index = stretch.first; index <= stretch.last; index++) {
    const x = pixelOf(scales.x, stations_mm[index] ?? 0);
    const y = pixelOf(scales.y, values[index] ?? 0);
    points.push(`${round(x)} ${round(y)}`);
  }
  return points.join("L");
}

function round(pixel: number): number {
  return Math.round(pixel * 10) / 10;
}
