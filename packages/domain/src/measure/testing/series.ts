import type { Series } from "../along/scatter.ts";
import { normalsFrom } from "./noise.ts";

/** A series of one value a millimetre with normal noise, the same for the same seed. */
export function noisySeries(count: number, truth: (x: number) => number, noise: number, seed = 3): Series {
  const normal = normalsFrom(seed);
  return {
    at_mm: Float64Array.from({ length: count }, (_, i) => i),
    values: Float64Array.from({ length: count }, (_, i) => truth(i) + noise * normal()),
    u: new Float64Array(count).fill(noise),
  };
}
