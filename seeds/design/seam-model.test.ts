import { parseSeamModel } from "@beadroll/domain/schemas/seam-model";
import { describe, expect, test } from "vitest";
import { DRAWINGS } from "./design-events.ts";
import { seamModel, stationsOf } from "./seam-model.ts";
import { SKID_FRAME } from "./skid-frame.ts";

const everySeam = DRAWINGS.flatMap((product) => product.seams.map((seam) => ({ product, seam })));

describe("models of the demo seams", () => {
  test("are all taken by the model's own checks", () => {
    for (const { product, seam } of everySeam) {
      expect(parseSeamModel(JSON.parse(JSON.stringify(seamModel(product, seam))))).toMatchObject({
        ok: true,
      });
    }
  });

  test("state their limits, within inside adapt", () => {
    for (const { product, seam } of everySeam) {
      const { within, adapt } = seamModel(product, seam).limits ?? {};
      expect(within?.lateral_mm).toBeLessThan(adapt?.lateral_mm ?? 0);
      expect(within?.gap_mm).toBeLessThan(adapt?.gap_mm ?? 0);
    }
  });

  test("have a station every 5 mm and at the end", () => {
    expect(stationsOf(20)).toEqual([0, 5, 10, 15, 20]);
    expect(stationsOf(21.7)).toEqual([0, 5, 10, 15, 20, 21.7]);
    expect(stationsOf(20.3)).toEqual([0, 5, 10, 15, 20.3]);
  });

  test("include straights, arcs and rounded corners, and four kinds of joint", () => {
    expect(new Set(everySeam.map(({ seam }) => seam.joint))).toEqual(
      new Set(["fillet_t", "lap", "corner_open", "butt_v"]),
    );
    const turning = everySeam.filter(({ seam }) => {
      const [start, end] = [seam.line.frameAt(0), seam.line.frameAt(seam.line.length_mm)];
      return start.tangent[0] * end.tangent[0] + start.tangent[1] * end.tangent[1] < 0.9;
    });
    expect(turning.length).toBeGreaterThanOrEqual(8);
  });

  test("number the skid frame's seams S1 to S18 in welding sequence", () => {
    expect(SKID_FRAME.seams.map(({ number }) => number)).toEqual(
      Array.from({ length: 18 }, (_, i) => `S${i + 1}`),
    );
  });
});
