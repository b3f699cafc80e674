/** A vector in the part frame. */
export type Vector = readonly [number, number, number];

/** The section frame at a place along the nominal line. */
export interface Frame {
  readonly point: Vector;
  readonly tangent: Vector;
  readonly lateral: Vector;
  readonly normal: Vector;
}

/** A nominal line. */
export interface Line {
  readonly length_mm: number;
  readonly closed: boolean;
  at(station_mm: number): Frame;
}

/** A straight seam along x. */
export function straight(length_mm: number): Line {
  return {
    length_mm,
    closed: false,
    at: (s) => ({ point: [s, 0, 0], tangent: [1, 0, 0], lateral: [0, 1, 0], normal: [0, 0, 1] }),
  };
}

/** An arc in the x-y plane, plate B on the inside; a whole circle is closed. */
export function arc(radius_mm: number, length_mm: number): Line {
  const closed = Math.abs(length_mm - 2 * Math.PI * radius_mm) < 1e-6;
  return {
    length_mm,
    closed,
    at: (s) => {
      const [c, d] = [Math.cos(s / radius_mm), Math.sin(s / radius_mm)];
      return {
        point: [radius_mm * c, radius_mm * d, 0],
        tangent: [-d, c, 0],
        lateral: [-c, -d, 0],
        normal: [0, 0, 1],
      };
    },
  };
}
