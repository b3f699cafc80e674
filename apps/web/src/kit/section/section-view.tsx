import type { SectionView as Section } from "@beadroll/domain/schemas/section-view";
import { type ReactElement, useMemo, useRef } from "react";
import { useWidth } from "../page/use-width.ts";
import { linearScale, pixelOf, roundTicks, type Scale, tickDecimals } from "../plots/plot-frame.ts";
import { formatFigure, formatLength, fromMm, type LengthUnits } from "../units/length-units.ts";
import { useLengthUnits } from "../units/units-context.tsx";
import { type SectionFrame, type SectionPlace, type SectionPoint, sectionFrame } from "./section-frame.ts";

export interface SectionViewProps {
  section: Section;
  /** An earlier section at the same station, drawn under it in grey: the fit-up under a finished bead. */
  under?: Section;
  /** Height in CSS pixels. */
  height?: number;
}

/** The joint's cross-section at a station: points, fitted faces, root, and the model's outline. Equal axes. */
export function SectionView(props: SectionViewProps): ReactElement {
  const { section } = props;
  const holder = useRef<HTMLDivElement>(null);
  const width = useWidth(holder, 420);
  const units = useLengthUnits();
  const place = useMemo(
    () => ({ width, height: props.height ?? 320, left: 44, right: 8, top: 8, bottom: 34 }),
    [width, props.height],
  );
  const frame = useMemo(() => sectionFrame(shownPoints(section), place), [section, place]);
  return (
    <figure className="min-w-0">
      <div ref={holder}>
        {frame === null ? (
          <p className="rounded-sm border border-dashed border-edge p-4 text-ash">
            No points at this station.
          </p>
        ) : (
          <svg
            role="img"
            aria-label={sectionSummary(section, units)}
            width={place.width}
            height={place.height}
            viewBox={`0 0 ${place.width} ${place.height}`}
            className="kit-drawing"
          >
            <Axes frame={frame} place={place} units={units} />
            <Drawing section={section} under={props.under ?? null} frame={frame} />
          </svg>
        )}
      </div>
      <figcaption>
        <SectionLegend section={section} under={props.under ?? null} units={units} />
      </figcaption>
    </figure>
  );
}

/** Of a finished weld this much beside its toes is shown, mm. */
const BESIDE_TOES_MM = 6;

/** A weld with what lies just beside it: its toes and the root, wider by a little. */
function weldPoints(toes: readonly SectionPoint[], root: SectionPoint | null): SectionPoint[] {
  const corners = [...toes, ...(root === null ? [] : [root])];
  const around = [-BESIDE_TOES_MM, BESIDE_TOES_MM];
  return corners.flatMap(([l, n]) => around.map((by): SectionPoint => [l + by, n + by]));
}

/** What must be seen: points used, faces, root, outline. Rejected points may lie far off and do not set the scale. */
function shownPoints(section: Section): SectionPoint[] {
  if (section.toes !== undefined) return weldPoints(section.toes, section.root);
  const faces = section.plates.flatMap((plate) => [plate.from, plate.to]);
  const near = [...section.kept, ...faces, ...(section.root === null ? [] : [section.root])];
  return near.length > 0 ? near : [...section.model.flat(), ...section.rejected.map((entry) => entry.point)];
}

function Drawing(props: { section: Section; under: Section | null; frame: SectionFrame }): ReactElement {
  const { section, under, frame } = props;
  const id = `clip-${section.station_mm}`;
  const [left, right] = frame.x.to;
  const [bottom, top] = frame.y.to;
  return (
    <>
      <clipPath id={id}>
        <rect x={left} y={top} width={right - left} height={bottom - top} />
      </clipPath>
      <g clipPath={`url(#${id})`}>
        {section.model.map((line) => (
          <path
            key={`${line[0]} ${line.at(-1)}`}
            d={polyline(line, frame)}
            className="fill-none stroke-ash"
            strokeWidth="1.25"
            strokeDasharray="6 4"
          />
        ))}
        {under === null ? null : (
          <path d={dots(under.kept, frame)} className="fill-edge" data-layer="under" />
        )}
        <path d={dots(section.kept, frame)} className="fill-link" />
        <path
          d={crosses(
            section.rejected.map((entry) => entry.point),
            frame,
          )}
          className="stroke-stop"
        />
        {section.plates.map((plate) => (
          <path
            key={plate.plate}
            d={polyline([plate.from, plate.to], frame)}
            className="fill-none stroke-ink"
            strokeWidth="1.25"
          />
        ))}
        {section.root === null ? null : <Root root={section.root} frame={frame} />}
        {section.toes === undefined ? null : (
          <path d={toeMarks(section.toes, frame)} className="fill-none stroke-attend" strokeWidth="2" />
        )}
      </g>
    </>
  );
}

function Root(props: { root: SectionPoint; frame: SectionFrame }): ReactElement {
  const [x, y] = [pixelOf(props.frame.x, props.root[0]), pixelOf(props.frame.y, props.root[1])];
  return (
    <g transform={`translate(${x} ${y})`}>
      <circle r="5" className="fill-sheet stroke-ink" strokeWidth="2" />
      <path d="M-9 0h18M0-9v18" className="stroke-ink" />
    </g>
  );
}

function Axes(props: { frame: SectionFrame; place: SectionPlace; units: LengthUnits }): ReactElement {
  const { frame, units } = props;
  const [left, right] = frame.x.to;
  const [bottom, top] = frame.y.to;
  const x = shownScale(frame.x, units);
  const y = shownScale(frame.y, units);
  const ticks_x = roundTicks(x.from[0], x.from[1], Math.max(2, (right - left) / 80));
  const ticks_y = roundTicks(y.from[0], y.from[1], Math.max(2, (bottom - top) / 60));
  return (
    <g className="stroke-row">
      {ticks_x.map((tick) => (
        <g key={tick} transform={`translate(${Math.round(pixelOf(x, tick)) + 0.5} 0)`}>
          <line y1={top} y2={bottom} />
          <text y={bottom + 15} textAnchor="middle" className="fill-ash stroke-none font-mono text-xs">
            {tickText(tick, ticks_x)}
          </text>
        </g>
      ))}
      {ticks_y.map((tick) => (
        <g key={tick} transform={`translate(0 ${Math.round(pixelOf(y, tick)) + 0.5})`}>
          <line x1={left} x2={right} />
          <text x={left - 8} y="4" textAnchor="end" className="fill-ash stroke-none font-mono text-xs">
            {tickText(tick, ticks_y)}
          </text>
        </g>
      ))}
      <text x={right} y={bottom + 30} textAnchor="end" className="fill-ash stroke-none text-xs">
        {`lateral across, normal up, ${units}`}
      </text>
    </g>
  );
}

function shownScale(scale: Scale, units: LengthUnits): Scale {
  return linearScale([fromMm(scale.from[0], units), fromMm(scale.from[1], units)], scale.to);
}

function tickText(tick: number, ticks: readonly number[]): string {
  return formatFigure(tick, tickDecimals((ticks[1] ?? 1) - (ticks[0] ?? 0)));
}

function SectionLegend(props: { section: Section; under: Section | null; units: LengthUnits }): ReactElement {
  const { section, units } = props;
  const root = section.root;
  return (
    <ul className="mt-2 grid gap-x-6 gap-y-1 text-sm sm:grid-cols-2">
      <LegendLine
        drawing={<path d={DOT} className="fill-link" />}
      >{`${section.kept.length} points used`}</LegendLine>
      <LegendLine drawing={<path d="M9 4l6 6M15 4l-6 6" className="stroke-stop" />}>
        {`${section.rejected.length} not used${rejectionWords(section)}`}
      </LegendLine>
      {section.plates.map((plate) => (
        <LegendLine key={plate.plate} drawing={<path d="M2 7h20" className="stroke-ink" strokeWidth="2" />}>
          {`Plate ${plate.plate.toUpperCase()} fitted, rms ${formatLength(plate.rms_mm, units, 3)}`}
        </LegendLine>
      ))}
      <LegendLine drawing={<circle cx="12" cy="7" r="4" className="fill-sheet stroke-ink" strokeWidth="2" />}>
        {root === null
          ? rootWords(section)
          : `Root at ${formatLength(root[0], units)}, ${formatLength(root[1], units)}`}
      </LegendLine>
      {section.toes === undefined ? null : (
        <LegendLine drawing={<path d="M12 1v12" className="stroke-attend" strokeWidth="2" />}>
          Toes of the weld
        </LegendLine>
      )}
      {props.under === null ? null : (
        <LegendLine drawing={<path d={DOT} className="fill-edge" />}>The fit-up before welding</LegendLine>
      )}
      <LegendLine drawing={<path d="M2 7h20" className="stroke-ash" strokeDasharray="6 4" />}>
        Model's outline
      </LegendLine>
    </ul>
  );
}

/** Of flush plates no root shows; else why it was not found. */
function rootWords({ why, measured }: Section): string {
  if (measured && why === null) return "No root shows under this weld";
  return `Root not found${why === null ? "" : `: ${why.replaceAll("_", " ")}`}`;
}

const DOT = "M10.5 5.5h3v3h-3z";

function LegendLine(props: { drawing: ReactElement; children: string }): ReactElement {
  return (
    <li className="flex items-baseline gap-2">
      <svg aria-hidden="true" width="24" height="14" className="shrink-0 translate-y-0.5">
        {props.drawing}
      </svg>
      {props.children}
    </li>
  );
}

function rejectionWords(section: Section): string {
  const counts = new Map<string, number>();
  for (const { why } of section.rejected) counts.set(why, (counts.get(why) ?? 0) + 1);
  if (counts.size === 0) return "";
  return `: ${[...counts].map(([why, count]) => `${count} ${why.replaceAll("_", " ")}`).join(", ")}`;
}

function sectionSummary(section: Section, units: LengthUnits): string {
  const at = `Section at ${formatLength(section.station_mm, units, 1)}`;
  if (section.root === null) return `${at}: root not found`;
  return `${at}: root at lateral ${formatLength(section.root[0], units)}, normal ${formatLength(section.root[1], units)}, from ${section.kept.length} points`;
}

function polyline(points: readonly SectionPoint[], frame: SectionFrame): string {
  return `M${points.map((point) => at(point, frame)).join("L")}`;
}

/** All points as one path of small squares: thousands of them stay light. */
function dots(points: readonly SectionPoint[], frame: SectionFrame): string {
  return points.map((point) => `M${at(point, frame)}m-1-1h2v2h-2z`).join("");
}

function crosses(points: readonly SectionPoint[], frame: SectionFrame): string {
  return points.map((point) => `M${at(point, frame)}m-2.5-2.5l5 5m-5 0l5-5`).join("");
}

/** A stroke through each toe. */
function toeMarks(points: readonly SectionPoint[], frame: SectionFrame): string {
  return points.map((point) => `M${at(point, frame)}m-6-6l12 12m-12 0l12-12`).join("");
}

function at(point: SectionPoint, frame: SectionFrame): string {
  return `${pixelOf(frame.x, point[0]).toFixed(1)} ${pixelOf(frame.y, point[1]).toFixed(1)}`;
}
