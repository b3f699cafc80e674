/** One line of a page of text. */
export interface PdfLine {
  readonly text: string;
  readonly size_pt: number;
  /** Space above the line, points. */
  readonly above_pt: number;
}

const LEFT_PT = 56;
const TOP_PT = 790;

/** PDF strings keep these characters only behind a backslash (ISO 32000-1, 7.3.4.2). */
const escaped = (text: string): string => text.replace(/[\\()]/g, (symbol) => `\\${symbol}`);

function pageContent(lines: readonly PdfLine[]): string {
  let y_pt = TOP_PT;
  const drawn = lines.map(({ text, size_pt, above_pt }) => {
    y_pt -= size_pt + above_pt;
    return `BT /F1 ${size_pt} Tf ${LEFT_PT} ${y_pt} Td (${escaped(text)}) Tj ET`;
  });
  return drawn.join("\n");
}

/**
 * A small PDF of one A4 page of Helvetica text, written out by hand so that its bytes never change.
 * @param lines ASCII text; other characters are refused, as the font's encoding would show them wrong
 * @throws RangeError for a character outside ASCII
 * Source: ISO 32000-1, 7.5 (file structure).
 */
export function textPdf(lines: readonly PdfLine[]): Uint8Array {
  for (const { text } of lines) {
    if (!/^[\x20-\x7e]*$/.test(text)) throw new RangeError(`lines: expected ASCII, got "${text}"`);
  }
  const content = pageContent(lines);
  const objects = [
    "<< /Type /Catalog /Pages 2 0 R >>",
    "<< /Type /Pages /Kids [3 0 R] /Count 1 >>",
    "<< /Type /Page /Parent 2 0 R /MediaBox [0 0 595 842] /Contents 5 0 R /Resources << /Font << /F1 4 0 R >> >> >>",
    "<< /Type /Font /Subtype /Type1 /BaseFont /Helvetica >>",
    `<< /Length ${content.length} >>\nstream\n${content}\nendstream`,
  ];
  let file = "%PDF-1.4\n";
  const offsets = objects.map((object, i) => {
    const offset = file.length;
    file += `${i + 1} 0 obj\n${object}\nendobj\n`;
    return offset;
  });
  const table = offsets.map((offset) => `${String(offset).padStart(10, "0")} 00000 n \n`).join("");
  const size = objects.length + 1;
  const trailer = `trailer\n<< /Size ${size} /Root 1 0 R >>\nstartxref\n${file.length}\n%%EOF\n`;
  return new TextEncoder().encode(`${file}xref\n0 ${size}\n0000000000 65535 f \n${table}${trailer}`);
}
