import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type Random, randomFrom } from "../simulation/random.ts";
import { type Design, type Edge, type Point, type Real, steel } from "../simulation/real-joint.ts";
import { straight } from "../simulation/seam-line.ts";
import { type Ball, type Dirt, profileOf, type Scanner } from "../simulation/sensor.ts";
import { type Course, course, modelOf, spatterOver, VIEWS } from "../simulation/simulate-scan.ts";

/** A seam to be timed: its model and what a scanner sees of it. */
export interface BenchSeam {
  readonly model: SeamModel;
  readonly cloud: ScanCloud;
}

const SEED = 20_260_519;
const PITCH_MM = 1;
const RETURNS = 640;

const DESIGN: Design = {
  joint: "fillet_t",
  a_mm: 10,
  b_mm: 8,
  height_mm: 60,
  root_face_mm: 1,
  groove_deg: 60,
};
const DIRT: Dirt = {
  noise_mm: 0.03,
  shared: 0.4,
  lost_share: 0.01,
  spike_share: 0.004,
  ghost_share: 0.05,
  burst_chance: 0.1,
};
const SCANNER: Scanner = { points: RETURNS, field_mm: 40, distance_mm: 150, view_deg: VIEWS.fillet_t };

/** Two tacks in each 300 mm, 14 mm long. */
const TACK_EVERY_MM = 150;
const isTacked = (s_mm: number) => Math.abs((s_mm % TACK_EVERY_MM) - TACK_EVERY_MM / 2) < 7;

interface Courses {
  readonly lateral: Course;
  readonly normal: Course;
  readonly gap: Course;
}

const realAt = ({ lateral, normal, gap }: Courses, s_mm: number): Real => ({
  lateral_mm: lateral(s_mm),
  normal_mm: normal(s_mm),
  gap_mm: Math.max(0, gap(s_mm)),
  step_mm: 0,
  turn_a_deg: 0.4,
  turn_b_deg: -0.6,
  tack_mm: isTacked(s_mm) ? 3.5 : 0,
});

function seenAt(edges: readonly Edge[], balls: readonly Ball[], real: Real, random: Random): Point[] {
  const root: Point = [real.lateral_mm, real.normal_mm];
  return profileOf(edges, balls, root, { scanner: SCANNER, dirt: DIRT, random });
}

/**
 * A straight T-joint, scanned in profiles of 640 returns 1 mm apart: offset, gap, tacks, spatter, ghosts and lost
 * returns as a shop floor has them. The same for the same number of profiles.
 */
export function benchSeam(profiles: number): BenchSeam {
  const random = randomFrom(SEED);
  const line = straight((profiles - 1) * PITCH_MM);
  const model = modelOf(`bench-${profiles}`, DESIGN, line, PITCH_MM);
  const courses: Courses = {
    lateral: course(random, 2, line.length_mm),
    normal: course(random, 1, line.length_mm),
    gap: course(random, 0.8, line.length_mm),
  };
  const balls = spatterOver(line, random, line.length_mm / 200);
  const xyz: number[] = [];
  const numbers: number[] = [];
  for (let k = 0; k < profiles; k++) {
    const s_mm = k * PITCH_MM;
    const real = realAt(courses, s_mm);
    const cut = balls
      .filter(({ s, ball }) => Math.abs(s - s_mm) < ball.radius_mm)
      .map(({ s, ball }) => ({ at: ball.at, radius_mm: Math.sqrt(ball.radius_mm ** 2 - (s - s_mm) ** 2) }));
    for (const [l, n] of seenAt(steel(DESIGN, real), cut, real, random)) {
      xyz.push(s_mm, l, n);
      numbers.push(k);
    }
  }
  return {
    model,
    cloud: {
      xyz_mm: Float64Array.from(xyz),
      count: numbers.length,
      profiles: Int32Array.from(numbers),
      lost: 0,
    },
  };
}
