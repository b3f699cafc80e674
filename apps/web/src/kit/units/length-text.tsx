import type { ReactElement } from "react";
import { formatDeviation, formatLength } from "./length-units.ts";
import { useLengthUnits } from "./units-context.tsx";

export interface LengthTextProps {
  length_mm: number | null;
  /** Decimals in mm; an inch gets one more. */
  decimals?: number;
  /** With its sign, as a deviation. */
  signed?: boolean;
}

/** A length in the units of this screen; a dash where there is none. */
export function LengthText(props: LengthTextProps): ReactElement {
  const units = useLengthUnits();
  if (props.length_mm === null) {
    return (
      <span className="text-ash">
        <span aria-hidden="true">–</span>
        <span className="sr-only">none</span>
      </span>
    );
  }
  const format = props.signed === true ? formatDeviation : formatLength;
  return (
    <span className="figures whitespace-nowrap">{format(props.length_mm, units, props.decimals ?? 2)}</span>
  );
}
