/** A straight line from a quantity to pixels and back. */
export interface Scale {
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
}

/** Pixels of a value. */
export function pixelOf(scale: Scale, value: number): number {
  const [from, until] = scale.from;
  const [first, last] = scale.to;
  return first + ((value - from) / (until - from)) * (last - first);
}

/** The value at a pixel. */
export function valueAt(scale: Scale, pixel: number): number {
  const [from, until] = scale.from;
  const [first, last] = scale.to;
  return from + ((pixel - first) / (last - first)) * (until - from);
}

/** A scale; a range of no width is widened, so that every value has a place. */
export function linearScale(from: readonly [number, number], to: readonly [number, number]): Scale {
  const [low, high] = from;
  if (!Number.isFinite(low) || !Number.isFinite(high)) {
    throw new RangeError(`from: expected two finite numbers, got ${low} and ${high}`);
  }
  return { from: high > low ? from : [low - 0.5, low + 0.5], to };
}

const STEPS = [1, 2, 2.5, 5, 10];

/**
 * Round values inside a range, about `count` of them: steps of 1, 2, 2.5 or 5 times a power of ten.
 * @returns in ascending order; values are exact multiples of the step, so that 0 is 0
 */
export function roundTicks(low: number, high: number, count: number): number[] {
  if (!(high > low) || !(count >= 1)) return [];
  const rough = (high - low) / count;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = power * (STEPS.find((candidate) => candidate * power >= rough * 0.8) ?? 10);
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  const decimals = tickDecimals(step);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) =>
    Number(((first + index) * step).toFixed(decimals)),
  );
}

/** How many decimals a step needs to be written exactly, twelve at most. */
export function tickDecimals(step: number): number {
  for (let decimals = 0; decimals < 12; decimals++) {
    if (Math.abs(step - Number(step.toFixed(decimals))) < step * 1e-6) return decimals;
  }
  return 12;
}

/** Lowest and highest of several lists, nulls left out; null where nothing is left. */
export function extentOf(
  ...lists: readonly (readonly (number | null | undefined)[])[]
): [number, number] | null {
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (const list of lists) {
    for (const value of list) {
      if (value === null || value === undefined || !Number.isFinite(value)) continue;
      if (value < low) low = value;
      if (value > high) high = value;
    }
  }
  return low > high ? null : [low, high];
}

/** A range with a margin at both ends, a share of its width; a range of no width gets one of 1. */
export function padded(extent: readonly [number, number], share: number): [number, number] {
  const width = extent[1] - extent[0];
  const margin = width > 0 ? width * share : 0.5;
  return [extent[0] - margin, extent[1] + margin];
}
