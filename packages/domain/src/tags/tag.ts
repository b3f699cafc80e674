import { z } from "zod";
import { checkCharacter, hasValidCheck } from "./check-character.ts";

/** What each kind letter stands for, in the trade's words. */
export const TAG_KINDS = {
  P: "part",
  S: "seam",
  L: "lot",
  C: "cell",
  W: "person",
  K: "record pack",
} as const;

/** The first letter of a tag. */
export type TagKind = keyof typeof TAG_KINDS;

/** Crockford base32: no I, L, O or U, so that nothing in a body can be read two ways. */
export const TAG_SYMBOLS = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";

/** Symbols after the kind letter: a body of eight and the check character. */
export const TAG_TAIL_LENGTH = 9;

/** The written form of a tag, `KIND-BODYC`; the check character still has to be tried. */
export const TAG_PATTERN = /^[PSLCWK]-[0-9A-HJKMNP-TV-Z]{9}$/;

const BODY_LENGTH = 8;

/** A tag in its written form, upper case with one hyphen, check character right. Made only by parsing or minting. */
export const Tag = z
  .string()
  .regex(TAG_PATTERN, "expected a tag such as S-8K3F7Q2NS")
  .refine((text) => !TAG_PATTERN.test(text) || hasValidCheck(text.replace("-", "")), {
    message: "the tag's check character does not match",
  })
  .brand<"Tag">()
  .meta({
    id: "Tag",
    description:
      "Printed code of a thing: a kind letter (P part, S seam, L lot, C cell, W person's badge, K record pack), eight Crockford base32 symbols and an ISO/IEC 7064 MOD 37-2 check character over all of them.",
    example: "S-8K3F7Q2NS",
  });
export type Tag = z.infer<typeof Tag>;

/** Whether a letter, upper case, is the kind letter of a tag. */
export function isTagKind(letter: string): letter is TagKind {
  return Object.hasOwn(TAG_KINDS, letter);
}

/**
 * A new tag from random bytes. Bodies whose check character would not be a Crockford symbol (I, L, O, U or `*`,
 * about one in seven) give way to the next body in counting order, so the same bytes always give the same tag.
 * @param kind   the kind letter
 * @param random at least 8 random bytes; the lower five bits of the first eight are the body (40 bits)
 * @returns a tag such as `S-8K3F7Q2NS`; store it under a unique index and mint again when it is taken
 * @throws RangeError when fewer than 8 bytes are given or `kind` is none
 * Source: ISO/IEC 7064 MOD 37-2; Crockford base32.
 */
export function mintTag(kind: TagKind, random: Uint8Array): Tag {
  if (!isTagKind(kind)) throw new RangeError(`kind: expected one of P S L C W K, got "${String(kind)}"`);
  if (random.length < BODY_LENGTH) {
    throw new RangeError(`random: expected at least ${BODY_LENGTH} bytes, got ${random.length}`);
  }
  const digits = Array.from(random.subarray(0, BODY_LENGTH), (byte) => byte & 31);
  for (;;) {
    const body = digits.map((digit) => TAG_SYMBOLS.charAt(digit)).join("");
    const check = checkCharacter(kind + body);
    if (TAG_SYMBOLS.includes(check)) return Tag.parse(`${kind}-${body}${check}`);
    countUp(digits);
  }
}

/** The next body in counting order; after the last comes the first. Writes `digits`. */
function countUp(digits: number[]): void {
  for (let i = digits.length - 1; i >= 0; i--) {
    const next = ((digits[i] ?? 0) + 1) % TAG_SYMBOLS.length;
    digits[i] = next;
    if (next !== 0) return;
  }
}

/** The kind letter of a tag. */
export function tagKind(tag: Tag): TagKind {
  const letter = tag.charAt(0);
  if (!isTagKind(letter)) throw new RangeError(`tag: expected a kind letter first, got "${letter}"`);
  return letter;
}

/**
 * What a tag's QR code holds: `<PUBLIC URL>/T/<TAG>`, all upper case, so that the symbol can use QR's alphanumeric mode.
 * @param publicUrl the server's public address, with or without a slash at the end
 * @param tag       any tag
 * @returns for `https://weld.example` and `S-8K3F7Q2NS`: `HTTPS://WELD.EXAMPLE/T/S-8K3F7Q2NS`
 */
export function tagUrl(publicUrl: string, tag: Tag): string {
  return `${publicUrl.replace(/\/+$/, "")}/T/${tag}`.toUpperCase();
}
