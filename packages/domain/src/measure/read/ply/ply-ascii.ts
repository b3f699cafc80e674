import { type FaultList, quoted } from "../fault-list.ts";
import { PointSink } from "../point-sink.ts";
import { BLANK, DOT, utf8Text } from "../text/bytes.ts";
import { NumberRows } from "../text/number-rows.ts";
import { parseNumber } from "../text/parse-number.ts";
import type { TextRows } from "../text/text-rows.ts";
import type { PlyBody } from "./ply-body.ts";
import type { PlyElement } from "./ply-header.ts";

/** Reads an ascii body: one element a line, elements in the order of the header. */
export function readPlyAscii(
  { bytes, header, vertex, columns, scale }: PlyBody,
  faults: FaultList,
): PointSink {
  const sink = new PointSink(false);
  const source = { bytes, separator: BLANK, mark: DOT, bodyAt: header.bodyAt, bodyLine: header.lines };
  const numbers = columns.map((index) => ({
    index,
    name: vertex.properties[index]!.name,
    allows: "nan" as const,
  }));
  const rows = new NumberRows(source, numbers, null, faults);
  const places = new Int32Array(vertex.properties.length);
  for (const element of header.elements) {
    if (element.properties.length === 0) continue;
    for (let i = 0; i < element.count; i++) {
      if (faults.full) return sink;
      if (!rows.rows.next()) {
        refuseEnd(element, i, rows.rows, faults);
        return sink;
      }
      if (!placesOf(element, rows.rows, places, faults) || element !== vertex) continue;
      for (let c = 0; c < 3; c++) numbers[c]!.index = places[columns[c]!]!;
      if (!rows.read()) continue;
      if (rows.lost) sink.lose();
      else sink.add(rows.values[0]! * scale, rows.values[1]! * scale, rows.values[2]! * scale, 0);
    }
  }
  if (rows.rows.next()) refuseRest(vertex, rows.rows, faults);
  return sink;
}

/** Finds the cell of each property in a row, lists included; a row that does not fit is a fault. */
function placesOf(element: PlyElement, rows: TextRows, places: Int32Array, faults: FaultList): boolean {
  let cell = 0;
  for (let p = 0; p < element.properties.length; p++) {
    if (p < places.length) places[p] = cell;
    if (element.properties[p]!.count === null || cell >= rows.count) {
      cell++;
      continue;
    }
    const length = cell < rows.starts.length ? listLength(rows, cell) : Number.NaN;
    if (!(length >= 0)) return refuseList(element.properties[p]!.name, rows, cell, faults);
    cell += 1 + length;
  }
  if (cell === rows.count) return true;
  const code = rows.count < cell && rows.unterminated ? "file-truncated" : "file-row-invalid";
  const what = `the row of ${quoted(element.name)} has ${rows.count} numbers where ${cell} were expected`;
  faults.add(code, what, { line: rows.line });
  return false;
}

function listLength(rows: TextRows, cell: number): number {
  const length = parseNumber(rows.bytes, rows.starts[cell]!, rows.ends[cell]!, DOT);
  return Number.isInteger(length) ? length : Number.NaN;
}

function refuseList(name: string, rows: TextRows, cell: number, faults: FaultList): false {
  const found = cell < rows.starts.length ? utf8Text(rows.bytes, rows.starts[cell]!, rows.ends[cell]!) : "…";
  const what = `list ${name} begins with ${quoted(found)} where its length was expected`;
  faults.add("file-value-invalid", what, { line: rows.line, field: name });
  return false;
}

function refuseEnd({ name, count }: PlyElement, found: number, rows: TextRows, faults: FaultList): void {
  const what = `the header says ${count} of element ${quoted(name)}, the file ends after ${found}`;
  faults.add("file-truncated", what, { line: rows.line, field: name });
}

function refuseRest({ count }: PlyElement, rows: TextRows, faults: FaultList): void {
  const what = `more rows follow than the header says (vertex ${count})`;
  faults.add("file-header-invalid", what, { line: rows.line, field: "vertex" });
}
