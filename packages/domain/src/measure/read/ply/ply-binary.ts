import { type FaultList, quoted } from "../fault-list.ts";
import { PointSink } from "../point-sink.ts";
import { viewOf } from "../scalar.ts";
import { readStrided, type StridedField } from "../strided-points.ts";
import type { PlyBody } from "./ply-body.ts";
import type { PlyElement } from "./ply-header.ts";

/** Reads a binary body: elements in the order of the header, each record without gaps. */
export function readPlyBinary(body: PlyBody, faults: FaultList): PointSink {
  const { bytes, header } = body;
  const little = header.format === "binary_little_endian";
  const sink = new PointSink(false);
  let at = header.bodyAt;
  for (const element of header.elements) {
    const next = isFixed(element)
      ? passFixed(body, element, { at, little }, sink)
      : passLists(body, element, { at, little }, sink);
    if (next.missing !== null) {
      refuseEnd(element, next.missing, bytes.length, faults);
      return sink;
    }
    at = next.at;
  }
  refuseRest(body, at, faults);
  return sink;
}

interface Cursor {
  readonly at: number;
  readonly little: boolean;
}

/** Where the element ends, or how many whole records there are of it where the bytes end before. */
interface Passed {
  readonly at: number;
  readonly missing: number | null;
}

function isFixed({ properties }: PlyElement): boolean {
  return properties.every(({ count }) => count === null);
}

/** Passes an element whose records all have one length; reads it where it is the vertex. */
function passFixed(body: PlyBody, element: PlyElement, { at, little }: Cursor, sink: PointSink): Passed {
  const { bytes, vertex, columns, scale } = body;
  const offsets = [0];
  for (const { scalar } of element.properties) offsets.push(offsets.at(-1)! + scalar.bytes);
  const stride = offsets.at(-1)!;
  const end = at + stride * element.count;
  if (end > bytes.length) return { at, missing: Math.max(0, Math.floor((bytes.length - at) / stride)) };
  if (element !== vertex) return { at: end, missing: null };
  const field = (column: number): StridedField => ({
    scalar: element.properties[column]!.scalar,
    at: at + offsets[column]!,
    stride,
  });
  const xyz = [field(columns[0]!), field(columns[1]!), field(columns[2]!)] as const;
  readStrided({ bytes, count: element.count, little, scale, xyz }, sink);
  return { at: end, missing: null };
}

/** Passes an element with lists, record by record; reads it where it is the vertex. */
function passLists(body: PlyBody, element: PlyElement, cursor: Cursor, sink: PointSink): Passed {
  const { bytes, vertex, columns, scale } = body;
  const { little } = cursor;
  const view = viewOf(bytes);
  const { properties } = element;
  const values = new Float64Array(properties.length);
  let { at } = cursor;
  for (let i = 0; i < element.count; i++) {
    for (let p = 0; p < properties.length; p++) {
      const { scalar, count } = properties[p]!;
      const head = count ?? scalar;
      if (at + head.bytes > bytes.length) return { at, missing: i };
      values[p] = head.read(view, at, little);
      at += head.bytes;
      // A negative length, which only a damaged file has, leads to the end of the file as well.
      if (count !== null) at += values[p]! < 0 ? bytes.length : values[p]! * scalar.bytes;
    }
    if (at > bytes.length) return { at, missing: i };
    if (element !== vertex) continue;
    sink.add(values[columns[0]!]! * scale, values[columns[1]!]! * scale, values[columns[2]!]! * scale, 0);
  }
  return { at, missing: null };
}

function refuseEnd({ name, count }: PlyElement, found: number, byte: number, faults: FaultList): void {
  const what = `the header says ${count} of element ${quoted(name)}, the file ends after ${found}`;
  faults.add("file-truncated", what, { byte, field: name });
}

/** Bytes after the last element mean a wrong count; zeros are padding. */
function refuseRest({ bytes, vertex }: PlyBody, from: number, faults: FaultList): void {
  let at = from;
  while (at < bytes.length && (bytes[at] === 0 || bytes[at] === 0x0a || bytes[at] === 0x0d)) at++;
  if (at >= bytes.length) return;
  const what = `${bytes.length - from} bytes follow the last element that the header names (vertex ${vertex.count})`;
  faults.add("file-header-invalid", what, { byte: from, field: "vertex" });
}
