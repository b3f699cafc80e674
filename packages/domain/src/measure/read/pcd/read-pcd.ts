import type { FaultList } from "../fault-list.ts";
import { MM_PER, PointSink } from "../point-sink.ts";
import { viewOf } from "../scalar.ts";
import type { OpenFile } from "../scan-input.ts";
import { readStrided, type StridedField } from "../strided-points.ts";
import { BLANK, DOT } from "../text/bytes.ts";
import { findColumns } from "../text/column-names.ts";
import { NumberRows } from "../text/number-rows.ts";
import { rowsExpected } from "../text/rows-expected.ts";
import { LZF_MAX_RATIO, unpackLzf } from "./lzf.ts";
import { type PcdField, type PcdHeader, readPcdHeader } from "./pcd-header.ts";

/** Bytes that a packed body may have unpacked: 1 GiB. */
const MAX_UNPACKED = 2 ** 30;

/** A PCD file whose header is read. */
interface PcdBody {
  readonly bytes: Uint8Array;
  readonly header: PcdHeader;
  /** Places of x, y and z among the fields. */
  readonly columns: readonly number[];
  /** Millimetres in a unit of the file. */
  readonly scale: number;
}

/**
 * Reads a PCD file: ascii, binary or binary_compressed. Fields beside x, y, z and the VIEWPOINT are passed over.
 */
export function readPcd(file: OpenFile): PointSink {
  const { bytes, units, faults } = file;
  const header = readPcdHeader(file);
  if (header === null) return new PointSink(false);
  const names = header.fields.map(({ name }) => name);
  const wanted = ["x", "y", "z"].map((base) => ({ base, isLength: true }));
  const columns = findColumns(
    { names, units, place: { line: header.fieldsLine }, noun: "field" },
    wanted,
    faults,
  );
  if (columns === null) return new PointSink(false);
  for (const column of columns) {
    const { name, count } = header.fields[column]!;
    if (count === 1) continue;
    const what = `field ${name} has COUNT ${count} where 1 was expected`;
    faults.add("file-header-invalid", what, { line: header.fieldsLine, field: name });
  }
  if (faults.any) return new PointSink(false);
  const body = { bytes, header, columns, scale: MM_PER[units] };
  switch (header.data) {
    case "ascii":
      return readAscii(body, faults);
    case "binary":
      return readBinary(body, faults);
    case "binary_compressed":
      return readCompressed(body, faults);
    default:
      return header.data satisfies never;
  }
}

function readAscii({ bytes, header, columns, scale }: PcdBody, faults: FaultList): PointSink {
  const sink = new PointSink(false);
  const { fields, points } = header;
  const starts = offsets(fields, ({ count }) => count);
  const source = { bytes, separator: BLANK, mark: DOT, bodyAt: header.bodyAt, bodyLine: header.lines };
  const numbers = columns.map((column) => ({
    index: starts[column]!,
    name: fields[column]!.name,
    allows: "nan" as const,
  }));
  const rows = new NumberRows(source, numbers, starts.at(-1)!, faults);
  const { values } = rows;
  sink.reserve(Math.min(points, rowsExpected(bytes, header.bodyAt)));
  while (rows.next()) {
    if (rows.lost) sink.lose();
    else sink.add(values[0]! * scale, values[1]! * scale, values[2]! * scale, 0);
  }
  if (!faults.full && rows.met !== points) {
    const code = rows.met < points ? "file-truncated" : "file-header-invalid";
    faults.add(code, `the header says ${points} points, ${rows.met} rows follow`, { line: rows.rows.line });
  }
  return sink;
}

/** Records of all fields, one after the other, little endian. Bytes after the last are padding. */
function readBinary({ bytes, header, columns, scale }: PcdBody, faults: FaultList): PointSink {
  const { fields, points, bodyAt } = header;
  const starts = offsets(fields, ({ scalar, count }) => scalar.bytes * count);
  const stride = starts.at(-1)!;
  if (bodyAt + stride * points > bytes.length) {
    const found = Math.max(0, Math.floor((bytes.length - bodyAt) / stride));
    const what = `the header says ${points} points, the file ends after ${found}`;
    faults.add("file-truncated", what, { byte: bytes.length });
    return new PointSink(false);
  }
  const field = (column: number): StridedField => ({
    scalar: fields[column]!.scalar,
    at: bodyAt + starts[column]!,
    stride,
  });
  return readBlock({ bytes, columns, count: points, scale }, field);
}

/** An LZF block in which each field stands whole: all x, then all y, and so on. */
function readCompressed({ bytes, header, columns, scale }: PcdBody, faults: FaultList): PointSink {
  const { fields, points } = header;
  const starts = offsets(fields, ({ scalar, count }) => scalar.bytes * count * points);
  const plain = unpackBody(bytes, header.bodyAt, starts.at(-1)!, faults);
  if (plain === null) return new PointSink(false);
  const field = (column: number): StridedField => ({
    scalar: fields[column]!.scalar,
    at: starts[column]!,
    stride: fields[column]!.scalar.bytes,
  });
  return readBlock({ bytes: plain, columns, count: points, scale }, field);
}

interface Block {
  readonly bytes: Uint8Array;
  readonly columns: readonly number[];
  readonly count: number;
  readonly scale: number;
}

function readBlock(
  { bytes, columns, count, scale }: Block,
  field: (column: number) => StridedField,
): PointSink {
  const sink = new PointSink(false);
  const xyz = [field(columns[0]!), field(columns[1]!), field(columns[2]!)] as const;
  readStrided({ bytes, count, little: true, scale, xyz }, sink);
  return sink;
}

/** Unpacks the block after its two sizes; null with a fault where it is short, damaged or of another size. */
function unpackBody(bytes: Uint8Array, at: number, expected: number, faults: FaultList): Uint8Array | null {
  if (at + 8 > bytes.length) {
    faults.add("file-truncated", "the file ends before the sizes of the packed block", {
      byte: bytes.length,
    });
    return null;
  }
  const view = viewOf(bytes);
  const packed = view.getUint32(at, true);
  const size = view.getUint32(at + 4, true);
  const start = at + 8;
  if (start + packed > bytes.length) {
    const what = `the packed block says ${packed} bytes, the file has ${bytes.length - start}`;
    faults.add("file-truncated", what, { byte: bytes.length });
    return null;
  }
  if (size !== expected || size > packed * LZF_MAX_RATIO) {
    const what = `the packed block says ${size} bytes unpacked where the header needs ${expected}`;
    faults.add("file-header-invalid", what, { byte: at + 4 });
    return null;
  }
  if (size > MAX_UNPACKED) {
    const what = `the packed block says ${size} bytes unpacked, at most ${MAX_UNPACKED} are read`;
    faults.add("file-too-large", what, { byte: at + 4 });
    return null;
  }
  const plain = new Uint8Array(size);
  const fault = unpackLzf(bytes.subarray(start, start + packed), plain);
  if (fault === null) return plain;
  faults.add("file-truncated", `the packed block is damaged: ${fault.why}`, { byte: start + fault.byte });
  return null;
}

/** Running sums of a size a field, from 0; the last is the sum of all. */
function offsets(fields: readonly PcdField[], size: (field: PcdField) => number): number[] {
  const sums = [0];
  for (const field of fields) sums.push(sums.at(-1)! + size(field));
  return sums;
}
