/** Millimetres in an inch, by definition. */
export const MM_PER_INCH = 25.4;

/** A unit in which a screen shows lengths; the record keeps mm. */
export type LengthUnit = "mm" | "in";

/** Inches to mm, rounded at the twelfth digit so that 1.5 in is 38.1 mm and not a hair less. */
export function mmFromInches(length_in: number): number {
  return Number((length_in * MM_PER_INCH).toPrecision(12));
}

/** Mm to inches, rounded at the twelfth digit. */
export function inchesFromMm(length_mm: number): number {
  return Number((length_mm / MM_PER_INCH).toPrecision(12));
}

const DIGITS: Readonly<Record<LengthUnit, number>> = { mm: 2, in: 3 };

/** How a length is shown. */
export interface LengthFormat {
  readonly unit: LengthUnit;
  /** Decimals; two for mm and three for inches if absent, 0 to 9. */
  readonly digits?: number;
  /** Whether a plus sign stands before what is above 0, as for deviations. */
  readonly signed?: boolean;
}

/**
 * A length for a person, with its unit, decimal point, the minus sign of typography, and no sign on what rounds to 0.
 * @param length_mm mm; null or not a number gives a dash
 * @returns e.g. `1.50 mm`, `+0.059 in`, `−3.20 mm`, `–`
 */
export function formatLength(
  length_mm: number | null,
  { unit, digits, signed = false }: LengthFormat,
): string {
  if (length_mm === null || !Number.isFinite(length_mm)) return "–";
  const value = unit === "in" ? inchesFromMm(length_mm) : length_mm;
  const size = Math.abs(value).toFixed(digits ?? DIGITS[unit]);
  const isZero = Number(size) === 0;
  const sign = isZero ? "" : value < 0 ? "−" : signed ? "+" : "";
  return `${sign}${size} ${unit}`;
}
