import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { parseTag } from "./parse-tag.ts";
import { mintTag, TAG_PATTERN, TAG_SYMBOLS, Tag, type TagKind, tagUrl } from "./tag.ts";
import { findTagDoubt } from "./tag-doubt.ts";

const KINDS: readonly TagKind[] = ["P", "S", "L", "C", "W", "K"];
const ANY_SYMBOL = "0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ";
const aTag = fc
  .tuple(fc.constantFrom(...KINDS), fc.uint8Array({ minLength: 8, maxLength: 8 }))
  .map(([kind, random]) => mintTag(kind, random));

const fold = (place: number, symbol: string): string => {
  if (place === 0) return symbol.replace(/[1I]/, "L");
  return symbol.replace("O", "0").replace(/[IL]/, "1");
};
const symbolsOf = (tag: string): string => tag.replace("-", "");
const put = (text: string, place: number, symbol: string): string =>
  text.slice(0, place) + symbol + text.slice(place + 1);

describe("laws of tags", () => {
  test("every minted tag has the written form, passes the schema and reads back as itself", () => {
    fc.assert(
      fc.property(aTag, (tag) => {
        expect(tag).toMatch(TAG_PATTERN);
        expect(Tag.safeParse(tag).success).toBe(true);
        expect(parseTag(tag)).toEqual({ ok: true, value: tag });
        expect(parseTag(tagUrl("https://weld.example", tag))).toEqual({ ok: true, value: tag });
      }),
    );
  });

  test("every single wrong symbol is refused, the kind letter included", () => {
    fc.assert(
      fc.property(
        aTag,
        fc.integer({ min: 0, max: 9 }),
        fc.constantFrom(...ANY_SYMBOL),
        (tag, place, symbol) => {
          const symbols = symbolsOf(tag);
          fc.pre(fold(place, symbol) !== symbols.charAt(place));
          expect(parseTag(put(symbols, place, symbol)).ok).toBe(false);
        },
      ),
      { numRuns: 2000 },
    );
  });

  test("every swap of unlike neighbours is refused", () => {
    fc.assert(
      fc.property(aTag, fc.integer({ min: 0, max: 8 }), (tag, place) => {
        const symbols = symbolsOf(tag);
        const [a, b] = [symbols.charAt(place), symbols.charAt(place + 1)];
        const swapped = put(put(symbols, place, b), place + 1, a);
        fc.pre(fold(place, b) !== a || fold(place + 1, a) !== b);
        expect(parseTag(swapped).ok).toBe(false);
      }),
      { numRuns: 2000 },
    );
  });

  test("case, hyphens, blanks and look-alikes are forgiven anywhere", () => {
    const disguise = fc.array(
      fc.record({ lower: fc.boolean(), alike: fc.boolean(), gap: fc.constantFrom("", "-", " ", "\u00a0") }),
      { minLength: 10, maxLength: 10 },
    );
    fc.assert(
      fc.property(aTag, disguise, (tag, how) => {
        const typed = [...symbolsOf(tag)].map((symbol, i) => {
          const alike = how[i]?.alike ? symbol.replace("0", "O").replace("1", i % 2 ? "I" : "L") : symbol;
          return (how[i]?.gap ?? "") + (how[i]?.lower ? alike.toLowerCase() : alike);
        });
        expect(parseTag(typed.join(""))).toEqual({ ok: true, value: tag });
      }),
    );
  });

  test("one unreadable symbol is always found again", () => {
    fc.assert(
      fc.property(aTag, fc.integer({ min: 0, max: 9 }), (tag, place) => {
        expect(findTagDoubt(put(symbolsOf(tag), place, "?"))).toEqual({
          places: [place],
          suggestion: tag,
          why: "unreadable",
        });
      }),
    );
  });

  test("a suggestion is always a valid tag that differs at the places named only", () => {
    const tenSymbols = fc.array(fc.constantFrom(...TAG_SYMBOLS), { minLength: 9, maxLength: 9 });
    fc.assert(
      fc.property(fc.constantFrom(...KINDS), tenSymbols, (kind, tail) => {
        const typed = kind + tail.join("");
        const doubt = findTagDoubt(typed);
        if (doubt === undefined) return;
        expect(Tag.safeParse(doubt.suggestion).success).toBe(true);
        const other = [...symbolsOf(doubt.suggestion)].flatMap((symbol, i) =>
          symbol === typed[i] ? [] : [i],
        );
        expect(other).toEqual(doubt.places);
      }),
      { numRuns: 2000 },
    );
  });

  test("no text at all makes reading fail otherwise than by a fault", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary", maxLength: 40 }), (text) => {
        const outcome = parseTag(text);
        expect(outcome.ok || outcome.faults.every((fault) => fault.code === "tag-invalid")).toBe(true);
      }),
      { numRuns: 1000 },
    );
  });
});
