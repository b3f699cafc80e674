import { drawsFrom } from "../fit/consensus-line.ts";

/** Draws the first of which a small seed shows through. */
const WARMING = 16;

/** Normal noise, mean 0 and standard deviation 1, the same for the same seed (Box and Muller). */
export function normalsFrom(seed: number): () => number {
  const draw = drawsFrom(seed);
  for (let i = 0; i < WARMING; i++) draw();
  return () => Math.sqrt(-2 * Math.log(1 - draw())) * Math.cos(2 * Math.PI * draw());
}

/** Root mean square. */
export const rmsOf = (values: readonly number[]): number =>
  Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
