/** Values 0 to 36 of ISO/IEC 7064 MOD 37-2, in order; the last is only ever a check character. */
const CHECK_ALPHABET = "0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ*";
const MODULUS = 37;
const RADIX = 2;

/**
 * Value of a symbol in ISO/IEC 7064 MOD 37-2.
 * @param symbol one of `0-9 A-Z *`
 * @returns 0 to 36
 * @throws RangeError for any other symbol
 */
export function checkValue(symbol: string): number {
  const value = symbol.length === 1 ? CHECK_ALPHABET.indexOf(symbol) : -1;
  if (value < 0) throw new RangeError(`symbol: expected one of ${CHECK_ALPHABET}, got "${symbol}"`);
  return value;
}

/**
 * Check character of a text: one wrong symbol, one adjacent swap, a jump swap and a twin error never pass it.
 * @param text symbols `0-9 A-Z` (and `*`), upper case; may be empty
 * @returns one symbol of `0-9 A-Z *`
 * @throws RangeError for a symbol outside the alphabet
 * Source: ISO/IEC 7064 pure system MOD 37-2. Example: `checkCharacter("G123498654321")` is `"H"`.
 */
export function checkCharacter(text: string): string {
  let sum = 0;
  for (const symbol of text) sum = ((sum + checkValue(symbol)) * RADIX) % MODULUS;
  return CHECK_ALPHABET.charAt((MODULUS + 1 - sum) % MODULUS);
}

/**
 * Whether a text that ends in its check character is whole.
 * @param text symbols `0-9 A-Z *`, upper case, check character last
 * @throws RangeError for a symbol outside the alphabet
 */
export function hasValidCheck(text: string): boolean {
  if (text.length === 0) return false;
  return checkCharacter(text.slice(0, -1)) === text.slice(-1);
}

/**
 * The one symbol at a place that makes the check come out, the others being right: what an unreadable character
 * must have been.
 * @param text symbols with the check character last; the one at `index` is not looked at
 * @param index 0-based place in `text`
 * @returns one symbol of `0-9 A-Z *`
 * @throws RangeError when `index` lies outside, or another symbol is outside the alphabet
 */
export function symbolThatFits(text: string, index: number): string {
  if (!(index >= 0 && index < text.length)) {
    throw new RangeError(`index: expected 0 to ${text.length - 1}, got ${index}`);
  }
  const before = text.slice(0, index);
  const after = text.slice(index + 1);
  // 37 is prime and 2 has an inverse, so exactly one of the 37 symbols fits at every place.
  const fitting = [...CHECK_ALPHABET].find((symbol) => hasValidCheck(before + symbol + after));
  if (fitting === undefined) throw new RangeError("text: no symbol fits, so the alphabet is not MOD 37-2's");
  return fitting;
}
