import { memo, type ReactElement } from "react";
import { formatFigure } from "../units/length-units.ts";
import { linearScale, pixelOf, roundTicks, tickDecimals } from "./plot-frame.ts";
import type { PlotLayout } from "./plot-layout.ts";
import { bandPath, blindStretches, linePath, type PlotScales } from "./plot-paths.ts";
import { around, bandOf, type PlotBand, type PlotSpec, plotExtent } from "./plot-spec.ts";

interface PictureProps {
  spec: PlotSpec;
  layout: PlotLayout;
  height: number;
  extent_mm: readonly [number, number];
}

/** The scales of one plot of a stack. */
export function plotScales({ spec, layout, height, extent_mm }: PictureProps): PlotScales {
  return {
    x: linearScale(extent_mm, [layout.left, layout.width - layout.right]),
    y: linearScale(plotExtent(spec), [height - 4, 4]),
  };
}

/** One plot without its cursor: ground, limits, uncertainty, line, what is beyond. */
export const PlotPicture = memo(function PlotPicture(props: PictureProps): ReactElement {
  const { spec, layout, height } = props;
  const scales = plotScales(props);
  const { stations_mm, values, expanded_u, envelope } = spec;
  return (
    <svg
      aria-hidden="true"
      width={layout.width}
      height={height}
      viewBox={`0 0 ${layout.width} ${height}`}
      className="kit-drawing"
    >
      <ValueTicks spec={spec} scales={scales} layout={layout} />
      <Limits spec={spec} scales={scales} layout={layout} />
      <BlindStretches spec={spec} scales={scales} height={height} />
      {envelope === undefined ? null : (
        <path d={bandPath(stations_mm, envelope.min, envelope.max, scales)} className="fill-ink/25" />
      )}
      {expanded_u === undefined ? null : (
        <path
          d={bandPath(stations_mm, around(values, expanded_u, -1), around(values, expanded_u, 1), scales)}
          className="fill-ink/20"
        />
      )}
      <path
        d={linePath(stations_mm, values, scales)}
        className="fill-none stroke-ink"
        strokeWidth="1.5"
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      <path d={beyondPath(spec, scales)} className="fill-stop" />
    </svg>
  );
});

/** A diamond at each station beyond the limits. */
function beyondPath(spec: PlotSpec, scales: PlotScales): string {
  return spec.values
    .map((value, index) => {
      if (value === null || bandOf(spec, index) !== "beyond") return "";
      const x = pixelOf(scales.x, spec.stations_mm[index] ?? 0);
      return `M${x.toFixed(1)} ${(pixelOf(scales.y, value) - 3).toFixed(1)}l3 3-3 3-3-3z`;
    })
    .join("");
}

function Limits(props: { spec: PlotSpec; scales: PlotScales; layout: PlotLayout }): ReactElement {
  const { scales, layout } = props;
  const [left, right] = [layout.left, layout.width - layout.right];
  const bands = [...(props.spec.bands ?? [])].sort((a, b) => a.kind.localeCompare(b.kind));
  return (
    <>
      {bands.map((band) => {
        const top = pixelOf(scales.y, band.high);
        const bottom = pixelOf(scales.y, band.low);
        const look = band.kind === "within" ? "text-good" : "text-attend";
        const dash = band.kind === "within" ? undefined : "5 3";
        return (
          <g key={`${band.kind} ${band.word}`} className={look}>
            <rect
              x={left}
              y={top}
              width={right - left}
              height={bottom - top}
              fill="currentColor"
              opacity="0.07"
            />
            {[top, bottom].map((y) => (
              <line key={y} x1={left} x2={right} y1={y} y2={y} stroke="currentColor" strokeDasharray={dash} />
            ))}
          </g>
        );
      })}
      {layout.right < 40 ? null : (
        <LimitWords spec={props.spec} bands={bands} scales={scales} x={right + 8} />
      )}
    </>
  );
}

/** The edge of a band that its word stands at. */
const wordEdge = (band: PlotBand): number => (band.edge === "low" ? band.low : band.high);

/** The limits' words right of the plot, each at its edge, pushed apart where they would touch. */
function LimitWords(props: {
  spec: PlotSpec;
  bands: readonly PlotBand[];
  scales: PlotScales;
  x: number;
}): ReactElement {
  const sorted = [...props.bands].sort((a, b) => wordEdge(b) - wordEdge(a));
  let last = Number.NEGATIVE_INFINITY;
  return (
    <>
      {sorted.map((band) => {
        last = Math.max(pixelOf(props.scales.y, wordEdge(band)) + 4, last + 13);
        return (
          <text
            key={`${band.kind} ${band.word}`}
            x={props.x}
            y={last}
            className={`text-xs ${band.kind === "within" ? "fill-good" : "fill-attend"}`}
          >
            {`${band.word} ${limitText(props.spec, wordEdge(band))}`}
          </text>
        );
      })}
    </>
  );
}

function limitText(spec: PlotSpec, value: number): string {
  return formatFigure(value, spec.decimals ?? 2);
}

function ValueTicks(props: { spec: PlotSpec; scales: PlotScales; layout: PlotLayout }): ReactElement {
  const { scales, layout } = props;
  const [low, high] = scales.y.from;
  const ticks = roundTicks(low, high, 4);
  const decimals = tickDecimals((ticks[1] ?? 1) - (ticks[0] ?? 0));
  return (
    <g className="stroke-row">
      {ticks.map((tick) => {
        const y = Math.round(pixelOf(scales.y, tick)) + 0.5;
        return (
          <g key={tick}>
            <line
              x1={layout.left}
              x2={layout.width - layout.right}
              y1={y}
              y2={y}
              className={tick === 0 ? "stroke-ash/60" : ""}
            />
            <text
              x={layout.left - 8}
              y={y + 4}
              textAnchor="end"
              className="fill-ash stroke-none font-mono text-xs"
            >
              {formatFigure(tick, decimals)}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** Stretches without data: a dashed outline over the whole height, as everywhere. */
function BlindStretches(props: { spec: PlotSpec; scales: PlotScales; height: number }): ReactElement {
  const { stations_mm, values } = props.spec;
  return (
    <>
      {blindStretches(values).map(({ first, last }) => {
        const from = pixelOf(props.scales.x, edge_mm(stations_mm, first, -1));
        const until = pixelOf(props.scales.x, edge_mm(stations_mm, last, 1));
        return (
          <rect
            key={first}
            x={from}
            y={4.5}
            width={Math.max(1, until - from)}
            height={props.height - 9}
            className="fill-sheet stroke-bead-outline"
            strokeDasharray="3 2.5"
          />
        );
      })}
    </>
  );
}

/** Halfway to the neighbouring station; at the seam's ends the station itself. */
function edge_mm(stations_mm: readonly number[], index: number, side: 1 | -1): number {
  const here = stations_mm[index] ?? 0;
  return (here + (stations_mm[index + side] ?? here)) / 2;
}
