import type { LengthUnit } from "@beadroll/domain/measure/scan-cloud";
import type { BeadResult } from "@beadroll/domain/schemas/bead-result";
import { LENGTH_UNITS } from "@beadroll/domain/schemas/scan";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type ReactElement, useEffect, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { useStationCursor } from "../../kit/cursor/cursor-context.tsx";
import { ChoiceField } from "../../kit/fields/choice-field.tsx";
import { FileDrop } from "../../kit/fields/file-drop.tsx";
import { NumberField } from "../../kit/fields/number-field.tsx";
import { Sheet, SheetStack } from "../../kit/page/sheet.tsx";
import { SectionView } from "../../kit/section/section-view.tsx";
import { Progress } from "../../kit/states/progress.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { FinishedBead } from "../beads/finished-bead.tsx";
import { Reasons } from "../seams/scan-reasons.tsx";
import { SeamDrawings } from "../seams/seam-drawings.tsx";
import { verdictSentence } from "../seams/seam-words.ts";
import type { MeasureTask } from "./measure-task.ts";
import { type Measuring, useMeasuring } from "./use-measuring.ts";

const STAGES = [
  { value: "fitup", label: "the fit-up" },
  { value: "bead", label: "the finished bead" },
] as const;

/** Drops a scan file on a model seam and shows the result, in this browser, without storing it. */
export function MeasureHere(props: { model: SeamModel; number: string }): ReactElement {
  const [files, setFiles] = useState<readonly File[]>([]);
  const [stage, setStage] = useState<MeasureTask["stage"]>("fitup");
  const [units, setUnits] = useState<LengthUnit>("mm");
  const [accuracy_mm, setAccuracy] = useState<number | null>(null);
  const measuring = useMeasuring();
  const poses = files.find((file) => /pose/i.test(file.name));
  const scan = files.find((file) => file !== poses);
  const start = async () => {
    if (scan === undefined) return;
    measuring.measure({
      model: props.model,
      stage,
      scan: { name: scan.name, bytes: await scan.arrayBuffer() },
      poses: poses ? { name: poses.name, bytes: await poses.arrayBuffer() } : null,
      units,
      scanner_accuracy_mm: accuracy_mm,
    });
  };
  return (
    <SheetStack>
      <Sheet title="Measure here">
        <p className="mb-4 max-w-prose text-ash">
          A scan of this seam is measured in this browser by the same code as on the server. Nothing is sent
          and nothing is stored.
        </p>
        <div className="grid gap-4">
          <FileDrop
            label="Scan, and its poses where it needs them"
            name="scan"
            files={files}
            onChange={setFiles}
            accept=".csv,.json,.ply,.pcd,.xyz,.asc,.txt,.gz"
            multiple
            limit="PLY, PCD, XYZ, or profiles with poses.csv"
          />
          <div className="grid gap-x-8 gap-y-4 sm:grid-cols-3">
            <ChoiceField label="Taken of" name="stage" value={stage} onChange={setStage} options={STAGES} />
            <ChoiceField
              label="Written in"
              name="units"
              value={units}
              onChange={setUnits}
              options={LENGTH_UNITS.map((value) => ({ value, label: value }))}
            />
            <NumberField
              label="Scanner's accuracy, ±"
              name="scanner_accuracy_mm"
              unit="mm"
              limit="as its maker states it"
              optional
              value={accuracy_mm}
              onChange={setAccuracy}
            />
          </div>
          <div>
            <Button
              kind="primary"
              busy={measuring.isBusy}
              disabled={scan === undefined}
              onClick={() => void start()}
            >
              Measure it
            </Button>
          </div>
          {measuring.isBusy ? <Progress label="Measuring the scan" /> : null}
          <Faults faults={measuring.faults} />
        </div>
      </Sheet>
      <Found measuring={measuring} model={props.model} number={props.number} />
    </SheetStack>
  );
}

function Faults(props: { faults: readonly string[] }): ReactElement | null {
  if (props.faults.length === 0) return null;
  return (
    <div role="alert" className="rounded-sm border border-l-[3px] border-rule border-l-stop px-4 py-3">
      <p className="font-semibold text-stop">The scan cannot be measured</p>
      <ul className="mt-1">
        {props.faults.map((fault) => (
          <li key={fault}>{fault}</li>
        ))}
      </ul>
    </div>
  );
}

/** Where the section is cut before somebody moves the cursor. */
function worstStation(result: ScanResult | BeadResult): number {
  if ("stage" in result) return result.findings[0]?.station_mm ?? 0;
  return result.reasons[0]?.station_mm ?? 0;
}

function Found(props: { measuring: Measuring; model: SeamModel; number: string }): ReactElement | null {
  const { result, taken_ms, section, cut } = props.measuring;
  const [cursor_mm] = useStationCursor();
  const first = result === null ? 0 : worstStation(result);
  const station_mm = cursor_mm ?? first;
  // The section is cut in the worker; it is asked when the cursor rests.
  useEffect(() => {
    if (result === null) return undefined;
    const timer = setTimeout(() => cut(station_mm), 60);
    return () => clearTimeout(timer);
  }, [result, station_mm, cut]);
  if (result === null) return null;
  const label = `Seam ${props.number}`;
  const aside = taken_ms === null ? "" : `${result.points} points in ${Math.round(taken_ms)} ms, not stored`;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-6 xl:grid-cols-[minmax(0,1fr)_26rem]">
      {"stage" in result ? (
        <FinishedBead label={label} result={result} model={props.model} aside={aside} />
      ) : (
        <Sheet title={<StateMark state={result.verdict} word={verdictSentence(result)} />} aside={aside}>
          <Reasons result={result} />
          <SeamDrawings label={label} result={result} model={props.model} pass={null} />
        </Sheet>
      )}
      {section === null ? null : (
        <Sheet title="Section at the cursor">
          <SectionView section={section} height={300} />
        </Sheet>
      )}
    </div>
  );
}
