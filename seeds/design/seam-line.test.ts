import { describe, expect, test } from "vitest";
import { seamLine, straight } from "./seam-line.ts";

describe("a seam line", () => {
  test("of a straight runs along its heading with plate B on its left", () => {
    const frame = straight([10, 20, 3], 90, 100).frameAt(40);
    expect(frame.point[0]).toBeCloseTo(10, 12);
    expect(frame.point[1]).toBeCloseTo(60, 12);
    expect(frame.point[2]).toBe(3);
    expect(frame.lateral[0]).toBeCloseTo(-1, 12);
    expect(frame.normal).toEqual([0, 0, 1]);
  });

  test("adds up straights and arcs, a quarter turn of radius 20 being 31.416 mm", () => {
    const line = seamLine({ at_mm: [0, 0, 0], heading_deg: 0 }, [
      { straight_mm: 100 },
      { left_deg: 90, radius_mm: 20 },
      { straight_mm: 50 },
    ]);
    expect(line.length_mm).toBeCloseTo(181.416, 3);
    const end = line.frameAt(line.length_mm);
    expect(end.point[0]).toBeCloseTo(120, 9);
    expect(end.point[1]).toBeCloseTo(70, 9);
    expect(end.tangent[1]).toBeCloseTo(1, 9);
  });

  test("of an arc stays at its radius from the centre on the left", () => {
    const line = seamLine({ at_mm: [150, 0, 0], heading_deg: 90 }, [{ left_deg: 150, radius_mm: 150 }]);
    for (const station_mm of [0, 97, 250, line.length_mm]) {
      const { point, lateral } = line.frameAt(station_mm);
      expect(Math.hypot(point[0], point[1])).toBeCloseTo(150, 9);
      expect(point[0] + 150 * lateral[0]).toBeCloseTo(0, 9);
      expect(point[1] + 150 * lateral[1]).toBeCloseTo(0, 9);
    }
  });

  test("runs straight on before its start and beyond its end", () => {
    const line = straight([0, 0, 0], 0, 100);
    expect(line.frameAt(-5).point[0]).toBeCloseTo(-5, 12);
    expect(line.frameAt(107).point[0]).toBeCloseTo(107, 12);
  });

  test("refuses to be without steps", () => {
    expect(() => seamLine({ at_mm: [0, 0, 0], heading_deg: 0 }, [])).toThrow(RangeError);
  });
});
