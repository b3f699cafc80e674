import type { ReactElement } from "react";
import type { Column } from "../tables/columns.ts";
import { DataTable } from "../tables/data-table.tsx";
import { formatFigure, fromMm, type LengthUnits } from "../units/length-units.ts";
import { indexAt } from "./plot-row.tsx";
import { bandOf, type PlotSpec, valueText } from "./plot-spec.ts";

interface StationRow {
  readonly station_mm: number;
}

/** The same values as numbers: a row a station, a column a quantity. */
export function PlotTable(props: {
  label: string;
  specs: readonly PlotSpec[];
  stations_mm: readonly number[];
  units: LengthUnits;
}): ReactElement {
  const rows = props.stations_mm.map((station_mm) => ({ station_mm }));
  const station: Column<StationRow> = {
    id: "station",
    head: `Station, ${props.units}`,
    value: (row) => fromMm(row.station_mm, props.units),
    cell: (row) => formatFigure(fromMm(row.station_mm, props.units), props.units === "mm" ? 1 : 2),
    align: "right",
    figures: true,
    field: `station_${props.units}`,
  };
  return (
    <DataTable
      dense
      caption={`${props.label}, station by station`}
      rows={rows}
      rowKey={(row) => String(row.station_mm)}
      columns={[station, ...props.specs.map(columnOf)]}
      fileName="stations"
    />
  );
}

function columnOf(spec: PlotSpec): Column<StationRow> {
  return {
    id: spec.id,
    head: `${spec.title}, ${spec.unit}`,
    value: (row) => spec.values[indexAt(spec, row.station_mm)] ?? null,
    cell: (row) => <PlotCell spec={spec} index={indexAt(spec, row.station_mm)} />,
    align: "right",
    figures: true,
    field: spec.id,
  };
}

function PlotCell(props: { spec: PlotSpec; index: number }): ReactElement {
  const text = valueText(props.spec, props.index);
  if (bandOf(props.spec, props.index) !== "beyond") return <>{text}</>;
  return <span className="font-medium text-stop">◆ {text}</span>;
}
