import type { LengthUnit } from "@beadroll/domain/measure/scan-cloud";
import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { SectionView } from "@beadroll/domain/schemas/section-view";

/** A scan file to be measured in this browser. */
export interface MeasureTask {
  readonly model: SeamModel;
  readonly stage: "fitup" | "bead";
  readonly scan: { readonly name: string; readonly bytes: ArrayBuffer };
  readonly poses: { readonly name: string; readonly bytes: ArrayBuffer } | null;
  readonly units: LengthUnit;
  /** Half-width of the scanner's stated accuracy, mm; null where it is not known. */
  readonly scanner_accuracy_mm: number | null;
}

/** What the worker is asked: to measure a file, or to cut the file measured last at a station. */
export type MeasureQuestion =
  | { readonly kind: "measure"; readonly task: MeasureTask }
  | { readonly kind: "section"; readonly station_mm: number };

/** What it answers. A scan that cannot be read is told with its faults as sentences. */
export type MeasureReply =
  | { readonly kind: "measured"; readonly result: ScanResult | BeadResult; readonly taken_ms: number }
  | { readonly kind: "refused"; readonly faults: readonly string[] }
  | { readonly kind: "section"; readonly section: SectionView };
