/**
 * Throat of a flat fillet between plates at right angles: a = z1·z2 / √(z1² + z2²).
 * @param leg1_mm leg along one plate, mm, 0 or more
 * @param leg2_mm leg along the other plate, mm, 0 or more; both 0 gives 0
 * @returns mm
 * Source: geometry. Example: legs of 6 mm give 4.24 mm.
 */
export function filletThroat(leg1_mm: number, leg2_mm: number): number {
  checkFrom0({ leg1_mm, leg2_mm });
  const face_mm = Math.hypot(leg1_mm, leg2_mm);
  return face_mm === 0 ? 0 : (leg1_mm * leg2_mm) / face_mm;
}

/** Leg of a flat fillet with equal legs: z = √2·a. @param throat_mm mm, 0 or more. Source: geometry. */
export function filletLeg(throat_mm: number): number {
  checkFrom0({ throat_mm });
  return Math.SQRT2 * throat_mm;
}

/** Cross-section of a flat fillet: z1·z2/2, mm². @param leg1_mm, leg2_mm mm, 0 or more. Source: geometry. */
export function filletArea(leg1_mm: number, leg2_mm: number): number {
  checkFrom0({ leg1_mm, leg2_mm });
  return (leg1_mm * leg2_mm) / 2;
}

/** Throat of a flat fillet with equal legs that has a cross-section: a = √A. @param area_mm2 mm², 0 or more */
export function throatOfArea(area_mm2: number): number {
  checkFrom0({ area_mm2 });
  return Math.sqrt(area_mm2);
}

/**
 * More weld metal that a gap under the upright of a T joint asks for, if both legs grow by the gap to keep the throat:
 * z·g + g²/2. What runs into the gap itself is not in it.
 * @param leg_mm nominal leg, mm, 0 or more
 * @param gap_mm gap, mm, 0 or more
 * @returns mm²
 * Source: geometry; that the legs grow by the gap is the practice of AWS D1.1. Example: z 6, g 1.5 gives 10.125 mm².
 */
export function gapExtraArea(leg_mm: number, gap_mm: number): number {
  checkFrom0({ leg_mm, gap_mm });
  return leg_mm * gap_mm + (gap_mm * gap_mm) / 2;
}

/**
 * Throat that is left when the legs do not grow with the gap: (z − g)/√2, and 0 once the gap swallows the leg.
 * @param leg_mm leg as welded, mm, 0 or more
 * @param gap_mm gap, mm, 0 or more
 * @returns mm
 * Source: geometry. Example: z 6, g 1.5 leaves 3.18 of 4.24 mm.
 */
export function throatDespiteGap(leg_mm: number, gap_mm: number): number {
  checkFrom0({ leg_mm, gap_mm });
  return Math.max(0, leg_mm - gap_mm) / Math.SQRT2;
}

function checkFrom0(lengths: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(lengths)) {
    if (!(value >= 0 && Number.isFinite(value)))
      throw new RangeError(`${name}: expected 0 or more, got ${value}`);
  }
}
