import type { CellCreate } from "@beadroll/domain/schemas/cell";
import type { Ref } from "../demo-event.ts";

/** The shop's two cells. */
export const CELLS: readonly { readonly ref: Ref; readonly fields: CellCreate }[] = [
  {
    ref: "cell-1",
    fields: {
      name: "Cell 1",
      robot: "Six-axis, 2.0 m, serial 7714",
      power_source: "500 A pulsed, serial 0093",
      scanner: "Laser line 100 mm, serial 2208",
      scanner_accuracy_mm: 0.03,
    },
  },
  {
    ref: "cell-2",
    fields: {
      name: "Cell 2",
      robot: "Six-axis, 1.6 m with turntable, serial 7802",
      power_source: "400 A pulsed, serial 0117",
      scanner: "Laser line 80 mm, serial 2231",
      scanner_accuracy_mm: 0.04,
    },
  },
];
