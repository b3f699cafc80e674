// Measures every scan of the scenario and counts the verdicts, to see whether the shop still tells what it should:
//   npx esbuild seeds/check-scenario.ts --bundle --platform=node --format=esm | node --input-type=module - [seed]
import { evaluateBead } from "@beadroll/domain/measure/bead/evaluate-bead";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { readScan } from "@beadroll/domain/measure/read/read-scan";
import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import { ISO_5817_CURRENT } from "@beadroll/domain/quality/iso-5817/limit";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import type { DemoEvent } from "./demo-event.ts";
import { demoEvents } from "./demo-scenario.ts";
import { intendedFit } from "./production/cell-events.ts";
import { PARTS } from "./production/part-plan.ts";
import { isFlawed } from "./production/welds.ts";
import { CELLS } from "./shop/cells.ts";

type Scan = Extract<DemoEvent, { kind: "scan" }>;

interface Measured {
  readonly name: string;
  readonly joint: string;
  readonly intended: string;
  readonly verdict: string;
  readonly why: string;
}

/** What the joint was made to be, in the words of a verdict. */
function intention(seed: number, { seam, file, fields }: Scan): string {
  if (fields.stage === "bead") return isFlawed(seam.part, seam.number) ? "hold" : "within";
  const fit = intendedFit(seed, seam, file.name.endsWith("-2.ply"));
  if (fit === "near") return "within";
  return fit === "off" ? "adapt" : "hold";
}

function measure(seed: number, event: Scan, model: SeamModel): Measured {
  const scanner_accuracy_mm = CELLS.find(({ ref }) => ref === event.cell)?.fields.scanner_accuracy_mm ?? 0;
  const read = readScan({ ...event.file, units: "mm" });
  const evaluated = (cloud: ScanCloud) =>
    event.fields.stage === "bead" && model.weld
      ? evaluateBead(model, cloud, { scanner_accuracy_mm, requirement: model.weld })
      : evaluateScan(model, cloud, { scanner_accuracy_mm });
  const result = read.ok ? evaluated(read.value) : read;
  return {
    name: event.file.name,
    joint: event.fields.stage === "bead" ? `finished ${model.joint_type}` : model.joint_type,
    intended: intention(seed, event),
    verdict: result.ok ? result.value.verdict : "refused",
    why: result.ok
      ? result.value.reasons.map((reason) => (typeof reason === "string" ? reason : reason.text)).join("; ")
      : result.faults.map(({ detail }) => detail).join("; "),
  };
}

function counted(values: readonly string[]): string {
  const counts = new Map<string, number>();
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts].map(([value, count]) => `${value} ${count}`).join(", ");
}

function report(measured: readonly Measured[], seconds: number): string {
  const strange = measured.filter(({ intended, verdict }) => intended !== verdict);
  return [
    `${measured.length} scans measured in ${seconds.toFixed(1)} s`,
    `verdicts: ${counted(measured.map(({ verdict }) => verdict))}`,
    `meant as: ${counted(measured.map(({ intended }) => intended))}`,
    ...[...new Set(measured.map(({ joint }) => joint))].map(
      (joint) =>
        `  ${joint}: ${counted(measured.filter((each) => each.joint === joint).map((each) => each.verdict))}`,
    ),
    `not as meant: ${strange.length}`,
    ...strange.map(
      ({ name, joint, intended, verdict, why }) => `  ${name} ${joint}: ${intended}, is ${verdict}: ${why}`,
    ),
    "",
  ].join("\n");
}

const seed = Number(process.argv[2] ?? 1);
const models = new Map<string, SeamModel>();
const measured: Measured[] = [];
const began_ms = performance.now();
for (const event of demoEvents({ seed, ends_at: "2026-12-01T14:00:00.000Z" })) {
  if (event.kind === "model-seam") {
    const { number, model, weld_size_mm, quality_level } = event.fields;
    const weld = { weld_size_mm, quality_level, edition: ISO_5817_CURRENT };
    models.set(`${event.drawing} ${number}`, { ...model, weld });
  }
  if (event.kind !== "scan") continue;
  const drawing = PARTS.find(({ ref }) => ref === event.seam.part)?.product.ref ?? "";
  const model = models.get(`${drawing} ${event.seam.number}`);
  if (model !== undefined) measured.push(measure(seed, event, model));
}
process.stdout.write(report(measured, (performance.now() - began_ms) / 1000));
