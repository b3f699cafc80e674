import { type ReactElement, useEffect, useState } from "react";
import { formatInstantExactly } from "../../kit/units/instants.ts";
import { sinceWords } from "./cell-words.ts";

/** How long ago something was; the instant itself on hover and for programs. */
export function SinceText(props: { at: string; now_ms: number }): ReactElement {
  return (
    <time dateTime={props.at} title={formatInstantExactly(props.at)} className="whitespace-nowrap">
      {sinceWords(props.at, props.now_ms)}
    </time>
  );
}

/** This screen's clock, read again every so often. */
export function useNow(every_ms: number): number {
  const [now_ms, setNow] = useState(() => Date.now());
  // The clock is outside React.
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), every_ms);
    return () => clearInterval(timer);
  }, [every_ms]);
  return now_ms;
}
