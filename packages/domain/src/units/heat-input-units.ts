import { MM_PER_INCH } from "./length.ts";

/** Heat input from kJ/mm to kJ/in, as American procedures give it. Source: definition of the inch. */
export function kjInFromKjMm(heat_input_kj_mm: number): number {
  return heat_input_kj_mm * MM_PER_INCH;
}

/** Heat input from kJ/cm to kJ/mm. Source: definition of the units. */
export function kjMmFromKjCm(heat_input_kj_cm: number): number {
  return heat_input_kj_cm / 10;
}
