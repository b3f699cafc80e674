import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import {
  type LabelChoice,
  type LabelPart,
  type LabelSeam,
  labelsOf,
} from "@beadroll/domain/labels/label-content";
import { type LabelRequest, labelSheet, placeLabels } from "@beadroll/domain/labels/label-sheets";
import PDFDocument from "pdfkit";
import { refusal } from "../http/refusal.ts";
import { FONTS, LabelPainter } from "./label-painter.ts";

const POINTS_PER_MM = 72 / 25.4;
const require = createRequire(import.meta.url);
const font = (path: string): Buffer => readFileSync(require.resolve(`@fontsource/${path}-normal.woff`));

/** Labels to print: whose, which and how. */
export interface LabelOrder extends LabelRequest {
  /** What the codes begin with. */
  readonly public_url: string;
  readonly what: LabelChoice;
  readonly part: LabelPart;
  readonly seams: readonly LabelSeam[];
}

function place(count: number, order: LabelOrder): ReturnType<typeof placeLabels> {
  try {
    return placeLabels(count, order);
  } catch (error) {
    if (error instanceof RangeError) throw refusal("request-invalid", error.message, { field: "start" });
    throw error;
  }
}

/**
 * Labels as a PDF, codes drawn as rectangles so that they print sharp at any size.
 * @throws Refusal request-invalid when a code would be too small, or `start` is no place of the sheet
 */
export function renderLabels(order: LabelOrder): Promise<Buffer> {
  const labels = labelsOf(order.part, order.seams, order.what);
  const pages = place(labels.length, order);
  const sheet = labelSheet(order);
  const size: [number, number] = [sheet.page_width_mm * POINTS_PER_MM, sheet.page_height_mm * POINTS_PER_MM];
  const document = new PDFDocument({
    size,
    margin: 0,
    autoFirstPage: false,
    lang: "en",
    displayTitle: true,
    info: { Title: `Labels of ${order.part.name} (${order.part.tag})`, Creator: "Beadroll" },
  });
  document.registerFont(FONTS.title, font("barlow-condensed/files/barlow-condensed-latin-600"));
  document.registerFont(FONTS.text, font("barlow/files/barlow-latin-500"));
  document.registerFont(FONTS.code, font("spline-sans-mono/files/spline-sans-mono-latin-500"));
  const finished = collected(document);
  const painter = new LabelPainter(document, order.public_url);
  let next = 0;
  for (const boxes of pages) {
    document.addPage();
    for (const box of boxes) {
      const label = labels[next];
      if (label) painter.paint(label, box);
      next += 1;
    }
  }
  document.end();
  return finished;
}

function collected(document: PDFKit.PDFDocument): Promise<Buffer> {
  const chunks: Buffer[] = [];
  return new Promise((resolve, reject) => {
    document.on("data", (chunk: Buffer) => chunks.push(chunk));
    document.on("end", () => resolve(Buffer.concat(chunks)));
    document.on("error", reject);
  });
}
