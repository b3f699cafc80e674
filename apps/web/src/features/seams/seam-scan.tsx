import type { SeamPage } from "@beadroll/domain/schemas/seam";
import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { Sheet } from "../../kit/page/sheet.tsx";
import { EmptyState } from "../../kit/states/empty-state.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
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
  const pass = seam.passes.filter((each) => each.attempt === scan.attempt).at(-1) ?? null;
  const label = `Seam ${seamNumber(seam.number, scan.attempt)}`;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-6 xl:grid-cols-[minmax(0,1fr)_26rem]">
      <Sheet title={<StateMark state={scan.verdict} word={verdictSentence(scan.result)} />}>
        <Reasons result={scan.result} />
        <SeamDrawings label={label} result={scan.result} model={model} pass={pass} />
        {scan.stage === "fitup" ? <ScanAdvice scanId={scan.id} /> : null}
      </Sheet>
      <div className="xl:sticky xl:top-20">
        <Sheet title="Section at the cursor">
          <SectionAtCursor scan={scan} model={model} />
        </Sheet>
      </div>
    </div>
  );
}
