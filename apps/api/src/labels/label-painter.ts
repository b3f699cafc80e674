import { groupedTag, type Label } from "@beadroll/domain/labels/label-content";
import type { LabelBox } from "@beadroll/domain/labels/label-sheets";
import { Tag, tagUrl } from "@beadroll/domain/tags/tag";
import { refusal } from "../http/refusal.ts";
import { type QrDrawing, qrDrawing, SMALLEST_MODULE_MM } from "./qr-drawing.ts";

const POINTS_PER_MM = 72 / 25.4;
const MARGIN_MM = 1.6;
/** Printers leave the edge of a page white, and outer labels end there. */
const RIGHT_MM = 3.5;
const GAP_MM = 1.8;
/** Share of a label's height that a strip of seam codes takes. */
const STRIP_SHARE = 0.46;
const INK = "#14181c";
const ASH = "#4e585e";

/** Fonts by the names they are registered under. */
export const FONTS = { title: "title", text: "text", code: "code" } as const;
type Font = (typeof FONTS)[keyof typeof FONTS];

interface Place {
  readonly x_mm: number;
  readonly y_mm: number;
  readonly width_mm: number;
}

/** Paints labels onto the current page of a document. */
export class LabelPainter {
  readonly #document: PDFKit.PDFDocument;
  readonly #publicUrl: string;

  constructor(document: PDFKit.PDFDocument, publicUrl: string) {
    this.#document = document;
    this.#publicUrl = publicUrl;
  }

  /** @throws Refusal when a code would be too small to be read */
  paint(label: Label, box: LabelBox): void {
    const strip_mm = label.strip.length > 0 ? box.height_mm * STRIP_SHARE : 0;
    this.#paintHead(label, { ...box, height_mm: box.height_mm - strip_mm });
    if (strip_mm > 0)
      this.#paintStrip(label.strip, {
        ...box,
        y_mm: box.y_mm + box.height_mm - strip_mm,
        height_mm: strip_mm,
      });
  }

  #paintHead(label: Label, box: LabelBox): void {
    const side_mm = Math.min(box.height_mm - MARGIN_MM, box.width_mm * 0.48);
    this.#qr(label.tag, box.x_mm + MARGIN_MM / 2, box.y_mm + (box.height_mm - side_mm) / 2, side_mm);
    const x_mm = box.x_mm + MARGIN_MM / 2 + side_mm + GAP_MM;
    const width_mm = box.x_mm + box.width_mm - RIGHT_MM - x_mm;
    const line_mm = Math.min(5.2, (box.height_mm - 2 * MARGIN_MM) / (label.lines.length + 2.6));
    const text_mm = line_mm * (label.lines.length + 2.5);
    let y_mm = box.y_mm + Math.max(MARGIN_MM, (box.height_mm - text_mm) / 2);
    this.#text(label.title, FONTS.title, { x_mm, y_mm, width_mm }, { size_mm: line_mm * 1.3, colour: INK });
    y_mm += line_mm * 1.45;
    this.#text(
      groupedTag(label.tag),
      FONTS.code,
      { x_mm, y_mm, width_mm },
      { size_mm: line_mm * 0.86, colour: INK },
    );
    y_mm += line_mm * 1.15;
    for (const line of label.lines) {
      this.#text(line, FONTS.text, { x_mm, y_mm, width_mm }, { size_mm: line_mm * 0.78, colour: ASH });
      y_mm += line_mm;
    }
  }

  #paintStrip(strip: Label["strip"], box: LabelBox): void {
    const number_mm = Math.min(3, box.height_mm * 0.22);
    const side_mm = Math.min(
      box.height_mm - number_mm - 0.4,
      (box.width_mm - 2 * MARGIN_MM) / Math.max(strip.length, 4),
    );
    const { x, y } = { x: (box.x_mm + MARGIN_MM) * POINTS_PER_MM, y: box.y_mm * POINTS_PER_MM };
    const right = (box.x_mm + box.width_mm - MARGIN_MM) * POINTS_PER_MM;
    this.#document.moveTo(x, y).lineTo(right, y).lineWidth(0.25).strokeColor(ASH).stroke();
    for (const [index, { tag, number }] of strip.entries()) {
      const x_mm = box.x_mm + MARGIN_MM + index * side_mm;
      this.#qr(tag, x_mm, box.y_mm + 0.2, side_mm);
      const place = { x_mm, y_mm: box.y_mm + side_mm - 0.1, width_mm: side_mm };
      this.#text(number, FONTS.title, place, { size_mm: number_mm, colour: INK, centred: true });
    }
  }

  #qr(tag: string, x_mm: number, y_mm: number, side_mm: number): void {
    const drawing = qrDrawing(tagUrl(this.#publicUrl, Tag.parse(tag)));
    const module_mm = side_mm / drawing.modules;
    if (module_mm < SMALLEST_MODULE_MM) refuseSmall(drawing, side_mm);
    const scale = module_mm * POINTS_PER_MM;
    for (const { row, column, length } of drawing.runs)
      this.#document.rect(
        x_mm * POINTS_PER_MM + column * scale,
        y_mm * POINTS_PER_MM + row * scale,
        length * scale,
        scale,
      );
    this.#document.fill("#000000");
  }

  /** One line: shrunk to fit, and cut with an ellipsis when shrinking would make it unreadable. */
  #text(
    text: string,
    font: Font,
    place: Place,
    look: { size_mm: number; colour: string; centred?: boolean },
  ): void {
    const width = place.width_mm * POINTS_PER_MM;
    const wanted = look.size_mm * POINTS_PER_MM;
    const document = this.#document.font(font).fontSize(wanted).fillColor(look.colour);
    const size = Math.max(
      wanted * 0.62,
      Math.min(wanted, (wanted * width) / Math.max(1, document.widthOfString(text))),
    );
    document.fontSize(size);
    let shown = text;
    while (shown.length > 1 && document.widthOfString(shown === text ? shown : `${shown}…`) > width + 0.01)
      shown = shown.slice(0, -1);
    const line = shown === text ? text : `${shown.trimEnd()}…`;
    const left = look.centred ? Math.max(0, (width - document.widthOfString(line)) / 2) : 0;
    document.text(line, place.x_mm * POINTS_PER_MM + left, place.y_mm * POINTS_PER_MM, { lineBreak: false });
  }
}

function refuseSmall(drawing: QrDrawing, side_mm: number): never {
  const needed_mm = Math.ceil(drawing.modules * SMALLEST_MODULE_MM + MARGIN_MM);
  throw refusal(
    "request-invalid",
    `The QR code would be ${side_mm.toFixed(1)} mm, too small to be read; it needs ${needed_mm} mm. Choose a larger label, or a shorter public URL.`,
    { field: "height_mm" },
  );
}
