/** Elements of a steel analysis in percent by mass, by symbol (`C`, `Mn`, …). Absent means not reported, never zero. */
export type Chemistry = Readonly<Record<string, number>>;

/** An element outside the composition for which a formula was made. */
export interface ElementOutside {
  readonly element: string;
  readonly value_pct: number;
  readonly min_pct: number;
  readonly max_pct: number;
}

/** A carbon equivalent with what is needed to doubt it. All in percent by mass, unrounded. */
export interface CarbonEquivalent {
  /** The value; null when an element of the formula was not reported, because a smaller sum would look better. */
  readonly value_pct: number | null;
  /** The sum over what was reported: the true value is this or more. */
  readonly at_least_pct: number;
  /** Elements of the formula that were not reported. */
  readonly missing: readonly string[];
  /** Reported elements outside the formula's range of use: the value is then an extrapolation. */
  readonly outside: readonly ElementOutside[];
}

type Range = readonly [min_pct: number, max_pct: number];

interface Formula {
  /** Divisor of each element beside carbon: the sum is C + Σ element / divisor. */
  readonly divisors: Readonly<Record<string, number>>;
  readonly ranges: Readonly<Record<string, Range>>;
}

/** EN 1011-2:2001, Annex C.2 (method A); formula after IIW. */
const CE_IIW: Formula = {
  divisors: { Mn: 6, Cr: 5, Mo: 5, V: 5, Ni: 15, Cu: 15 },
  ranges: {
    C: [0.05, 0.25],
    Si: [0, 0.8],
    Mn: [0, 1.7],
    Cr: [0, 0.9],
    Cu: [0, 1.0],
    Ni: [0, 2.5],
    Mo: [0, 0.75],
    V: [0, 0.2],
  },
};

/** EN 1011-2:2001, Annex C.3 (method B). */
const CET: Formula = {
  divisors: { Mn: 10, Mo: 10, Cr: 20, Cu: 20, Ni: 40 },
  ranges: {
    C: [0.05, 0.32],
    Si: [0, 0.8],
    Mn: [0.5, 1.9],
    Cr: [0, 1.5],
    Cu: [0, 0.7],
    Mo: [0, 0.75],
    Nb: [0, 0.06],
    Ni: [0, 2.5],
    Ti: [0, 0.12],
    V: [0, 0.18],
    B: [0, 0.005],
  },
};

/** Ito and Bessyo, 1968; 5·B is written as B over 0.2. */
const PCM: Formula = {
  divisors: { Si: 30, Mn: 20, Cu: 20, Cr: 20, Ni: 60, Mo: 15, V: 10, B: 0.2 },
  ranges: {
    C: [0.07, 0.22],
    Si: [0, 0.6],
    Mn: [0.4, 1.4],
    Cu: [0, 0.5],
    Ni: [0, 1.2],
    Cr: [0, 1.2],
    Mo: [0, 0.7],
    V: [0, 0.12],
    Nb: [0, 0.04],
    Ti: [0, 0.05],
    B: [0, 0.005],
  },
};

/** Yurioka, 1983: copper over 15 and nickel over 20; sheets that print (Cu+Ni)/15 are wrong. */
const CEN: Formula = {
  divisors: { Si: 24, Mn: 6, Cu: 15, Ni: 20, Cr: 5, Mo: 5, Nb: 5, V: 5, B: 0.2 },
  ranges: {},
};

/**
 * Carbon equivalent CE(IIW), also called CEV: C + Mn/6 + (Cr+Mo+V)/5 + (Ni+Cu)/15.
 * @param chemistry ladle analysis, percent by mass
 * Source: EN 1011-2:2001, C.2.1; EN 10025-1. The composition range is from memory of the standard.
 */
export function carbonEquivalentIiw(chemistry: Chemistry): CarbonEquivalent {
  return computed(CE_IIW, chemistry, 1);
}

/**
 * Carbon equivalent CET: C + (Mn+Mo)/10 + (Cr+Cu)/20 + Ni/40.
 * @param chemistry percent by mass
 * Source: EN 1011-2:2001, C.3.1. Example: C 0.17, Mn 1.40, Cr 0.05, Mo 0.02, Ni 0.05, Cu 0.10 gives 0.32075.
 */
export function carbonEquivalentCet(chemistry: Chemistry): CarbonEquivalent {
  return computed(CET, chemistry, 1);
}

/**
 * Cracking parameter Pcm: C + Si/30 + (Mn+Cu+Cr)/20 + Ni/60 + Mo/15 + V/10 + 5·B; for steels low in carbon.
 * @param chemistry percent by mass
 * Source: Ito and Bessyo, IIW doc. IX-576-68. The composition range is from memory.
 */
export function carbonEquivalentPcm(chemistry: Chemistry): CarbonEquivalent {
  return computed(PCM, chemistry, 1);
}

/**
 * Carbon equivalent CEN, which leads from Pcm (low carbon) to CE(IIW): C + A·[Si/24 + Mn/6 + Cu/15 + Ni/20 +
 * (Cr+Mo+Nb+V)/5 + 5·B] with A = 0.75 + 0.25·tanh(20·(C − 0.12)). Without a stated composition range.
 * @param chemistry percent by mass
 * Source: Yurioka and others, Welding Journal 62 (1983).
 */
export function carbonEquivalentCen(chemistry: Chemistry): CarbonEquivalent {
  const carbon_pct = chemistry["C"] ?? 0;
  return computed(CEN, chemistry, 0.75 + 0.25 * Math.tanh(20 * (carbon_pct - 0.12)));
}

function computed({ divisors, ranges }: Formula, chemistry: Chemistry, weight: number): CarbonEquivalent {
  let alloy_pct = 0;
  for (const [element, divisor] of Object.entries(divisors))
    alloy_pct += percentOf(chemistry, element) / divisor;
  const at_least_pct = percentOf(chemistry, "C") + weight * alloy_pct;
  const missing = ["C", ...Object.keys(divisors)].filter((element) => chemistry[element] === undefined);
  const outside = Object.entries(ranges).flatMap(([element, [min_pct, max_pct]]) => {
    const value_pct = chemistry[element];
    if (value_pct === undefined || (value_pct >= min_pct && value_pct <= max_pct)) return [];
    return [{ element, value_pct, min_pct, max_pct }];
  });
  return { value_pct: missing.length === 0 ? at_least_pct : null, at_least_pct, missing, outside };
}

/** @throws RangeError for an amount that is no percentage */
function percentOf(chemistry: Chemistry, element: string): number {
  const value_pct = chemistry[element] ?? 0;
  if (!(value_pct >= 0 && value_pct <= 100)) {
    throw new RangeError(`chemistry.${element}: expected 0 to 100 percent, got ${value_pct}`);
  }
  return value_pct;
}
