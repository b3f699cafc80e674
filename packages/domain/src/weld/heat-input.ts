/**
 * Arc efficiency k by ISO 4063 process number: EN 1011-1:2009, Table 1 (15 from a trade page that agrees with it).
 * Processes not listed have no k here: ask for one with its source rather than guess.
 */
const ARC_EFFICIENCY_K: Readonly<Record<string, number>> = {
  "121": 1.0,
  "111": 0.8,
  "114": 0.8,
  "131": 0.8,
  "135": 0.8,
  "136": 0.8,
  "137": 0.8,
  "138": 0.8,
  "139": 0.8,
  "141": 0.6,
  "15": 0.6,
};

/**
 * Arc efficiency k of a process.
 * @param process ISO 4063 number, e.g. `135`
 * @returns 0 to 1, or undefined for a process that EN 1011-1, Table 1 does not list
 */
export function arcEfficiency(process: string): number | undefined {
  return Object.hasOwn(ARC_EFFICIENCY_K, process) ? ARC_EFFICIENCY_K[process] : undefined;
}

/** What a weld run took and how far it went. */
export interface ArcRun {
  /** Arc time, s, above 0. */
  readonly arc_on_s: number;
  /** Length welded, mm, above 0. */
  readonly length_mm: number;
}

/**
 * Arc energy from mean voltage and mean current: E = U·I·t / L. Right for steady arcs only; for waveform-controlled
 * transfer (pulsed, controlled short circuit) the product of means is wrong in either direction.
 * @param voltage_v mean voltage, V, 0 or more
 * @param current_a mean current, A, 0 or more
 * @returns kJ/mm, without arc efficiency
 * @throws RangeError when time or length are not above 0
 * Source: ISO/TR 18491:2015, mean method; EN 1011-1:2009, 8.7. Example: 20 V, 300 A at 2.5 mm/s is 2.4 kJ/mm.
 */
export function arcEnergyFromMeans(voltage_v: number, current_a: number, run: ArcRun): number {
  return arcEnergyFromPower(voltage_v * current_a, run);
}

/**
 * Arc energy from instantaneous power: E = IP·t / L, IP being the mean of the product U·I of each sample. For pulsed
 * arcs the sampling must be of the order of 10 kHz.
 * @param power_w mean of the instantaneous power, W, 0 or more
 * @returns kJ/mm, without arc efficiency
 * @throws RangeError when time or length are not above 0
 * Source: ISO/TR 18491:2015, instantaneous power method. Example: 6500 W for 30 s over 300 mm is 0.65 kJ/mm.
 */
export function arcEnergyFromPower(power_w: number, { arc_on_s, length_mm }: ArcRun): number {
  checkAbove0(arc_on_s, "arc_on_s");
  checkAbove0(length_mm, "length_mm");
  return (power_w * arc_on_s) / length_mm / 1000;
}

/**
 * Heat input Q = k·E.
 * @param arc_energy_kj_mm arc energy E, kJ/mm
 * @param arc_efficiency_k 0 to 1
 * @returns kJ/mm
 * @throws RangeError when k lies outside 0 to 1
 * Source: EN 1011-1:2009, 8.7. Example: E 0.8778 kJ/mm with k 0.8 is 0.7023 kJ/mm.
 */
export function heatInput(arc_energy_kj_mm: number, arc_efficiency_k: number): number {
  if (!(arc_efficiency_k > 0 && arc_efficiency_k <= 1)) {
    throw new RangeError(`arc_efficiency_k: expected above 0 to 1, got ${arc_efficiency_k}`);
  }
  return arc_efficiency_k * arc_energy_kj_mm;
}

/** A run at constant speed, as the handbooks' formulas have it. @throws RangeError unless the speed is above 0 */
export function runAtSpeed(travel_mm_s: number): ArcRun {
  checkAbove0(travel_mm_s, "travel_mm_s");
  return { arc_on_s: 1, length_mm: travel_mm_s };
}

function checkAbove0(value: number, name: string): void {
  if (!(value > 0 && Number.isFinite(value))) throw new RangeError(`${name}: expected above 0, got ${value}`);
}
