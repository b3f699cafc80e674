import { type Fault, good, type Outcome, refused } from "../faults/fault.ts";
import {
  type ArcRestart,
  PASS_QUANTITIES,
  type PassQuantity,
  type PassResult,
  type QuantityRange,
  type QuantityStatistics,
} from "../schemas/pass-result.ts";
import type { ProcedureRanges } from "../schemas/procedure.ts";
import { accumulated, arcTime, fillGaps, shareOutside, statisticsOver } from "./arc-integral.ts";
import { type ArcOnRule, type Burn, DEFAULT_ARC_ON, findArcOn } from "./arc-on.ts";
import { arcEfficiency, arcEnergyFromMeans, arcEnergyFromPower, heatInput } from "./heat-input.ts";
import { judgePass } from "./judge-pass.ts";
import type { PassLog } from "./pass-log.ts";
import { thinLog } from "./pass-series.ts";

/** What is known about a pass beside its log. */
export interface PassContext {
  /** ISO 4063 process number, e.g. `135`. */
  readonly process: string;
  /** The procedure's ranges; without them nothing is judged. */
  readonly ranges?: ProcedureRanges;
  /** The seam's length, mm, above 0; serves where the log has no travel speed. */
  readonly seam_length_mm?: number;
  /** Arc efficiency, 0 to 1, instead of EN 1011-1's; its source belongs into the procedure. */
  readonly arc_efficiency_k?: number;
  readonly arcOn?: ArcOnRule;
}

/**
 * Reduces a weld log to what the record keeps: arc time, restarts, means and spread over the arc time, heat input by
 * mean values and by instantaneous power, and how all that stands against the procedure.
 * @param log as `readPassLog` gives it, two samples or more; sampling may be uneven (trapezoid rule)
 * @returns the result, times counted from the first sample; or the fault `log-no-arc`
 * @throws RangeError when a length or an efficiency in `context` is out of range
 * Source: ISO/TR 18491:2015 and EN 1011-1:2009 for the heat input. Cost: linear in the samples.
 */
export function reducePass(log: PassLog, context: PassContext): Outcome<PassResult> {
  const rule = context.arcOn ?? DEFAULT_ARC_ON;
  const burns = findArcOn(log.times_s, log.readings.current_a, rule);
  if (burns.length === 0) return refused(noArc(log, rule));
  const { times_s } = log;
  const start_s = times_s[0]!;
  const values = mapQuantities((quantity) => {
    const readings = log.readings[quantity];
    return readings === null ? null : fillGaps(times_s, readings);
  });
  const welded_mm = values.travel_mm_s === null ? null : accumulated(times_s, values.travel_mm_s, burns);
  const length = weldedLength(welded_mm, context.seam_length_mm);
  const judged = {
    statistics: mapQuantities((q) =>
      quantityStatistics(times_s, values[q], burns, context.ranges?.[q] ?? null),
    ),
    interpass_c: interpassBefore(log, burns[0]!.first),
    ...heatInputs(log, burns, length.length_mm, context),
  };
  return good({
    duration_s: times_s[times_s.length - 1]! - start_s,
    samples: times_s.length,
    sample_interval_s: medianInterval(times_s),
    arc_on_s: arcTime(times_s, burns),
    intervals: burns.map(({ first, last }) => ({
      start_s: times_s[first]! - start_s,
      end_s: times_s[last]! - start_s,
    })),
    restarts: restartsOf(times_s, burns, welded_mm),
    ...judged,
    ...length,
    process: context.process,
    judgement: context.ranges === undefined ? null : judgePass(judged, context.ranges),
    series: thinLog(log, welded_mm),
  });
}

function noArc(log: PassLog, rule: ArcOnRule): Fault {
  const peak_a = log.readings.current_a.reduce((most, value) => Math.max(most, value), 0);
  const detail = `The current never stayed at ${rule.on_a} A or more for ${rule.shortest_burn_s} s; its highest value is ${peak_a} A.`;
  return { code: "log-no-arc", detail, field: "current_a" };
}

function mapQuantities<T>(each: (quantity: PassQuantity) => T): Record<PassQuantity, T> {
  const [current_a, voltage_v, wire_feed_m_min, travel_mm_s, gas_l_min] = PASS_QUANTITIES;
  return {
    current_a: each(current_a),
    voltage_v: each(voltage_v),
    wire_feed_m_min: each(wire_feed_m_min),
    travel_mm_s: each(travel_mm_s),
    gas_l_min: each(gas_l_min),
  };
}

function quantityStatistics(
  times_s: Float64Array,
  values: Float64Array | null,
  burns: readonly Burn[],
  range: QuantityRange | null,
): QuantityStatistics | null {
  if (values === null) return null;
  const share_outside = range === null ? null : shareOutside({ times_s, values }, burns, range);
  return { ...statisticsOver(times_s, values, burns), range, share_outside };
}

function weldedLength(
  welded_mm: Float64Array | null,
  seam_length_mm: number | undefined,
): Pick<PassResult, "length_mm" | "length_source"> {
  if (seam_length_mm !== undefined && !(seam_length_mm > 0)) {
    throw new RangeError(`seam_length_mm: expected above 0, got ${seam_length_mm}`);
  }
  const travelled_mm = welded_mm?.at(-1) ?? 0;
  if (travelled_mm > 0) return { length_mm: travelled_mm, length_source: "travel" };
  if (seam_length_mm === undefined) return { length_mm: null, length_source: null };
  return { length_mm: seam_length_mm, length_source: "seam" };
}

function heatInputs(
  { times_s, readings: { current_a, voltage_v } }: PassLog,
  burns: readonly Burn[],
  length_mm: number | null,
  context: PassContext,
): Pick<PassResult, "arc_efficiency_k" | "heat_input_kj_mm" | "heat_input_instant_kj_mm"> {
  const arc_efficiency_k = context.arc_efficiency_k ?? arcEfficiency(context.process) ?? null;
  if (length_mm === null || arc_efficiency_k === null) {
    return { arc_efficiency_k, heat_input_kj_mm: null, heat_input_instant_kj_mm: null };
  }
  const meanOf = (values: Float64Array): number => statisticsOver(times_s, values, burns).mean;
  const powers_w = current_a.map((current, i) => current * voltage_v[i]!);
  const run = { arc_on_s: arcTime(times_s, burns), length_mm };
  const byMeans = arcEnergyFromMeans(meanOf(voltage_v), meanOf(current_a), run);
  const byPower = arcEnergyFromPower(meanOf(powers_w), run);
  return {
    arc_efficiency_k,
    heat_input_kj_mm: heatInput(byMeans, arc_efficiency_k),
    heat_input_instant_kj_mm: heatInput(byPower, arc_efficiency_k),
  };
}

function restartsOf(
  times_s: Float64Array,
  burns: readonly Burn[],
  welded_mm: Float64Array | null,
): ArcRestart[] {
  return burns.slice(1).map(({ first }, i) => ({
    at_s: times_s[first]! - times_s[0]!,
    off_s: times_s[first]! - times_s[burns[i]!.last]!,
    station_mm: welded_mm === null ? null : welded_mm[first]!,
  }));
}

/** The temperature last read at or before a sample. */
function interpassBefore({ interpass_c }: PassLog, sample: number): number | null {
  return interpass_c?.subarray(0, sample + 1).findLast((value) => !Number.isNaN(value)) ?? null;
}

function medianInterval(times_s: Float64Array): number {
  const intervals_s = times_s.subarray(1).map((time, i) => time - times_s[i]!);
  intervals_s.sort();
  const middle = intervals_s.length >> 1;
  const upper = intervals_s[middle]!;
  return intervals_s.length % 2 === 1 ? upper : (upper + intervals_s[middle - 1]!) / 2;
}
