import type { ShopJoint } from "../design/product.ts";

/** A laser-line scanner set up for a kind of joint. */
export interface Sensor {
  readonly points: number;
  readonly field_of_view_mm: number;
  readonly working_distance_mm: number;
  /** Half the depth it can measure, about the working distance. */
  readonly range_mm: number;
  /** Direction from the root to the scanner: from plate A's normal away from plate B. */
  readonly view_deg: number;
}

const set = (points: number, field_of_view_mm: number, view_deg: number): Sensor => ({
  points,
  field_of_view_mm,
  working_distance_mm: 150,
  range_mm: 30,
  view_deg,
});

/** Each joint is looked at from the side where both of its faces are seen. */
export const SENSORS: Readonly<Record<ShopJoint, Sensor>> = {
  fillet_t: set(96, 30, 40),
  lap: set(144, 28, 36),
  butt_v: set(110, 32, 0),
  corner_open: set(104, 30, -45),
};

/** A finished weld is looked at wider and finer: its toes and the plates beside them have to be seen. */
export const FINISHED_SENSOR: Sensor = set(320, 44, 40);
