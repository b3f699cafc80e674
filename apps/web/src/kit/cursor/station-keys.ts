/**
 * The index of the station that a key leads to from station `at`; null if the key means nothing on an axis.
 * Arrow keys go by one, page keys by ten, Home and End to the ends (ARIA's slider pattern).
 */
export function indexAfterKey(key: string, at: number, count: number): number | null {
  const steps: Record<string, number> = {
    ArrowRight: at + 1,
    ArrowUp: at + 1,
    ArrowLeft: at - 1,
    ArrowDown: at - 1,
    PageUp: at + 10,
    PageDown: at - 10,
    Home: 0,
    End: count - 1,
  };
  const next = steps[key];
  if (next === undefined || count === 0) return null;
  return Math.min(Math.max(next, 0), count - 1);
}
