import { type FaultList, quoted } from "../fault-list.ts";
import { FLOAT32, FLOAT64, INT8, INT16, INT32, type Scalar, UINT8, UINT16, UINT32 } from "../scalar.ts";
import type { OpenFile } from "../scan-input.ts";
import { HeaderLines, wholeNumber } from "../text/header-lines.ts";
import { checkCommentUnit } from "../text/unit-comment.ts";

/** How the body is written. */
export type PlyFormat = "ascii" | "binary_little_endian" | "binary_big_endian";

/** One value of an element, or a list of values led by their count. */
export interface PlyProperty {
  readonly name: string;
  readonly scalar: Scalar;
  /** Type of the count that leads a list; null for a single value. */
  readonly count: Scalar | null;
}

/** One kind of thing in the body, in the order of the header. */
export interface PlyElement {
  readonly name: string;
  readonly count: number;
  readonly properties: PlyProperty[];
  readonly line: number;
}

/** What a PLY header says, and where the body begins. */
export interface PlyHeader {
  readonly format: PlyFormat;
  readonly elements: readonly PlyElement[];
  readonly bodyAt: number;
  /** Number of lines up to the body. */
  readonly lines: number;
}

const SCALARS = new Map<string, Scalar>([
  ["char", INT8],
  ["int8", INT8],
  ["uchar", UINT8],
  ["uint8", UINT8],
  ["short", INT16],
  ["int16", INT16],
  ["ushort", UINT16],
  ["uint16", UINT16],
  ["int", INT32],
  ["int32", INT32],
  ["uint", UINT32],
  ["uint32", UINT32],
  ["float", FLOAT32],
  ["float32", FLOAT32],
  ["double", FLOAT64],
  ["float64", FLOAT64],
]);

const FORMATS: readonly string[] = ["ascii", "binary_little_endian", "binary_big_endian"];

/**
 * Reads a PLY header, from `ply` to `end_header`.
 * @returns null where it has faults, each noted with its line
 * Source: G. Turk, The PLY Polygon File Format (1994), version 1.0; sized type names as later programs write them.
 */
export function readPlyHeader(file: OpenFile): PlyHeader | null {
  const { bytes, from, faults } = file;
  const lines = new HeaderLines(bytes, from);
  if (lines.next() !== "ply") {
    faults.add("file-header-invalid", `the first line must be "ply"`, { line: 1 });
    return null;
  }
  const elements: PlyElement[] = [];
  let format: PlyFormat | null = null;
  for (;;) {
    const text = lines.next();
    if (text === null) {
      faults.add("file-header-invalid", "the header is not closed: no line end_header", { line: lines.line });
      return null;
    }
    const words = text.split(/\s+/);
    if (text === "end_header") break;
    if (words[0] === "comment" || words[0] === "obj_info") checkCommentUnit(text, lines.line, file);
    if (words[0] === "format") format = readFormat(words, lines.line, faults);
    else if (!readLine(words, elements, lines.line, faults)) return null;
  }
  if (format === null && !faults.any) {
    faults.add("file-header-invalid", "the header has no format line", { line: lines.line });
  }
  if (format === null || faults.any) return null;
  return { format, elements, bodyAt: lines.at, lines: lines.line };
}

function readFormat(words: readonly string[], line: number, faults: FaultList): PlyFormat | null {
  if (FORMATS.includes(words[1] ?? "") && words[2] === "1.0") return words[1] as PlyFormat;
  const what = `${quoted(words.join(" "))} is no format this reader knows: ${FORMATS.join(", ")}, each 1.0`;
  faults.add("file-header-invalid", what, { line });
  return null;
}

/** Reads any other line; false where it is no line of a header, so that the header was never closed. */
function readLine(
  words: readonly string[],
  elements: PlyElement[],
  line: number,
  faults: FaultList,
): boolean {
  switch (words[0]) {
    case "comment":
    case "obj_info":
    case "":
      return true;
    case "element":
      addElement(words, elements, line, faults);
      return true;
    case "property":
      addProperty(words, elements.at(-1), line, faults);
      return true;
    default:
      faults.add(
        "file-header-invalid",
        `the header is not closed: ${quoted(words.join(" "))} stands where end_header was expected`,
        { line },
      );
      return false;
  }
}

function addElement(words: readonly string[], elements: PlyElement[], line: number, faults: FaultList): void {
  const count = wholeNumber(words[2]);
  if (words.length === 3 && count !== null) {
    elements.push({ name: words[1]!, count, properties: [], line });
    return;
  }
  const what = `${quoted(words.join(" "))} is not "element", a name and a count`;
  faults.add("file-header-invalid", what, { line });
  elements.push({ name: words[1] ?? "", count: 0, properties: [], line });
}

function addProperty(
  words: readonly string[],
  element: PlyElement | undefined,
  line: number,
  faults: FaultList,
): void {
  const property = words[1] === "list" ? listProperty(words) : singleProperty(words);
  if (property !== null && element !== undefined) element.properties.push(property);
  else {
    const why = element === undefined ? "has no element before it" : "is no property of a known type";
    faults.add("file-header-invalid", `${quoted(words.join(" "))} ${why}`, { line });
  }
}

function singleProperty([, type, name, ...rest]: readonly string[]): PlyProperty | null {
  const scalar = SCALARS.get(type ?? "");
  if (scalar === undefined || name === undefined || rest.length > 0) return null;
  return { name, scalar, count: null };
}

function listProperty([, , countType, type, name, ...rest]: readonly string[]): PlyProperty | null {
  const count = SCALARS.get(countType ?? "");
  const scalar = SCALARS.get(type ?? "");
  if (count === undefined || count.isFloat32 || count === FLOAT64) return null;
  if (scalar === undefined || name === undefined || rest.length > 0) return null;
  return { name, scalar, count };
}
