/** The time zone of this screen unless one is named; tests name one. */
type Zone = string | undefined;

const parts = (zone: Zone, options: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat("en-GB", zone === undefined ? options : { ...options, timeZone: zone });

/** An instant (RFC 3339) as this place's clock showed it: "28 Nov 2026, 14:05". */
export function formatInstant(instant: string, zone?: string): string {
  return parts(zone, {
    day: "numeric",
    month: "short",
    year: "numeric",
    hour: "2-digit",
    minute: "2-digit",
  }).format(new Date(instant));
}

/** An instant with its seconds and time zone, for a record: "28 Nov 2026, 14:05:09 CET". */
export function formatInstantExactly(instant: string, zone?: string): string {
  return parts(zone, {
    day: "numeric",
    month: "short",
    year: "numeric",
    hour: "2-digit",
    minute: "2-digit",
    second: "2-digit",
    timeZoneName: "short",
  }).format(new Date(instant));
}

/** A day (YYYY-MM-DD), the same everywhere: "28 Nov 2026". */
export function formatDay(day: string): string {
  return parts("UTC", { day: "numeric", month: "short", year: "numeric" }).format(
    new Date(`${day}T00:00:00Z`),
  );
}
