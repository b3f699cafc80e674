import { type FaultList, quoted } from "../fault-list.ts";
import { type CellKind, cellKind } from "../number/cell-kind.ts";
import { parseNumber } from "../number/parse-number.ts";
import { utf8Text } from "./bytes.ts";
import { wasCut } from "./cut-row.ts";
import { quickRow, type RowShape, rowShape } from "./quick-row.ts";
import { TextRows } from "./text-rows.ts";

/** A column to be read as numbers. */
export interface NumberColumn {
  /** Place in the row, 0-based. */
  index: number;
  readonly name: string;
  /** What may stand there beside a number: nothing else, a word for nan, or also an empty cell (a lost return). */
  readonly allows: "number" | "nan" | "empty";
}

/** Where the rows stand and how they are written. */
export interface RowSource {
  readonly bytes: Uint8Array;
  readonly separator: number;
  readonly mark: number;
  readonly bodyAt: number;
  readonly bodyLine: number;
}

/** Reads chosen columns of a text row by row as numbers; what cannot be read becomes faults. */
export class NumberRows {
  /** Numbers of the row that `next` found, in the order of the columns. */
  readonly values: Float64Array;
  /** True where that row is a lost return: a word for nan, or an empty cell where one is allowed. */
  lost = false;
  /** Rows met so far, readable or not. */
  met = 0;
  /** Rows to be met at most. */
  limit = Number.POSITIVE_INFINITY;
  readonly rows: TextRows;
  readonly #mark: number;
  readonly #separator: number;
  readonly #columns: readonly NumberColumn[];
  readonly #width: number | null;
  readonly #faults: FaultList;
  readonly #shape: RowShape | null;

  /** @param width number of cells that every row must have; null where rows may differ */
  constructor(source: RowSource, columns: readonly NumberColumn[], width: number | null, faults: FaultList) {
    this.rows = new TextRows(source.bytes, source.separator, source.bodyAt, source.bodyLine);
    this.#mark = source.mark;
    this.#separator = source.separator;
    this.#columns = columns;
    this.#width = width;
    this.#faults = faults;
    this.values = new Float64Array(columns.length);
    const wanted = columns.map(({ index }) => index);
    this.#shape = rowShape(source, wanted, width);
  }

  /** Goes to the next row that can be read or is lost; false at the end, or when faults are enough. */
  next(): boolean {
    while (!this.#faults.full && this.met < this.limit) {
      if (this.#quick()) return true;
      if (!this.rows.next()) return false;
      this.met++;
      if (this.#fits() && this.read()) return true;
    }
    return false;
  }

  #quick(): boolean {
    const { rows } = this;
    const shape = this.#shape;
    if (shape === null || rows.at >= shape.limit) return false;
    const next = quickRow(rows.bytes, rows.at, shape, this.values);
    if (next < 0) return false;
    rows.at = next;
    rows.line++;
    this.met++;
    this.lost = false;
    return true;
  }

  /** Goes through all rows only for their faults. */
  pass(): void {
    while (this.next()) this.lost = false;
  }

  /** Moves the columns to other cells, in the order given to the constructor: for rows of varying shape. */
  place(cells: readonly number[]): void {
    this.#columns.forEach((column, i) => {
      column.index = cells[i]!;
    });
  }

  /** Reads the row that `rows` stands at; false where it has faults. */
  read(): boolean {
    const { rows, values } = this;
    const columns = this.#columns;
    let clean = true;
    for (let i = 0; i < columns.length; i++) {
      const { index } = columns[i]!;
      const value = parseNumber(rows.bytes, rows.starts[index]!, rows.ends[index]!, this.#mark);
      values[i] = value;
      if (value - value !== 0) clean = false;
    }
    this.lost = false;
    return (clean || this.#judge()) && !(rows.unterminated && this.#cut());
  }

  /** Why some cell of the row is no finite number: lost, or a fault each. */
  #judge(): boolean {
    const { rows } = this;
    const kinds = this.#columns.map(({ index }) =>
      cellKind(rows.bytes, rows.starts[index]!, rows.ends[index]!, this.#mark),
    );
    const anyEmptyAllowed = this.#columns.some(
      (column, i) => column.allows === "empty" && kinds[i] === "empty",
    );
    let good = true;
    this.#columns.forEach((column, i) => {
      if (isAllowed(column, kinds[i]!, anyEmptyAllowed)) return;
      good = false;
      this.#refuseCell(column, kinds[i]!);
    });
    this.lost = good;
    return good;
  }

  #refuseCell({ index, name }: NumberColumn, kind: CellKind): void {
    const { rows } = this;
    const place = { line: rows.line, field: name };
    const cell = quoted(utf8Text(rows.bytes, rows.starts[index]!, rows.ends[index]!));
    const what = kind === "empty" ? "is empty" : `holds ${cell}`;
    const cutEnd = rows.unterminated && index === rows.count - 1;
    const code = cutEnd ? "file-truncated" : "file-value-invalid";
    this.#faults.add(code, `column ${name} ${what} where a number was expected`, place);
  }

  #fits(): boolean {
    const { rows } = this;
    const width = this.#width;
    if (width === null || rows.count === width) return true;
    if (rows.count > width && this.#onlyEmptyAfter(width)) return true;
    const code = rows.count < width && rows.unterminated ? "file-truncated" : "file-row-invalid";
    const missing = this.#columns.find(({ index }) => index >= rows.count);
    const what = `the row has ${rows.count} columns where ${width} were expected`;
    const also = missing === undefined ? "" : `; ${missing.name} is missing`;
    const field = missing === undefined ? {} : { field: missing.name };
    this.#faults.add(code, what + also, { line: rows.line, ...field });
    return false;
  }

  /** A separator at the end of a row adds no column. */
  #onlyEmptyAfter(width: number): boolean {
    const { rows } = this;
    for (let cell = width; cell < rows.count; cell++) {
      if (cell >= rows.starts.length || rows.ends[cell]! > rows.starts[cell]!) return false;
    }
    return true;
  }

  #cut(): boolean {
    const { rows } = this;
    if (!wasCut(rows, this.#separator, this.#mark)) return false;
    const what =
      "the last number has fewer decimals than in every row before and no line end follows: it was cut";
    this.#faults.add("file-truncated", what, { line: rows.line });
    return true;
  }
}

function isAllowed({ allows }: NumberColumn, kind: CellKind, rowIsEmpty: boolean): boolean {
  if (kind === "number") return true;
  if (kind === "nan") return allows !== "number";
  return kind === "empty" && rowIsEmpty && allows !== "number";
}
