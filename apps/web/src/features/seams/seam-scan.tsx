import type { ScanPage } from "@beadroll/domain/schemas/scan";
import type { SeamPage } from "@beadroll/domain/schemas/seam";
import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { Sheet } from "../../kit/page/sheet.tsx";
import { EmptyState } from "../../kit/states/empty-state.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
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

function Reasons(props: { scan: ScanPage }): ReactElement | null {
  const [, ...more] = props.scan.result.reasons;
  const notes = props.scan.result.warnings;
  if (more.length === 0 && notes.length === 0) return null;
  return (
    <ul className="mb-3 grid gap-0.5">
      {more.map((reason) => (
        <li key={`${reason.check} ${reason.level} ${reason.station_mm}`}>{reason.text}</li>
      ))}
      {notes.map((note) => (
        <li key={note} className="text-ash">
          {note}
        </li>
      ))}
    </ul>
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
      <Sheet title={<StateMark state={scan.verdict} word={verdictSentence(scan)} />}>
        <Reasons scan={scan} />
        <SeamDrawings label={label} scan={scan} model={model} pass={pass} />
      </Sheet>
      <div className="xl:sticky xl:top-20">
        <Sheet title="Section at the cursor">
          <SectionAtCursor scan={scan} model={model} />
        </Sheet>
      </div>
    </div>
  );
}
