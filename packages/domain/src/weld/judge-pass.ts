import {
  PASS_QUANTITIES,
  type PassJudgement,
  type PassReason,
  type PassResult,
} from "../schemas/pass-result.ts";
import type { ProcedureRanges } from "../schemas/procedure.ts";

/** What of a reduced log is held against the procedure. */
export type JudgedPass = Pick<
  PassResult,
  "statistics" | "interpass_c" | "heat_input_kj_mm" | "heat_input_instant_kj_mm"
>;

/**
 * Share of the arc time that may lie outside a range before it is worth a second look: striking the arc and filling
 * the crater leave the range for a moment in every pass. Our own choice, no standard's.
 */
export const TOLERATED_SHARE_OUTSIDE = 0.05;

const WORDS: Readonly<Record<PassReason["quantity"], { name: string; unit: string; digits: number }>> = {
  current_a: { name: "Current", unit: "A", digits: 0 },
  voltage_v: { name: "Voltage", unit: "V", digits: 1 },
  wire_feed_m_min: { name: "Wire feed", unit: "m/min", digits: 2 },
  travel_mm_s: { name: "Travel speed", unit: "mm/s", digits: 2 },
  gas_l_min: { name: "Gas flow", unit: "l/min", digits: 1 },
  interpass_c: { name: "Interpass temperature", unit: "°C", digits: 0 },
  heat_input_kj_mm: { name: "Heat input", unit: "kJ/mm", digits: 3 },
};

/**
 * How a pass stands against its procedure's ranges. Outside: a mean, the heat input or the interpass temperature lies
 * outside. Doubtful: more than 5 % of the arc time outside, the two ways to compute heat input disagree about the
 * range, or the procedure limits what the log does not say. Unrounded values are compared; both ends are allowed.
 * @returns the verdict with every reason
 */
export function judgePass(pass: JudgedPass, ranges: ProcedureRanges): PassJudgement {
  const reasons = [
    ...PASS_QUANTITIES.flatMap((quantity) => judgeQuantity(pass, ranges, quantity)),
    ...judgeValue("interpass_c", pass.interpass_c, ranges.interpass_c),
    ...judgeValue("heat_input_kj_mm", pass.heat_input_kj_mm, ranges.heat_input_kj_mm),
    ...judgeMethods(pass, ranges.heat_input_kj_mm),
  ];
  const outside = reasons.some((reason) => reason.kind === "mean-outside");
  return { verdict: outside ? "outside" : reasons.length > 0 ? "doubtful" : "inside", reasons };
}

type Range = PassReason["range"];

function judgeQuantity(
  { statistics }: JudgedPass,
  ranges: ProcedureRanges,
  quantity: (typeof PASS_QUANTITIES)[number],
): PassReason[] {
  const range = ranges[quantity];
  if (range === null) return [];
  const found = statistics[quantity];
  if (found === null) return [notMeasured(quantity, range)];
  if (isOutside(found.mean, range)) return [valueOutside(quantity, found.mean, range, "was on average")];
  const share = found.share_outside ?? 0;
  return share > TOLERATED_SHARE_OUTSIDE ? [timeOutside(quantity, share, range)] : [];
}

function judgeValue(
  quantity: "interpass_c" | "heat_input_kj_mm",
  value: number | null,
  range: Range | null,
): PassReason[] {
  if (range === null) return [];
  if (value === null) return [notMeasured(quantity, range)];
  return isOutside(value, range) ? [valueOutside(quantity, value, range, "was")] : [];
}

function judgeMethods(pass: JudgedPass, range: Range | null): PassReason[] {
  const { heat_input_kj_mm: byMeans, heat_input_instant_kj_mm: byPower } = pass;
  if (range === null || byMeans === null || byPower === null) return [];
  if (isOutside(byMeans, range) || !isOutside(byPower, range)) return [];
  const detail = `Heat input from the power of each sample was ${numberOf(byPower, 3)} kJ/mm, outside ${between("heat_input_kj_mm", range)}; from the means it was ${numberOf(byMeans, 3)} kJ/mm.`;
  return [{ quantity: "heat_input_kj_mm", kind: "methods-disagree", value: byPower, range, detail }];
}

function notMeasured(quantity: PassReason["quantity"], range: Range): PassReason {
  const detail = `${WORDS[quantity].name} is limited to ${between(quantity, range)}, and the log does not say what it was.`;
  return { quantity, kind: "not-measured", value: null, range, detail };
}

function valueOutside(
  quantity: PassReason["quantity"],
  value: number,
  range: Range,
  was: string,
): PassReason {
  const { name, unit, digits } = WORDS[quantity];
  const detail = `${name} ${was} ${numberOf(value, digits + 1)} ${unit}, outside ${between(quantity, range)}.`;
  return { quantity, kind: "mean-outside", value, range, detail };
}

function timeOutside(quantity: PassReason["quantity"], share: number, range: Range): PassReason {
  const detail = `${WORDS[quantity].name} was outside ${between(quantity, range)} for ${numberOf(share * 100, 1)} % of the arc time.`;
  return { quantity, kind: "time-outside", value: share, range, detail };
}

function between(quantity: PassReason["quantity"], range: Range): string {
  return `${range.min} to ${range.max} ${WORDS[quantity].unit}`;
}

function isOutside(value: number, range: Range): boolean {
  return value < range.min || value > range.max;
}

function numberOf(value: number, digits: number): string {
  return String(Number(value.toFixed(digits)));
}
