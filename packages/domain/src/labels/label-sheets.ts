/** Layouts that labels are printed in: common sheets, or one label a page for a label printer. */
export const LABEL_LAYOUTS = ["sheet-a4-3x8", "sheet-letter-3x10", "single"] as const;
export type LabelLayout = (typeof LABEL_LAYOUTS)[number];

/** A rectangle on a page, mm from its top left corner. */
export interface LabelBox {
  readonly x_mm: number;
  readonly y_mm: number;
  readonly width_mm: number;
  readonly height_mm: number;
}

/** A sheet of labels: page and grid, mm. */
export interface LabelSheet {
  readonly page_width_mm: number;
  readonly page_height_mm: number;
  readonly columns: number;
  readonly rows: number;
  readonly width_mm: number;
  readonly height_mm: number;
  readonly left_mm: number;
  readonly top_mm: number;
  /** From one label's left edge to the next one's. */
  readonly pitch_x_mm: number;
}

/** Sheets by the sizes that label stock is commonly sold in: 24 of 70 x 37 mm on A4, 30 of 2 5/8 x 1 in on Letter. */
const SHEETS: Readonly<Record<Exclude<LabelLayout, "single">, LabelSheet>> = {
  "sheet-a4-3x8": {
    page_width_mm: 210,
    page_height_mm: 297,
    columns: 3,
    rows: 8,
    width_mm: 70,
    height_mm: 37,
    left_mm: 0,
    top_mm: 0.5,
    pitch_x_mm: 70,
  },
  "sheet-letter-3x10": {
    page_width_mm: 215.9,
    page_height_mm: 279.4,
    columns: 3,
    rows: 10,
    width_mm: 66.675,
    height_mm: 25.4,
    left_mm: 4.7625,
    top_mm: 12.7,
    pitch_x_mm: 69.85,
  },
};

/** What is asked for: a layout, the size of a single label, and the first free place of a begun sheet, from 1. */
export interface LabelRequest {
  readonly layout: LabelLayout;
  readonly width_mm: number;
  readonly height_mm: number;
  readonly start: number;
}

/** The sheet of a layout; a single label is a sheet of one. */
export function labelSheet({ layout, width_mm, height_mm }: LabelRequest): LabelSheet {
  if (layout !== "single") return SHEETS[layout];
  return {
    page_width_mm: width_mm,
    page_height_mm: height_mm,
    columns: 1,
    rows: 1,
    width_mm,
    height_mm,
    left_mm: 0,
    top_mm: 0,
    pitch_x_mm: width_mm,
  };
}

/**
 * Places labels on pages, row by row from the first free place.
 * @param count labels, 0 or more
 * @returns pages, each with the boxes of its labels in order
 * @throws RangeError when `start` is no place of the sheet
 */
export function placeLabels(count: number, request: LabelRequest): LabelBox[][] {
  const sheet = labelSheet(request);
  const places = sheet.columns * sheet.rows;
  const first = request.layout === "single" ? 0 : request.start - 1;
  if (!Number.isInteger(first) || first < 0 || first >= places)
    throw new RangeError(`start: expected 1 to ${places}, got ${request.start}`);
  const pages: LabelBox[][] = [];
  for (let index = 0; index < count; index += 1) {
    const place = first + index;
    const page = Math.floor(place / places);
    const within = place % places;
    const boxes = pages[page] ?? [];
    boxes.push({
      x_mm: sheet.left_mm + (within % sheet.columns) * sheet.pitch_x_mm,
      y_mm: sheet.top_mm + Math.floor(within / sheet.columns) * sheet.height_mm,
      width_mm: sheet.width_mm,
      height_mm: sheet.height_mm,
    });
    pages[page] = boxes;
  }
  return pages;
}
