/** How a quantity runs along a seam; every share of the run is 0 at the start and 1 at the end. */
export interface Course {
  readonly start: number;
  readonly end: number;
  /** Bow between the ends: largest in the middle. */
  readonly bow: number;
  /** A bump of a height at a share of the run; its width is the standard deviation, as a share too. */
  readonly bump?: { readonly at: number; readonly width: number; readonly height: number };
}

/** A tack weld in the root. */
export interface Tack {
  readonly at_mm: number;
  /** Half its length along the seam. */
  readonly half_mm: number;
  /** Leg of its section at the middle. */
  readonly leg_mm: number;
}

/** Where a scan sees nothing, and why the shop floor would know: a clamp, a hose, a hand lamp. */
export interface BlindStretch {
  readonly from_mm: number;
  readonly to_mm: number;
}

/** How a joint really stands before welding. Deviations are of the root, as the seam model defines them. */
export interface FitUp {
  readonly lateral_mm: Course;
  readonly normal_mm: Course;
  /** Opening at the root, the nominal gap in it. */
  readonly gap_mm: Course;
  readonly mismatch_mm: Course;
  /** Turn of each plate about the tangent, from lateral toward normal. */
  readonly turn_a_deg: Course;
  readonly turn_b_deg: Course;
  readonly tacks: readonly Tack[];
  readonly blind: readonly BlindStretch[];
  /** Spatter balls per 100 mm of seam. */
  readonly spatter: number;
}

/** Values of a fit-up at one station. */
export interface JointState {
  readonly lateral_mm: number;
  readonly normal_mm: number;
  readonly gap_mm: number;
  readonly mismatch_mm: number;
  readonly turn_a_deg: number;
  readonly turn_b_deg: number;
  /** Leg of the tack here; 0 without one. */
  readonly tack_mm: number;
  readonly blind: boolean;
}

/** A course that stays the same. */
export const level = (value: number): Course => ({ start: value, end: value, bow: 0 });

/** A course's value at a share of the run. */
export function valueAt(course: Course, share: number): number {
  const { start, end, bow, bump } = course;
  const even = start + (end - start) * share + bow * Math.sin(Math.PI * share);
  if (bump === undefined) return even;
  const off = (share - bump.at) / bump.width;
  return even + bump.height * Math.exp(-0.5 * off * off);
}

/** The joint at a station; before the start and beyond the end the ends' values hold. */
export function jointAt(fitUp: FitUp, station_mm: number, length_mm: number): JointState {
  const share = Math.min(1, Math.max(0, station_mm / length_mm));
  const tack_mm = fitUp.tacks.reduce((largest, tack) => {
    const off = (station_mm - tack.at_mm) / tack.half_mm;
    return Math.abs(off) < 1 ? Math.max(largest, tack.leg_mm * Math.sqrt(1 - off * off)) : largest;
  }, 0);
  return {
    lateral_mm: valueAt(fitUp.lateral_mm, share),
    normal_mm: valueAt(fitUp.normal_mm, share),
    gap_mm: Math.max(0, valueAt(fitUp.gap_mm, share)),
    mismatch_mm: valueAt(fitUp.mismatch_mm, share),
    turn_a_deg: valueAt(fitUp.turn_a_deg, share),
    turn_b_deg: valueAt(fitUp.turn_b_deg, share),
    tack_mm,
    blind: fitUp.blind.some(({ from_mm, to_mm }) => station_mm >= from_mm && station_mm <= to_mm),
  };
}
