import type { Inspection } from "@beadroll/domain/schemas/inspection";
import type { ReactElement } from "react";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";

/** Methods in words beside their abbreviations (ISO 17635). */
export const METHOD_WORDS: Readonly<Record<Inspection["method"], string>> = {
  VT: "Visual",
  PT: "Penetrant",
  MT: "Magnetic particle",
  RT: "Radiographic",
  UT: "Ultrasonic",
};

/** The inspections of a seam, latest first. */
export function InspectionsList(props: { inspections: readonly Inspection[] }): ReactElement {
  if (props.inspections.length === 0) return <p className="text-ash">Not inspected yet.</p>;
  return (
    <ul className="grid gap-3">
      {props.inspections.map((inspection) => (
        <li key={inspection.id} className="grid gap-0.5">
          <span className="flex flex-wrap items-baseline justify-between gap-x-4">
            <StateMark state={inspection.result} />
            <span className="text-ash">
              {METHOD_WORDS[inspection.method]} ({inspection.method})
              {inspection.attempt > 1 ? `, repair ${inspection.attempt - 1}` : ""}
            </span>
          </span>
          {inspection.note === "" ? null : <span>{inspection.note}</span>}
          <span className="text-sm text-ash">
            {inspection.inspector_name}, <InstantText at={inspection.performed_at} />
          </span>
        </li>
      ))}
    </ul>
  );
}
