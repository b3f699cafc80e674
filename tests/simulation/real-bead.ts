import {
  bevelDeg,
  type Design,
  depthOf,
  type Edge,
  edges,
  type Point,
  place,
  REACH_MM,
  type Real,
} from "./real-joint.ts";

/** A finished weld as it really is at one place, mm. */
export interface RealBead {
  /** From the root (butt: from the opening's edge at the surface) to the toe, along each parent face. */
  readonly leg_a_mm: number;
  readonly leg_b_mm: number;
  /** Height of the face over the middle of the line from toe to toe; negative where it is hollow. */
  readonly bow_mm: number;
  readonly undercut_a_mm: number;
  readonly undercut_b_mm: number;
}

/** What a finished weld measures, by plain geometry. */
export interface BeadTruth {
  readonly leg_a_mm: number;
  readonly leg_b_mm: number;
  readonly throat_mm: number;
  readonly throat_actual_mm: number;
  readonly convexity_mm: number;
  readonly concavity_mm: number;
  readonly width_mm: number;
  readonly toe_angle_a_deg: number;
  readonly toe_angle_b_deg: number;
  readonly undercut_a_mm: number;
  readonly undercut_b_mm: number;
}

/** Width of an undercut along the parent face, mm. */
const NOTCH_MM = 1.8;
const STEPS = 48;

/** A notch beside a toe, outward along x: a raised cosine `depth` below y = 0. */
function notch(from_mm: number, depth_mm: number): Point[] {
  if (depth_mm <= 0) return [];
  return Array.from({ length: 13 }, (_, i): Point => {
    const share = i / 12;
    return [from_mm + share * NOTCH_MM, (-depth_mm * (1 - Math.cos(2 * Math.PI * share))) / 2];
  });
}

/** A circular bow from p to q, `bow_mm` to the left of the way. */
function arcBetween(p: Point, q: Point, bow_mm: number): Point[] {
  const [dl, dn] = [q[0] - p[0], q[1] - p[1]];
  const chord = Math.hypot(dl, dn);
  const size = Math.abs(bow_mm);
  if (size < 1e-6) return [p, q];
  const radius = (chord * chord) / (8 * size) + size / 2;
  const half = Math.asin(Math.min(1, chord / 2 / radius));
  return Array.from({ length: STEPS + 1 }, (_, i): Point => {
    const angle = half * ((2 * i) / STEPS - 1);
    const along = chord / 2 + radius * Math.sin(angle);
    const up = Math.sign(bow_mm) * (radius * Math.cos(angle) - (radius - size));
    return [p[0] + (along * dl - up * dn) / chord, p[1] + (along * dn + up * dl) / chord];
  });
}

/** One parent face in axes of its own: x outward along the face, y out of the steel; then placed in the section. */
interface Parent {
  readonly root: Point;
  /** Direction of x in the section, degrees, and the sign of y against a left turn from x. */
  readonly turn_deg: number;
  readonly left: 1 | -1;
  /** Beyond the toe, in the face's own axes. */
  readonly rest: (toe_mm: number) => readonly Point[];
}

function onFace({ root, turn_deg, left }: Parent, points: readonly Point[]): Point[] {
  return place(
    points.map(([x, y]): Point => [x, left * y]),
    turn_deg,
    root,
  );
}

/** The parent faces of a joint with what lies beyond the weld. */
function parentsOf(design: Design, real: Real): { a: Parent; b: Parent } {
  const root: Point = [real.lateral_mm, real.normal_mm];
  const open = (): readonly Point[] => [[REACH_MM, 0]];
  const { a_mm, b_mm, height_mm } = design;
  const { turn_a_deg, turn_b_deg } = real;
  if (design.joint.startsWith("butt")) {
    const depth = depthOf(design);
    const origin = (side: "a" | "b"): Point => {
      const run = depth * Math.tan((bevelDeg(design, side) * Math.PI) / 180);
      const [sign, turn] = side === "a" ? [-1, turn_a_deg] : [1, turn_b_deg];
      const [edge] = place([[(sign * real.gap_mm) / 2, (sign * real.step_mm) / 2]], turn_a_deg, root);
      return place([[sign * run, depth]], turn, edge ?? root)[0] ?? root;
    };
    return {
      a: { root: origin("a"), turn_deg: 180 + turn_a_deg, left: -1, rest: open },
      b: { root: origin("b"), turn_deg: turn_b_deg, left: 1, rest: open },
    };
  }
  if (design.joint === "corner_open")
    return {
      a: {
        root,
        turn_deg: 90 + turn_a_deg,
        left: -1,
        rest: () => [
          [real.gap_mm + a_mm, 0],
          [real.gap_mm + a_mm, -REACH_MM],
        ],
      },
      b: {
        root,
        turn_deg: turn_b_deg,
        left: 1,
        rest: () => [
          [b_mm, 0],
          [b_mm, -REACH_MM],
        ],
      },
    };
  const isLap = design.joint === "lap";
  const top = real.gap_mm + (isLap ? b_mm : height_mm);
  return {
    a: { root, turn_deg: 180 + turn_a_deg, left: -1, rest: open },
    b: {
      root,
      turn_deg: 90 + turn_b_deg,
      left: 1,
      rest: () => [
        [top, 0],
        [top, isLap ? -REACH_MM : -b_mm],
      ],
    },
  };
}

/** A finished weld's steel in the section, and what it measures. */
export function weld(design: Design, real: Real, bead: RealBead): { steel: Edge[]; truth: BeadTruth } {
  const { a, b } = parentsOf(design, real);
  const faceOf = (parent: Parent, leg: number, cut: number): Point[] =>
    onFace(parent, [[leg, 0], ...notch(leg, cut), ...parent.rest(leg)]);
  const [faceA, faceB] = [
    faceOf(a, bead.leg_a_mm, bead.undercut_a_mm),
    faceOf(b, bead.leg_b_mm, bead.undercut_b_mm),
  ];
  const [toeA, toeB] = [faceA[0], faceB[0]];
  if (!toeA || !toeB) throw new Error("a weld without toes");
  const face = arcBetween(toeA, toeB, bead.bow_mm);
  const steel = [...edges(faceA), ...edges(face), ...edges(faceB)];
  return { steel, truth: truthOf(a, b, bead, face) };
}

const unit = (turn_deg: number): Point => [
  Math.cos((turn_deg * Math.PI) / 180),
  Math.sin((turn_deg * Math.PI) / 180),
];

function truthOf(a: Parent, b: Parent, bead: RealBead, face: readonly Point[]): BeadTruth {
  const [ea, eb] = [unit(a.turn_deg), unit(b.turn_deg)];
  const sum: Point = [ea[0] + eb[0], ea[1] + eb[1]];
  const size = Math.max(1e-9, Math.hypot(sum[0], sum[1]));
  const bisector: Point = [sum[0] / size, sum[1] / size];
  const fromRoot = face.map(([l, n]): Point => [l - a.root[0], n - a.root[1]]);
  const heights = fromRoot.map(([l, n]) => l * bisector[0] + n * bisector[1]);
  const across = fromRoot.map(([l, n]) => l * bisector[1] - n * bisector[0]);
  let actual = Number.NaN;
  for (let i = 1; i < across.length; i++) {
    const [p, q] = [across[i - 1] ?? 0, across[i] ?? 0];
    if (p * q <= 0 && p !== q)
      actual = (heights[i - 1] ?? 0) + (p / (p - q)) * ((heights[i] ?? 0) - (heights[i - 1] ?? 0));
  }
  const first: Point = face[0] ?? [0, 0];
  const last: Point = face.at(-1) ?? [0, 0];
  const angle = (parent: Parent, from: Point, to: Point) => {
    const [x, y] = unit(parent.turn_deg);
    const [dl, dn] = [to[0] - from[0], to[1] - from[1]];
    return (Math.acos((x * dl + y * dn) / Math.hypot(dl, dn)) * 180) / Math.PI;
  };
  return {
    leg_a_mm: bead.leg_a_mm,
    leg_b_mm: bead.leg_b_mm,
    throat_mm: Math.min(...heights),
    throat_actual_mm: actual,
    convexity_mm: Math.max(0, bead.bow_mm),
    concavity_mm: Math.max(0, -bead.bow_mm),
    width_mm: Math.hypot(last[0] - first[0], last[1] - first[1]),
    toe_angle_a_deg: angle(a, first, face[1] ?? last),
    toe_angle_b_deg: angle(b, last, face.at(-2) ?? first),
    undercut_a_mm: bead.undercut_a_mm,
    undercut_b_mm: bead.undercut_b_mm,
  };
}
