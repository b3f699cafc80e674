import { type ReactElement, useEffect, useState } from "react";
import { StateShapeIcon } from "../../kit/states/state-shape.tsx";
import { refusalWords, type SignInRefusal, waitWords } from "./refusal-words.ts";

/** Why somebody was not let in, above the button: it belongs to both fields. */
export function RefusalNote(props: { refusal: SignInRefusal }): ReactElement {
  const { refusal } = props;
  const wait_s = refusal.why === "wait" ? refusal.wait_s : null;
  return (
    <div>
      <p role="alert" className="flex gap-2.5 font-medium text-stop">
        <span className="mt-[5px] shrink-0">
          <StateShapeIcon shape="diamond" size={12} />
        </span>
        {refusalWords(refusal)}
      </p>
      {wait_s === null ? null : <TimeLeft wait_s={wait_s} />}
    </div>
  );
}

/** The time that is left, for the eye alone: read out each second it would drown everything else. */
function TimeLeft(props: { wait_s: number }): ReactElement {
  const left = useSecondsLeft(props.wait_s);
  return (
    <p aria-hidden="true" className="mt-1 pl-[1.375rem] text-ash tabular-nums">
      {left > 0 ? `${waitWords(left)} left` : "You can try again now."}
    </p>
  );
}

/** Counts down by the clock, so that a screen that slept does not wait twice. */
function useSecondsLeft(wait_s: number): number {
  const [until_ms] = useState(() => Date.now() + wait_s * 1000);
  const [now_ms, setNow] = useState(() => Date.now());
  // The clock is outside React.
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 1000);
    return () => clearInterval(timer);
  }, []);
  return Math.max(0, Math.ceil((until_ms - now_ms) / 1000));
}
