import { expect, it } from "vitest";
import type { CellValue, Column } from "./columns.ts";
import { toCsv } from "./csv.ts";

interface Row {
  readonly name: CellValue;
  readonly gap_mm: CellValue;
}
const COLUMNS: readonly Column<Row>[] = [
  { id: "name", head: "Name", value: (row) => row.name },
  { id: "strip", head: "Deviation" },
  { id: "gap", head: "Gap", field: "gap_mm", value: (row) => row.gap_mm },
];
const csv = (...rows: Row[]) => toCsv(rows, COLUMNS);

it("writes the columns that have values, with the unit in the head and CRLF at each line's end", () => {
  expect(csv({ name: "S4", gap_mm: 0.92 }, { name: "S5", gap_mm: null })).toBe(
    "Name,gap_mm\r\nS4,0.92\r\nS5,\r\n",
  );
});

it("keeps commas, quotes and line breaks inside a cell", () => {
  expect(csv({ name: 'Frame "A", left\nside', gap_mm: 1 })).toBe(
    'Name,gap_mm\r\n"Frame ""A"", left\nside",1\r\n',
  );
});

it("takes the formula out of text that a spreadsheet would run", () => {
  for (const name of ["=1+1", "+A1", "-2+3", "@SUM(A1)", "\t=1", "\r=1", "＝1+1", "＋1", "－1", "＠x"]) {
    const cell = csv({ name, gap_mm: 1 }).split("\r\n").slice(1).join("\r\n");
    expect(cell.replace(/^"/, "").startsWith("'")).toBe(true);
  }
});

it("guards a formula also where its cell needs quotes", () => {
  expect(csv({ name: '=HYPERLINK("a","b")', gap_mm: 1 })).toContain(`"'=HYPERLINK(""a"",""b"")"`);
});

it("leaves numbers numbers, below zero too", () => {
  expect(csv({ name: "S1", gap_mm: -0.4 })).toBe("Name,gap_mm\r\nS1,-0.4\r\n");
});
