import type { ReactElement, ReactNode } from "react";
import { Button } from "../actions/button.tsx";
import type { ProblemWords } from "./problem-words.ts";
import { StateShapeIcon } from "./state-shape.tsx";

export interface FaultPanelProps {
  problem: ProblemWords;
  onRetry?: () => void;
  /** Another way on, such as a link to the list. */
  children?: ReactNode;
}

/** What happened, what is safe, what to do; a part that failed says it in its own place. */
export function FaultPanel(props: FaultPanelProps): ReactElement {
  const { problem } = props;
  return (
    <div
      role="alert"
      className="rounded-sm border border-l-[3px] border-rule border-l-stop bg-sheet px-[1.125rem] py-4"
    >
      <h3 className="flex items-center gap-2.5 text-lg text-stop">
        <StateShapeIcon shape="diamond" size={14} />
        {problem.title}
      </h3>
      <p className="mt-1">{problem.detail}</p>
      {problem.faults.length === 0 ? null : (
        <ul className="mt-3 border-t border-row">
          {problem.faults.map((fault) => (
            <li key={`${fault.place} ${fault.detail}`} className="flex gap-4 border-b border-row py-1.5">
              {fault.place === null ? null : (
                <span className="figures shrink-0 leading-[1.375rem] text-ash">{fault.place}</span>
              )}
              <span>{fault.detail}</span>
            </li>
          ))}
        </ul>
      )}
      <p className="mt-3">
        <span className="font-semibold">What is safe:</span> {problem.safe}
      </p>
      <p>
        <span className="font-semibold">What to do:</span> {problem.todo}
      </p>
      <div className="screen-only mt-4 flex flex-wrap items-center gap-3 empty:hidden">
        {props.onRetry === undefined ? null : <Button onClick={props.onRetry}>Try again</Button>}
        {props.children}
      </div>
      {problem.request_id === null ? null : (
        <p className="mt-3 text-sm text-ash">
          For the administrator: request <span className="figures">{problem.request_id}</span>
        </p>
      )}
    </div>
  );
}
