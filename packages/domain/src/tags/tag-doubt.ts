import { hasValidCheck, symbolThatFits } from "./check-character.ts";
import { isTagKind, TAG_SYMBOLS, Tag } from "./tag.ts";

/** Where a mistyped tag is most likely wrong. */
export interface TagDoubt {
  /** 0-based places among the ten letters and digits of the tag, the kind letter being 0. */
  readonly places: readonly number[];
  /** The tag it would be then: to be shown and confirmed, never taken over silently. */
  readonly suggestion: Tag;
  readonly why: "unreadable" | "swapped" | "look-alike";
}

/** Symbols that are taken for one another in print, in handwriting or over a machine's noise. */
const LOOK_ALIKES = [
  "8B",
  "5S",
  "2Z",
  "6G",
  "0D",
  "0Q",
  "CG",
  "VY",
  "MN",
  "VW",
  "17",
  "PR",
  "EF",
  "XK",
  "6B",
];

/**
 * The one likely slip that turns ten symbols into a valid tag: a symbol that is not used in tags, two neighbours
 * swapped, or one look-alike taken for another.
 * @param symbols ten characters, kind letter first, upper case, hyphen left out, O/0 and I/L/1 already folded
 * @returns undefined when the symbols are right, or when several slips (or none) would explain them: then the
 *   check character cannot tell the place, and a guess would be worse than none
 */
export function findTagDoubt(symbols: string): TagDoubt | undefined {
  const strange = [...symbols].flatMap((symbol, i) => (fitsAt(i, symbol) ? [] : [i]));
  if (strange.length > 1) return undefined;
  const [place] = strange;
  if (place !== undefined) return unreadable(symbols, place);
  if (hasValidCheck(symbols)) return undefined;
  const slips = [...swaps(symbols), ...lookAlikes(symbols)];
  return slips.length === 1 ? slips[0] : undefined;
}

/** Whether a symbol may stand at a place of a tag: a kind letter first, Crockford symbols after it. */
export function fitsAt(place: number, symbol: string): boolean {
  return place === 0 ? isTagKind(symbol) : symbol.length === 1 && TAG_SYMBOLS.includes(symbol);
}

/** One unreadable symbol is an erasure: the check character determines it. */
function unreadable(symbols: string, place: number): TagDoubt | undefined {
  const symbol = symbolThatFits(symbols, place);
  if (!fitsAt(place, symbol)) return undefined;
  return { places: [place], suggestion: written(replaced(symbols, place, symbol)), why: "unreadable" };
}

function swaps(symbols: string): TagDoubt[] {
  const found: TagDoubt[] = [];
  for (let i = 0; i + 1 < symbols.length; i++) {
    const swapped = symbols.slice(0, i) + symbols.charAt(i + 1) + symbols.charAt(i) + symbols.slice(i + 2);
    if (!isWhole(swapped)) continue;
    found.push({ places: [i, i + 1], suggestion: written(swapped), why: "swapped" });
  }
  return found;
}

function lookAlikes(symbols: string): TagDoubt[] {
  const found: TagDoubt[] = [];
  for (let i = 0; i < symbols.length; i++) {
    const symbol = symbols.charAt(i);
    const meant = symbolThatFits(symbols, i);
    const alike = LOOK_ALIKES.some((pair) => pair.includes(symbol) && pair.includes(meant));
    if (!alike || !fitsAt(i, meant)) continue;
    found.push({ places: [i], suggestion: written(replaced(symbols, i, meant)), why: "look-alike" });
  }
  return found;
}

function isWhole(symbols: string): boolean {
  return [...symbols].every((symbol, i) => fitsAt(i, symbol)) && hasValidCheck(symbols);
}

function replaced(symbols: string, place: number, symbol: string): string {
  return symbols.slice(0, place) + symbol + symbols.slice(place + 1);
}

function written(symbols: string): Tag {
  return Tag.parse(`${symbols.charAt(0)}-${symbols.slice(1)}`);
}
