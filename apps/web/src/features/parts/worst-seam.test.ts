import type { SeamRow } from "@beadroll/domain/schemas/seam";
import { describe, expect, it } from "vitest";
import { worstSeam } from "./worst-seam.tsx";

const seam = (number: string, state: SeamRow["state"], strip: SeamRow["strip"]): SeamRow => ({
  id: `0193782a-5c1e-7c3a-9d52-6b1f0e4c8a0${number.length}`,
  tag: "S-8K3F7Q2NS",
  number,
  attempt: 1,
  joint_type: "fillet_t",
  weld_size_mm: 5,
  length_mm: 100,
  state,
  verdict: "adapt",
  largest_mm: 1,
  heat_input_kj_mm: null,
  strip,
  part_tag: "P-8K3F7Q2NA",
  part_name: "Skid frame 0418",
  changed_at: "2026-11-30T09:41:07.250Z",
});

describe("the worst seam of a roll", () => {
  it("is a held one before any other, else the one that uses most of its limits, on either side", () => {
    const a = seam("S1", "accepted", [0.2, null, 0.4]);
    const b = seam("S2", "accepted", [-0.9, 0.1]);
    const held = seam("S3", "held", [0.3]);
    expect(worstSeam([a, b])?.number).toBe("S2");
    expect(worstSeam([a, b, held])?.number).toBe("S3");
  });

  it("is none where nothing was scanned", () => {
    expect(worstSeam([seam("S1", "planned", null)])).toBeNull();
    expect(worstSeam([])).toBeNull();
  });
});
