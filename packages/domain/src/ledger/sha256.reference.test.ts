import { createHash } from "node:crypto";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { z } from "zod";
import { readShared } from "../../vectors/shared-vectors.ts";
import { fromHex, toHex } from "./hex.ts";
import { sha256 } from "./sha256.ts";
import { utf8 } from "./utf8.ts";

const Vectors = z.object({
  cases: z.array(z.object({ id: z.string(), msg_hex: z.string(), sha256: z.string() })).min(10),
});

describe("SHA-256 against FIPS 180-4", () => {
  test.each([
    ["", "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855"],
    ["abc", "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad"],
    [
      "abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq",
      "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1",
    ],
  ])("gives the standard's digest of %j", (text, digest) => {
    expect(toHex(sha256(utf8(text)))).toBe(digest);
  });

  test("gives the standard's digest of a million letters a", () => {
    expect(toHex(sha256(new Uint8Array(1_000_000).fill(0x61)))).toBe(
      "cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0",
    );
  });

  test("agrees with the NIST CAVP short and long messages", () => {
    const text = readShared("reference/vectors/hash/sha256.json");
    if (text === undefined) return;
    for (const { id, msg_hex, sha256: digest } of Vectors.parse(JSON.parse(text)).cases) {
      expect(toHex(sha256(fromHex(msg_hex))), id).toBe(digest);
    }
  });

  test("agrees with another implementation for any bytes, also inside a larger buffer", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 300 }), fc.nat(70), (bytes, skip) => {
        const part = bytes.subarray(Math.min(skip, bytes.length));
        expect(toHex(sha256(part))).toBe(createHash("sha256").update(part).digest("hex"));
      }),
    );
  });
});

describe("bytes and texts", () => {
  test("reads hex of either case and refuses anything else", () => {
    expect(fromHex("00fFa0")).toEqual(Uint8Array.of(0, 255, 160));
    expect(() => fromHex("abc")).toThrow(RangeError);
    expect(() => fromHex("zz")).toThrow(RangeError);
  });

  test("writes any whole text as UTF-8, as another implementation does", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary" }), (text) => {
        expect(utf8(text)).toEqual(new TextEncoder().encode(text));
      }),
    );
  });

  test("refuses half a surrogate pair", () => {
    expect(() => utf8("a\ud800b")).toThrow(/half of one at 1/);
    expect(() => utf8("\udc00\ud800")).toThrow(RangeError);
  });
});
