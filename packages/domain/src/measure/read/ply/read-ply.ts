import { MM_PER, PointSink } from "../point-sink.ts";
import type { OpenFile } from "../scan-input.ts";
import { findColumns } from "../text/column-names.ts";
import { readPlyAscii } from "./ply-ascii.ts";
import { readPlyBinary } from "./ply-binary.ts";
import { readPlyHeader } from "./ply-header.ts";

/**
 * Reads the vertices of a PLY file, ascii or binary; every other element and property is passed over.
 */
export function readPly(file: OpenFile): PointSink {
  const { bytes, units, faults } = file;
  const header = readPlyHeader(file);
  const none = new PointSink(false);
  if (header === null) return none;
  const vertex = header.elements.find(({ name }) => name === "vertex");
  if (vertex === undefined) {
    faults.add("file-header-invalid", "the header has no element vertex", { line: header.lines });
    return none;
  }
  const names = vertex.properties.map(({ name }) => name);
  const wanted = ["x", "y", "z"].map((base) => ({ base, isLength: true }));
  const columns = findColumns(
    { names, units, place: { line: vertex.line }, noun: "property" },
    wanted,
    faults,
  );
  if (columns === null) return none;
  const list = columns.find((column) => vertex.properties[column]!.count !== null);
  if (list !== undefined) {
    const what = `property ${names[list]} is a list where one number was expected`;
    faults.add("file-header-invalid", what, { line: vertex.line, field: names[list]! });
    return none;
  }
  const body = { bytes, header, vertex, columns, scale: MM_PER[units] };
  return header.format === "ascii" ? readPlyAscii(body, faults) : readPlyBinary(body, faults);
}
