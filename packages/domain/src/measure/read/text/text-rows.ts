import { BLANK, CR, HASH, LF, SLASH, TAB } from "./bytes.ts";

/** Cells of one row whose places are kept; further ones are counted only. */
const MAX_CELLS = 4096;
const FIRST_CELLS = 16;

/**
 * Walks through the rows of a text and finds their cells, without making strings.
 * Lines end with LF, CR LF or CR. Blank lines and comments (`#`, `//`) are passed over but counted as lines.
 */
export class TextRows {
  /** 1-based line of the row that `next` found. */
  line: number;
  /** Number of cells in that row. */
  count = 0;
  /** First byte of each cell, blanks left out. */
  starts = new Int32Array(FIRST_CELLS);
  /** Byte after the last of each cell, blanks left out. */
  ends = new Int32Array(FIRST_CELLS);
  /** First byte of the row. */
  rowStart = 0;
  /** Byte after the last of the row, without the line end. */
  rowEnd = 0;
  /** True where the text ended without a line end. */
  unterminated = false;
  /** Where the next line begins. */
  at: number;
  readonly bytes: Uint8Array;
  readonly #separator: number;

  /**
   * @param separator the byte between cells; BLANK stands for any run of blanks and tabs
   * @param from where the first line begins
   * @param line number of lines before it
   */
  constructor(bytes: Uint8Array, separator: number, from = 0, line = 0) {
    this.bytes = bytes;
    this.#separator = separator;
    this.at = from;
    this.line = line;
  }

  /** Goes to the next row that has cells; false at the end of the text. */
  next(): boolean {
    while (this.at < this.bytes.length) {
      this.line++;
      this.rowStart = this.at;
      if (this.#skipComment()) continue;
      if (this.#separator === BLANK) this.#splitAtBlanks();
      else this.#splitAtSeparator();
      if (this.count > 1 || (this.count === 1 && this.ends[0]! > this.starts[0]!)) return true;
    }
    return false;
  }

  #skipComment(): boolean {
    const { bytes } = this;
    let at = this.at;
    while (bytes[at] === BLANK || bytes[at] === TAB) at++;
    if (bytes[at] !== HASH && (bytes[at] !== SLASH || bytes[at + 1] !== SLASH)) return false;
    while (at < bytes.length && bytes[at] !== LF && bytes[at] !== CR) at++;
    this.#endRow(at);
    return true;
  }

  #splitAtBlanks(): void {
    const { bytes } = this;
    const end = bytes.length;
    let at = this.at;
    let count = 0;
    for (;;) {
      let byte = at < end ? bytes[at]! : LF;
      while (byte === BLANK || byte === TAB) byte = ++at < end ? bytes[at]! : LF;
      if (byte === LF || byte === CR) break;
      const start = at;
      while (byte > BLANK || (byte !== BLANK && byte !== TAB && byte !== LF && byte !== CR)) {
        byte = ++at < end ? bytes[at]! : LF;
      }
      this.#keep(count++, start, at);
    }
    this.count = count;
    this.#endRow(at);
  }

  #splitAtSeparator(): void {
    const { bytes } = this;
    const separator = this.#separator;
    const end = bytes.length;
    let at = this.at;
    let start = at;
    let count = 0;
    for (;;) {
      const byte = at < end ? bytes[at]! : LF;
      if (byte === separator) {
        this.#keepTrimmed(count++, start, at);
        start = at + 1;
      } else if (byte === LF || byte === CR) break;
      at++;
    }
    this.#keepTrimmed(count++, start, at);
    this.count = count;
    this.#endRow(at);
  }

  #keepTrimmed(cell: number, from: number, to: number): void {
    const { bytes } = this;
    let start = from;
    let end = to;
    while (start < end && (bytes[start] === BLANK || bytes[start] === TAB)) start++;
    while (end > start && (bytes[end - 1] === BLANK || bytes[end - 1] === TAB)) end--;
    this.#keep(cell, start, end);
  }

  #keep(cell: number, start: number, end: number): void {
    if (cell >= this.starts.length && !this.#grow()) return;
    this.starts[cell] = start;
    this.ends[cell] = end;
  }

  #grow(): boolean {
    if (this.starts.length >= MAX_CELLS) return false;
    const starts = new Int32Array(2 * this.starts.length);
    const ends = new Int32Array(starts.length);
    starts.set(this.starts);
    ends.set(this.ends);
    this.starts = starts;
    this.ends = ends;
    return true;
  }

  /** Notes where the row ends and steps over its line end. */
  #endRow(at: number): void {
    const { bytes } = this;
    this.rowEnd = at;
    this.unterminated = at >= bytes.length;
    this.at = bytes[at] === CR && bytes[at + 1] === LF ? at + 2 : at + 1;
  }
}
