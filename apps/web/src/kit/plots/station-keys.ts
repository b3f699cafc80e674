import { nearestStation } from "../strip/bead-strip-drawing.ts";

/** The station that a key leads to; null if the key means nothing here. */
export function stationAfterKey(
  key: string,
  stations_mm: readonly number[],
  cursor_mm: number | null,
): number | null {
  const last = stations_mm.length - 1;
  const at = nearestStation(
    stations_mm.map((station_mm) => ({ station_mm })),
    cursor_mm ?? 0,
  );
  const steps: Record<string, number> = {
    ArrowRight: at + 1,
    ArrowUp: at + 1,
    ArrowLeft: at - 1,
    ArrowDown: at - 1,
    PageUp: at + 10,
    PageDown: at - 10,
    Home: 0,
    End: last,
  };
  const next = steps[key];
  if (next === undefined || last < 0) return null;
  return stations_mm[Math.min(Math.max(next, 0), last)] ?? null;
}
