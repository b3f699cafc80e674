/** Numbers by chance, the same for the same seed. */
export interface Random {
  /** Even between two bounds. */
  even(low: number, high: number): number;
  /** Normal, mean 0, standard deviation 1. */
  normal(): number;
  /** Student's t with four degrees of freedom, scaled to standard deviation 1: heavier tails than normal. */
  heavy(): number;
  chance(share: number): boolean;
  pick<T>(of: readonly T[]): T;
}

/** Mulberry32: 32 bits of state, a full period of 2^32. */
export function randomFrom(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
  const normal = () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next());
  const heavy = () => {
    const square = (normal() ** 2 + normal() ** 2 + normal() ** 2 + normal() ** 2) / 4;
    // A t variable of four degrees of freedom has variance 2.
    return normal() / Math.sqrt(square) / Math.SQRT2;
  };
  return {
    even: (low, high) => low + (high - low) * next(),
    normal,
    heavy,
    chance: (share) => next() < share,
    pick: (of) => {
      const one = of[Math.floor(next() * of.length)];
      if (one === undefined) throw new RangeError("nothing to pick from");
      return one;
    },
  };
}
