import type { ReactElement } from "react";
import { Button } from "../actions/button.tsx";
import { KeyValue } from "../page/key-value.tsx";
import { Sheet } from "../page/sheet.tsx";
import { EmptyState } from "../states/empty-state.tsx";
import { FaultPanel } from "../states/fault-panel.tsx";
import { Loading } from "../states/loading.tsx";
import { problemWords } from "../states/problem-words.ts";
import { Progress } from "../states/progress.tsx";
import { StateMark } from "../states/state-mark.tsx";
import { isStateName, STATE_LOOKS } from "../states/state-words.ts";
import { DayText, InstantText } from "../units/instant-text.tsx";
import { LengthText } from "../units/length-text.tsx";

const PROBLEM = problemWords({
  type: "/docs/api/problems#file-value-invalid",
  title: "A value is not a number",
  status: 422,
  detail: "The scan S4-fitup.csv was not taken: 2 values cannot be read.",
  instance: "0193782a-5c1e-7c3a",
  errors: [
    { code: "file-value-invalid", detail: 'Expected a number, found "12,4,1".', line: 418, field: "z_mm" },
    { code: "file-value-invalid", detail: "Expected a number, found nothing.", line: 1207, field: "x_mm" },
  ],
});

/** Every state's look, and what stands where something is missing, coming or failed. */
export function StateSpecimens(): ReactElement {
  return (
    <>
      <Sheet title="States">
        <div className="grid grid-cols-2 gap-x-6 gap-y-1.5 sm:grid-cols-4">
          {Object.keys(STATE_LOOKS)
            .filter(isStateName)
            .map((state) => (
              <StateMark key={state} state={state} />
            ))}
        </div>
        <div className="mt-4 flex flex-wrap gap-x-10 gap-y-2 border-t border-row pt-4">
          <StateMark large state="ready" word="Ready to weld S4" />
          <StateMark large state="not_ready" word="Not ready: wire lot missing" />
        </div>
      </Sheet>
      <Sheet title="Coming, working">
        <div className="grid gap-5">
          <Loading label="The roll" />
          <Progress label="Sending the scan" share={0.37} detail="3.1 of 8.4 MB" />
          <Progress label="Measuring 65 stations" />
        </div>
      </Sheet>
      <EmptyState title="No lots yet" action={<Button kind="primary">Record a lot</Button>}>
        Plates by heat number, wire and gas by lot number: everything that goes into a seam is recorded here
        as it comes in, with its certificate.
      </EmptyState>
      <FaultPanel problem={PROBLEM} onRetry={() => undefined} />
      <Sheet title="Lengths and times">
        <KeyValue
          rows={[
            { key: "Largest deviation", value: <LengthText length_mm={-3.41} signed /> },
            { key: "Not measured", value: <LengthText length_mm={null} /> },
            { key: "Welded", value: <InstantText at="2026-11-28T13:05:09.000Z" /> },
            { key: "Came in", value: <DayText day="2026-11-24" /> },
          ]}
        />
      </Sheet>
    </>
  );
}
