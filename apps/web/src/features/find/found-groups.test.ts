import type { Found } from "@beadroll/domain/schemas/find";
import { describe, expect, it } from "vitest";
import { foundGroups, foundPath, isCut, soleTagged } from "./found-groups.ts";

const found = (kind: Found["kind"], title: string, tag: string | null = null): Found => ({
  kind,
  title,
  tag,
  detail: "",
  id: "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77",
});

describe("what a search found", () => {
  it("is grouped by kind, the best match's kind first", () => {
    const groups = foundGroups([found("lot", "H48812"), found("part", "0418"), found("lot", "H48813")]);
    expect(groups.map(({ heading, items }) => [heading, items.length])).toEqual([
      ["Lots", 2],
      ["Parts", 1],
    ]);
  });

  it("leads to each thing's page, by tag or by id", () => {
    expect(foundPath(found("seam", "S4", "S-8K3F7Q2NS"))).toBe("/seams/S-8K3F7Q2NS");
    expect(foundPath(found("drawing", "FW-2210"))).toBe("/drawings/0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77");
    expect(foundPath(found("cell", "Cell 2", "C-8K3F7Q2N6"))).toBe("/?cell=C-8K3F7Q2N6");
  });

  it("goes straight to a thing only for its own tag, and only when nothing else was found", () => {
    const seam = found("seam", "S4", "S-8K3F7Q2NS");
    expect(soleTagged([seam], "S-8K3F7Q2NS")).toBe(seam);
    expect(soleTagged([seam], "S-00000000X")).toBeNull();
    expect(soleTagged([seam, found("part", "0418")], "S-8K3F7Q2NS")).toBeNull();
    expect(soleTagged([], "S-8K3F7Q2NS")).toBeNull();
  });

  it("says when there may be more of a kind", () => {
    const [few] = foundGroups([found("lot", "H1")]);
    const [many] = foundGroups(Array.from({ length: 12 }, (_, i) => found("lot", `H${i}`)));
    expect([few, many].map((group) => group && isCut(group))).toEqual([false, true]);
  });
});
