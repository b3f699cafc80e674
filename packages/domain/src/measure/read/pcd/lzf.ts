const MAX_LITERAL = 32;
const LONG_COPY = 7;

/** LZF block that cannot be unpacked: where, and why. */
export interface LzfFault {
  /** 0-based byte in the packed block. */
  readonly byte: number;
  readonly why: string;
}

/** The most bytes that a packed byte can become: three bytes give 264. */
export const LZF_MAX_RATIO = 88;

/**
 * Unpacks an LZF block.
 * `000LLLLL`: L + 1 bytes follow as they are. `LLLooooo oooooooo`, L 1 to 6: copy L + 2 bytes from o + 1 back.
 * `111ooooo NNNNNNNN oooooooo`: copy N + 9 bytes from o + 1 back. A copy may overlap what it writes.
 * @param packed the block
 * @param plain takes the bytes; the block must fill it exactly
 * @returns null, or why the block cannot be unpacked
 * Source: the format of liblzf 3.6.
 */
export function unpackLzf(packed: Uint8Array, plain: Uint8Array): LzfFault | null {
  let from = 0;
  let to = 0;
  while (from < packed.length) {
    const start = from;
    const control = packed[from++]!;
    if (control < MAX_LITERAL) {
      const length = control + 1;
      if (from + length > packed.length) return { byte: start, why: "the block ends inside a literal run" };
      if (to + length > plain.length) return { byte: start, why: "the block holds more than it says" };
      for (let i = 0; i < length; i++) plain[to++] = packed[from++]!;
      continue;
    }
    const isLong = control >> 5 === LONG_COPY;
    if (from + (isLong ? 2 : 1) > packed.length) return { byte: start, why: "the block ends inside a copy" };
    const length = (isLong ? LONG_COPY + packed[from++]! : control >> 5) + 2;
    const distance = ((control & 31) << 8) + packed[from++]! + 1;
    if (distance > to) return { byte: start, why: "a copy reaches back before the first byte" };
    if (to + length > plain.length) return { byte: start, why: "the block holds more than it says" };
    for (let i = 0; i < length; i++, to++) plain[to] = plain[to - distance]!;
  }
  return to === plain.length ? null : { byte: from, why: `the block gives ${to} bytes of ${plain.length}` };
}
