import { extentOf, linearScale, padded, type Scale } from "../plots/plot-frame.ts";

/** A point of a section: lateral, normal; mm. */
export type SectionPoint = readonly [lateral_mm: number, normal_mm: number];

/** Both scales of a section, a millimetre as long on either axis. */
export interface SectionFrame {
  readonly x: Scale;
  readonly y: Scale;
}

/** The place of a section in CSS pixels: its size and the margins for ticks. */
export interface SectionPlace {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/**
 * Scales that show all points, equal on both axes, the drawing in the middle of its place.
 * @returns null where there is no point or no room
 */
export function sectionFrame(points: readonly SectionPoint[], place: SectionPlace): SectionFrame | null {
  const lateral = extentOf(points.map((point) => point[0]));
  const normal = extentOf(points.map((point) => point[1]));
  const width = place.width - place.left - place.right;
  const height = place.height - place.top - place.bottom;
  if (lateral === null || normal === null || width <= 0 || height <= 0) return null;
  const [west, east] = padded(lateral, 0.05);
  const [south, north] = padded(normal, 0.05);
  const mm_px = Math.max((east - west) / width, (north - south) / height);
  const middle_x = (west + east) / 2;
  const middle_y = (south + north) / 2;
  const half_x = (width * mm_px) / 2;
  const half_y = (height * mm_px) / 2;
  return {
    x: linearScale([middle_x - half_x, middle_x + half_x], [place.left, place.width - place.right]),
    y: linearScale([middle_y - half_y, middle_y + half_y], [place.height - place.bottom, place.top]),
  };
}
