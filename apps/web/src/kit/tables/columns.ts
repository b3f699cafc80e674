import type { ReactNode } from "react";

/** What a cell is worth for sorting and export; null where there is nothing. */
export type CellValue = string | number | boolean | null;

/** One column of a table. */
export interface Column<Row> {
  readonly id: string;
  readonly head: string;
  /** What the cell shows; without it the value itself. */
  readonly cell?: (row: Row) => ReactNode;
  /** What the cell is worth: sorted by, exported. A column without it is only looked at. */
  readonly value?: (row: Row) => CellValue;
  readonly align?: "left" | "right";
  /** In the mono face, for codes and numbers. */
  readonly figures?: boolean;
  /** CSS width, such as "7rem"; one column should be left without, to take what remains. */
  readonly width?: string;
  /** Left out where the screen is narrow. */
  readonly wideOnly?: boolean;
  /** Shown only when somebody chooses it. */
  readonly optional?: boolean;
  /** Its head in an exported file, where the unit belongs: "largest_mm". */
  readonly field?: string;
}

/** By which column a table is sorted. */
export interface Sort {
  readonly column: string;
  readonly descending: boolean;
}

const collator = new Intl.Collator("en", { numeric: true, sensitivity: "base" });

/**
 * Rows in the order of a column: numbers by size, text as people count (S2 before S10), nothing always last.
 * Equal rows keep their order. Without a sort, or for a column without values, the rows as given.
 */
export function sortRows<Row>(
  rows: readonly Row[],
  columns: readonly Column<Row>[],
  sort: Sort | null,
): readonly Row[] {
  const value = columns.find((column) => column.id === sort?.column)?.value;
  if (sort === null || value === undefined) return rows;
  const sign = sort.descending ? -1 : 1;
  return [...rows].sort((a, b) => compareCells(value(a), value(b), sign));
}

function compareCells(a: CellValue, b: CellValue, sign: number): number {
  if (a === null || b === null) return Number(a === null) - Number(b === null);
  if (typeof a === "string" || typeof b === "string") return sign * collator.compare(String(a), String(b));
  return sign * (Number(a) - Number(b));
}

/** What a press on a head does: first upwards, then downwards, then the order as it came. */
export function nextSort(sort: Sort | null, column: string): Sort | null {
  if (sort?.column !== column) return { column, descending: false };
  return sort.descending ? null : { column, descending: true };
}

/** A sort as it stands in the URL: "largest" upwards, "-largest" downwards. */
export function sortText(sort: Sort | null): string {
  if (sort === null) return "";
  return sort.descending ? `-${sort.column}` : sort.column;
}

/** The sort that a URL names; null where it names none. */
export function parseSort(text: string | null): Sort | null {
  if (text === null || text === "" || text === "-") return null;
  return text.startsWith("-")
    ? { column: text.slice(1), descending: true }
    : { column: text, descending: false };
}

/** The classes by which a column's head and cells keep one side and one width of screen. */
export function columnClass<Row>(column: Column<Row>): string {
  const side = column.align === "right" ? "text-right" : "text-left";
  return column.wideOnly === true ? `${side} max-sm:hidden` : side;
}
