import type { ReactElement } from "react";
import { nearestStation } from "../cursor/nearest-station.ts";
import { pixelOf } from "./plot-frame.ts";
import type { PlotLayout } from "./plot-layout.ts";
import { PlotPicture, plotScales } from "./plot-picture.tsx";
import { bandOf, type PlotSpec, valueText } from "./plot-spec.ts";

interface PlotRowProps {
  spec: PlotSpec;
  layout: PlotLayout;
  height: number;
  extent_mm: readonly [number, number];
  cursor_mm: number | null;
}

/** One plot of a stack: its name, the value at the cursor, and the drawing. */
export function PlotRow(props: PlotRowProps): ReactElement {
  const { spec, cursor_mm } = props;
  const at = cursor_mm === null ? null : indexAt(spec, cursor_mm);
  const isBeyond = at !== null && bandOf(spec, at) === "beyond";
  return (
    <div className="kit-plot-row">
      <div className="flex items-baseline gap-x-2 max-md:pt-2 md:block md:pt-1">
        <h3 className="text-base leading-5">
          {spec.title} <span className="font-sans text-sm font-normal text-ash">{spec.unit}</span>
        </h3>
        <div
          className={`figures leading-4 max-md:ml-auto ${isBeyond ? "font-medium text-stop" : "text-ash"}`}
        >
          {at === null ? "\u00A0" : `${isBeyond ? "◆ " : ""}${valueText(spec, at)}`}
        </div>
      </div>
      <div className="relative">
        <PlotPicture spec={spec} layout={props.layout} height={props.height} extent_mm={props.extent_mm} />
        {cursor_mm === null || at === null ? null : <CursorMark {...props} at={at} cursor_mm={cursor_mm} />}
      </div>
    </div>
  );
}

/** The station of a plot nearest to the cursor. */
export function indexAt(spec: PlotSpec, cursor_mm: number): number {
  return nearestStation(spec.stations_mm, cursor_mm);
}

function CursorMark(props: PlotRowProps & { at: number; cursor_mm: number }): ReactElement {
  const scales = plotScales(props);
  const x = pixelOf(scales.x, props.cursor_mm);
  const value = props.spec.values[props.at];
  return (
    <svg
      aria-hidden="true"
      width={props.layout.width}
      height={props.height}
      className="screen-only pointer-events-none absolute inset-0 overflow-visible"
    >
      <line x1={x} x2={x} y1="-2" y2={props.height + 2} className="stroke-ink" strokeWidth="1" />
      {value === null || value === undefined ? null : (
        <circle
          cx={x}
          cy={pixelOf(scales.y, value)}
          r="3.5"
          className="fill-sheet stroke-ink"
          strokeWidth="2"
        />
      )}
    </svg>
  );
}
