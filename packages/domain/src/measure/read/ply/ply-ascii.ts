import { type FaultList, quoted } from "../fault-list.ts";
import { parseNumber } from "../number/parse-number.ts";
import { PointSink } from "../point-sink.ts";
import { BLANK, DOT, utf8Text } from "../text/bytes.ts";
import { NumberRows } from "../text/number-rows.ts";
import { rowsExpected } from "../text/rows-expected.ts";
import type { TextRows } from "../text/text-rows.ts";
import type { PlyBody } from "./ply-body.ts";
import type { PlyElement } from "./ply-header.ts";

/** Reads an ascii body: one element a line, elements in the order of the header. */
export function readPlyAscii(body: PlyBody, faults: FaultList): PointSink {
  const { header, vertex } = body;
  const sink = new PointSink(false);
  let rows = rowsFrom(body, { at: header.bodyAt, line: header.lines }, faults);
  for (const element of header.elements) {
    // An element without properties has no lines.
    if (element.properties.length === 0) continue;
    rows = rowsFrom(body, rows.rows, faults);
    rows.limit = element.count;
    if (element === vertex && isFixed(vertex)) takeRows(rows, body, sink);
    else walkRows(rows, element, body, { sink, faults });
    if (faults.full) return sink;
    if (rows.met < element.count) {
      refuseEnd(element, rows, faults);
      return sink;
    }
  }
  if (rows.rows.next()) refuseRest(vertex, rows.rows, faults);
  return sink;
}

/** Rows of numbers from a place on; vertices without lists have a fixed width and are read quickly. */
function rowsFrom(body: PlyBody, { at, line }: { at: number; line: number }, faults: FaultList): NumberRows {
  const { bytes, vertex, columns } = body;
  const source = { bytes, separator: BLANK, mark: DOT, bodyAt: at, bodyLine: line };
  const numbers = columns.map((index) => ({
    index,
    name: vertex.properties[index]!.name,
    allows: "nan" as const,
  }));
  return new NumberRows(source, numbers, isFixed(vertex) ? vertex.properties.length : null, faults);
}

function isFixed({ properties }: PlyElement): boolean {
  return properties.every(({ count }) => count === null);
}

function takeRows(rows: NumberRows, { vertex, scale }: PlyBody, sink: PointSink): void {
  sink.reserve(Math.min(vertex.count, rowsExpected(rows.rows.bytes, rows.rows.at)));
  const { values } = rows;
  while (rows.next()) {
    if (rows.lost) sink.lose();
    else sink.add(values[0]! * scale, values[1]! * scale, values[2]! * scale, 0);
  }
}

interface Results {
  readonly sink: PointSink;
  readonly faults: FaultList;
}

/** Goes through an element row by row, finding each property's cell; takes the points where it is the vertex. */
function walkRows(numbers: NumberRows, element: PlyElement, body: PlyBody, { sink, faults }: Results): void {
  const { columns, scale, vertex } = body;
  const { rows, values } = numbers;
  const places = new Int32Array(element.properties.length);
  while (numbers.met < element.count && !faults.full && rows.next()) {
    numbers.met++;
    if (!placesOf(element, rows, places, faults) || element !== vertex) continue;
    numbers.place(columns.map((column) => places[column]!));
    if (!numbers.read()) continue;
    if (numbers.lost) sink.lose();
    else sink.add(values[0]! * scale, values[1]! * scale, values[2]! * scale, 0);
  }
}

/** Finds the cell of each property in a row, lists included; a row that does not fit is a fault. */
function placesOf(element: PlyElement, rows: TextRows, places: Int32Array, faults: FaultList): boolean {
  let cell = 0;
  for (let p = 0; p < element.properties.length; p++) {
    places[p] = cell;
    const { count, name } = element.properties[p]!;
    if (count !== null && cell < rows.count) {
      const length = listLength(rows, cell);
      if (!(length >= 0)) return refuseList(name, rows, cell, faults);
      cell += length;
    }
    cell++;
  }
  if (cell === rows.count) return true;
  const code = rows.count < cell && rows.unterminated ? "file-truncated" : "file-row-invalid";
  const what = `the row of ${quoted(element.name)} has ${rows.count} numbers where ${cell} were expected`;
  faults.add(code, what, { line: rows.line });
  return false;
}

function listLength(rows: TextRows, cell: number): number {
  const length = parseNumber(rows.bytes, rows.starts[cell] ?? 0, rows.ends[cell] ?? 0, DOT);
  return Number.isInteger(length) ? length : Number.NaN;
}

function refuseList(name: string, rows: TextRows, cell: number, faults: FaultList): false {
  const found = utf8Text(rows.bytes, rows.starts[cell] ?? 0, rows.ends[cell] ?? 0);
  const what = `list ${name} begins with ${quoted(found)} where its length was expected`;
  faults.add("file-value-invalid", what, { line: rows.line, field: name });
  return false;
}

function refuseEnd({ name, count }: PlyElement, { met, rows }: NumberRows, faults: FaultList): void {
  const what = `the header says ${count} of element ${quoted(name)}, the file ends after ${met}`;
  faults.add("file-truncated", what, { line: rows.line, field: name });
}

function refuseRest({ count }: PlyElement, rows: TextRows, faults: FaultList): void {
  const what = `more rows follow than the header says (vertex ${count})`;
  faults.add("file-header-invalid", what, { line: rows.line, field: "vertex" });
}
