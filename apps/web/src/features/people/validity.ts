import type { Qualification } from "@beadroll/domain/schemas/person";

const DAY_MS = 86_400_000;
/** From this many days before the end on, somebody should see to it. */
export const DUE_DAYS = 60;

/** How far a qualification's time is used up. */
export interface Validity {
  readonly state: "valid" | "due" | "expired";
  /** Days left; negative when it has ended. */
  readonly days_left: number;
  /** Share of its time that is used, 0 to 1, more once it has ended. */
  readonly share: number;
}

/**
 * A qualification's validity on a day.
 * @param today `YYYY-MM-DD`; the last day of validity still counts
 */
export function validityOn(
  qualification: Pick<Qualification, "issued_on" | "valid_until">,
  today: string,
): Validity {
  const day = (text: string): number => Date.parse(`${text}T00:00:00Z`) / DAY_MS;
  const days_left = day(qualification.valid_until) - day(today);
  const span = Math.max(1, day(qualification.valid_until) - day(qualification.issued_on) + 1);
  const share = Math.max(0, (day(today) - day(qualification.issued_on)) / span);
  return { state: days_left < 0 ? "expired" : days_left <= DUE_DAYS ? "due" : "valid", days_left, share };
}

/** Days left in words. */
export function daysWords({ days_left }: Validity): string {
  if (days_left < 0) return `ended ${-days_left} ${days_left === -1 ? "day" : "days"} ago`;
  return days_left === 0 ? "last day today" : `${days_left} ${days_left === 1 ? "day" : "days"} left`;
}
