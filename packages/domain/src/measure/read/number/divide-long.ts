/** Splits a double into two halves of 26 bits (Veltkamp). */
const SPLITTER = 2 ** 27 + 1;
/** More than all rounding of this computation may add up to, in parts of the quotient. */
const DOUBT = 2 ** -98;

/**
 * (leading x shift + trailing) / divisor, rounded once to the nearest double, although the numerator has too many
 * digits for one.
 * @param leading whole number below 2^53
 * @param shift power of ten up to 10^7
 * @param trailing whole number below `shift`
 * @param divisor power of ten up to 10^22
 * @returns the quotient; nan where it lies so near the middle of two doubles that this computation cannot tell
 *
 * The quotient is formed as a sum of two doubles, which carries about 106 bits, and both ends of what is left in
 * doubt must round to the same double. Source: T. J. Dekker, A floating-point technique for extending the available
 * precision, Numer. Math. 18 (1971) 224-242, exact product and division.
 */
export function divideLong(leading: number, shift: number, trailing: number, divisor: number): number {
  const product = leading * shift;
  // Whole numbers all: the error of the product and its sum with the trailing digits are exact.
  const rest = productError(leading, shift, product) + trailing;
  const numerator = product + rest;
  const low = rest - (numerator - product);
  const quotient = numerator / divisor;
  const back = quotient * divisor;
  const remainder = numerator - back - productError(quotient, divisor, back) + low;
  const correction = remainder / divisor;
  const doubt = quotient * DOUBT;
  const rounded = quotient + (correction + doubt);
  return rounded === quotient + (correction - doubt) ? rounded : Number.NaN;
}

/** What `a * b` lost when it was rounded to `product`: exact while nothing overflows or underflows. */
function productError(a: number, b: number, product: number): number {
  const aScaled = SPLITTER * a;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = SPLITTER * b;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}
