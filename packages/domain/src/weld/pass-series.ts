import { type PassSeries, SERIES_BUCKETS_MAX } from "../schemas/pass-result.ts";
import type { PassLog, Readings } from "./pass-log.ts";

/**
 * The log thinned for plotting: neighbouring samples share a bucket that keeps their smallest and largest value, so
 * that a spike of one sample still shows. Values are rounded to five digits, times to 1 ms, stations to 0.01 mm.
 * @param stations_mm length welded at each sample, mm, same length as the log; null without travel speed
 * @returns one bucket a sample up to 600 samples, else 600 buckets of like many samples
 */
export function thinLog(log: PassLog, stations_mm: Float64Array | null): PassSeries {
  const start_s = log.times_s[0]!;
  const count = log.times_s.length;
  const buckets = Math.min(count, SERIES_BUCKETS_MAX);
  const starts = Array.from({ length: buckets + 1 }, (_, b) => Math.floor((b * count) / buckets));
  const firsts = starts.slice(0, buckets);
  const { current_a, voltage_v, wire_feed_m_min, travel_mm_s, gas_l_min } = log.readings;
  return {
    time_s: firsts.map((i) => Number((log.times_s[i]! - start_s).toFixed(3))),
    station_mm: stations_mm === null ? null : firsts.map((i) => Number(stations_mm[i]!.toFixed(2))),
    current_a: envelopeOf(current_a, starts),
    voltage_v: envelopeOf(voltage_v, starts),
    wire_feed_m_min: envelopeOf(wire_feed_m_min, starts),
    travel_mm_s: envelopeOf(travel_mm_s, starts),
    gas_l_min: envelopeOf(gas_l_min, starts),
  };
}

type Envelope = PassSeries["current_a"];

function envelopeOf(readings: Readings | null, starts: readonly number[]): Envelope {
  if (readings === null) return null;
  const [min, max]: [(number | null)[], (number | null)[]] = [[], []];
  for (let b = 0; b + 1 < starts.length; b++) {
    let [low, high] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
    for (let i = starts[b]!; i < starts[b + 1]!; i++) {
      const value = readings[i]!;
      if (value < low) low = value;
      if (value > high) high = value;
    }
    min.push(low > high ? null : plotted(low));
    max.push(low > high ? null : plotted(high));
  }
  return { min, max };
}

function plotted(value: number): number {
  return Number(value.toPrecision(5));
}
