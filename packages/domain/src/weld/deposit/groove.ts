/** A groove of a butt weld, in section. */
export interface VGroove {
  /** Plate thickness, mm, above 0. */
  readonly thickness_mm: number;
  /** Root gap, mm, 0 or more. */
  readonly gap_mm: number;
  /** Angle between the two faces, degrees, 0 (square) to below 180. */
  readonly included_angle_deg: number;
  /** Root face: height without bevel, mm, 0 up to the thickness. */
  readonly root_face_mm: number;
  /** Height of the bead over the plate, mm, 0 or more. */
  readonly reinforcement_mm: number;
}

/** The weld metal of a groove, by its elements. */
export interface GrooveFill {
  /** Width of the groove at the plate's surface, mm. */
  readonly width_mm: number;
  /** Rectangle under the root gap, mm². */
  readonly gap_mm2: number;
  /** The two bevel triangles, mm². */
  readonly bevels_mm2: number;
  /** Bead over the plate as a parabola, mm². */
  readonly reinforcement_mm2: number;
  readonly area_mm2: number;
}

/**
 * Weld metal that a V groove takes: g·t + (t − f)²·tan(α/2) + ⅔·w·h with w = g + 2·(t − f)·tan(α/2).
 * A square butt is an angle of 0. The bead's ⅔ is a parabola; some texts use up to 0.75.
 * @throws RangeError when a length or the angle lies outside its range
 * Source: geometry. Example: 15 mm, gap 3, 60°, root face 1, reinforcement 2 takes 183.7 mm².
 */
export function vGrooveFill(groove: VGroove): GrooveFill {
  check(groove);
  const { thickness_mm, gap_mm, reinforcement_mm } = groove;
  const height_mm = thickness_mm - groove.root_face_mm;
  const slope = Math.tan((groove.included_angle_deg * Math.PI) / 360);
  const width_mm = gap_mm + 2 * height_mm * slope;
  const gap_mm2 = gap_mm * thickness_mm;
  const bevels_mm2 = height_mm * height_mm * slope;
  const reinforcement_mm2 = (2 / 3) * width_mm * reinforcement_mm;
  return {
    width_mm,
    gap_mm2,
    bevels_mm2,
    reinforcement_mm2,
    area_mm2: gap_mm2 + bevels_mm2 + reinforcement_mm2,
  };
}

function check({ thickness_mm, gap_mm, included_angle_deg, root_face_mm, reinforcement_mm }: VGroove): void {
  if (!(thickness_mm > 0 && Number.isFinite(thickness_mm))) {
    throw new RangeError(`thickness_mm: expected above 0, got ${thickness_mm}`);
  }
  for (const [name, value] of Object.entries({ gap_mm, reinforcement_mm })) {
    if (!(value >= 0 && Number.isFinite(value)))
      throw new RangeError(`${name}: expected 0 or more, got ${value}`);
  }
  if (!(root_face_mm >= 0 && root_face_mm <= thickness_mm)) {
    throw new RangeError(`root_face_mm: expected 0 to ${thickness_mm}, got ${root_face_mm}`);
  }
  if (!(included_angle_deg >= 0 && included_angle_deg < 180)) {
    throw new RangeError(`included_angle_deg: expected 0 to below 180, got ${included_angle_deg}`);
  }
}
