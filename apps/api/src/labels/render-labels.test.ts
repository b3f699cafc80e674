import { LABEL_LAYOUTS, placeLabels } from "@beadroll/domain/labels/label-sheets";
import { mintTag } from "@beadroll/domain/tags/tag";
import { createCanvas } from "@napi-rs/canvas";
import jsQRModule from "jsqr";
import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";
import { describe, expect, it } from "vitest";
import { type LabelOrder, renderLabels } from "./render-labels.ts";

// jsqr is CommonJS whose function is its default export; its types and Node's view of it differ.
const jsQR = (jsQRModule as unknown as { default: typeof jsQRModule.default }).default;

const tag = (kind: "P" | "S", seed: number) =>
  mintTag(
    kind,
    Uint8Array.from({ length: 8 }, (_, i) => (seed * 37 + i * 11) % 256),
  );
const order = (fields: Partial<LabelOrder> = {}): LabelOrder => ({
  public_url: "http://localhost:8080",
  layout: "sheet-a4-3x8",
  width_mm: 62,
  height_mm: 29,
  start: 1,
  what: "all",
  part: {
    tag: tag("P", 1),
    name: "Skid frame with an uncommonly long title 0418",
    serial: "0418",
    drawing_number: "FW-2210",
    drawing_revision: "C",
    order_no: "41-2207",
  },
  seams: Array.from({ length: 7 }, (_, i) => ({
    tag: tag("S", i + 2),
    number: `S${i + 1}`,
    joint_type: "fillet_t",
    weld_size_mm: 5,
  })),
  ...fields,
});

interface Picture {
  readonly data: Uint8ClampedArray;
  readonly width: number;
  readonly height: number;
}

/** Pages of a PDF as pictures, by an independent reader. */
async function pictures(pdf: Buffer, dpi: number): Promise<Picture[]> {
  const document = await getDocument({ data: new Uint8Array(pdf), verbosity: 0 }).promise;
  const pages: Picture[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const viewport = page.getViewport({ scale: dpi / 72 });
    const canvas = createCanvas(Math.ceil(viewport.width), Math.ceil(viewport.height));
    // pdf.js draws on anything with a canvas' methods; its types know only the browser's own.
    await page.render({ canvas: canvas as never, canvasContext: canvas.getContext("2d") as never, viewport })
      .promise;
    const { width, height } = canvas;
    pages.push({ data: canvas.getContext("2d").getImageData(0, 0, width, height).data, width, height });
  }
  return pages;
}

interface Region {
  readonly x_mm: number;
  readonly y_mm: number;
  readonly width_mm: number;
  readonly height_mm: number;
}

/** The code in a region of a page, as a phone held over it sees it; null when it reads none. */
function codeIn(page: Picture, region: Region, dpi: number): string | null {
  const [x0, y0] = [Math.round((region.x_mm / 25.4) * dpi), Math.round((region.y_mm / 25.4) * dpi)];
  const width = Math.min(page.width - x0, Math.round((region.width_mm / 25.4) * dpi));
  const height = Math.min(page.height - y0, Math.round((region.height_mm / 25.4) * dpi));
  const data = new Uint8ClampedArray(width * height * 4);
  for (let y = 0; y < height; y += 1) {
    const from = ((y0 + y) * page.width + x0) * 4;
    data.set(page.data.subarray(from, from + width * 4), y * width * 4);
  }
  return jsQR(data, width, height, { inversionAttempts: "dontInvert" })?.data ?? null;
}

/** What a phone reads that is moved over every label, one after the other. */
async function codesOf(asked: LabelOrder, dpi: number): Promise<(string | null)[]> {
  const pages = await pictures(await renderLabels(asked), dpi);
  const count = expected(asked).length;
  return placeLabels(count, asked).flatMap((boxes, i) =>
    boxes.map((box) => codeIn(pages[i] as Picture, box, dpi)),
  );
}

const expected = (asked: LabelOrder): string[] => {
  const seams = asked.seams.map((seam) => seam.tag);
  const tags = {
    all: [asked.part.tag, ...seams],
    part: [asked.part.tag],
    seams,
    strip: [asked.part.tag, ...seams],
  }[asked.what];
  return tags.map((each) => `HTTP://LOCALHOST:8080/T/${each}`);
};

describe("labels printed as PDF", () => {
  it.each(LABEL_LAYOUTS)(
    "carry on the layout %s codes that an independent reader reads, each leading to its tag",
    async (layout) => {
      const asked = order({ layout, what: "all" });
      expect(await codesOf(asked, 200)).toEqual(expected(asked));
    },
  );

  it("carry a strip of seam codes that are read one by one", async () => {
    const asked = order({ what: "strip" });
    const [page] = await pictures(await renderLabels(asked), 300);
    const [boxes = []] = placeLabels(2, asked);
    const found = new Set<string>();
    for (const box of boxes) {
      // A phone that is moved along the strip, a little more than one code in view.
      for (let x_mm = box.x_mm; x_mm + 14 <= box.x_mm + box.width_mm; x_mm += 1) {
        const region = {
          x_mm,
          y_mm: box.y_mm + box.height_mm * 0.54,
          width_mm: 14,
          height_mm: box.height_mm * 0.46,
        };
        const code = codeIn(page as Picture, region, 300);
        if (code) found.add(code);
      }
      const head = codeIn(page as Picture, { ...box, height_mm: box.height_mm * 0.54 }, 300);
      if (head) found.add(head);
    }
    expect([...found].sort()).toEqual(expected(asked).sort());
  });

  it("are one page each on a label printer, in its size", async () => {
    const asked = order({ layout: "single", width_mm: 62, height_mm: 29 });
    const pages = await pictures(await renderLabels(asked), 254);
    expect(pages.length).toBe(8);
    expect([pages[0]?.width, pages[0]?.height]).toEqual([620, 290]);
  });

  it("are refused where a code would be too small to be read, naming what it needs", async () => {
    const small = order({ layout: "single", width_mm: 30, height_mm: 9 });
    expect(() => renderLabels(small)).toThrow(/it needs \d+ mm/);
    expect(() => renderLabels(order({ start: 25 }))).toThrow(/1 to 24/);
  });
});
