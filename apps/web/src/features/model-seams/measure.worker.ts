/// <reference lib="webworker" />
import "../../app/content-policy.ts";
import type { Fault } from "@beadroll/domain/faults/fault";
import { beadSectionAt } from "@beadroll/domain/measure/bead/bead-section-at";
import { evaluateBead } from "@beadroll/domain/measure/bead/evaluate-bead";
import { measureBead } from "@beadroll/domain/measure/bead/measure-bead";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { readScan } from "@beadroll/domain/measure/read/read-scan";
import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import { measureSeam } from "@beadroll/domain/measure/seam/measure-seam";
import { sectionAt } from "@beadroll/domain/measure/section-at";
import type { BeadRequirement } from "@beadroll/domain/schemas/bead-requirement";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { SectionView } from "@beadroll/domain/schemas/section-view";
import type { MeasureQuestion, MeasureReply, MeasureTask } from "./measure-task.ts";

/** Cuts the scan measured last at a station. */
let cut: ((station_mm: number) => SectionView) | null = null;

const sentences = (faults: readonly Fault[]): string[] => faults.map(({ detail }) => detail);

/** First bytes of a gzip file (RFC 1952, 2.3.1). */
const GZIP_MARK = [0x1f, 0x8b] as const;

/** A file unpacked where it is packed, under its name without `.gz`. */
async function unpacked(file: {
  readonly name: string;
  readonly bytes: ArrayBuffer;
}): Promise<{ name: string; bytes: Uint8Array }> {
  const bytes = new Uint8Array(file.bytes);
  if (bytes[0] !== GZIP_MARK[0] || bytes[1] !== GZIP_MARK[1]) return { name: file.name, bytes };
  const stream = new Blob([bytes]).stream().pipeThrough(new DecompressionStream("gzip"));
  const whole = await new Response(stream).arrayBuffer();
  return { name: file.name.replace(/\.gz$/i, ""), bytes: new Uint8Array(whole) };
}

/** Measures as the server does, with the same code; nothing leaves this computer. */
async function measure(task: MeasureTask): Promise<MeasureReply> {
  const { units, scanner_accuracy_mm } = task;
  const began_ms = performance.now();
  cut = null;
  const scan = await unpacked(task.scan);
  const poses = task.poses && (await unpacked(task.poses));
  const cloud = readScan({ ...scan, units, ...(poses && { poses }) });
  if (!cloud.ok) return { kind: "refused", faults: sentences(cloud.faults) };
  const options = scanner_accuracy_mm === null ? {} : { scanner_accuracy_mm };
  const outcome =
    task.stage === "bead"
      ? evaluateBead(task.model, cloud.value, { ...options, requirement: requirementOf(task.model) })
      : evaluateScan(task.model, cloud.value, options);
  if (!outcome.ok) return { kind: "refused", faults: sentences(outcome.faults) };
  const taken_ms = performance.now() - began_ms;
  cut = cutting(task, cloud.value);
  return { kind: "measured", result: outcome.value, taken_ms };
}

/** The section under the cursor is cut from what was measured, which the result does not carry. */
function cutting({ stage, model }: MeasureTask, cloud: ScanCloud): (station_mm: number) => SectionView {
  if (stage === "bead") {
    const bead = measureBead(model, cloud, requirementOf(model).weld_size_mm);
    return (station_mm) => beadSectionAt(bead, station_mm);
  }
  const seam = measureSeam(model, cloud);
  return (station_mm) => sectionAt(seam, station_mm);
}

/** What the server's models always say of the weld. */
function requirementOf({ weld }: SeamModel): BeadRequirement {
  if (!weld) throw new RangeError("the model says nothing of the weld");
  return weld;
}

async function answer(question: MeasureQuestion): Promise<MeasureReply | null> {
  if (question.kind === "section") {
    return cut && { kind: "section", section: cut(question.station_mm) };
  }
  try {
    return await measure(question.task);
  } catch (error) {
    return { kind: "refused", faults: [`The file cannot be unpacked or measured: ${String(error)}`] };
  }
}

self.onmessage = async ({ data }: MessageEvent<MeasureQuestion>) => {
  const reply = await answer(data);
  if (reply) self.postMessage(reply);
};
