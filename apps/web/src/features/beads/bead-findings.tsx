import type { BeadFinding, BeadResult } from "@beadroll/domain/schemas/bead-result";
import type { ReactElement } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { useStationCursor } from "../../kit/cursor/cursor-context.tsx";
import { StateMark, type StateTone } from "../../kit/states/state-mark.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { LengthText } from "../../kit/units/length-text.tsx";
import { formatFigure } from "../../kit/units/length-units.ts";

const STATES: Readonly<Record<BeadFinding["state"], { tone: StateTone; word: string }>> = {
  met: { tone: "good", word: "keeps" },
  not_met: { tone: "stop", word: "fails" },
  not_proven: { tone: "attend", word: "not proved" },
};

function FigureText(props: { value: number; unit: BeadFinding["unit"] }): ReactElement {
  if (props.unit === "mm") return <LengthText length_mm={props.value} decimals={2} />;
  return <span className="figures">{formatFigure(props.value, 0)}°</span>;
}

const columns = (show: (station_mm: number) => void): Column<BeadFinding>[] => [
  {
    id: "state",
    head: "Level",
    value: ({ state }) => STATES[state].word,
    cell: ({ state }) => <StateMark {...STATES[state]} />,
    width: "8rem",
  },
  { id: "code", head: "ISO 6520-1", value: ({ code }) => code, figures: true, width: "6rem" },
  {
    id: "name",
    head: "Imperfection",
    value: ({ name, plate }) => (plate === undefined ? name : `${name}, plate ${plate.toUpperCase()}`),
  },
  {
    id: "value",
    head: "Worst",
    value: ({ value }) => value,
    cell: ({ value, unit }) => <FigureText value={value} unit={unit} />,
    align: "right",
    figures: true,
  },
  {
    id: "limit",
    head: "Limit",
    value: ({ limit }) => limit,
    cell: ({ limit, unit }) => (limit === null ? "none" : <FigureText value={limit} unit={unit} />),
    align: "right",
    figures: true,
  },
  {
    id: "station",
    head: "Station",
    value: ({ station_mm }) => station_mm,
    cell: ({ station_mm }) => (
      <Button kind="quiet" onClick={() => show(station_mm)}>
        <LengthText length_mm={station_mm} decimals={1} />
      </Button>
    ),
    align: "right",
    figures: true,
  },
  { id: "source", head: "Source", value: ({ source }) => source, wideOnly: true },
];

/** Every imperfection that the scan can measure, held against the level; a station moves the cursor to it. */
export function BeadFindings(props: { result: BeadResult }): ReactElement {
  const [, setCursor] = useStationCursor();
  return (
    <DataTable
      plain
      dense
      caption="Imperfections that the scan can measure"
      rows={props.result.findings}
      columns={columns(setCursor)}
      rowKey={({ code, plate }) => `${code} ${plate ?? ""}`}
      empty={<p className="text-ash">Nothing could be measured on this scan.</p>}
    />
  );
}
