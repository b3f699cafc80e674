import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import { hasValidCheck } from "./check-character.ts";
import { TAG_TAIL_LENGTH, Tag } from "./tag.ts";
import { findTagDoubt, fitsAt } from "./tag-doubt.ts";

const EXAMPLE = "S-8K3F7Q2NS";
const SYMBOL_COUNT = TAG_TAIL_LENGTH + 1;
/** Longer input is no tag and no link to one; refusing it first keeps the work bounded. */
const LONGEST_INPUT = 2048;
/** Hyphens and dashes of every width, blanks of every kind: none of them carries meaning in a tag. */
const SEPARATORS = /[\s\u00ad\u200b\u2010-\u2015\u2212\ufeff-]/gu;

/**
 * Reads a tag as people type and scanners send it. Forgiven: case, blanks, missing or extra hyphens, O for 0, I or
 * L for 1 (and 1 or I for the kind letter L), and a link that ends in `/T/<TAG>` on any host (whose host is
 * the caller's to check). Nothing else is: a wrong symbol or swapped neighbours are refused before any look-up.
 * @param text up to 2048 characters
 * @returns the tag in its written form, or faults `tag-invalid` that name the place of doubt where it can be known
 *   (characters are counted from the kind letter, 1, without hyphens)
 * Example: `parseTag("https://weld.example/t/s 8k3f-7q2n-s")` gives `S-8K3F7Q2NS`.
 */
export function parseTag(text: string): Outcome<Tag> {
  if (text.length > LONGEST_INPUT)
    return refused(mistyped(`A tag has ${SYMBOL_COUNT} characters, like ${EXAMPLE}.`));
  const symbols = foldSymbols(tagPart(text));
  const length = [...symbols].length;
  if (length !== SYMBOL_COUNT) return refused(wrongLength(length));
  const strange = [...symbols].flatMap((symbol, i) => (fitsAt(i, symbol) ? [] : [{ symbol, place: i }]));
  if (strange.length > 0) return refused(...strange.map((at) => strangeSymbol(symbols, at.symbol, at.place)));
  if (!hasValidCheck(symbols)) return refused(checkFails(symbols));
  return good(Tag.parse(`${symbols.charAt(0)}-${symbols.slice(1)}`));
}

/** What follows the last `/T/` of a link, or the text itself. */
function tagPart(text: string): string {
  const path = text.replace(/[?#].*$/s, "").trim();
  const link = /^.*\/t\/([^/]*)\/?$/is.exec(path);
  return link?.[1] ?? text;
}

/** Upper case without separators, look-alikes folded to the symbol that tags use; one UTF-16 unit a character. */
function foldSymbols(text: string): string {
  const bare = text
    .replace(SEPARATORS, "")
    .replace(/[a-z]/g, (letter) => letter.toUpperCase())
    .replace(/[\u{10000}-\u{10ffff}]/gu, "\ufffd");
  const kind = bare.slice(0, 1).replace(/[1I]/, "L");
  return kind + bare.slice(1).replace(/O/g, "0").replace(/[IL]/g, "1");
}

function wrongLength(length: number): Fault {
  if (length === 0) return mistyped(`Nothing to read; a tag looks like ${EXAMPLE}.`);
  const off = SYMBOL_COUNT - length;
  const hint = off > 0 ? `${off} missing` : `${-off} too many`;
  return mistyped(
    `A tag has ${SYMBOL_COUNT} letters and digits, like ${EXAMPLE}; this has ${length}: ${hint}.`,
  );
}

function strangeSymbol(symbols: string, symbol: string, place: number): Fault {
  const doubt = findTagDoubt(symbols);
  const meant = doubt === undefined ? "" : ` Did you mean ${doubt.suggestion}?`;
  const rule =
    place === 0
      ? "is no kind letter (P, S, L, C, W or K)"
      : "is not used in tags (digits and letters without I, L, O, U)";
  return mistyped(`Character ${place + 1}, "${symbol}", ${rule}.${meant}`);
}

function checkFails(symbols: string): Fault {
  const doubt = findTagDoubt(symbols);
  if (doubt === undefined) {
    return mistyped(
      "The check character does not match, and no single slip explains it; read the tag again.",
    );
  }
  const [first = 0, second] = doubt.places;
  const where =
    second === undefined
      ? `Character ${first + 1}, "${symbols.charAt(first)}", may be misread.`
      : `Characters ${first + 1} and ${second + 1}, "${symbols.charAt(first)}${symbols.charAt(second)}", may be swapped.`;
  return mistyped(`The check character does not match. ${where} Did you mean ${doubt.suggestion}?`);
}

function mistyped(detail: string): Fault {
  return { code: "tag-invalid", detail };
}
