/** The row that a key leads to from row `at`, or null if the key means nothing in a table. */
export function rowAfterKey(key: string, at: number, count: number, page = 10): number | null {
  const steps: Record<string, number> = {
    ArrowDown: at + 1,
    ArrowUp: at - 1,
    PageDown: at + page,
    PageUp: at - page,
    Home: 0,
    End: count - 1,
  };
  const next = steps[key];
  if (next === undefined || count === 0) return null;
  return Math.min(Math.max(next, 0), count - 1);
}
