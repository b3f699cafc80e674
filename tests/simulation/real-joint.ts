import type { JointType } from "@beadroll/domain/schemas/seam-model";

/** A point of a section, (lateral, normal) in mm. */
export type Point = readonly [number, number];

/** A straight piece of surface. */
export type Edge = readonly [Point, Point];

/** Sizes of the joint as designed, mm and degrees. */
export interface Design {
  readonly joint: JointType;
  readonly a_mm: number;
  readonly b_mm: number;
  readonly height_mm: number;
  readonly root_face_mm: number;
  readonly groove_deg: number;
}

/** The joint as it really is at one place, mm and degrees. */
export interface Real {
  readonly lateral_mm: number;
  readonly normal_mm: number;
  readonly gap_mm: number;
  /** Height of B's root edge over A's along A's normal; butt joints only. */
  readonly step_mm: number;
  readonly turn_a_deg: number;
  readonly turn_b_deg: number;
  /** Leg of a tack over the root; 0 where there is none. */
  readonly tack_mm: number;
}

export const REACH_MM = 70;
const RAD = Math.PI / 180;

/** From a plate's own axes to the section: turned about the plate's origin, then moved there. */
export const place = (points: readonly Point[], turn_deg: number, [ol, on]: Point): Point[] => {
  const [c, s] = [Math.cos(turn_deg * RAD), Math.sin(turn_deg * RAD)];
  return points.map(([l, n]): Point => [ol + l * c - n * s, on + l * s + n * c]);
};

export const edges = (points: readonly Point[]): Edge[] =>
  points.slice(1).map((to, i): Edge => [points[i] ?? to, to]);

export const bevelDeg = (design: Design, side: "a" | "b"): number => {
  if (design.joint === "butt_v") return design.groove_deg / 2;
  return design.joint === "butt_half_v" && side === "b" ? design.groove_deg : 0;
};

/** Depth of the root edges below the surface of a butt joint. */
export const depthOf = (design: Design): number =>
  design.joint === "butt_square" ? 0 : design.a_mm - design.root_face_mm;

/** One plate of a butt joint about its root edge, lying to the left; mirrored for the right one. */
function buttPlate(design: Design, side: "a" | "b"): Point[] {
  const depth = depthOf(design);
  const run = depth * Math.tan(bevelDeg(design, side) * RAD);
  const bottom = depth - (side === "a" ? design.a_mm : design.b_mm);
  const left: Point[] = [
    [-REACH_MM, depth],
    [-run, depth],
    [0, 0],
    [0, bottom],
    [-REACH_MM, bottom],
  ];
  return side === "a" ? left : left.map(([l, n]): Point => [-l, n]);
}

function butt(design: Design, real: Real): Edge[] {
  const root: Point = [real.lateral_mm, real.normal_mm];
  const [a] = place([[-real.gap_mm / 2, -real.step_mm / 2]], real.turn_a_deg, root);
  const [b] = place([[real.gap_mm / 2, real.step_mm / 2]], real.turn_a_deg, root);
  if (!a || !b) return [];
  return [
    ...edges(place(buttPlate(design, "a"), real.turn_a_deg, a)),
    ...edges(place(buttPlate(design, "b"), real.turn_b_deg, b)),
  ];
}

function meeting(design: Design, real: Real): Edge[] {
  const root: Point = [real.lateral_mm, real.normal_mm];
  const { a_mm, b_mm, height_mm } = design;
  const gap = real.gap_mm;
  if (design.joint === "corner_open") {
    const a: Point[] = [
      [-REACH_MM, gap + a_mm],
      [0, gap + a_mm],
      [0, gap],
      [-REACH_MM, gap],
    ];
    const b: Point[] = [
      [-REACH_MM, 0],
      [b_mm, 0],
      [b_mm, -REACH_MM],
    ];
    return [...edges(place(a, real.turn_a_deg, root)), ...edges(place(b, real.turn_b_deg, root))];
  }
  const a: Point[] = [
    [-REACH_MM, 0],
    [REACH_MM, 0],
  ];
  const isLap = design.joint === "lap";
  const top = gap + (isLap ? b_mm : height_mm);
  const b: Point[] = [
    [isLap ? REACH_MM : b_mm, gap],
    [0, gap],
    [0, top],
    [isLap ? REACH_MM : b_mm, top],
  ];
  return [...edges(place(a, real.turn_a_deg, root)), ...edges(place(b, real.turn_b_deg, root))];
}

/** A tack's face across the open side of the joint. */
function tack(design: Design, real: Real): Edge[] {
  const leg = real.tack_mm;
  if (leg <= 0) return [];
  const root: Point = [real.lateral_mm, real.normal_mm];
  if (design.joint.startsWith("butt")) {
    const depth = depthOf(design);
    const height = Math.min(leg, Math.max(0.6, depth / 2));
    const reach = (side: "a" | "b") => real.gap_mm / 2 + height * Math.tan(bevelDeg(design, side) * RAD);
    return edges(
      place(
        [
          [-reach("a") - 0.3, height + 0.2],
          [0, height],
          [reach("b") + 0.3, height + 0.2],
        ],
        real.turn_a_deg,
        root,
      ),
    );
  }
  const open = design.joint === "corner_open" ? 1 : -1;
  const bow: Point[] = [
    [0, leg],
    [open * leg * 0.55, leg * 0.55],
    [open * leg, 0],
  ];
  return edges(place(bow, real.turn_a_deg, root));
}

/** Every edge of steel in the section. */
export function steel(design: Design, real: Real): Edge[] {
  const plates = design.joint.startsWith("butt") ? butt(design, real) : meeting(design, real);
  return [...plates, ...tack(design, real)];
}

/** Mismatch as it is defined: height of B's surface over A's along A's normal at the root. */
export function mismatchOf(design: Design, real: Real): number {
  const depth = depthOf(design);
  const turn = (real.turn_b_deg - real.turn_a_deg) * RAD;
  // In plate A's axes about the root: B's surface passes (gap/2, step/2) + depth along B's own normal.
  const [l, n] = [real.gap_mm / 2 - depth * Math.sin(turn), real.step_mm / 2 + depth * Math.cos(turn)];
  return n - l * Math.tan(turn) - (depth - real.step_mm / 2);
}
