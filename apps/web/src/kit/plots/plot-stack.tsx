import { type PointerEvent, type ReactElement, type ReactNode, useMemo, useRef, useState } from "react";
import { Button } from "../actions/button.tsx";
import { useStationCursor } from "../cursor/cursor-context.tsx";
import { nearestStation } from "../cursor/nearest-station.ts";
import { useWidth } from "../page/use-width.ts";
import { formatLength, type LengthUnits } from "../units/length-units.ts";
import { useLengthUnits } from "../units/units-context.tsx";
import { linearScale, valueAt } from "./plot-frame.ts";
import { type PlotLayout, plotLayout } from "./plot-layout.ts";
import { indexAt, PlotRow } from "./plot-row.tsx";
import { inUnits, type PlotSpec, valueText } from "./plot-spec.ts";
import { PlotTable } from "./plot-table.tsx";
import { StationAxis } from "./station-axis.tsx";
import { type StationMark, StationMarks } from "./station-marks.tsx";

export interface PlotStackProps {
  /** What is plotted, such as "Seam S4". */
  label: string;
  plots: readonly PlotSpec[];
  /** Length of the seam; the axis runs from 0 to it. */
  length_mm: number;
  /** Findings, tacks, restarts: marked at their station. */
  marks?: readonly StationMark[];
  /** Drawn above the plots on the same axis, such as the bead strip with `inset={layout}`. */
  above?: (layout: PlotLayout) => ReactNode;
  /** Height of each plot in CSS pixels. */
  height?: number;
}

/** Plots of several quantities on one station axis, joined by one cursor, with their numbers as a table. */
export function PlotStack(props: PlotStackProps): ReactElement {
  const holder = useRef<HTMLDivElement>(null);
  const layout = plotLayout(useWidth(holder, 900));
  const units = useLengthUnits();
  const [cursor_mm, setCursor] = useStationCursor();
  const [isTable, setTable] = useState(false);
  const specs = useMemo(() => props.plots.map((spec) => inUnits(spec, units)), [props.plots, units]);
  const stations_mm = useMemo(() => longestAxis(props.plots), [props.plots]);
  const extent_mm = useMemo(() => [0, props.length_mm] as const, [props.length_mm]);
  const point = (event: PointerEvent<HTMLElement>) => {
    const box = holder.current?.getBoundingClientRect();
    if (box === undefined) return;
    const scale = linearScale(extent_mm, [layout.left, layout.width - layout.right]);
    const place_mm = valueAt(scale, event.clientX - box.left);
    setCursor(stations_mm[nearestStation(stations_mm, place_mm)] ?? null);
  };
  const toggle = <TableToggle isTable={isTable} onToggle={() => setTable(!isTable)} />;
  if (isTable) {
    return (
      <div className="min-w-0">
        {toggle}
        <PlotTable label={props.label} specs={specs} stations_mm={stations_mm} units={units} />
      </div>
    );
  }
  return (
    <div onPointerMove={point} onPointerDown={point} className="min-w-0 touch-pan-y">
      <div className="kit-plot-row">
        {toggle}
        <div ref={holder} className="min-w-0">
          {props.above?.(layout)}
          <StationMarks marks={props.marks ?? []} layout={layout} extent_mm={extent_mm} onPick={setCursor} />
        </div>
      </div>
      {specs.map((spec) => (
        <PlotRow
          key={spec.id}
          spec={spec}
          layout={layout}
          height={props.height ?? 84}
          extent_mm={extent_mm}
          cursor_mm={cursor_mm}
        />
      ))}
      <div className="kit-plot-row">
        <div className="figures text-ash max-md:hidden">
          {cursor_mm === null ? null : `at ${formatLength(cursor_mm, units, 1)}`}
        </div>
        <StationAxis
          label={props.label}
          layout={layout}
          extent_mm={extent_mm}
          stations_mm={stations_mm}
          cursor_mm={cursor_mm}
          onMove={setCursor}
          words={cursorWords(specs, cursor_mm, units)}
        />
      </div>
    </div>
  );
}

function TableToggle(props: { isTable: boolean; onToggle: () => void }): ReactElement {
  return (
    <div className="screen-only -ml-4">
      <Button kind="quiet" onClick={props.onToggle}>
        {props.isTable ? "Show as plots" : "Show as table"}
      </Button>
    </div>
  );
}

/** The stations of the plot that has most of them; the cursor stops at these. */
function longestAxis(plots: readonly PlotSpec[]): readonly number[] {
  return plots.reduce<readonly number[]>(
    (longest, plot) => (plot.stations_mm.length > longest.length ? plot.stations_mm : longest),
    [],
  );
}

/** Everything at the cursor in one sentence. */
function cursorWords(specs: readonly PlotSpec[], cursor_mm: number | null, units: LengthUnits): string {
  if (cursor_mm === null) return "nowhere yet";
  const values = specs.map((spec) => {
    const text = valueText(spec, indexAt(spec, cursor_mm)).replace("±", "plus or minus");
    return `${spec.title} ${text}${text === "not measured" ? "" : ` ${spec.unit}`}`;
  });
  return [`at ${formatLength(cursor_mm, units, 1)}`, ...values].join(", ");
}
