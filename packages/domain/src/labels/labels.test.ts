import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { groupedTag, labelsOf } from "./label-content.ts";
import { LABEL_LAYOUTS, type LabelRequest, labelSheet, placeLabels } from "./label-sheets.ts";

const part = {
  tag: "P-8K3F7Q2NA",
  name: "Skid frame 0418",
  serial: "0418",
  drawing_number: "FW-2210",
  drawing_revision: "C",
  order_no: "41-2207",
};
const seams = Array.from({ length: 8 }, (_, i) => ({
  tag: `S-00000000${i}`,
  number: `S${i + 1}`,
  joint_type: "fillet_t",
  weld_size_mm: 5,
}));

describe("labels on sheets", () => {
  const requests = fc.record({
    layout: fc.constantFrom(...LABEL_LAYOUTS),
    width_mm: fc.integer({ min: 20, max: 200 }),
    height_mm: fc.integer({ min: 12, max: 200 }),
    start: fc.integer({ min: 1, max: 24 }),
  });

  it("are all placed, inside the page, and never over each other", () => {
    fc.assert(
      fc.property(requests, fc.integer({ min: 0, max: 90 }), (request: LabelRequest, count) => {
        const sheet = labelSheet(request);
        const pages = placeLabels(count, request);
        expect(pages.flat().length).toBe(count);
        for (const boxes of pages) {
          const seen = new Set<string>();
          for (const { x_mm, y_mm, width_mm, height_mm } of boxes) {
            expect(x_mm + width_mm).toBeLessThanOrEqual(sheet.page_width_mm + 1e-9);
            expect(y_mm + height_mm).toBeLessThanOrEqual(sheet.page_height_mm + 1e-9);
            const column = (x_mm - sheet.left_mm) / sheet.pitch_x_mm;
            const row = (y_mm - sheet.top_mm) / sheet.height_mm;
            expect(Math.abs(column - Math.round(column)) + Math.abs(row - Math.round(row))).toBeLessThan(
              1e-9,
            );
            seen.add(`${Math.round(column)} ${Math.round(row)}`);
          }
          expect(seen.size).toBe(boxes.length);
          expect(sheet.pitch_x_mm).toBeGreaterThanOrEqual(sheet.width_mm);
        }
      }),
    );
  });

  it("begin at the first free place of a begun sheet", () => {
    const [boxes = []] = placeLabels(1, { layout: "sheet-a4-3x8", width_mm: 62, height_mm: 29, start: 5 });
    expect(boxes[0]).toMatchObject({ x_mm: 70, y_mm: 37.5 });
  });

  it("are refused a place that the sheet does not have", () => {
    const request = { layout: "sheet-a4-3x8", width_mm: 62, height_mm: 29, start: 25 } as const;
    expect(() => placeLabels(1, request)).toThrow(RangeError);
  });
});

describe("what labels say", () => {
  it("is the part first, then each seam with its joint and size", () => {
    const labels = labelsOf(part, seams, "all");
    expect(labels.length).toBe(9);
    expect(labels[0]).toMatchObject({
      tag: part.tag,
      title: "Skid frame 0418",
      lines: ["FW-2210 rev C", "Order 41-2207"],
    });
    expect(labels[1]).toMatchObject({
      title: "Seam S1",
      lines: ["Skid frame 0418", "T joint, a5", "FW-2210 rev C"],
    });
  });

  it("is a strip of seam codes under as many part labels as they need", () => {
    const labels = labelsOf(part, seams, "strip");
    expect(labels.map((label) => label.strip.length)).toEqual([6, 2]);
    expect(new Set(labels.map((label) => label.tag))).toEqual(new Set([part.tag]));
  });

  it("groups a tag in threes for reading aloud", () => {
    expect(groupedTag("S-8K3F7Q2NS")).toBe("S 8K3 F7Q 2NS");
  });
});
