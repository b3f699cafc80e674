import type { PassRecord } from "@beadroll/domain/schemas/pass";
import { PASS_QUANTITIES, type PassQuantity } from "@beadroll/domain/schemas/pass-result";
import type { PlotSpec } from "../../kit/plots/plot-spec.ts";

const TITLES: Readonly<Record<PassQuantity, { title: string; unit: string; decimals: number }>> = {
  current_a: { title: "Current", unit: "A", decimals: 0 },
  voltage_v: { title: "Voltage", unit: "V", decimals: 1 },
  wire_feed_m_min: { title: "Wire feed", unit: "m/min", decimals: 1 },
  travel_mm_s: { title: "Travel", unit: "mm/s", decimals: 1 },
  gas_l_min: { title: "Gas", unit: "l/min", decimals: 1 },
};

/** Middle of two bounds; null where either is missing. */
const middle = (low: number | null | undefined, high: number | null | undefined): number | null =>
  low === null || low === undefined || high === null || high === undefined ? null : (low + high) / 2;

/**
 * A pass's log as plots on the seam's axis, by the torch's position; empty when the log knows no travel, so that no place
 * along the seam is made up.
 */
export function passPlots(pass: PassRecord): PlotSpec[] {
  const { series, statistics } = pass.result;
  const { station_mm } = series;
  if (station_mm === null) return [];
  return PASS_QUANTITIES.flatMap((quantity): PlotSpec[] => {
    const envelope = series[quantity];
    if (envelope === null) return [];
    const range = statistics[quantity]?.range ?? null;
    return [
      {
        id: quantity,
        ...TITLES[quantity],
        stations_mm: station_mm,
        values: envelope.min.map((low, index) => middle(low, envelope.max[index])),
        envelope: { min: envelope.min, max: envelope.max },
        ...(range && {
          bands: [{ kind: "within", low: range.min, high: range.max, word: "procedure" }] as const,
        }),
      },
    ];
  });
}
