import { describe, expect, test } from "vitest";
import { parseTag } from "./parse-tag.ts";

function read(text: string): string {
  const outcome = parseTag(text);
  return outcome.ok
    ? outcome.value
    : outcome.faults.map((fault) => `${fault.code}: ${fault.detail}`).join("\n");
}

describe("reading a tag", () => {
  test.each([
    "S-8K3F7Q2NS",
    "s-8k3f7q2ns",
    "S8K3F7Q2NS",
    "  s 8k3f 7q2n s ",
    "S-8K3F-7Q2N-S",
    "S–8K3F7Q2NS",
    "HTTPS://WELD.EXAMPLE/T/S-8K3F7Q2NS",
    "https://weld.example/t/s-8k3f7q2ns/",
    "https://weld.example/beadroll/t/s-8k3f7q2ns?from=mail#top",
    "https://weld.example/t/s-8k3f7q2ns?next=/t/other",
    "/t/S-8K3F7Q2NS",
  ])("forgives %j", (text) => {
    expect(read(text)).toBe("S-8K3F7Q2NS");
  });

  test("reads O as 0, and I and L as 1", () => {
    expect(read("P-OOlOOIOl3")).toBe("P-001001013");
  });

  test("reads 1 and I as the kind letter L", () => {
    expect(read("L-8K3F7Q2NN")).toBe("L-8K3F7Q2NN");
    expect(read("1-8K3F7Q2NN")).toBe("L-8K3F7Q2NN");
    expect(read("i-8k3f7q2nn")).toBe("L-8K3F7Q2NN");
  });
});

describe("refusing a mistyped tag", () => {
  test("names swapped neighbours and the tag they would make", () => {
    expect(read("S-8K3F7Q2SN")).toBe(
      'tag-invalid: The check character does not match. Characters 9 and 10, "SN", may be swapped. Did you mean S-8K3F7Q2NS?',
    );
  });

  test("names a look-alike and the tag it would make", () => {
    expect(read("S-BK3F7Q2NS")).toBe(
      'tag-invalid: The check character does not match. Character 2, "B", may be misread. Did you mean S-8K3F7Q2NS?',
    );
  });

  test("names a character that tags leave out, its place, and what it must have been", () => {
    expect(read("S-8K3U7Q2NS")).toBe(
      'tag-invalid: Character 5, "U", is not used in tags (digits and letters without I, L, O, U). Did you mean S-8K3F7Q2NS?',
    );
  });

  test("names a letter that is no kind", () => {
    expect(read("5-8K3F7Q2NS")).toBe(
      'tag-invalid: Character 1, "5", is no kind letter (P, S, L, C, W or K). Did you mean S-8K3F7Q2NS?',
    );
  });

  test("names every strange character, not the first only", () => {
    expect(read("S-8K!F7Q?NS").split("\n")).toHaveLength(2);
  });

  test("says how many characters are missing or too many", () => {
    expect(read("S-8K3F7Q2N")).toContain("this has 9: 1 missing");
    expect(read("S-8K3F7Q2NSS2")).toContain("this has 12: 2 too many");
    expect(read("")).toContain("Nothing to read");
    expect(read(" - ")).toContain("Nothing to read");
  });

  test("does not guess where no single slip explains the check character", () => {
    expect(read("S-AAAAAAAA7")).toBe(
      "tag-invalid: The check character does not match, and no single slip explains it; read the tag again.",
    );
  });

  test("is not taken in by a link without a tag, or by any text at all", () => {
    expect(read("https://weld.example/parts/12")).toContain("tag-invalid");
    expect(read("https://weld.example/t/")).toContain("tag-invalid");
    expect(read("🔩".repeat(10)).split("\n")).toHaveLength(10);
    expect(read("S".repeat(5000))).toContain("tag-invalid");
  });

  test("points at a pictograph among good characters without failing", () => {
    expect(read("S-8K3🔩7Q2NS")).toContain("Did you mean S-8K3F7Q2NS?");
  });
});
