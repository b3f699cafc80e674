/** Units as people write them, by the end of a field's name; longer ends before shorter. */
const UNITS: readonly (readonly [suffix: string, unit: string])[] = [
  ["_kj_mm", "kJ/mm"],
  ["_mm_s", "mm/s"],
  ["_m_min", "m/min"],
  ["_l_min", "l/min"],
  ["_mm", "mm"],
  ["_deg", "°"],
  ["_mpa", "MPa"],
  ["_pct", "%"],
  ["_kg", "kg"],
  ["_c", "°C"],
  ["_a", "A"],
  ["_v", "V"],
  ["_s", "s"],
  ["_j", "J"],
];

/** The unit that a field's name ends with: `thickness_mm` is in "mm"; undefined where it has none. */
export function unitOfName(name: string): string | undefined {
  return UNITS.find(([suffix]) => name.endsWith(suffix))?.[1];
}
