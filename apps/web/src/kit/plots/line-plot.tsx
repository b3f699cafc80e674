import type { ReactElement } from "react";
import type { PlotSpec } from "./plot-spec.ts";
import { PlotStack } from "./plot-stack.tsx";

export interface LinePlotProps {
  label: string;
  plot: PlotSpec;
  length_mm: number;
  height?: number;
}

/** One quantity along the seam, with its limits, its uncertainty and its numbers as a table. */
export function LinePlot(props: LinePlotProps): ReactElement {
  return (
    <PlotStack
      label={props.label}
      plots={[props.plot]}
      length_mm={props.length_mm}
      height={props.height ?? 140}
    />
  );
}
