import type { ReactElement, ReactNode } from "react";
import { PATHS } from "../../app/paths.ts";
import { Button, ButtonLink } from "../../kit/actions/button.tsx";
import { Sheet } from "../../kit/page/sheet.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";

export interface FirstStepsProps {
  hasDrawing: boolean;
  hasPart: boolean;
  /** Records the cell; null for who may not. */
  onRecordCell: (() => void) | null;
  mayMakeKeys: boolean;
}

/** A fresh shop: what has to be recorded before a cell can send anything, in order, with what is done. */
export function FirstSteps(props: FirstStepsProps): ReactElement {
  return (
    <Sheet title="No cell is recorded yet">
      <p className="mb-3 max-w-prose text-ash">
        Here stands every cell with what it does. Four steps lead to its first seam; each can be done by
        whoever has the right to.
      </p>
      <ol>
        <Step
          number={1}
          title="Record a drawing"
          isDone={props.hasDrawing}
          action={<ButtonLink to={PATHS.drawingNew.path}>Record a drawing</ButtonLink>}
        >
          Its model seams say where each seam runs, which joint it is and how far it may be off.
        </Step>
        <Step
          number={2}
          title="Start a part"
          isDone={props.hasPart}
          action={
            props.hasDrawing ? <ButtonLink to={PATHS.partNew.path}>Start a part</ButtonLink> : undefined
          }
        >
          Made to the drawing, its seams are planned by themselves. Print its labels.
        </Step>
        <Step
          number={3}
          title="Record the cell"
          isDone={false}
          action={
            props.onRecordCell === null ? undefined : (
              <Button kind="primary" onClick={props.onRecordCell}>
                Record a cell
              </Button>
            )
          }
        >
          Its robot, power source and scanner.{" "}
          {props.onRecordCell === null ? "An administrator does this." : ""}
        </Step>
        <Step
          number={4}
          title="Give its computer a key"
          isDone={false}
          action={
            props.mayMakeKeys ? <ButtonLink to={PATHS.users.path}>Users and keys</ButtonLink> : undefined
          }
        >
          An administrator makes it. On the cell's computer, <code className="figures">beadroll enrol</code>{" "}
          takes it; from then on it can send scans and passes.
        </Step>
      </ol>
    </Sheet>
  );
}

function Step(props: {
  number: number;
  title: string;
  isDone: boolean;
  action: ReactNode;
  children: ReactNode;
}): ReactElement {
  return (
    <li className="grid grid-cols-[2.5rem_minmax(0,1fr)] items-start gap-x-2 gap-y-2 border-t border-row py-4 sm:grid-cols-[2.5rem_minmax(0,1fr)_auto]">
      <span className="font-title text-[1.75rem] leading-8 font-semibold text-ash">{props.number}</span>
      <div>
        <h3 className="flex flex-wrap items-baseline gap-x-4 text-lg leading-8">
          {props.title}
          {props.isDone ? (
            <span className="font-sans text-base">
              <StateMark tone="good" shape="tick" word="Done" />
            </span>
          ) : null}
        </h3>
        <p className="max-w-prose text-ash">{props.children}</p>
      </div>
      <div className="max-sm:col-start-2">{props.action}</div>
    </li>
  );
}
