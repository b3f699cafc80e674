import type { ReactElement } from "react";
import { StateShapeIcon } from "../states/state-shape.tsx";
import type { StateTone } from "../states/state-words.ts";
import { placeMarks } from "./mark-places.ts";
import { linearScale, pixelOf } from "./plot-frame.ts";
import type { PlotLayout } from "./plot-layout.ts";

/** Something found at a station. */
export interface StationMark {
  readonly station_mm: number;
  /** "2017 surface pore, 0.8 mm". */
  readonly label: string;
  readonly tone: Extract<StateTone, "attend" | "stop" | "plain">;
}

const SHAPES = { attend: "triangle", stop: "diamond", plain: "open" } as const;
const COLOURS = { attend: "text-attend", stop: "text-stop", plain: "text-ash" } as const;
/** Height of a line of marks. */
const LINE_PX = 22;

/** Marks above the plots, each with its word at its station; a press takes the cursor there. */
export function StationMarks(props: {
  marks: readonly StationMark[];
  layout: PlotLayout;
  extent_mm: readonly [number, number];
  onPick: (station_mm: number) => void;
}): ReactElement | null {
  if (props.marks.length === 0) return null;
  const { layout } = props;
  const scale = linearScale(props.extent_mm, [layout.left, layout.width - layout.right]);
  const placed = placeMarks(
    props.marks.map((mark) => pixelOf(scale, mark.station_mm)),
    layout.width,
  );
  const lines = Math.max(...placed.map((place) => place.line)) + 1;
  return (
    <ul className="relative" style={{ height: lines * LINE_PX + 4 }}>
      {props.marks.map((mark, index) => {
        const { x, line, isLate } = placed[index] ?? { x: 0, line: 0, isLate: false };
        return (
          <li
            key={`${mark.station_mm} ${mark.label}`}
            className={`absolute ${isLate ? "-translate-x-[calc(100%-6px)]" : "-translate-x-1.5"}`}
            style={{ left: `${(x / layout.width) * 100}%`, top: line * LINE_PX }}
          >
            <button
              type="button"
              onClick={() => props.onPick(mark.station_mm)}
              className={`flex min-h-6 items-center gap-1.5 text-xs whitespace-nowrap hover:underline ${isLate ? "flex-row-reverse" : ""} ${COLOURS[mark.tone]}`}
            >
              <StateShapeIcon shape={SHAPES[mark.tone]} />
              {mark.label}
            </button>
          </li>
        );
      })}
    </ul>
  );
}
