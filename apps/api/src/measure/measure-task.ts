import type { Outcome } from "@beadroll/domain/faults/fault";
import type { LengthUnit } from "@beadroll/domain/measure/scan-cloud";
import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { PassResult } from "@beadroll/domain/schemas/pass-result";
import type { ProcedureRanges } from "@beadroll/domain/schemas/procedure";
import type { ScanRecord } from "@beadroll/domain/schemas/scan";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { SectionView } from "@beadroll/domain/schemas/section-view";

/** A scan's files on this machine. */
export interface ScanFiles {
  readonly scan: { readonly name: string; readonly path: string };
  readonly poses: { readonly name: string; readonly path: string } | null;
  readonly units: LengthUnit;
}

/** Work for a measuring worker. */
export type MeasureTask =
  | {
      readonly kind: "evaluate";
      readonly stage: ScanRecord["stage"];
      readonly files: ScanFiles;
      readonly model: SeamModel;
      readonly scanner_accuracy_mm: number | null;
    }
  | {
      readonly kind: "section";
      readonly stage: ScanRecord["stage"];
      readonly files: ScanFiles;
      readonly model: SeamModel;
      readonly station_mm: number;
    }
  | {
      readonly kind: "cloud";
      readonly files: ScanFiles;
      /** Points kept at most. */
      readonly most: number;
    }
  | {
      readonly kind: "pass";
      readonly log: { readonly name: string; readonly path: string };
      readonly process: string;
      readonly ranges: ProcedureRanges | null;
      readonly seam_length_mm: number;
    };

/** What a task gives. */
export type MeasureAnswer<T extends MeasureTask> = T["kind"] extends "evaluate"
  ? Outcome<ScanResult | BeadResult>
  : T["kind"] extends "section"
    ? Outcome<SectionView>
    : T["kind"] extends "cloud"
      ? Outcome<Uint8Array>
      : Outcome<PassResult>;
