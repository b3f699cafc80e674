import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { z } from "zod";
import { unpackLzf } from "./lzf.ts";

const Vectors = z.object({
  vectors: z.array(z.object({ name: z.string(), plain_hex: z.string(), lzf_hex: z.string() })).min(5),
});
const file = new URL("../../../../vectors/formats/lzf-vectors.json", import.meta.url);
const { vectors } = Vectors.parse(JSON.parse(readFileSync(file, "utf8")));
const bytesOf = (hex: string): Uint8Array => new Uint8Array(Buffer.from(hex, "hex"));

describe("unpacking LZF blocks written by liblzf 3.6", () => {
  test.each(vectors)("gives $name byte for byte", ({ plain_hex, lzf_hex }) => {
    const plain = new Uint8Array(plain_hex.length / 2);
    expect(unpackLzf(bytesOf(lzf_hex), plain)).toBeNull();
    expect(Buffer.from(plain).toString("hex")).toBe(plain_hex);
  });

  test.each(vectors)("refuses $name at every length but the right one", ({ plain_hex, lzf_hex }) => {
    for (const wrong of [-1, 1]) {
      const plain = new Uint8Array(plain_hex.length / 2 + wrong);
      expect(unpackLzf(bytesOf(lzf_hex), plain)).not.toBeNull();
    }
  });

  test.each(vectors)("refuses $name when it is cut anywhere", ({ plain_hex, lzf_hex }) => {
    const packed = bytesOf(lzf_hex);
    for (let end = 0; end < packed.length; end++) {
      const fault = unpackLzf(packed.subarray(0, end), new Uint8Array(plain_hex.length / 2));
      expect(fault?.byte).toBeLessThanOrEqual(end);
    }
  });

  test("names the byte of a copy that reaches back before the first byte", () => {
    const fault = unpackLzf(Uint8Array.of(0, 65, 0x20, 5), new Uint8Array(4));
    expect(fault).toEqual({ byte: 2, why: "a copy reaches back before the first byte" });
  });

  test("comes to an end for any bytes", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 60 }), fc.nat(400), (packed, size) => {
        const fault = unpackLzf(packed, new Uint8Array(size));
        expect(fault === null || fault.byte <= packed.length).toBe(true);
      }),
    );
  });
});
