import { type KeyboardEvent, type ReactElement, useMemo, useRef, useState } from "react";
import { useStationCursor } from "../cursor/cursor-context.tsx";
import { useLengthUnits } from "../units/units-context.tsx";
import {
  drawStrip,
  nearestStation,
  type StripFrame,
  stationAtX,
  stripFrame,
  xOfStation,
} from "./bead-strip-drawing.ts";
import type { StripStation } from "./strip-groups.ts";
import { StripCanvas, StripSvg } from "./strip-picture.tsx";
import { StripReadout } from "./strip-readout.tsx";
import { type StripUnit, stationWords, stripSummary } from "./strip-words.ts";
import { useWidth } from "./use-width.ts";

export interface BeadStripProps {
  /** In ascending order of station_mm. */
  stations: readonly StripStation[];
  /** What is drawn, such as "Seam S4, lateral deviation". */
  label: string;
  /** What the deviations are in; lengths follow the units of the screen. */
  unit?: StripUnit;
  /** row: in a table. sheet: on the seam's own page. */
  size?: "row" | "sheet";
  /** Free room at both ends, to stand on a plot's axis. */
  inset?: { left: number; right: number };
  /** svg by default, canvas from a few hundred ripples on. */
  surface?: "svg" | "canvas";
  /** False inside a table: the row's arrow keys lead into it instead of Tab. */
  tabStop?: boolean;
}

const HEIGHTS = { row: 32, sheet: 84 } as const;
const CANVAS_FROM = 300;

/** A seam as a bead: one ripple a station. Hover, tap or the arrow keys read out a station's numbers. */
export function BeadStrip(props: BeadStripProps): ReactElement {
  const { stations, unit = "mm", size = "row" } = props;
  const holder = useRef<HTMLDivElement>(null);
  const width = useWidth(holder, 424);
  const units = useLengthUnits();
  const [cursor_mm, setCursor] = useStationCursor();
  const [isReading, setReading] = useState(false);
  const place = useMemo(() => ({ width, height: HEIGHTS[size], ...props.inset }), [width, size, props.inset]);
  const commands = useMemo(() => drawStrip(stations, place), [stations, place]);
  const frame = useMemo(() => stripFrame(stations, place), [stations, place]);
  const at = cursor_mm === null || stations.length === 0 ? null : nearestStation(stations, cursor_mm);
  const station = at === null ? undefined : stations[at];
  const summary = stripSummary(stations, unit, units);
  if (frame === null) {
    return (
      <div ref={holder} className="text-sm text-ash">
        {stations.length === 0 ? "No stations" : null}
      </div>
    );
  }
  const words = station === undefined ? null : stationWords(station, unit, units);
  const Picture =
    props.surface === "canvas" || (props.surface === undefined && commands.length > CANVAS_FROM)
      ? StripCanvas
      : StripSvg;
  const point = (clientX: number) => {
    const box = holder.current?.getBoundingClientRect();
    if (box !== undefined)
      setCursor(stations[stationAtX(frame, stations, clientX - box.left)]?.station_mm ?? null);
  };
  return (
    <div
      ref={holder}
      role="slider"
      tabIndex={props.tabStop === false ? -1 : 0}
      aria-label={`${props.label}: ${summary}`}
      aria-orientation="horizontal"
      aria-valuemin={frame.start_mm}
      aria-valuemax={frame.end_mm}
      aria-valuenow={station?.station_mm ?? frame.start_mm}
      aria-valuetext={
        words === null ? summary : [words.at, words.value, words.share].filter(Boolean).join(", ")
      }
      className="relative min-w-0 touch-pan-y rounded-sm"
      style={{ height: HEIGHTS[size] }}
      onPointerMove={(event) => point(event.clientX)}
      onPointerDown={(event) => point(event.clientX)}
      onPointerEnter={() => setReading(true)}
      onPointerLeave={() => {
        setReading(document.activeElement === holder.current);
        if (document.activeElement !== holder.current) setCursor(null);
      }}
      onFocus={() => {
        setReading(true);
        if (cursor_mm === null) setCursor(stations[0]?.station_mm ?? null);
      }}
      onBlur={() => {
        setReading(false);
        setCursor(null);
      }}
      onKeyDown={(event) => {
        const next = stationAfterKey(event, at ?? 0, stations.length);
        if (next !== null) setCursor(stations[next]?.station_mm ?? null);
      }}
    >
      <Picture commands={commands} width={width} height={HEIGHTS[size]} />
      {station === undefined ? null : <StripCursor frame={frame} station={station} />}
      {words === null || station === undefined || !isReading || holder.current === null ? null : (
        <StripReadout
          {...words}
          anchor={holder.current.getBoundingClientRect()}
          x={xOfStation(frame, station.station_mm)}
        />
      )}
    </div>
  );
}

/** The station that a key leads to, or null if the key means nothing here. */
function stationAfterKey(event: KeyboardEvent, at: number, count: number): number | null {
  const steps: Record<string, number> = {
    ArrowRight: at + 1,
    ArrowLeft: at - 1,
    PageUp: at + 10,
    PageDown: at - 10,
    Home: 0,
    End: count - 1,
  };
  const next = steps[event.key];
  if (next === undefined) return null;
  event.preventDefault();
  return Math.min(Math.max(next, 0), count - 1);
}

function StripCursor(props: { frame: StripFrame; station: StripStation }): ReactElement {
  return (
    <div
      aria-hidden="true"
      className="screen-only pointer-events-none absolute -inset-y-0.5 w-0.5 -translate-x-1/2 bg-ink"
      style={{ left: xOfStation(props.frame, props.station.station_mm) }}
    />
  );
}
