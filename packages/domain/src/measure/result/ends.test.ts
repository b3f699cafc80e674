import { describe, expect, it } from "vitest";
import { jointFaces } from "../joints/joint-faces.ts";
import type { MeasuredSeam } from "../seam/measure-seam.ts";
import type { SliceOutcome } from "../section/measure-slice.ts";
import { jointModel, SECTIONS } from "../testing/joints.ts";
import { endsOf } from "./ends.ts";

const joint = jointFaces(jointModel("fillet_t", SECTIONS.fillet_t));
const nought = {
  lateral_mm: 0,
  normal_mm: 0,
  gap_mm: 0,
  mismatch_mm: 0,
  angle_rad: 0,
  turn_a_rad: 0,
  turn_b_rad: 0,
};
const found: SliceOutcome = {
  found: true,
  result: { fits: [], at: nought, u: nought, seen_gap: null, tack: false },
};
const blind: SliceOutcome = { found: false, why: "few_points_b" };

/** Slices two millimetres apart from -6 mm on: `x` shows the joint, `.` does not. */
const seam = (shown: string): MeasuredSeam => ({
  joint,
  outside: 0,
  outcomes: [...shown].map((one) => (one === "x" ? found : blind)),
  slices: {
    count: shown.length,
    at_mm: Float64Array.from(shown, (_, i) => 2 * i - 6),
    starts: new Int32Array(shown.length + 1),
    l_mm: new Float64Array(0),
    n_mm: new Float64Array(0),
    pitch_mm: 2,
  },
});

describe("ends along the seam", () => {
  it("are seen where the scan runs on past them, half a pitch before the first slice that shows the joint", () => {
    expect(endsOf(seam("...xxxxxxx...."))).toEqual({
      start_mm: -1,
      end_mm: 13,
      start_seen: true,
      end_seen: true,
    });
  });

  it("are the scan's own where it stops with the joint", () => {
    expect(endsOf(seam("xxxxxxx"))).toEqual({ start_mm: -6, end_mm: 6, start_seen: false, end_seen: false });
  });

  it("are not believed of a single slice without the joint", () => {
    expect(endsOf(seam(".xxxxxx."))).toMatchObject({
      start_mm: -4,
      end_mm: 6,
      start_seen: false,
      end_seen: false,
    });
    expect(endsOf(seam("..xxxxxx.."))).toMatchObject({ start_seen: true, end_seen: true });
  });

  it("take a find alone beyond an end for chance", () => {
    expect(endsOf(seam("x...xxxxxx..x"))).toMatchObject({ start_mm: 1, end_mm: 13 });
  });

  it("are not found inside: a blind stretch is no end", () => {
    expect(endsOf(seam("xxx....xxx"))).toMatchObject({ start_mm: -6, end_mm: 12, start_seen: false });
  });

  it("are none where the joint is seen nowhere, or never twice running", () => {
    const none = { start_mm: null, end_mm: null, start_seen: false, end_seen: false };
    for (const shown of ["", ".", ".....", "x.x.x"]) expect(endsOf(seam(shown))).toEqual(none);
  });

  it("are both at the one slice there is", () => {
    expect(endsOf({ ...seam("x") })).toMatchObject({ start_mm: -6, end_mm: -6, start_seen: false });
  });
});
