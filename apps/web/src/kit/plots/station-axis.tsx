import type { KeyboardEvent, ReactElement } from "react";
import { nearestStation } from "../cursor/nearest-station.ts";
import { indexAfterKey } from "../cursor/station-keys.ts";
import { formatFigure, formatLength, fromMm } from "../units/length-units.ts";
import { useLengthUnits } from "../units/units-context.tsx";
import { linearScale, pixelOf, roundTicks, tickDecimals } from "./plot-frame.ts";
import type { PlotLayout } from "./plot-layout.ts";

interface StationAxisProps {
  label: string;
  layout: PlotLayout;
  extent_mm: readonly [number, number];
  /** Stations that the cursor stops at, ascending. */
  stations_mm: readonly number[];
  cursor_mm: number | null;
  onMove: (station_mm: number) => void;
  /** All values at the cursor, read out. */
  words: string;
}

const HEIGHT = 36;

/** The axis under a stack of plots: its ticks, and the cursor as a slider for keys. */
export function StationAxis(props: StationAxisProps): ReactElement {
  const units = useLengthUnits();
  const { layout, extent_mm, cursor_mm, stations_mm } = props;
  const range: [number, number] = [layout.left, layout.width - layout.right];
  const scale = linearScale([fromMm(extent_mm[0], units), fromMm(extent_mm[1], units)], range);
  const ticks = roundTicks(scale.from[0], scale.from[1], Math.max(2, Math.floor((range[1] - range[0]) / 90)));
  const decimals = tickDecimals((ticks[1] ?? 1) - (ticks[0] ?? 0));
  const onKeyDown = (event: KeyboardEvent) => {
    const next = indexAfterKey(event.key, nearestStation(stations_mm, cursor_mm ?? 0), stations_mm.length);
    if (next === null) return;
    event.preventDefault();
    props.onMove(stations_mm[next] ?? 0);
  };
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={`Station, ${props.label}`}
      aria-valuemin={extent_mm[0]}
      aria-valuemax={extent_mm[1]}
      aria-valuenow={cursor_mm ?? extent_mm[0]}
      aria-valuetext={props.words}
      onKeyDown={onKeyDown}
      onFocus={() => cursor_mm === null && props.onMove(stations_mm[0] ?? 0)}
      className="rounded-sm"
    >
      <svg
        aria-hidden="true"
        width={layout.width}
        height={HEIGHT}
        viewBox={`0 0 ${layout.width} ${HEIGHT}`}
        className="kit-drawing"
      >
        <line x1={range[0]} x2={range[1]} y1="0.5" y2="0.5" className="stroke-ink" />
        {ticks.map((tick) => {
          const x = Math.round(pixelOf(scale, tick)) + 0.5;
          return (
            <g key={tick}>
              <line x1={x} x2={x} y1="0" y2="5" className="stroke-ink" />
              <text x={x} y="19" textAnchor="middle" className="fill-ash font-mono text-xs">
                {formatFigure(tick, decimals)}
              </text>
            </g>
          );
        })}
        <text x={range[1]} y="33" textAnchor="end" className="fill-ash text-xs">
          {`station, ${units}`}
        </text>
        {cursor_mm === null ? null : (
          <text x={range[0]} y="33" className="fill-ash font-mono text-xs md:hidden">
            {`at ${formatLength(cursor_mm, units, 1)}`}
          </text>
        )}
        {cursor_mm === null ? null : (
          <path
            transform={`translate(${pixelOf(scale, fromMm(cursor_mm, units))} 0)`}
            d="M0 1 5 9v5h-10v-5z"
            className="fill-ink stroke-sheet"
          />
        )}
      </svg>
    </div>
  );
}
