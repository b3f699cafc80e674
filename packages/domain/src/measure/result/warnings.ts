import type { StationResult } from "../../schemas/scan-result.ts";
import type { JointSeries } from "../along/joint-series.ts";
import type { EvaluateOptions } from "../evaluate.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import type { MeasuredSeam } from "../seam/measure-seam.ts";

/** A scan with more of its points than this share elsewhere is worth a look. */
const ELSEWHERE = 0.5;

const mm = (value: number) => `${Number(value.toFixed(2))} mm`;

/** The stretches of stations under a tack, as words. */
function tackWords(stations: readonly StationResult[]): string[] {
  const stretches: [from: number, to: number][] = [];
  stations.forEach((station, i) => {
    if (!station.tack) return;
    const last = stretches.at(-1);
    if (last && stations[i - 1]?.tack) last[1] = station.station_mm;
    else stretches.push([station.station_mm, station.station_mm]);
  });
  const words = stretches.map(([from, to]) => (from === to ? mm(from) : `${mm(from)} to ${mm(to)}`));
  return words.length === 0
    ? []
    : [`Metal over the root at ${words.join(", ")}: the root there is constructed from the faces beside it.`];
}

/** What a person should know besides the reasons of the verdict. */
export function warningsOf(found: {
  readonly seam: MeasuredSeam;
  readonly along: JointSeries;
  readonly stations: readonly StationResult[];
  readonly cloud: ScanCloud;
  readonly options: EvaluateOptions;
}): string[] {
  const { seam, along, stations, cloud, options } = found;
  const warnings: string[] = [];
  if (options.scanner_accuracy_mm === undefined)
    warnings.push(
      "No scanner accuracy was stated: the uncertainties hold only what the scan itself shows, its scatter.",
    );
  const { size_departure_mm } = along;
  if (size_departure_mm !== 0) {
    const way = size_departure_mm > 0 ? "larger" : "smaller";
    warnings.push(
      `Plate ${seam.joint.chain?.plate.toUpperCase()} is ${mm(Math.abs(size_departure_mm))} ${way} than the model says; gaps are taken from its edge as seen.`,
    );
  }
  if (cloud.count > 0 && seam.outside > ELSEWHERE * cloud.count)
    warnings.push(`${seam.outside} of ${cloud.count} points lie nowhere near this seam.`);
  return [...warnings, ...tackWords(stations)];
}
