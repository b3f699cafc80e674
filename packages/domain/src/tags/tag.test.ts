import { describe, expect, test } from "vitest";
import { mintTag, TAG_PATTERN, Tag, tagKind, tagUrl } from "./tag.ts";

const bytes = (...values: number[]): Uint8Array => Uint8Array.from(values);
/** The eight symbols 8 K 3 F 7 Q 2 N by their Crockford values. */
const BODY = bytes(8, 19, 3, 15, 7, 23, 2, 21);

describe("minting tags", () => {
  test("writes kind, hyphen, eight symbols and the check character", () => {
    expect(mintTag("S", BODY)).toBe("S-8K3F7Q2NS");
  });

  test("lets the kind letter change the check character", () => {
    expect(mintTag("P", BODY)).toBe("P-8K3F7Q2NA");
  });

  test("takes the next body where the check character would be the letter U", () => {
    const oneBefore = bytes(8, 19, 3, 15, 7, 23, 2, 20);
    expect(mintTag("S", oneBefore)).toBe("S-8K3F7Q2NS");
  });

  test("uses the lower five bits of each byte, so that any random bytes serve", () => {
    expect(
      mintTag(
        "S",
        BODY.map((byte) => byte | 0xe0),
      ),
    ).toBe("S-8K3F7Q2NS");
  });

  test("refuses fewer than eight random bytes", () => {
    expect(() => mintTag("S", BODY.subarray(1))).toThrow(/at least 8 bytes, got 7/);
  });

  test("knows the kind of a tag", () => {
    expect(tagKind(mintTag("L", BODY))).toBe("L");
  });
});

describe("the written form", () => {
  test("passes the schema only with its check character", () => {
    expect(Tag.safeParse("S-8K3F7Q2NS").success).toBe(true);
    expect(Tag.safeParse("S-8K3F7Q2NT").success).toBe(false);
    expect(Tag.safeParse("P-8K3F7Q2NS").success).toBe(false);
  });

  test("is not met by lower case, a missing hyphen or a letter that tags leave out", () => {
    for (const text of ["s-8K3F7Q2NS", "S8K3F7Q2NS", "S-8K3F7Q2NU", "X-8K3F7Q2NS", "S-8K3F7Q2N"]) {
      expect(TAG_PATTERN.test(text), text).toBe(false);
      expect(Tag.safeParse(text).success, text).toBe(false);
    }
  });

  test("stands in the QR code behind the public address, all upper case", () => {
    const tag = mintTag("S", BODY);
    expect(tagUrl("https://weld.example/", tag)).toBe("HTTPS://WELD.EXAMPLE/T/S-8K3F7Q2NS");
    expect(tagUrl("http://127.0.0.1:8080", tag)).toBe("HTTP://127.0.0.1:8080/T/S-8K3F7Q2NS");
  });

  test("keeps the link inside QR's alphanumeric set", () => {
    expect(tagUrl("https://weld.example", mintTag("K", BODY))).toMatch(/^[0-9A-Z $%*+\-./:]+$/);
  });
});
