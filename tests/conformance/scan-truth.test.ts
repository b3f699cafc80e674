import { readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { gunzipSync } from "node:zlib";
import { evaluateScan } from "@beadroll/domain/measure/evaluate";
import { readScan } from "@beadroll/domain/measure/read/read-scan";
import type { ScanResult, StationResult } from "@beadroll/domain/schemas/scan-result";
import { parseSeamModel, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import { afterAll, describe, expect, it } from "vitest";

/**
 * The five simulated seams of packages/domain/vectors/scans, made by a simulator that shares nothing with the
 * measuring, held against the truth they were built from. Prints the errors as a table.
 */
const SCANS = fileURLToPath(new URL("../../packages/domain/vectors/scans/", import.meta.url));

/** 95th percentiles of |error|, mm, of a plain robust fit of each profile alone, as the data's README gives them. */
const PLAIN_FIT = {
  "01-two-uprights/seam-1": { lateral: 0.022, normal: 0.024, gap: 0.14 },
  "01-two-uprights/seam-2": { lateral: 0.028, normal: 0.025, gap: 0.14 },
  "02-butt-v-hilo": { lateral: 0.027, normal: 0.045, gap: 0.077, mismatch: 0.048 },
  "03-lap-gap": { lateral: 0.043, normal: 0.028, gap: 0.027 },
  "04-corner-arc": { lateral: 0.073, normal: 0.096, gap: 0.113 },
} as const;

type Case = keyof typeof PLAIN_FIT;
type Quantity = "lateral" | "normal" | "gap" | "mismatch";

interface TrueStation {
  readonly station_mm: number;
  readonly lateral_dev_mm: number;
  readonly normal_dev_mm: number;
  readonly gap_mm: number;
  readonly mismatch_mm: number | null;
  readonly included_angle_deg: number;
  readonly measurable: boolean;
}

interface Truth {
  readonly stations: readonly TrueStation[];
  readonly suggested_tolerance: Readonly<Record<string, number | null>>;
}

const TRUE_KEYS = {
  lateral: "lateral_dev_mm",
  normal: "normal_dev_mm",
  gap: "gap_mm",
  mismatch: "mismatch_mm",
} as const;

const bytes = (name: Case, file: string) => readFileSync(`${SCANS}${name}/${file}`);

function evaluated(name: Case): { model: SeamModel; result: ScanResult; truth: Truth } {
  const model = parseSeamModel(JSON.parse(bytes(name, "nominal.json").toString()));
  const cloud = readScan({
    name: "profiles.csv.gz",
    bytes: bytes(name, "profiles.csv.gz"),
    units: "mm",
    gunzip: (packed) => gunzipSync(packed),
    poses: { name: "poses.csv", bytes: bytes(name, "poses.csv") },
  });
  if (!model.ok || !cloud.ok) throw new Error(`${name} cannot be read`);
  const result = evaluateScan(model.value, cloud.value);
  if (!result.ok) throw new Error(JSON.stringify(result.faults));
  const truth: Truth = JSON.parse(gunzipSync(bytes(name, "truth.json.gz")).toString());
  return { model: model.value, result: result.value, truth };
}

interface Pair {
  readonly found: StationResult;
  readonly real: TrueStation;
}

function pairs(result: ScanResult, truth: Truth): Pair[] {
  return truth.stations.map((real) => {
    const found = result.stations.find((one) => Math.abs(one.station_mm - real.station_mm) < 1e-6);
    if (!found) throw new Error(`no station at ${real.station_mm} mm`);
    return { found, real };
  });
}

function errors(all: readonly Pair[], quantity: Quantity) {
  const seen = all.flatMap(({ found, real }) => {
    const [value, u] = [found[`${quantity}_mm`], found[`u_${quantity}_mm`]];
    const wanted = real[TRUE_KEYS[quantity]];
    return value === undefined || u === undefined || wanted === null ? [] : { error: value - wanted, u };
  });
  const sizes = seen.map(({ error }) => Math.abs(error)).sort((a, b) => a - b);
  return {
    count: seen.length,
    rms: Math.sqrt(seen.reduce((sum, { error }) => sum + error * error, 0) / Math.max(1, seen.length)),
    p95: sizes[Math.ceil(0.95 * sizes.length) - 1] ?? 0,
    max: sizes.at(-1) ?? 0,
    covered: seen.filter(({ error, u }) => Math.abs(error) <= 2 * u).length,
  };
}

const rows: string[] = [];
const totals = { count: 0, covered: 0 };
afterAll(() => {
  const head = "seam                     quantity    rms    p95    max  plain fit  covered (k = 2)";
  console.log([head, ...rows].join("\n"));
});

describe.each(Object.keys(PLAIN_FIT) as Case[])("%s", (name) => {
  const { model, result, truth } = evaluated(name);
  const all = pairs(result, truth);

  it.each(Object.entries(PLAIN_FIT[name]) as [Quantity, number][])("%s", (quantity, plain_mm) => {
    const found = errors(all, quantity);
    totals.count += found.count;
    totals.covered += found.covered;
    const figures = [found.rms, found.p95, found.max].map((mm) => mm.toFixed(4)).join(" ");
    rows.push(
      `${name.padEnd(24)} ${quantity.padEnd(9)} ${figures}  ${plain_mm.toFixed(3).padStart(9)}  ${((100 * found.covered) / found.count).toFixed(1)} %`,
    );
    expect(found.count).toBe(truth.stations.filter((station) => station.measurable).length);
    expect(found.p95).toBeLessThan(plain_mm);
    expect(found.p95).toBeLessThanOrEqual(truth.suggested_tolerance[`${quantity}_p95_mm`] ?? 0);
    expect(found.max).toBeLessThan(truth.suggested_tolerance["gross_error_mm"] ?? 0);
  });

  it("finds the included angle", () => {
    const nominal = model.section.included_angle_deg ?? 0;
    const off = all
      .map(({ found, real }) => Math.abs((found.angle_deg ?? 90) + nominal - real.included_angle_deg))
      .sort((a, b) => a - b);
    expect(off[off.length >> 1]).toBeLessThan(truth.suggested_tolerance["included_angle_median_deg"] ?? 0);
  });

  it("measures only what can be measured", () => {
    for (const { found, real } of all) if (!real.measurable) expect(found.measured).toBe(false);
  });
});

describe("two uprights", () => {
  it("gives 33.0 and 129.5 mm and the turn of 2.30 degrees", () => {
    const { result } = evaluated("01-two-uprights/seam-2");
    const y = (station: StationResult | undefined) => station?.root_mm?.[1] ?? Number.NaN;
    expect(Math.abs(y(result.stations[0]) - 101.6 - 33)).toBeLessThan(0.1);
    expect(Math.abs(y(result.stations.at(-1)) - 129.5)).toBeLessThan(0.1);
    expect(Math.abs(result.rigid.rotation_deg[2] + 2.3)).toBeLessThan(0.05);
    expect(Math.abs(result.rigid.rotation_deg[0])).toBeLessThan(0.05);
  });
});

it("states uncertainties that hold: between 90 and 99 % of all errors lie within k = 2", () => {
  const share = totals.covered / totals.count;
  rows.push(`all seams                                                    ${(100 * share).toFixed(1)} %`);
  expect(share).toBeGreaterThan(0.9);
  expect(share).toBeLessThan(0.99);
});
