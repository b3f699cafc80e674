import { mintTag, Tag } from "@beadroll/domain/tags/tag";
import { describe, expect, it } from "vitest";
import { readTag, tagPlaces, unknownTag } from "./tag-reading.ts";

const SEAM = "S-8K3F7Q2NS";

describe("a tag as it was typed or scanned", () => {
  it.each([SEAM, "s8k3f7q2ns", "S 8K3F 7Q2N S", "HTTPS://WELD.EXAMPLE/T/S-8K3F7Q2NS"])("reads %s", (text) =>
    expect(readTag(text)).toEqual({ ok: true, tag: SEAM }),
  );

  it("shows two swapped neighbours and what it would be", () => {
    const places = tagPlaces("S-8K3F7Q2SN");
    expect(places?.suggestion).toBe(SEAM);
    expect(places?.places).toEqual([8, 9]);
    expect(places?.symbols).toBe("S8K3F7Q2SN");
  });

  it("shows the one symbol that tags do not use", () => {
    const places = tagPlaces("S-8K3F7U2NS");
    expect(places?.places).toEqual([6]);
    expect(places?.suggestion).toBe(SEAM);
  });

  it("says nothing of a place where several slips would explain it, or a length is wrong", () => {
    expect(tagPlaces("S-8K3F7Q2N")).toBeNull();
    const read = readTag("S-8K3F7Q2N");
    expect(read.ok ? null : read.fault).toMatchObject({ doubt: null, heading: "This tag is mistyped" });
  });

  it("agrees with the words of the fault on the suggestion", () => {
    const read = readTag("S-8K3F7Q2SN");
    if (read.ok || read.fault.doubt === null) throw new Error("expected a place of doubt");
    expect(read.fault.why).toContain(read.fault.doubt.suggestion);
  });
});

describe("a whole tag that nothing has", () => {
  it("names the kind that is missing", () =>
    expect(unknownTag(Tag.parse(SEAM)).heading).toBe("No seam here has this tag"));

  it("tells that a record pack is a file", () => {
    const pack = mintTag("K", new Uint8Array([1, 2, 3, 4, 5, 6, 7, 8]));
    expect(unknownTag(pack).todo).toContain("beadroll verify");
  });
});
