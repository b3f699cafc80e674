import type { StationResult, VerdictReason } from "../../schemas/scan-result.ts";
import { COVERAGE_FACTOR, decide, type Proof } from "./decide.ts";
import type { JudgedQuantity } from "./judged-quantities.ts";

/** The worst proof is told first. */
const RANK: Record<Exclude<Proof, "inside">, number> = { outside: 3, too_coarse: 2, not_proven: 1 };

const rounded = (value: number) => Math.round(value * 1e4) / 1e4 + 0;

interface Failing {
  readonly index: number;
  readonly proof: Exclude<Proof, "inside">;
  readonly size: number;
  readonly value: number;
  readonly u: number;
}

function failingStations(
  stations: readonly StationResult[],
  quantity: JudgedQuantity,
  nominal: number,
  limit: number,
): Failing[] {
  return stations.flatMap((station, index) => {
    const value = quantity.value(station);
    if (value === undefined) return [];
    const u = quantity.u(station) ?? 0;
    const proof = decide(value - nominal, limit, u);
    return proof === "inside" ? [] : { index, proof, size: Math.abs(value - nominal), value, u };
  });
}

/** The unbroken stretch of failing stations around one of them. */
function stretchAround(stations: readonly StationResult[], failing: readonly Failing[], index: number) {
  const set = new Set(failing.map((one) => one.index));
  let [from, to] = [index, index];
  while (set.has(from - 1)) from -= 1;
  while (set.has(to + 1)) to += 1;
  return { from_mm: stations[from]?.station_mm ?? 0, to_mm: stations[to]?.station_mm ?? 0 };
}

const SAYS: Record<Exclude<Proof, "inside">, (limit: string, expanded: string) => string> = {
  outside: (limit) => `beyond ${limit}`,
  not_proven: (limit, expanded) => `too near ${limit} to say, uncertainty ${expanded}`,
  too_coarse: (limit, expanded) => `the scan is too coarse to prove ${limit}, uncertainty ${expanded}`,
};

/** Trailing zeros say nothing and stations are read aloud. */
const place = (station_mm: number) => `${Number(station_mm.toFixed(1))} mm`;

/**
 * The reason why a quantity does not keep a limit everywhere: its worst station, with the stretch around it.
 * @param level which set of limits this one belongs to
 * @returns null where every station is proved inside
 */
export function reasonFor(
  stations: readonly StationResult[],
  quantity: JudgedQuantity,
  { level, limit, nominal }: { level: "within" | "adapt"; limit: number; nominal: number },
): VerdictReason | null {
  const failing = failingStations(stations, quantity, nominal, limit);
  const worst = failing.reduce<Failing | null>((best, one) => {
    if (!best || RANK[one.proof] > RANK[best.proof]) return one;
    return RANK[one.proof] === RANK[best.proof] && one.size > best.size ? one : best;
  }, null);
  const station = worst && stations[worst.index];
  if (!worst || !station) return null;
  const side = worst.value < nominal ? -1 : 1;
  const unit = quantity.unit === "mm" ? " mm" : "°";
  const crossed = nominal + side * limit;
  const figure = (value: number) => `${value.toFixed(2)}${unit}`;
  const expanded = COVERAGE_FACTOR * worst.u;
  return {
    check: quantity.check,
    station_mm: station.station_mm,
    value: rounded(worst.value),
    limit: rounded(crossed),
    unit: quantity.unit,
    level,
    proof: worst.proof,
    expanded_u: rounded(expanded),
    ...stretchAround(stations, failing, worst.index),
    text: `${quantity.name} ${figure(worst.value)} at ${place(station.station_mm)}: ${SAYS[worst.proof](figure(crossed), figure(expanded))}`,
  };
}
