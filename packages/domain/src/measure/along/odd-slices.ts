import { medianOf } from "../fit/median.ts";

/** Neighbours asked to each side. */
const ASKED = 4;

/** A slice this far from what its neighbours say is odd: in standard uncertainties, and at least in mm. */
const ODD_U = 6;
const ODD_MM = 0.15;

/** What the neighbours of a slice say its value should be. */
export interface Expected {
  readonly value: number;
  readonly odd: boolean;
}

/**
 * Whether a value stands alone: neither what lies before it nor what lies after it leads to it. A step is not odd,
 * since one of its sides agrees.
 * @param values one a slice, NaN where not found
 * @param u their standard uncertainties
 * @param odd_u how many of them make a value odd
 * @returns the middle of the neighbours on both sides; null where there are fewer than two on a side
 */
export function expectedFromNeighbours(
  values: Float64Array,
  u: Float64Array,
  index: number,
  odd_u = ODD_U,
): Expected | null {
  const side = (way: -1 | 1) => {
    const found: number[] = [];
    for (let k = index + way; k >= 0 && k < values.length && found.length < ASKED; k += way)
      if (Number.isFinite(values[k])) found.push(values[k]!);
    return found;
  };
  const before = side(-1);
  const after = side(1);
  if (before.length < 2 || after.length < 2) return null;
  const value = (medianOf(before) + medianOf(after)) / 2;
  const limit = Math.max(ODD_MM, odd_u * u[index]!);
  const away = (from: number) => Math.abs(values[index]! - from);
  const odd = Math.min(away(medianOf(before)), away(medianOf(after)), away(value)) > limit;
  return { value, odd };
}
