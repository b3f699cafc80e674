/** A page as every list answers with it. */
export interface Page<T> {
  readonly items: T[];
  readonly next_cursor: string | null;
}

/** A page of rows as a page of what the API shows. */
export function pageOf<Row, T>(
  page: { rows: Row[]; next_cursor: string | null },
  show: (row: Row) => T,
): Page<T> {
  return { items: page.rows.map(show), next_cursor: page.next_cursor };
}
