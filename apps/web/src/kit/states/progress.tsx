import { type ReactElement, useId } from "react";

export interface ProgressProps {
  /** What is being done, such as "Sending the scan". */
  label: string;
  /** 0 to 1; absent while it cannot be known. */
  share?: number;
  /** Figures beside it: "3.1 of 8.4 MB". */
  detail?: string;
}

/** Long work: what is being done, how far it is. */
export function Progress(props: ProgressProps): ReactElement {
  const id = useId();
  return (
    <div>
      <div className="mb-1 flex justify-between gap-4 text-sm">
        <span id={id}>{props.label}</span>
        {props.detail === undefined ? null : <span className="figures text-ash">{props.detail}</span>}
      </div>
      <progress
        aria-labelledby={id}
        className="kit-progress"
        max={1}
        {...(props.share === undefined ? {} : { value: props.share })}
      />
    </div>
  );
}
