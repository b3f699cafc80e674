import type { FitUpScanPage } from "@beadroll/domain/schemas/scan";
import type { SeamPage } from "@beadroll/domain/schemas/seam";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { Sheet } from "../../kit/page/sheet.tsx";
import { EmptyState } from "../../kit/states/empty-state.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { FinishedBead } from "../beads/finished-bead.tsx";
import { CloudView } from "../cloud-view/cloud-view.tsx";
import { ScanAdvice } from "./scan-advice.tsx";
import { Reasons } from "./scan-reasons.tsx";
import { SeamDrawings } from "./seam-drawings.tsx";
import { seamNumber, verdictSentence } from "./seam-words.ts";
import { seamQueries } from "./seams.queries.ts";
import { SectionAtCursor } from "./section-at-cursor.tsx";

/** The shown scan of a seam: verdict, strip, plots and the section at the cursor. */
export function SeamScan(props: { seam: SeamPage; scanId: string | null }): ReactElement {
  if (props.scanId === null) return <NoScan tag={props.seam.tag} />;
  return <ShownScan seam={props.seam} scanId={props.scanId} />;
}

function NoScan(props: { tag: string }): ReactElement {
  return (
    <Sheet>
      <EmptyState title="No scan yet">
        <p>
          The cell scans the joint before welding. Its computer pushes the scan, and the verdict stands here
          at once:
        </p>
        <pre className="figures overflow-x-auto text-sm">
          beadroll push scan --seam {props.tag} --scan profiles.csv
        </pre>
      </EmptyState>
    </Sheet>
  );
}

function ShownScan(props: { seam: SeamPage; scanId: string }): ReactElement {
  const { seam } = props;
  const { data: scan } = useSuspenseQuery(seamQueries.scan(props.scanId));
  const { data: model } = useSuspenseQuery(seamQueries.model(seam.model_seam.id));
  const label = `Seam ${seamNumber(seam.number, scan.attempt)}`;
  // A finished bead lies on the fit-up of its own attempt.
  const fitUp = seam.scans.find((one) => one.stage === "fitup" && one.attempt === scan.attempt) ?? null;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-6 xl:grid-cols-[minmax(0,1fr)_26rem]">
      {scan.stage === "bead" ? (
        <FinishedBead label={label} result={scan.result} model={model}>
          <CloudView key={scan.id} scanId={scan.id} model={model} />
        </FinishedBead>
      ) : (
        <FitUp label={label} scan={scan} seam={seam} model={model} />
      )}
      <div className="xl:sticky xl:top-20">
        <Sheet title="Section at the cursor">
          <SectionAtCursor
            scan={scan}
            model={model}
            fitUpId={scan.stage === "bead" ? (fitUp?.id ?? null) : null}
          />
        </Sheet>
      </div>
    </div>
  );
}

function FitUp(props: {
  label: string;
  scan: FitUpScanPage;
  seam: SeamPage;
  model: SeamModel;
}): ReactElement {
  const { scan, seam, model } = props;
  const pass = seam.passes.filter((each) => each.attempt === scan.attempt).at(-1) ?? null;
  return (
    <Sheet title={<StateMark state={scan.verdict} word={verdictSentence(scan.result)} />}>
      <Reasons result={scan.result} />
      <SeamDrawings label={props.label} result={scan.result} model={model} pass={pass} />
      <ScanAdvice scanId={scan.id} />
      <CloudView key={scan.id} scanId={scan.id} model={model} />
    </Sheet>
  );
}
