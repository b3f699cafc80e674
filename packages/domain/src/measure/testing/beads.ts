import { parseSeamModel, type SeamModel } from "../../schemas/seam-model.ts";
import type { ScanCloud } from "../scan-cloud.ts";

type Point = readonly [l: number, n: number];

/** A finished fillet weld on a T joint: plate A along −l, plate B along +n, the root at (0, 0), mm. */
export interface FilletSection {
  readonly leg_a_mm: number;
  readonly leg_b_mm: number;
  /** Height of the circular face over its chord; negative: hollow. */
  readonly bow_mm?: number;
  readonly undercut_b_mm?: number;
}

const APART_MM = 0.08;

/** Points every 0.08 mm along a polyline. */
function along(points: readonly Point[]): Point[] {
  return points.slice(1).flatMap((to, i) => {
    const from = points[i]!;
    const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
    const count = Math.max(1, Math.round(length / APART_MM));
    return Array.from({ length: count }, (_, k): Point => {
      const share = k / count;
      return [from[0] + share * (to[0] - from[0]), from[1] + share * (to[1] - from[1])];
    });
  });
}

/** A circular arc from p to q, `bow` to the left of the way. */
function bowed(p: Point, q: Point, bow: number): Point[] {
  const [dl, dn] = [q[0] - p[0], q[1] - p[1]];
  const chord = Math.hypot(dl, dn);
  if (Math.abs(bow) < 1e-9) return [p, q];
  const radius = (chord * chord) / (8 * Math.abs(bow)) + Math.abs(bow) / 2;
  const half = Math.asin(Math.min(1, chord / 2 / radius));
  return Array.from({ length: 61 }, (_, i): Point => {
    const angle = half * (i / 30 - 1);
    const x = chord / 2 + radius * Math.sin(angle);
    const y = Math.sign(bow) * (radius * Math.cos(angle) - radius + Math.abs(bow));
    return [p[0] + (x * dl - y * dn) / chord, p[1] + (x * dn + y * dl) / chord];
  });
}

/** The surface of a finished fillet weld as points. */
export function flatFillet({ leg_a_mm, leg_b_mm, bow_mm = 0, undercut_b_mm = 0 }: FilletSection): Point[] {
  const [toeA, toeB]: [Point, Point] = [
    [-leg_a_mm, 0],
    [0, leg_b_mm],
  ];
  const notch: Point[] =
    undercut_b_mm > 0
      ? Array.from(
          { length: 13 },
          (_, i): Point => [(undercut_b_mm * (1 - Math.cos((Math.PI * i) / 6))) / 2, leg_b_mm + 0.15 * i],
        )
      : [];
  return along([[-26, 0], ...bowed(toeA, toeB, bow_mm), ...notch, [0, 26]]);
}

/** A finished butt weld over two plates 8 mm thick, surfaces at n = 6 mm; B stands `step_mm` proud. */
export function vButt(weld: { width_mm: number; excess_mm: number; step_mm: number }): Point[] {
  const half = weld.width_mm / 2;
  const [a, b] = [6 - weld.step_mm / 2, 6 + weld.step_mm / 2];
  return along([[-28, a], ...bowed([-half, a], [half, b], weld.excess_mm), [28, b]]);
}

/** A straight seam of 120 mm, a station every 2 mm. */
export function beadModel(joint: "fillet_t" | "butt_v"): SeamModel {
  const parsed = parseSeamModel({
    case: `finished-${joint}`,
    joint_type: joint,
    seam: {
      length_mm: 120,
      vertices: Array.from({ length: 61 }, (_, i) => ({
        station_mm: 2 * i,
        point: [2 * i, 0, 0],
        tangent: [1, 0, 0],
        lateral: [0, 1, 0],
        normal: [0, 0, 1],
      })),
    },
    section:
      joint === "fillet_t"
        ? { plate_a: { thickness_mm: 8 }, plate_b: { thickness_mm: 8, height_mm: 60 } }
        : {
            plate_a: { thickness_mm: 8 },
            plate_b: { thickness_mm: 8 },
            gap_mm: 2,
            groove_angle_deg: 60,
            root_face_mm: 2,
            root_depth_below_surface_mm: 6,
          },
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

/** A scan of a straight seam along x, a profile every millimetre. */
export function beadCloud(section: (station_mm: number) => readonly Point[]): ScanCloud {
  const xyz: number[] = [];
  const profiles: number[] = [];
  for (let s = 0; s <= 120; s++)
    for (const [l, n] of section(s)) {
      xyz.push(s, l, n);
      profiles.push(s);
    }
  return {
    xyz_mm: Float64Array.from(xyz),
    count: profiles.length,
    profiles: Int32Array.from(profiles),
    lost: 0,
  };
}
