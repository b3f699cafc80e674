/** Density of unalloyed steel, g/cm³. Austenitic steel: 7.9 to 8.0; aluminium: 2.7. */
export const STEEL_DENSITY_G_CM3 = 7.85;

/** A wire as it is fed. */
export interface WireFeed {
  /** Diameter, mm, above 0. */
  readonly wire_diameter_mm: number;
  /** Wire feed, m/min, above 0. */
  readonly wire_feed_m_min: number;
  /** Share of the wire that becomes weld metal, above 0 to 1; solid wire under mixed gas about 0.96. */
  readonly deposition_share: number;
}

/**
 * Typical share of the filler that becomes weld metal, from a maker's handbook; the procedure's own figure is better.
 * The names of the rows are from memory.
 */
export const DEPOSITION_SHARES = {
  "121": 0.99,
  "135, argon with 2 % oxygen": 0.98,
  "135, argon with 25 % carbon dioxide": 0.96,
  "135, carbon dioxide or short circuit": 0.93,
  "138": 0.93,
  "136": 0.86,
  "114": 0.78,
} as const;

/**
 * Cross-section that a wire deposits at a travel speed: A = (π·d²/4)·WFS·η / v.
 * @param travel_mm_s travel speed, mm/s, above 0
 * @returns mm²
 * @throws RangeError when an input is not in its range
 * Source: geometry. Example: 1.2 mm, 9 m/min, η 0.96 at 500 mm/min deposits 19.5 mm².
 */
export function depositedArea(feed: WireFeed, travel_mm_s: number): number {
  checkAbove0({ travel_mm_s });
  return volumePerSecond(feed) / travel_mm_s;
}

/**
 * Travel speed at which a wire deposits a cross-section.
 * @param area_mm2 cross-section wanted, mm², above 0
 * @returns mm/s
 * @throws RangeError when an input is not in its range
 * Source: geometry, `depositedArea` turned round.
 */
export function travelForArea(feed: WireFeed, area_mm2: number): number {
  checkAbove0({ area_mm2 });
  return volumePerSecond(feed) / area_mm2;
}

/**
 * Deposition rate of a wire.
 * @param density_g_cm3 density of the wire, g/cm³
 * @returns kg/h
 * @throws RangeError when an input is not in its range
 * Source: geometry. Example: 1.2 mm, 9 m/min, η 0.96 in steel is 4.60 kg/h.
 */
export function depositionRate(feed: WireFeed, density_g_cm3: number = STEEL_DENSITY_G_CM3): number {
  checkAbove0({ density_g_cm3 });
  return (volumePerSecond(feed) * 3600 * density_g_cm3) / 1e6;
}

/** Mass of weld metal, or of any bar, for each metre: kg/m. @param area_mm2 mm², 0 or more. Source: geometry. */
export function massPerLength(area_mm2: number, density_g_cm3: number = STEEL_DENSITY_G_CM3): number {
  checkAbove0({ density_g_cm3 });
  if (!(area_mm2 >= 0)) throw new RangeError(`area_mm2: expected 0 or more, got ${area_mm2}`);
  return (area_mm2 * density_g_cm3) / 1000;
}

/** Length of a wire for each kilogram: m/kg. @param wire_diameter_mm mm, above 0. Source: geometry. */
export function wireLengthPerMass(
  wire_diameter_mm: number,
  density_g_cm3: number = STEEL_DENSITY_G_CM3,
): number {
  checkAbove0({ wire_diameter_mm });
  return 1 / massPerLength(wireSection(wire_diameter_mm), density_g_cm3);
}

/** Volume deposited, mm³/s. */
function volumePerSecond({ wire_diameter_mm, wire_feed_m_min, deposition_share }: WireFeed): number {
  checkAbove0({ wire_diameter_mm, wire_feed_m_min });
  if (!(deposition_share > 0 && deposition_share <= 1)) {
    throw new RangeError(`deposition_share: expected above 0 to 1, got ${deposition_share}`);
  }
  return (wireSection(wire_diameter_mm) * wire_feed_m_min * 1000 * deposition_share) / 60;
}

function wireSection(wire_diameter_mm: number): number {
  return (Math.PI * wire_diameter_mm ** 2) / 4;
}

function checkAbove0(values: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(values)) {
    if (!(value > 0 && Number.isFinite(value)))
      throw new RangeError(`${name}: expected above 0, got ${value}`);
  }
}
