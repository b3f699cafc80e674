/**
 * The index of the station nearest to a place; the earlier of two that are as near.
 * @param count     stations, 1 and more
 * @param stationAt the station of an index, mm, in ascending order
 */
export function nearestIndex(
  count: number,
  stationAt: (index: number) => number,
  station_mm: number,
): number {
  let low = 0;
  let high = count - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (stationAt(middle) <= station_mm) low = middle;
    else high = middle;
  }
  return Math.abs(stationAt(high) - station_mm) < Math.abs(stationAt(low) - station_mm) ? high : low;
}

/** The same for a list of stations, mm. */
export function nearestStation(stations_mm: readonly number[], station_mm: number): number {
  return nearestIndex(stations_mm.length, (index) => stations_mm[index] ?? 0, station_mm);
}
