const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;

/** Hours of one working day; work of different days follows on without a gap in working hours. */
export const SHIFT_HOURS = 10;
/** Working days of the scenario: five weeks without their weekends. */
export const WORKING_DAYS = 25;
export const WORKING_HOURS = SHIFT_HOURS * WORKING_DAYS;

/** The shop's working time, counted back from the end so that the last shift is always under way "now". */
export interface Calendar {
  readonly ends_ms: number;
  /** The instant at a working hour, 0 to {@link WORKING_HOURS}, in milliseconds. */
  readonly at: (hour: number) => number;
}

function isWeekend(instant_ms: number): boolean {
  const day = new Date(instant_ms).getUTCDay();
  return day === 0 || day === 6;
}

/**
 * The calendar that ends at an instant: its last shift ends there, the earlier ones at the same time of day on the
 * weekdays before. If the end falls on a weekend, that shift is an extra one.
 * @param ends_at RFC 3339
 * @throws RangeError for a text that is no instant
 */
export function calendarUntil(ends_at: string): Calendar {
  const ends_ms = Date.parse(ends_at);
  if (Number.isNaN(ends_ms)) throw new RangeError(`ends_at: expected an instant, got "${ends_at}"`);
  const shiftEnds_ms: number[] = [];
  for (let back = 0; shiftEnds_ms.length < WORKING_DAYS; back++) {
    const end_ms = ends_ms - back * DAY_MS;
    if (back === 0 || !isWeekend(end_ms)) shiftEnds_ms.unshift(end_ms);
  }
  const at = (hour: number): number => {
    const day = Math.min(WORKING_DAYS - 1, Math.max(0, Math.floor(hour / SHIFT_HOURS)));
    const end_ms = shiftEnds_ms[day] ?? ends_ms;
    return Math.round(end_ms - ((day + 1) * SHIFT_HOURS - hour) * HOUR_MS);
  };
  return { ends_ms, at };
}

/** RFC 3339 in UTC with milliseconds. */
export function instantOf(instant_ms: number): string {
  return new Date(instant_ms).toISOString();
}

/** The calendar date, some days away. */
export function dayOf(instant_ms: number, daysLater = 0): string {
  return instantOf(instant_ms + daysLater * DAY_MS).slice(0, 10);
}
