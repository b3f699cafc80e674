import * as domain from "@beadroll/domain/units/length";

/** How this screen shows lengths. Everything stored and sent is in mm. */
export type LengthUnits = domain.LengthUnit;

/** What is added to a number of decimals so that an inch shows about as finely as a millimetre does. */
export const MORE_DECIMALS_FOR_INCHES = 1;

/** A length in the units shown. */
export function fromMm(length_mm: number, units: LengthUnits): number {
  return units === "mm" ? length_mm : domain.inchesFromMm(length_mm);
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

/** A length with its unit: `formatLength(3.41, "mm")` is "3.41 mm", in inches "0.134 in". */
export function formatLength(length_mm: number, units: LengthUnits, decimals_mm = 2): string {
  return domain.formatLength(length_mm, { unit: units, digits: digitsFor(units, decimals_mm) });
}

/** A deviation with its sign and unit: "+0.37 mm". */
export function formatDeviation(length_mm: number, units: LengthUnits, decimals_mm = 2): string {
  return domain.formatLength(length_mm, { unit: units, digits: digitsFor(units, decimals_mm), signed: true });
}

function digitsFor(units: LengthUnits, decimals_mm: number): number {
  return units === "mm" ? decimals_mm : decimals_mm + MORE_DECIMALS_FOR_INCHES;
}
