import { describe, expect, it } from "vitest";
import { beadModel } from "../testing/beads.ts";
import { decodeCloud, encodeCloud } from "./cloud-codec.ts";
import { offModel } from "./off-model.ts";

const cloudOf = (count: number) => ({
  xyz_mm: Float64Array.from({ length: 3 * count }, (_, i) => i / 8),
  count,
  profiles: null,
  lost: 0,
});

describe("a cloud to be drawn", () => {
  it("comes back as it was sent, in 32 bits", () => {
    const { count, xyz_mm } = decodeCloud(encodeCloud(cloudOf(5), 100));
    expect([count, [...xyz_mm]]).toEqual([5, [...cloudOf(5).xyz_mm]]);
  });

  it("is thinned evenly and never shows more than asked", () => {
    const { count, xyz_mm } = decodeCloud(encodeCloud(cloudOf(1000), 300));
    expect(count).toBe(1000);
    expect(xyz_mm.length / 3).toBe(250);
    expect(xyz_mm[3]).toBe((3 * 4) / 8);
  });

  it("is refused when it is cut, or when nothing may be shown", () => {
    expect(() => decodeCloud(encodeCloud(cloudOf(5), 9).subarray(0, 30))).toThrow(/expected 5 points/);
    expect(() => decodeCloud(new Uint8Array(3))).toThrow(RangeError);
    expect(() => encodeCloud(cloudOf(5), 0)).toThrow(/most/);
  });

  it("knows how far each point lies from the nominal faces", () => {
    const off = offModel(beadModel("fillet_t"), [10, -5, 0, 50, -5, 0.7, 119, 0.4, 30, 60, -3, 3]);
    expect([...off].map((value) => Math.round(value * 100) / 100)).toEqual([0, 0.7, 0.4, 3]);
  });
});
