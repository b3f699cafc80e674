import QRCode from "qrcode";

/** Quiet zone on each side, in modules (ISO/IEC 18004). */
const QUIET_MODULES = 4;
/** Smallest module a phone reads from a common label printer, mm (common practice, no source). */
export const SMALLEST_MODULE_MM = 0.25;

/** A QR code as rectangles to fill: one a run of dark modules. */
export interface QrDrawing {
  /** Modules a side with the quiet zone. */
  readonly modules: number;
  readonly runs: readonly { readonly row: number; readonly column: number; readonly length: number }[];
}

/** A text as a QR code of error-correction level Q: a quarter of the symbol may be lost. */
export function qrDrawing(text: string): QrDrawing {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: "Q" });
  const runs: { row: number; column: number; length: number }[] = [];
  for (let row = 0; row < modules.size; row += 1) {
    let begun = -1;
    for (let column = 0; column <= modules.size; column += 1) {
      const dark = column < modules.size && modules.get(row, column) === 1;
      if (dark && begun < 0) begun = column;
      if (!dark && begun >= 0) {
        runs.push({ row: row + QUIET_MODULES, column: begun + QUIET_MODULES, length: column - begun });
        begun = -1;
      }
    }
  }
  return { modules: modules.size + 2 * QUIET_MODULES, runs };
}
