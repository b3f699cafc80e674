export type Vector = readonly [number, number, number];

/** A place on a seam with its section frame, as data/scans and the seam model define it. */
export interface Frame {
  readonly point: Vector;
  readonly tangent: Vector;
  /** In plate A's surface, toward plate B: here always to the left of the tangent, seen from above. */
  readonly lateral: Vector;
  readonly normal: Vector;
}

/** A seam's nominal line in a plane at constant height; stations before 0 and beyond the end run straight on. */
export interface SeamLine {
  readonly length_mm: number;
  readonly frameAt: (station_mm: number) => Frame;
}

/** A straight run, or a turn to the left along an arc. */
export type Step =
  | { readonly straight_mm: number }
  | { readonly left_deg: number; readonly radius_mm: number };

export interface LineStart {
  readonly at_mm: Vector;
  /** Direction of travel, degrees from +x toward +y. */
  readonly heading_deg: number;
}

interface Leg {
  readonly from_mm: number;
  readonly length_mm: number;
  readonly x_mm: number;
  readonly y_mm: number;
  readonly heading_rad: number;
  /** Turn to the left per mm; 0 on a straight. */
  readonly curvature: number;
}

interface Place {
  readonly x_mm: number;
  readonly y_mm: number;
  readonly heading_rad: number;
}

const RAD = Math.PI / 180;

/** Where a leg is after a length from its own start. */
function along({ x_mm, y_mm, heading_rad, curvature }: Leg, run_mm: number): Place {
  if (curvature === 0) {
    return {
      x_mm: x_mm + run_mm * Math.cos(heading_rad),
      y_mm: y_mm + run_mm * Math.sin(heading_rad),
      heading_rad,
    };
  }
  const turned = heading_rad + run_mm * curvature;
  return {
    x_mm: x_mm + (Math.sin(turned) - Math.sin(heading_rad)) / curvature,
    y_mm: y_mm - (Math.cos(turned) - Math.cos(heading_rad)) / curvature,
    heading_rad: turned,
  };
}

function legsOf(start: LineStart, steps: readonly Step[]): Leg[] {
  const legs: Leg[] = [];
  let place: Place = {
    x_mm: start.at_mm[0],
    y_mm: start.at_mm[1],
    heading_rad: start.heading_deg * RAD,
  };
  let from_mm = 0;
  for (const step of steps) {
    const arc = "left_deg" in step;
    const length_mm = arc ? step.left_deg * RAD * step.radius_mm : step.straight_mm;
    const leg: Leg = { ...place, from_mm, length_mm, curvature: arc ? 1 / step.radius_mm : 0 };
    legs.push(leg);
    place = along(leg, length_mm);
    from_mm += length_mm;
  }
  return legs;
}

/**
 * A seam line from a start and its steps.
 * @throws RangeError without steps
 * Example: a straight of 100, a quarter turn of radius 20 and a straight of 50 is 181.4 mm long.
 */
export function seamLine(start: LineStart, steps: readonly Step[]): SeamLine {
  const legs = legsOf(start, steps);
  const last = legs.at(-1);
  if (last === undefined) throw new RangeError("steps: expected at least one");
  const length_mm = last.from_mm + last.length_mm;
  const z_mm = start.at_mm[2];
  const frameAt = (station_mm: number): Frame => {
    const leg = legs.findLast((each) => station_mm >= each.from_mm) ?? legs[0] ?? last;
    const { x_mm, y_mm, heading_rad } = along(leg, station_mm - leg.from_mm);
    const [cos, sin] = [Math.cos(heading_rad), Math.sin(heading_rad)];
    return { point: [x_mm, y_mm, z_mm], tangent: [cos, sin, 0], lateral: [-sin, cos, 0], normal: [0, 0, 1] };
  };
  return { length_mm, frameAt };
}

/** A straight seam. */
export function straight(at_mm: Vector, heading_deg: number, length_mm: number): SeamLine {
  return seamLine({ at_mm, heading_deg }, [{ straight_mm: length_mm }]);
}
