import { temperColour } from "@beadroll/domain/quality/temper";
import type { Qualification } from "@beadroll/domain/schemas/person";
import type { ReactElement } from "react";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { DayText } from "../../kit/units/instant-text.tsx";
import { daysWords, validityOn } from "./validity.ts";

/** Time used, as a bar in the temper scale; the words beside it say the same. */
function TimeUsed(props: { share: number }): ReactElement {
  return (
    <svg aria-hidden="true" viewBox="0 0 100 6" preserveAspectRatio="none" className="h-1.5 w-full">
      <rect width="100" height="6" className="fill-rule" />
      <rect width={Math.min(1, props.share) * 100} height="6" fill={temperColour(props.share)} />
    </svg>
  );
}

/** The qualifications of a person, with the time that is left. */
export function Qualifications(props: { qualifications: readonly Qualification[] }): ReactElement {
  if (props.qualifications.length === 0) return <p className="text-ash">No qualification is recorded.</p>;
  const today = new Date().toISOString().slice(0, 10);
  return (
    <ul className="grid gap-4">
      {props.qualifications.map((qualification) => {
        const validity = validityOn(qualification, today);
        return (
          <li key={qualification.id} className="grid gap-1">
            <span className="flex flex-wrap items-baseline justify-between gap-x-4">
              <span>
                {qualification.standard}, process <span className="figures">{qualification.process}</span>,{" "}
                <span className="figures">{qualification.number}</span>
              </span>
              <StateMark state={validity.state} word={daysWords(validity)} />
            </span>
            <TimeUsed share={validity.share} />
            <span className="text-sm text-ash">
              {qualification.range} · <DayText day={qualification.issued_on} /> to{" "}
              <DayText day={qualification.valid_until} />
            </span>
          </li>
        );
      })}
    </ul>
  );
}
