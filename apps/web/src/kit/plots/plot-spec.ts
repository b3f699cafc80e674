import {
  formatFigure,
  formatSigned,
  fromMm,
  type LengthUnits,
  MORE_DECIMALS_FOR_INCHES,
} from "../units/length-units.ts";
import { extentOf, padded } from "./plot-frame.ts";
import type { Values } from "./plot-paths.ts";

/** A range that a quantity is held against. */
export interface PlotBand {
  /** within: the nominal path serves, or the procedure's window. adapt: the path may follow the joint. */
  readonly kind: "within" | "adapt";
  readonly low: number;
  readonly high: number;
  /** The word at its edge, such as "adapt" or "procedure". */
  readonly word: string;
  /** Which edge bears the word; the upper one where nothing is said. */
  readonly edge?: "low" | "high";
}

/** One quantity along the seam, as a plot and as a column of its table. */
export interface PlotSpec {
  readonly id: string;
  /** "Lateral", "Heat input". */
  readonly title: string;
  /** A quantity in "mm" follows the units of the screen. */
  readonly unit: string;
  readonly stations_mm: readonly number[];
  /** Null where it was not measured. */
  readonly values: Values;
  /** Expanded uncertainty of each value, half the width of its band. */
  readonly expanded_u?: Values;
  /** Smallest and largest around each value, for a thinned log. */
  readonly envelope?: { readonly min: Values; readonly max: Values };
  readonly bands?: readonly PlotBand[];
  /** Decimals in the table and at the cursor; an inch gets one more. */
  readonly decimals?: number;
  /** Deviations bear their sign. */
  readonly signed?: boolean;
}

/** Values around each other: a ± half width, where both are known. */
export function around(values: Values, half: Values, sign: 1 | -1): Values {
  return values.map((value, index) => {
    const width = half[index];
    return value === null || width === null || width === undefined ? null : value + sign * width;
  });
}

/** Lowest and highest that a plot shows: values, their uncertainty or envelope, every limit, and 0 for deviations. */
export function plotExtent(spec: PlotSpec): [number, number] {
  const half = spec.expanded_u ?? [];
  const extent = extentOf(
    spec.values,
    around(spec.values, half, 1),
    around(spec.values, half, -1),
    spec.envelope?.min ?? [],
    spec.envelope?.max ?? [],
    (spec.bands ?? []).flatMap((band) => [band.low, band.high]),
    spec.signed === true ? [0] : [],
  );
  return padded(extent ?? [0, 1], 0.08);
}

/** A spec with its lengths in the units of the screen. */
export function inUnits(spec: PlotSpec, units: LengthUnits): PlotSpec {
  if (spec.unit !== "mm" || units === "mm") return spec;
  const turn = (value: number | null) => (value === null ? null : fromMm(value, units));
  return {
    ...spec,
    unit: units,
    decimals: (spec.decimals ?? 2) + MORE_DECIMALS_FOR_INCHES,
    values: spec.values.map(turn),
    ...(spec.expanded_u && { expanded_u: spec.expanded_u.map(turn) }),
    ...(spec.envelope && {
      envelope: { min: spec.envelope.min.map(turn), max: spec.envelope.max.map(turn) },
    }),
    ...(spec.bands && {
      bands: spec.bands.map((band) => ({
        ...band,
        low: fromMm(band.low, units),
        high: fromMm(band.high, units),
      })),
    }),
  };
}

/** A value as the cursor and the table write it, without its unit: "+3.41 ± 0.06", "not measured". */
export function valueText(spec: PlotSpec, index: number): string {
  const value = spec.values[index];
  if (value === null || value === undefined) return "not measured";
  const decimals = spec.decimals ?? 2;
  const figure = spec.signed === true ? formatSigned(value, decimals) : formatFigure(value, decimals);
  const half = spec.expanded_u?.[index];
  return half === null || half === undefined ? figure : `${figure} ± ${formatFigure(half, decimals)}`;
}

/** The outermost band that a value lies in; "beyond" all of them; null where nothing limits it or nothing is known. */
export function bandOf(spec: PlotSpec, index: number): PlotBand["kind"] | "beyond" | null {
  const value = spec.values[index];
  const bands = spec.bands ?? [];
  if (value === null || value === undefined || bands.length === 0) return null;
  const holding = bands.filter((band) => value >= band.low && value <= band.high);
  if (holding.some((band) => band.kind === "within")) return "within";
  return holding.length > 0 ? "adapt" : "beyond";
}
