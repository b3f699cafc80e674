import type { ScanResult, ScanSummary, StationResult } from "../../schemas/scan-result.ts";
import { selectKth } from "../fit/median.ts";

const QUANTITIES = ["lateral_mm", "normal_mm", "gap_mm", "mismatch_mm", "angle_deg"] as const;

const rounded = (value: number) => Math.round(value * 1e4) / 1e4;

function statistic(stations: readonly StationResult[], quantity: (typeof QUANTITIES)[number]) {
  const sizes = new Float64Array(stations.length);
  let [count, square, max_abs, at_mm] = [0, 0, -1, 0];
  for (const station of stations) {
    const value = station[quantity];
    if (value === undefined) continue;
    const size = Math.abs(value);
    sizes[count++] = size;
    square += size * size;
    if (size > max_abs) [max_abs, at_mm] = [size, station.station_mm];
  }
  if (count === 0) return undefined;
  return {
    max_abs: rounded(max_abs),
    at_mm,
    rms: rounded(Math.sqrt(square / count)),
    // Nearest rank: the smallest value that 95 % of the stations do not exceed.
    p95_abs: rounded(selectKth(sizes, count, Math.ceil(0.95 * count) - 1)),
  };
}

/** Largest, root mean square and 95th percentile of each quantity; absent where nothing was measured. */
export function summaryOf(stations: readonly StationResult[]): ScanSummary {
  return Object.fromEntries(
    QUANTITIES.flatMap((quantity) => {
      const found = statistic(stations, quantity);
      return found ? [[quantity, found]] : [];
    }),
  );
}

/**
 * Share of the stations measured and the longest stretch without one. A blind stretch reaches from the measured
 * station before it to the measured station after it, or to the seam's end.
 */
export function coverageOf(stations: readonly StationResult[]): ScanResult["coverage"] {
  const measured = stations.filter((station) => station.measured);
  const share = stations.length === 0 ? 0 : measured.length / stations.length;
  const [first, last] = [stations[0]?.station_mm ?? 0, stations.at(-1)?.station_mm ?? 0];
  if (measured.length === stations.length) return { share, longest_blind_mm: 0 };
  let [longest_blind_mm, blind_from_mm, blind_to_mm] = [0, first, last];
  let from_mm = first;
  let isBlind = false;
  for (const station of stations) {
    if (!station.measured) isBlind = true;
    if (!station.measured && station.station_mm !== last) continue;
    if (isBlind && station.station_mm - from_mm > longest_blind_mm)
      [longest_blind_mm, blind_from_mm, blind_to_mm] = [
        station.station_mm - from_mm,
        from_mm,
        station.station_mm,
      ];
    [from_mm, isBlind] = [station.station_mm, false];
  }
  return { share, longest_blind_mm, blind_from_mm, blind_to_mm };
}
