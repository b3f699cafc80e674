/** What preheat by CET is computed from. */
export interface PreheatInput {
  /** Carbon equivalent CET of the steel that governs, percent by mass. */
  readonly cet_pct: number;
  /** Thickness of the thicker single plate, mm; not the combined thickness of method A. */
  readonly thickness_mm: number;
  /** Diffusible hydrogen, ml per 100 g of deposited metal (ISO 3690). */
  readonly hydrogen_ml_100g: number;
  /** Heat input Q, arc efficiency in it, kJ/mm. */
  readonly heat_input_kj_mm: number;
}

/** An input outside the range for which the equation holds: the result is then an extrapolation. */
export interface InputOutside {
  readonly input: keyof PreheatInput;
  readonly value: number;
  readonly min: number;
  readonly max: number;
}

/** The preheat temperature and where it comes from. */
export interface Preheat {
  /** As the equation gives it, °C, unrounded; it may lie below room temperature. */
  readonly preheat_c: number;
  /** What each input contributes, K; the four sum to `preheat_c`. */
  readonly parts_k: Readonly<Record<keyof PreheatInput, number>>;
  readonly outside: readonly InputOutside[];
}

/** Range of use of method B; for parent metal with a yield strength up to 1000 MPa. */
const RANGES: Readonly<Record<keyof PreheatInput, readonly [min: number, max: number]>> = {
  cet_pct: [0.2, 0.5],
  thickness_mm: [10, 90],
  hydrogen_ml_100g: [1, 20],
  heat_input_kj_mm: [0.5, 4],
};

/**
 * Preheat temperature against hydrogen cracking, method B:
 * Tp = 697·CET + 160·tanh(d/35) + 62·HD^0.35 + (53·CET − 32)·Q − 328.
 * A result at or below the workpiece's temperature means that this formula asks for no preheat; it is no permission:
 * the procedure governs.
 * @param input each above 0; outside the equation's range the result is given and flagged
 * @throws RangeError when an input is not above 0
 * Source: EN 1011-2:2001+A1:2003, Annex C.3, equation C.8 and the partial equations before it.
 * Example: CET 0.40, 50 mm, HD 10, 2.0 kJ/mm gives 210.6 °C.
 */
export function preheatByCet(input: PreheatInput): Preheat {
  const { cet_pct, thickness_mm, hydrogen_ml_100g, heat_input_kj_mm } = input;
  const outside = INPUTS.flatMap((name): InputOutside[] => {
    const value = input[name];
    if (!(value > 0 && Number.isFinite(value)))
      throw new RangeError(`${name}: expected above 0, got ${value}`);
    const [min, max] = RANGES[name];
    return value < min || value > max ? [{ input: name, value, min, max }] : [];
  });
  const parts_k = {
    cet_pct: 750 * cet_pct - 150,
    thickness_mm: 160 * Math.tanh(thickness_mm / 35) - 110,
    hydrogen_ml_100g: 62 * hydrogen_ml_100g ** 0.35 - 100,
    heat_input_kj_mm: (53 * cet_pct - 32) * heat_input_kj_mm - 53 * cet_pct + 32,
  };
  const preheat_c = INPUTS.reduce((sum, name) => sum + parts_k[name], 0);
  return { preheat_c, parts_k, outside };
}

const INPUTS = ["cet_pct", "thickness_mm", "hydrogen_ml_100g", "heat_input_kj_mm"] as const;

/**
 * Combined thickness for method A: the sum over the paths by which heat leaves the joint.
 * @param joint a butt weld has two paths, a T fillet three (the through plate counts on both sides)
 * @throws RangeError when a thickness is not above 0
 * Source: EN 1011-2:2001, Annex C.2. Example: a T fillet of 15 mm on 15 mm is 45 mm.
 */
export function combinedThickness(
  joint:
    | { readonly kind: "butt"; readonly plates_mm: readonly [number, number] }
    | { readonly kind: "fillet_t"; readonly through_mm: number; readonly upright_mm: number },
): number {
  const paths_mm =
    joint.kind === "butt" ? joint.plates_mm : [joint.through_mm, joint.through_mm, joint.upright_mm];
  for (const path_mm of paths_mm) {
    if (!(path_mm > 0 && Number.isFinite(path_mm)))
      throw new RangeError(`thickness: expected above 0, got ${path_mm}`);
  }
  return paths_mm.reduce((sum, path_mm) => sum + path_mm, 0);
}
