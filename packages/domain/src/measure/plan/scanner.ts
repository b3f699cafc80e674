import type { ScannerData } from "../../schemas/scan-plan.ts";

const RAD = Math.PI / 180;

/** Distance from profile to profile, mm: travel over rate. */
export const profileSpacing = (travel_mm_s: number, profile_rate_hz: number): number =>
  travel_mm_s / profile_rate_hz;

/** Profiles taken over a length, both ends included: ⌊L f / v⌋ + 1. */
export const profileCount = (length_mm: number, travel_mm_s: number, profile_rate_hz: number): number =>
  // A whole number of spacings must not lose its last profile to rounding.
  Math.floor((length_mm * profile_rate_hz) / travel_mm_s + 1e-9) + 1;

/** Width of the field at a stand-off, mm; it grows evenly from the near to the far edge. */
export function fieldWidth(scanner: ScannerData, stand_off_mm: number): number {
  const { near_mm, far_mm, width_near_mm, width_far_mm } = scanner;
  return width_near_mm + ((width_far_mm - width_near_mm) * (stand_off_mm - near_mm)) / (far_mm - near_mm);
}

/** Distance from point to point across the field, mm: W / (N − 1). */
export const pointSpacing = (scanner: ScannerData, stand_off_mm: number): number =>
  fieldWidth(scanner, stand_off_mm) / (scanner.points_per_profile - 1);

/**
 * Height that one pixel resolves, mm, the camera tilted by `camera_deg` and the laser by `laser_deg` to the other side
 * of the surface's normal: dx cos b / sin(a + b). With the laser along the normal dx / sin a; with the camera along it
 * dx / tan b.
 * @param pixel_mm size of a pixel on the surface, mm
 * Source: geometry of the sheet of light.
 */
export function heightStep(pixel_mm: number, camera_deg: number, laser_deg: number): number {
  return (pixel_mm * Math.cos(laser_deg * RAD)) / Math.sin((camera_deg + laser_deg) * RAD);
}

/**
 * Uncertainty of height that speckle leaves whatever the electronics: C λ / (2π sin u sin θ).
 * @param wavelength_um µm
 * @param contrast speckle contrast, 1 on ground steel
 * @param sin_aperture sine of half the observation aperture
 * @param triangulation_deg angle between laser and camera, degrees
 * @returns µm
 * Source: Dorsch, Häusler, Herrmann, Applied Optics 33 (1994) 1306; the formula from memory.
 */
export const speckleFloor = (
  wavelength_um: number,
  contrast: number,
  sin_aperture: number,
  triangulation_deg: number,
): number => (contrast * wavelength_um) / (2 * Math.PI * sin_aperture * Math.sin(triangulation_deg * RAD));

/** Error along the seam from a clock of scanner and robot that differ by `dt_ms`, mm. */
export const clockError = (travel_mm_s: number, dt_ms: number): number => (travel_mm_s * dt_ms) / 1000;

/** Length hidden behind a step, the camera looking over it at the triangulation angle, mm. */
export const blindBehindStep = (step_mm: number, triangulation_deg: number): number =>
  step_mm * Math.tan(triangulation_deg * RAD);

/** Depth to which a gap is lit by a ray that leans from its wall, mm. */
export const litDepth = (gap_mm: number, ray_deg: number): number => gap_mm / Math.tan(ray_deg * RAD);
