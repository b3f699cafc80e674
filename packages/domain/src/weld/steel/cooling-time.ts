/** What the cooling time depends on beside the plate. */
export interface CoolingInput {
  /** Heat input Q, arc efficiency in it, kJ/mm, above 0. */
  readonly heat_input_kj_mm: number;
  /** Preheat or interpass temperature, °C, below 500. */
  readonly preheat_c: number;
}

/** Shape factors of the weld for two- and three-dimensional heat flow, above 0 to 1. */
export interface ShapeFactors {
  readonly f2: number;
  readonly f3: number;
}

/**
 * Shape factors by kind of weld, Table D.1. For fillets the standard gives a span of F2 that depends on heat input
 * and thickness without a rule to interpolate; the upper end stands here, and the user may choose another.
 */
export const SHAPE_FACTORS = {
  run_on_plate: { f2: 1, f3: 1 },
  butt_between_runs: { f2: 0.9, f3: 0.9 },
  fillet_corner: { f2: 0.67, f3: 0.67 },
  fillet_t: { f2: 0.67, f3: 0.67 },
} as const satisfies Record<string, ShapeFactors>;

/** The cooling time and how the heat flows. */
export interface CoolingTime {
  /** Time from 800 to 500 °C, s, unrounded. */
  readonly t85_s: number;
  /** Thin plate: the heat flows in two dimensions, and thickness counts; else in three. */
  readonly flow: "2d" | "3d";
  /** Thickness at which both give the same time, mm. */
  readonly transition_mm: number;
}

const UPPER_C = 800;
const LOWER_C = 500;

/**
 * Cooling time from 800 to 500 °C for three-dimensional heat flow:
 * t = (6700 − 5·T0)·Q·[1/(500 − T0) − 1/(800 − T0)]·F3.
 * @returns s, above 0; independent of thickness, so ask `coolingTime` which case applies
 * @throws RangeError for T0 of 500 °C or more, or a heat input or factor that is not above 0
 * Source: EN 1011-2:2001, Annex D.6; unalloyed and low-alloy ferritic steels only.
 */
export function coolingTime3d(input: CoolingInput, f3: number): number {
  check(input, f3);
  const { heat_input_kj_mm: q, preheat_c: t0 } = input;
  return (6700 - 5 * t0) * q * (1 / (LOWER_C - t0) - 1 / (UPPER_C - t0)) * f3;
}

/**
 * Cooling time from 800 to 500 °C for two-dimensional heat flow:
 * t = (4300 − 4.3·T0)·10⁵·Q²/d²·[1/(500 − T0)² − 1/(800 − T0)²]·F2.
 * @param thickness_mm plate thickness d, mm, above 0
 * @returns s, above 0
 * @throws RangeError as `coolingTime3d`
 * Source: EN 1011-2:2001, Annex D.6.
 */
export function coolingTime2d(input: CoolingInput, thickness_mm: number, f2: number): number {
  check(input, f2);
  checkAbove0(thickness_mm, "thickness_mm");
  const { heat_input_kj_mm: q, preheat_c: t0 } = input;
  const falls = 1 / (LOWER_C - t0) ** 2 - 1 / (UPPER_C - t0) ** 2;
  return ((4300 - 4.3 * t0) * 1e5 * q * q * falls * f2) / thickness_mm ** 2;
}

/**
 * Thickness at which two- and three-dimensional heat flow give the same time.
 * @returns mm, above 0
 * @throws RangeError as `coolingTime3d`
 * Source: derived from both equations of EN 1011-2:2001, Annex D.6.
 */
export function transitionThickness(input: CoolingInput, { f2, f3 }: ShapeFactors): number {
  check(input, f2);
  check(input, f3);
  const { heat_input_kj_mm: q, preheat_c: t0 } = input;
  const ratio = ((4300 - 4.3 * t0) * 1e5) / (6700 - 5 * t0);
  return Math.sqrt(ratio * q * (1 / (LOWER_C - t0) + 1 / (UPPER_C - t0)) * (f2 / f3));
}

/**
 * The cooling time that governs, the heat flow told from the plate's thickness. Ends of seams, short seams and plates
 * narrower than the heated field lie outside the model.
 * @param thickness_mm plate thickness, mm, above 0; at the transition thickness itself both agree
 * @throws RangeError as `coolingTime3d`
 * Source: EN 1011-2:2001, Annex D.6. Example: 1.5 kJ/mm, 100 °C, 12 mm, butt: 22.9 s, two-dimensional.
 */
export function coolingTime(input: CoolingInput, thickness_mm: number, factors: ShapeFactors): CoolingTime {
  const transition_mm = transitionThickness(input, factors);
  const flow = thickness_mm < transition_mm ? "2d" : "3d";
  const t85_s =
    flow === "2d" ? coolingTime2d(input, thickness_mm, factors.f2) : coolingTime3d(input, factors.f3);
  checkAbove0(thickness_mm, "thickness_mm");
  return { t85_s, flow, transition_mm };
}

function check({ heat_input_kj_mm, preheat_c }: CoolingInput, factor: number): void {
  checkAbove0(heat_input_kj_mm, "heat_input_kj_mm");
  if (!(preheat_c < LOWER_C && preheat_c > -273.15)) {
    throw new RangeError(`preheat_c: expected below ${LOWER_C}, got ${preheat_c}`);
  }
  if (!(factor > 0 && factor <= 1))
    throw new RangeError(`shape factor: expected above 0 to 1, got ${factor}`);
}

function checkAbove0(value: number, name: string): void {
  if (!(value > 0 && Number.isFinite(value))) throw new RangeError(`${name}: expected above 0, got ${value}`);
}
