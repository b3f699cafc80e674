import { type ReactElement, type RefObject, useMemo, useRef, useState } from "react";
import { useStationCursor } from "../cursor/cursor-context.tsx";
import { indexAfterKey } from "../cursor/station-keys.ts";
import { useWidth } from "../page/use-width.ts";
import { useLengthUnits } from "../units/units-context.tsx";
import {
  drawStrip,
  type StripCommand,
  type StripFrame,
  stationAt,
  stationAtX,
  stripFrame,
  xOfStation,
} from "./bead-strip-drawing.ts";
import type { StripStation } from "./strip-groups.ts";
import { StripCanvas, StripSvg } from "./strip-picture.tsx";
import { StripReadout } from "./strip-readout.tsx";
import { type StripUnit, stationWords, stripSummary } from "./strip-words.ts";

export interface BeadStripProps {
  /** In ascending order of station_mm. */
  stations: readonly StripStation[];
  /** What is drawn, such as "Seam S4, lateral deviation". */
  label: string;
  /** What the deviations are in; lengths follow the units of the screen. */
  unit?: StripUnit;
  /** row: in a table. sheet: on the seam's own page. */
  size?: "row" | "sheet";
  /** Length of the seam, from station 0; without it the strip runs from its first to its last station. */
  length_mm?: number;
  /** Free room at both ends, to stand on a plot's axis. */
  inset?: { readonly left: number; readonly right: number };
  /** svg by default, canvas from a few hundred ripples on. */
  surface?: "svg" | "canvas";
  /** False inside a table: the row's arrow keys lead into it instead of Tab. */
  tabStop?: boolean;
}

const HEIGHTS = { row: 32, sheet: 84 } as const;
const USUAL_WIDTH = 424;
const CANVAS_FROM = 300;

/** A seam as a bead: one ripple a station. Hover, tap or the arrow keys read out a station's numbers. */
export function BeadStrip(props: BeadStripProps): ReactElement {
  const { stations, unit = "mm", size = "row" } = props;
  const holder = useRef<HTMLDivElement>(null);
  const { commands, frame, width } = useDrawing(props, holder);
  const units = useLengthUnits();
  const [cursor_mm, setCursor, isShared] = useStationCursor();
  const [isReading, setReading] = useState(false);
  if (frame === null) {
    return (
      <div ref={holder} className="text-sm text-ash">
        {stations.length === 0 ? "No stations" : null}
      </div>
    );
  }
  const at = cursor_mm === null ? null : stationAt(stations, cursor_mm);
  const station = at === null ? undefined : stations[at];
  const summary = stripSummary(stations, unit, units);
  const words = station === undefined ? null : stationWords(station, unit, units);
  const Picture = props.surface === "canvas" || commands.length > CANVAS_FROM ? StripCanvas : StripSvg;
  const goTo = (index: number) => setCursor(stations[index]?.station_mm ?? null);
  const point = (clientX: number) => {
    const left = holder.current?.getBoundingClientRect().left ?? 0;
    goTo(stationAtX(frame, stations, clientX - left));
  };
  const stopReading = () => {
    setReading(false);
    if (!isShared) setCursor(null);
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
      className="relative min-w-32 touch-pan-y rounded-sm"
      style={{ height: HEIGHTS[size] }}
      onPointerMove={(event) => point(event.clientX)}
      onPointerDown={(event) => point(event.clientX)}
      onPointerEnter={() => setReading(true)}
      onPointerLeave={() => document.activeElement !== holder.current && stopReading()}
      onFocus={() => {
        setReading(true);
        if (cursor_mm === null) goTo(0);
      }}
      onBlur={stopReading}
      onKeyDown={(event) => {
        const next = indexAfterKey(event.key, at ?? 0, stations.length);
        if (next === null) return;
        event.preventDefault();
        goTo(next);
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

/** The drawing for the place the strip has; drawn anew only when stations or place change. */
function useDrawing(
  props: BeadStripProps,
  holder: RefObject<HTMLDivElement | null>,
): { commands: readonly StripCommand[]; frame: StripFrame | null; width: number } {
  const { stations, size = "row", length_mm, inset } = props;
  const width = useWidth(holder, USUAL_WIDTH);
  const left = inset?.left;
  const right = inset?.right;
  return useMemo(() => {
    const place = {
      width,
      height: HEIGHTS[size],
      ...(left !== undefined && { left }),
      ...(right !== undefined && { right }),
      ...(length_mm !== undefined && { extent_mm: [0, length_mm] as const }),
    };
    return { width, commands: drawStrip(stations, place), frame: stripFrame(stations, place) };
  }, [stations, width, size, left, right, length_mm]);
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
