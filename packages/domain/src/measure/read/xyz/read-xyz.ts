import type { LengthUnit } from "../../scan-cloud.ts";
import type { FaultList } from "../fault-list.ts";
import { MM_PER, PointSink } from "../point-sink.ts";
import type { OpenFile } from "../scan-input.ts";
import { findColumns, hasColumn } from "../text/column-names.ts";
import { type NumberColumn, NumberRows } from "../text/number-rows.ts";
import { rowsExpected } from "../text/rows-expected.ts";
import type { TableLayout } from "../text/table-layout.ts";
import { TextRows } from "../text/text-rows.ts";
import { StationOrder } from "./station-order.ts";

const COORDINATES = ["x", "y", "z"] as const;

/**
 * Reads a cloud written as text, one point a row: the columns x, y, z by name, or the first three.
 * With a column `station` the points of one station are one profile; where x is missing, the station is x.
 */
export function readXyz(layout: TableLayout, { units, faults }: OpenFile): PointSink {
  const { names } = layout;
  const stations = names !== null && hasColumn(names, "station") ? new StationOrder() : null;
  const sink = new PointSink(stations !== null);
  const columns = names === null ? firstThree() : named(layout, units, faults);
  if (columns === null) return sink;
  const rows = new NumberRows(layout, columns, names?.length ?? firstWidth(layout), faults);
  const scale = MM_PER[units];
  const { values } = rows;
  sink.reserve(rowsExpected(layout.bytes, layout.bodyAt));
  while (rows.next()) {
    if (rows.lost) sink.lose();
    else {
      const profile = stations?.add(values[3]!) ?? 0;
      sink.add(values[0]! * scale, values[1]! * scale, values[2]! * scale, profile);
    }
  }
  checkCount(layout, rows, faults);
  return stations === null ? sink : sink.renumber(stations.ranks());
}

function firstThree(): NumberColumn[] {
  return COORDINATES.map((name, index) => ({ index, name, allows: allowedIn(name) }));
}

function named(layout: TableLayout, units: LengthUnit, faults: FaultList): NumberColumn[] | null {
  const names = layout.names!;
  const hasStation = hasColumn(names, "station");
  const alongX = hasStation && !hasColumn(names, "x") ? ["station", "y", "z"] : COORDINATES;
  const bases = hasStation ? [...alongX, "station"] : alongX;
  const wanted = bases.map((base) => ({ base, isLength: true }));
  const found = findColumns(
    { names, units, place: { line: layout.namesLine }, noun: "column" },
    wanted,
    faults,
  );
  if (found === null) return null;
  return found.map((index, i) => ({ index, name: names[index]!, allows: allowedIn(bases[i]!) }));
}

function allowedIn(base: string): NumberColumn["allows"] {
  if (base === "station") return "number";
  return base === "z" ? "empty" : "nan";
}

/** Number of cells in the first row: what every other row must have, three at least. */
function firstWidth({ bytes, separator, bodyAt, bodyLine }: TableLayout): number {
  const rows = new TextRows(bytes, separator, bodyAt, bodyLine);
  return rows.next() ? Math.max(3, rows.count) : 3;
}

function checkCount({ declared }: TableLayout, rows: NumberRows, faults: FaultList): void {
  if (declared === null || faults.full || rows.met === declared) return;
  const code = rows.met < declared ? "file-truncated" : "file-header-invalid";
  faults.add(code, `the count line says ${declared} points, ${rows.met} rows follow`, {
    line: rows.rows.line,
  });
}
