import { type FaultList, quoted } from "../fault-list.ts";
import {
  FLOAT32,
  FLOAT64,
  INT8,
  INT16,
  INT32,
  INT64,
  type Scalar,
  UINT8,
  UINT16,
  UINT32,
  UINT64,
} from "../scalar.ts";
import type { OpenFile } from "../scan-input.ts";
import { HeaderLines, wholeNumber } from "../text/header-lines.ts";
import { checkCommentUnit } from "../text/unit-comment.ts";

/** How the body is written. */
export type PcdData = "ascii" | "binary" | "binary_compressed";

/** One field of a point. */
export interface PcdField {
  readonly name: string;
  readonly scalar: Scalar;
  /** Values a point. */
  readonly count: number;
}

/** What a PCD header says, and where the body begins. */
export interface PcdHeader {
  readonly fields: readonly PcdField[];
  readonly points: number;
  readonly data: PcdData;
  /** Line of FIELDS. */
  readonly fieldsLine: number;
  readonly bodyAt: number;
  /** Number of lines up to the body. */
  readonly lines: number;
}

/** Types by the letter of TYPE and the digit of SIZE. */
const SCALARS = new Map<string, Scalar>([
  ["I1", INT8],
  ["I2", INT16],
  ["I4", INT32],
  ["I8", INT64],
  ["U1", UINT8],
  ["U2", UINT16],
  ["U4", UINT32],
  ["U8", UINT64],
  ["F4", FLOAT32],
  ["F8", FLOAT64],
]);

const KEYWORDS = [
  "VERSION",
  "FIELDS",
  "COLUMNS",
  "SIZE",
  "TYPE",
  "COUNT",
  "WIDTH",
  "HEIGHT",
  "VIEWPOINT",
  "POINTS",
  "DATA",
];
const DATA: readonly string[] = ["ascii", "binary", "binary_compressed"];

interface Entry {
  readonly words: readonly string[];
  readonly line: number;
}

/** True where a line begins as a line of a PCD header does. */
export function isPcdLine(text: string): boolean {
  return text.startsWith("# .PCD") || /^(VERSION|FIELDS)\s/.test(text);
}

/**
 * Reads a PCD header, up to the line DATA. COUNT, VIEWPOINT and one of POINTS and WIDTH may miss.
 * @returns null where it has faults, each noted with its line
 * Source: the PCD format, version 0.7.
 */
export function readPcdHeader(file: OpenFile): PcdHeader | null {
  const { bytes, from, faults } = file;
  const lines = new HeaderLines(bytes, from);
  const entries = new Map<string, Entry>();
  while (!entries.has("DATA")) {
    const text = lines.next();
    const words = text?.split(/\s+/) ?? [];
    if (text === null || !(text === "" || text.startsWith("#") || KEYWORDS.includes(words[0]!))) {
      const found = text === null ? "the file ends" : `${quoted(text)} stands there`;
      const what = `the header is not closed: ${found} where DATA was expected`;
      faults.add("file-header-invalid", what, { line: lines.line });
      return null;
    }
    if (text.startsWith("#")) checkCommentUnit(text, lines.line, file);
    if (text === "" || text.startsWith("#")) continue;
    const keyword = words[0] === "COLUMNS" ? "FIELDS" : words[0]!;
    entries.set(keyword, { words: words.slice(1), line: lines.line });
  }
  const fields = readFields(entries, faults);
  const points = readPoints(entries, faults);
  const data = readData(entries, faults);
  if (fields === null || points === null || data === null) return null;
  const fieldsLine = entries.get("FIELDS")!.line;
  return { fields, points, data, fieldsLine, bodyAt: lines.at, lines: lines.line };
}

function readFields(entries: ReadonlyMap<string, Entry>, faults: FaultList): PcdField[] | null {
  const names = entries.get("FIELDS");
  const sizes = entries.get("SIZE");
  const types = entries.get("TYPE");
  if (names === undefined || sizes === undefined || types === undefined) {
    const missing = ["FIELDS", "SIZE", "TYPE"].filter((keyword) => !entries.has(keyword));
    faults.add("file-header-invalid", `the header has no line ${missing.join(", ")}`);
    return null;
  }
  const counts = entries.get("COUNT") ?? { words: names.words.map(() => "1"), line: names.line };
  for (const { words, line } of [sizes, types, counts]) {
    if (words.length === names.words.length) continue;
    const what = `${words.length} entries where FIELDS names ${names.words.length}`;
    faults.add("file-header-invalid", what, { line });
    return null;
  }
  const fields: PcdField[] = [];
  names.words.forEach((name, i) => {
    const scalar = SCALARS.get(`${types.words[i]}${sizes.words[i]}`);
    const count = wholeNumber(counts.words[i]);
    if (scalar !== undefined && count !== null) fields.push({ name, scalar, count });
    else {
      const found = `TYPE ${types.words[i]}, SIZE ${sizes.words[i]}, COUNT ${counts.words[i]}`;
      faults.add("file-header-invalid", `field ${quoted(name)} has ${found}`, {
        line: types.line,
        field: name,
      });
    }
  });
  return fields.length === names.words.length ? fields : null;
}

function readPoints(entries: ReadonlyMap<string, Entry>, faults: FaultList): number | null {
  const number = (keyword: string): number | null | undefined => {
    const entry = entries.get(keyword);
    if (entry === undefined) return undefined;
    const value = entry.words.length === 1 ? wholeNumber(entry.words[0]) : null;
    if (value !== null) return value;
    const what = `${keyword} ${quoted(entry.words.join(" "))} is no whole number`;
    faults.add("file-header-invalid", what, { line: entry.line, field: keyword });
    return null;
  };
  const [points, width, height] = [number("POINTS"), number("WIDTH"), number("HEIGHT")];
  if (points === null || width === null || height === null) return null;
  if (width === undefined) {
    if (points === undefined) faults.add("file-header-invalid", "the header has neither POINTS nor WIDTH");
    return points ?? null;
  }
  const product = width * (height ?? 1);
  if (points === undefined || points === product) return product;
  const what = `POINTS ${points} is not WIDTH ${width} x HEIGHT ${height ?? 1}`;
  faults.add("file-header-invalid", what, { line: entries.get("POINTS")!.line, field: "POINTS" });
  return null;
}

function readData(entries: ReadonlyMap<string, Entry>, faults: FaultList): PcdData | null {
  const { words, line } = entries.get("DATA")!;
  if (DATA.includes(words.join(" "))) return words[0] as PcdData;
  const what = `DATA ${quoted(words.join(" "))} is none of ${DATA.join(", ")}`;
  faults.add("file-header-invalid", what, { line, field: "DATA" });
  return null;
}
