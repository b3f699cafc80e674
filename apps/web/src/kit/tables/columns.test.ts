import { describe, expect, it } from "vitest";
import { type Column, nextSort, parseSort, sortRows, sortText } from "./columns.ts";
import { rowAfterKey } from "./row-keys.ts";
import { withParam } from "./url-state.ts";

interface Row {
  readonly seam: string;
  readonly largest_mm: number | null;
}
const ROWS: readonly Row[] = [
  { seam: "S10", largest_mm: 0.5 },
  { seam: "S2", largest_mm: null },
  { seam: "S1", largest_mm: 3.65 },
  { seam: "s3", largest_mm: 0.5 },
];
const COLUMNS: readonly Column<Row>[] = [
  { id: "seam", head: "Seam", value: (row) => row.seam },
  { id: "largest", head: "Largest", value: (row) => row.largest_mm },
  { id: "strip", head: "Deviation" },
];
const order = (column: string, descending: boolean) =>
  sortRows(ROWS, COLUMNS, { column, descending }).map((row) => row.seam);

describe("sorting a table", () => {
  it("counts seams as people do: S2 before S10, capitals or not", () => {
    expect(order("seam", false)).toEqual(["S1", "S2", "s3", "S10"]);
  });

  it("sorts numbers by size, equal ones in the order they came, and what is missing last both ways", () => {
    expect(order("largest", false)).toEqual(["S10", "s3", "S1", "S2"]);
    expect(order("largest", true)).toEqual(["S1", "S10", "s3", "S2"]);
  });

  it("leaves rows as they came without a sort, or for a column that has no values", () => {
    expect(sortRows(ROWS, COLUMNS, null)).toBe(ROWS);
    expect(sortRows(ROWS, COLUMNS, { column: "strip", descending: true })).toBe(ROWS);
    expect(sortRows(ROWS, COLUMNS, { column: "gone", descending: false })).toBe(ROWS);
  });

  it("goes upwards, downwards, then back to the order as it came, head by head", () => {
    const up = nextSort(null, "seam");
    expect(up).toEqual({ column: "seam", descending: false });
    expect(nextSort(up, "seam")).toEqual({ column: "seam", descending: true });
    expect(nextSort(nextSort(up, "seam"), "seam")).toBeNull();
    expect(nextSort(up, "largest")).toEqual({ column: "largest", descending: false });
  });

  it("is the same again when read back from the URL", () => {
    for (const sort of [null, { column: "seam", descending: false }, { column: "seam", descending: true }]) {
      expect(parseSort(sortText(sort))).toEqual(sort);
    }
    expect(parseSort(null)).toBeNull();
    expect(parseSort("-")).toBeNull();
  });
});

describe("a table by keyboard", () => {
  it("goes row by row, by the page, and to both ends, and stays in the table", () => {
    expect(rowAfterKey("ArrowDown", 3, 1200)).toBe(4);
    expect(rowAfterKey("PageUp", 3, 1200)).toBe(0);
    expect(rowAfterKey("End", 3, 1200)).toBe(1199);
    expect(rowAfterKey("ArrowDown", 1199, 1200)).toBe(1199);
  });

  it("leaves other keys alone, and every key in an empty table", () => {
    expect(rowAfterKey("x", 3, 1200)).toBeNull();
    expect(rowAfterKey("ArrowDown", 0, 0)).toBeNull();
  });
});

it("keeps a filter in the URL beside the others, and takes it out when it is empty", () => {
  const params = new URLSearchParams("verdict=hold&sort=-largest");
  expect(withParam(params, "seam", "0412 S3").toString()).toBe("verdict=hold&sort=-largest&seam=0412+S3");
  expect(withParam(params, "verdict", "").toString()).toBe("sort=-largest");
});
