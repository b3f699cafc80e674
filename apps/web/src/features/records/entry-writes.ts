import { z } from "zod";

const Cell = z.union([z.string(), z.number(), z.null()]);
const Write = z.object({
  table: z.string(),
  key: z.record(z.string(), Cell),
  before: z.record(z.string(), Cell).optional(),
  after: z.record(z.string(), Cell),
});

/** One column that an entry wrote. */
export interface WrittenCell {
  readonly table: string;
  readonly column: string;
  readonly before: string | null;
  readonly after: string;
}

const shown = (value: string | number | null | undefined): string =>
  value === null || value === undefined ? "nothing" : String(value);

/** What an entry wrote, column by column; empty for an entry that wrote no rows. */
export function writtenCells(body: Readonly<Record<string, unknown>>): WrittenCell[] {
  const writes = z.array(Write).safeParse(body["writes"]);
  if (!writes.success) return [];
  return writes.data.flatMap(({ table, before, after }) =>
    Object.entries(after).map(([column, value]) => ({
      table,
      column,
      before: before === undefined ? null : shown(before[column]),
      after: shown(value),
    })),
  );
}

/** What an entry says at a glance, beside the rows. */
export function entryFacts(body: Readonly<Record<string, unknown>>): { key: string; value: string }[] {
  return Object.entries(body)
    .filter(([name]) => name !== "writes")
    .map(([name, value]) => ({
      key: name.replaceAll("_", " "),
      value: typeof value === "string" ? value : JSON.stringify(value),
    }));
}
