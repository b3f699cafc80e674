/** How this screen shows lengths. Everything stored and sent is in mm. */
export type LengthUnits = "mm" | "in";

/** Millimetres in an inch, exact (ISO 80000-3:2019, 3-1.1). */
export const MM_PER_INCH = 25.4;

/** What is added to a number of decimals so that an inch shows as finely as a millimetre does. */
const MORE_DECIMALS_FOR_INCHES = 2;

/** A length in the units shown. */
export function fromMm(length_mm: number, units: LengthUnits): number {
  return units === "mm" ? length_mm : length_mm / MM_PER_INCH;
}

/** A length typed in the units shown, in mm. */
export function toMm(length: number, units: LengthUnits): number {
  return units === "mm" ? length : length * MM_PER_INCH;
}

/** A figure with a fixed number of decimals, a true minus sign, and no "-0.00". */
export function formatFigure(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  if (Number(text) === 0) return text.replace("-", "");
  return text.replace("-", "−");
}

/** A figure that always bears its sign, as deviations do: +0.37, −1.20, 0.00. */
export function formatSigned(value: number, decimals: number): string {
  const text = formatFigure(value, decimals);
  return Number(value.toFixed(decimals)) > 0 ? `+${text}` : text;
}

/** A length with its unit: `formatLength(3.41, "mm")` is "3.41 mm", in inches "0.1343 in". */
export function formatLength(length_mm: number, units: LengthUnits, decimals_mm = 2): string {
  const decimals = units === "mm" ? decimals_mm : decimals_mm + MORE_DECIMALS_FOR_INCHES;
  return `${formatFigure(fromMm(length_mm, units), decimals)} ${units}`;
}
