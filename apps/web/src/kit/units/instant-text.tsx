import type { ReactElement } from "react";
import { formatDay, formatInstant, formatInstantExactly } from "./instants.ts";

/** An instant as this place's clock showed it; the exact one on hover and for programs. */
export function InstantText(props: { at: string }): ReactElement {
  return (
    <time dateTime={props.at} title={formatInstantExactly(props.at)} className="whitespace-nowrap">
      {formatInstant(props.at)}
    </time>
  );
}

/** A day. */
export function DayText(props: { day: string }): ReactElement {
  return (
    <time dateTime={props.day} className="whitespace-nowrap">
      {formatDay(props.day)}
    </time>
  );
}
