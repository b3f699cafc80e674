import { formatDeviation, formatLength, formatSigned, type LengthUnits } from "../units/length-units.ts";
import { isDrawable, type StripStation, signOf } from "./strip-groups.ts";

/** What the strip's deviations are in. */
export type StripUnit = "mm" | "°";

/** What a station's numbers are, in words: for the tooltip and for those who listen. */
export function stationWords(
  station: StripStation,
  unit: StripUnit,
  units: LengthUnits,
): { at: string; value: string; share: string } {
  const at = formatLength(station.station_mm, units, 0);
  if (!isDrawable(station)) return { at, value: "not measured", share: "" };
  return {
    at,
    value:
      station.deviation === undefined || station.deviation === null
        ? sideText(station)
        : deviationText(station.deviation, unit, units),
    share: shareText(Math.abs(station.share ?? 0)),
  };
}

/** A strip in one sentence, for those who cannot see it. */
export function stripSummary(stations: readonly StripStation[], unit: StripUnit, units: LengthUnits): string {
  if (stations.length === 0) return "no stations";
  const measured = stations.filter(isDrawable);
  const blind = stations.length - measured.length;
  const blindText = blind === 0 ? "" : `; ${blind} of ${stations.length} stations not measured`;
  const [first, ...rest] = measured;
  if (first === undefined) return `not measured, ${stations.length} stations`;
  const worst = rest.reduce((most, next) => (shareOf(next) > shareOf(most) ? next : most), first);
  const words = stationWords(worst, unit, units);
  return `largest ${words.value} at ${words.at}, ${words.share}${blindText}`;
}

function shareOf(station: StripStation): number {
  return Math.abs(station.share ?? 0);
}

function sideText(station: StripStation): string {
  const sign = signOf(station);
  if (sign === 0) return "on the model";
  return sign > 0 ? "to plus" : "to minus";
}

function deviationText(deviation: number, unit: StripUnit, units: LengthUnits): string {
  if (unit === "°") return `${formatSigned(deviation, 1)}°`;
  return formatDeviation(deviation, units);
}

function shareText(share: number): string {
  const percent = Math.round(share * 100);
  if (share > 1) return `${Math.max(percent, 101)} % of the limit, beyond it`;
  return `${percent} % of the limit`;
}
