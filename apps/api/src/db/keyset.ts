import type { Knex } from "knex";
import { refusal } from "../http/refusal.ts";

type KeyValue = string | number;

/** Columns a list is ordered by, the last one unique, so that pages neither skip nor repeat. */
export interface Keyset {
  readonly columns: readonly string[];
  readonly descending: boolean;
}

/** Which page is asked for. */
export interface PageRequest {
  readonly limit: number;
  readonly cursor?: string | undefined;
}

function readCursor(cursor: string, length: number): KeyValue[] {
  try {
    const values: unknown = JSON.parse(Buffer.from(cursor, "base64url").toString("utf8"));
    const isKey = (value: unknown): value is KeyValue =>
      typeof value === "string" || typeof value === "number";
    if (Array.isArray(values) && values.length === length && values.every(isKey)) return values;
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
  }
  throw refusal("request-invalid", "cursor: this is no next_cursor of this list.", { field: "cursor" });
}

/**
 * One page of a query by keyset: rows after the cursor in order, found through the index of the key's columns.
 * @param query without order and limit
 * @throws Refusal request-invalid for a cursor that is not of this list
 */
export async function readPage<Row extends object>(
  query: Knex.QueryBuilder,
  keyset: Keyset,
  request: PageRequest,
): Promise<{ rows: Row[]; next_cursor: string | null }> {
  const direction = keyset.descending ? "desc" : "asc";
  if (request.cursor !== undefined) {
    const values = readCursor(request.cursor, keyset.columns.length);
    const places = keyset.columns.map(() => "?").join(", ");
    query.whereRaw(`(${keyset.columns.join(", ")}) ${keyset.descending ? "<" : ">"} (${places})`, values);
  }
  for (const [index, column] of keyset.columns.entries())
    query.orderBy(column, direction).select(`${column} as key_${index}`);
  const found: (Row & Record<string, KeyValue>)[] = await query.limit(request.limit + 1);
  const last = found[request.limit - 1];
  const more = found.length > request.limit && last !== undefined;
  const cursor = more ? keyset.columns.map((_, index) => last[`key_${index}`]) : null;
  return {
    rows: found.slice(0, request.limit).map((row) => withoutKeys(row, keyset.columns.length)),
    next_cursor: cursor && Buffer.from(JSON.stringify(cursor)).toString("base64url"),
  };
}

/** The cursor's columns are no part of the record. */
function withoutKeys<Row extends object>(row: Row & Record<string, KeyValue>, count: number): Row {
  for (let index = 0; index < count; index += 1) delete row[`key_${index}`];
  return row;
}
