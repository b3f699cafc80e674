import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { ReactElement } from "react";

/** The reasons after the first, which is the heading, and what a person should know besides. */
export function Reasons(props: { result: ScanResult }): ReactElement | null {
  const { reasons, warnings } = props.result;
  const [, ...more] = reasons;
  if (more.length === 0 && warnings.length === 0) return null;
  return (
    <ul className="mb-3 grid gap-0.5">
      {more.map((reason) => (
        <li key={`${reason.check} ${reason.level} ${reason.station_mm}`}>{reason.text}</li>
      ))}
      {warnings.map((note) => (
        <li key={note} className="text-ash">
          {note}
        </li>
      ))}
    </ul>
  );
}
