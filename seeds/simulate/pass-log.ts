import type { Random } from "../random.ts";
import type { Settings } from "../shop/procedures.ts";

/** What a pass does beside welding as set. */
export type PassTrouble =
  /** The arc goes out and is struck again within seconds. */
  | { readonly kind: "restart"; readonly at: number; readonly off_s: number }
  /** The spool runs out; the arc waits for the next one. */
  | { readonly kind: "spool-change"; readonly at: number; readonly off_s: number }
  /** The gas bundle runs empty. */
  | { readonly kind: "gas-low" }
  /** The robot program ran at a reduced speed: too much heat for each mm. */
  | { readonly kind: "slow"; readonly factor: number }
  /** The arc grows long for a while: a worn contact tip. */
  | { readonly kind: "unsteady" };

/** One weld run as the cell is to weld it. */
export interface PassPlan {
  readonly settings: Settings;
  readonly length_mm: number;
  readonly trouble: PassTrouble | null;
}

const SAMPLES_PER_S = 20;
const GAS_BEFORE_S = 0.8;
const GAS_AFTER_S = 1.5;
const STRIKE_S = 0.2;
const CRATER_S = 0.35;
/** The robot sets off this long after the strike. */
const DWELL_S = 0.15;

interface Phase {
  readonly from_s: number;
  readonly to_s: number;
  readonly burns: boolean;
  /** Gas is closed during a long wait. */
  readonly gas: boolean;
}

function travelOf({ settings, trouble }: PassPlan): number {
  return settings.travel_mm_s * (trouble?.kind === "slow" ? trouble.factor : 1);
}

/** When the arc burns and when it does not, from the log's start. */
function phasesOf(plan: PassPlan): Phase[] {
  const burn_s = plan.length_mm / travelOf(plan) + DWELL_S + CRATER_S;
  const { trouble } = plan;
  const phases: Phase[] = [];
  const add = (duration_s: number, burns: boolean, gas: boolean) => {
    const from_s = phases.at(-1)?.to_s ?? 0;
    phases.push({ from_s, to_s: from_s + duration_s, burns, gas });
  };
  add(GAS_BEFORE_S, false, true);
  if (trouble?.kind === "restart" || trouble?.kind === "spool-change") {
    add(burn_s * trouble.at, true, true);
    add(trouble.off_s, false, trouble.kind === "restart");
    add(burn_s * (1 - trouble.at), true, true);
  } else {
    add(burn_s, true, true);
  }
  add(GAS_AFTER_S, false, true);
  return phases;
}

/** Length of a pass's log, s. */
export function passDuration(plan: PassPlan): number {
  return phasesOf(plan).at(-1)?.to_s ?? 0;
}

/** Middle of the longest wait between two burns, s from the log's start; null where the arc burned through. */
export function longestWait(plan: PassPlan): number | null {
  const waits = phasesOf(plan)
    .slice(1, -1)
    .filter((phase) => !phase.burns);
  const longest = waits.toSorted((one, other) => other.to_s - other.from_s - (one.to_s - one.from_s))[0];
  return longest === undefined ? null : (longest.from_s + longest.to_s) / 2;
}

/** How far the arc is up: 0 to 1 while it is struck, down again while the crater is filled. */
function strength(phase: Phase, time_s: number): number {
  const up = Math.min(1, (time_s - phase.from_s + 0.05) / STRIKE_S);
  return phase.to_s - time_s < CRATER_S ? 0.62 : up;
}

/** A slow wander and fast noise, like a pulsed arc read twenty times a second. */
function wander(random: Random): (time_s: number, slow: number, fast: number) => number {
  const [phase, period_s] = [random.between(0, 6.28), random.between(15, 30)];
  return (time_s, slow, fast) =>
    1 + slow * Math.sin(phase + (6.283 * time_s) / period_s) + fast * random.normal();
}

const tenths = (value: number): number => Math.round(value * 10) / 10;
const hundredths = (value: number): number => Math.round(value * 100) / 100;

/**
 * The log of a pass as the cell writes it: CSV with time, current, voltage, wire feed, travel and gas, 20 rows a second.
 */
export function passLogCsv(plan: PassPlan, random: Random): Uint8Array {
  const { settings, trouble } = plan;
  const phases = phasesOf(plan);
  const end_s = phases.at(-1)?.to_s ?? 0;
  const travel_mm_s = travelOf(plan) * (1 + 0.004 * random.normal());
  const own = { current: 1 + 0.012 * random.normal(), voltage: 1 + 0.008 * random.normal() };
  const [current, voltage, wire, gas] = [wander(random), wander(random), wander(random), wander(random)];
  const rows = ["time_s,current_a,voltage_v,wire_feed_m_min,travel_mm_s,gas_l_min"];
  let place = 0;
  for (let i = 0; i / SAMPLES_PER_S <= end_s; i++) {
    const time_s = i / SAMPLES_PER_S;
    while (place < phases.length - 1 && time_s >= (phases[place]?.to_s ?? 0)) place++;
    const phase = phases[place];
    if (phase === undefined) break;
    const flow = phase.gas
      ? settings.gas_l_min * gasShare(trouble, time_s / end_s) * gas(time_s, 0.01, 0.008)
      : 0;
    if (!phase.burns) {
      rows.push(`${hundredths(time_s)},0,0,0,0,${tenths(flow)}`);
      continue;
    }
    const arc = strength(phase, time_s);
    const current_a = settings.current_a * own.current * arc * current(time_s, 0.012, 0.013);
    const long = trouble?.kind === "unsteady" && Math.abs(time_s / end_s - 0.6) < 0.05 ? 3.6 : 0;
    const voltage_v =
      (settings.voltage_v * own.voltage + long) * (0.4 + 0.6 * arc) * voltage(time_s, 0.006, 0.009);
    const feed = settings.wire_feed_m_min * arc * wire(time_s, 0.005, 0.006);
    const moves = time_s - phase.from_s >= DWELL_S && phase.to_s - time_s >= CRATER_S;
    const travel = moves ? travel_mm_s * (1 + 0.006 * random.normal()) : 0;
    rows.push(
      `${hundredths(time_s)},${tenths(current_a)},${hundredths(voltage_v)},${hundredths(feed)},${hundredths(travel)},${tenths(flow)}`,
    );
  }
  rows.push("");
  return new TextEncoder().encode(rows.join("\n"));
}

/** Share of the set gas flow at a share of the pass. */
function gasShare(trouble: PassTrouble | null, share: number): number {
  return trouble?.kind === "gas-low" ? 0.9 - 0.55 * share : 1;
}
