import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import type { JointType, SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type Random, randomFrom } from "./random.ts";
import { type BeadTruth, type RealBead, weld } from "./real-bead.ts";
import type { Design, Point, Real } from "./real-joint.ts";
import { type Dirt, profileOf, type Scanner } from "./sensor.ts";
import { type Course, course, designFor, lineFor, modelOf, spatterOver, VIEWS } from "./simulate-scan.ts";

/** A simulated scan of a finished weld with its model and its truth. */
export interface SimulatedBead {
  readonly name: string;
  readonly model: SeamModel;
  readonly cloud: ScanCloud;
  readonly weld_size_mm: number;
  readonly truth: readonly (BeadTruth & { readonly station_mm: number })[];
}

/** What a simulated weld is made of besides chance. */
export interface BeadOptions {
  /** Throat of a fillet, mm; drawn where absent. */
  readonly throat_mm?: number;
  /** Bow of the face, mm; drawn where absent. */
  readonly bow_mm?: number;
  /** Undercuts deeper than this never occur, mm. */
  readonly undercut_most_mm?: number;
}

/** A stretch of undercut: where, how long, how deep, on which plate. */
interface Cut {
  readonly at_mm: number;
  readonly half_mm: number;
  readonly depth_mm: number;
  readonly on: "a" | "b";
}

function beadFor(
  design: Design,
  length_mm: number,
  random: Random,
  options: BeadOptions,
): { weld_size_mm: number; at: (s: number) => RealBead } {
  const isButt = design.joint.startsWith("butt");
  const thinnest = Math.min(design.a_mm, design.b_mm);
  const throat = options.throat_mm ?? (isButt ? design.a_mm : random.pick([3, 4, 5]));
  const most = design.joint === "lap" || design.joint === "corner_open" ? thinnest - 1.6 : 12;
  const leg = isButt ? random.even(1.2, 2.6) : Math.min(most, throat * Math.SQRT2 + random.even(-0.2, 0.6));
  const [legA, legB] = [course(random, 0.35, length_mm), course(random, 0.35, length_mm)];
  const bow = options.bow_mm ?? (isButt ? random.even(0.6, 2) : random.even(-0.8, 1.2));
  const bowing: Course = course(random, 0.15, length_mm);
  const cuts: Cut[] = Array.from({ length: random.pick([0, 1, 2]) }, () => ({
    at_mm: random.even(0.1, 0.9) * length_mm,
    half_mm: random.even(5, 20),
    depth_mm: random.even(0.25, options.undercut_most_mm ?? 0.9),
    on: random.pick(["a", "b"] as const),
  }));
  const cut = (s: number, on: "a" | "b") =>
    cuts.reduce((deepest, one) => {
      if (one.on !== on || Math.abs(s - one.at_mm) > one.half_mm) return deepest;
      return Math.max(deepest, one.depth_mm);
    }, 0);
  // A ripple of the arc's pulses: small and short.
  const ripple = (s: number) => 0.06 * Math.sin((2 * Math.PI * s) / 2.7);
  return {
    weld_size_mm: throat,
    at: (s) => ({
      leg_a_mm: Math.min(most, Math.max(1, leg + legA(s) + ripple(s))),
      leg_b_mm: Math.min(most, Math.max(1, leg + legB(s) - ripple(s))),
      bow_mm: bow + bowing(s) + ripple(s),
      undercut_a_mm: cut(s, "a"),
      undercut_b_mm: cut(s, "b"),
    }),
  };
}

/** A little warped and moved, as a welded part is. */
function realityFor(design: Design, length_mm: number, random: Random, hard: number): (s: number) => Real {
  const isButt = design.joint.startsWith("butt");
  const [lateral, normal] = [
    course(random, 0.6 + 2 * hard, length_mm),
    course(random, 0.4 + hard, length_mm),
  ];
  const step = course(random, 0.5, length_mm);
  const [turn_a_deg, turn_b_deg] = [random.even(-1.5, 1.5) * hard, random.even(-2, 2) * hard];
  return (s) => ({
    lateral_mm: lateral(s),
    normal_mm: normal(s),
    gap_mm: isButt ? 2 : 0,
    step_mm: isButt ? step(s) : 0,
    turn_a_deg,
    turn_b_deg,
    tack_mm: 0,
  });
}

/**
 * A finished weld scanned by chance.
 * @param hard 0: clean and near the model, 1: dirty, turned and far off
 */
export function simulateBead(
  joint: JointType,
  seed: number,
  hard: number,
  options: BeadOptions = {},
): SimulatedBead {
  const random = randomFrom(seed * 6007 + 29);
  const drawn = designFor(joint, random);
  // A flat bar that its weld nearly covers would leave nothing to measure from.
  const design = { ...drawn, height_mm: Math.max(30, drawn.height_mm), b_mm: Math.max(8, drawn.b_mm) };
  const even = joint.startsWith("butt") ? { ...design, b_mm: design.a_mm } : design;
  const line = lineFor(random);
  const name = `${joint}-bead-${seed}`;
  const model = modelOf(name, even, line, random.pick([1, 1.5, 2]));
  const real = realityFor(even, line.length_mm, random, hard);
  const bead = beadFor(even, line.length_mm, random, options);
  const balls = spatterOver(line, random, hard);
  const scanner: Scanner = {
    points: random.pick([480, 640]),
    field_mm: random.pick([44, 52]),
    distance_mm: 150,
    view_deg: VIEWS[joint] + random.even(-3, 3),
  };
  const dirt: Dirt = {
    noise_mm: random.even(0.015, 0.04),
    shared: random.even(0.2, 0.6),
    lost_share: 0.01 + 0.03 * hard,
    spike_share: 0.006 * hard,
    ghost_share: 0,
    burst_chance: 0.2 * hard,
  };
  const xyz: number[] = [];
  const profiles: number[] = [];
  const truth = model.seam.vertices.map(({ station_mm: s }, k) => {
    const joined = real(s);
    const { steel, truth: here } = weld(even, joined, bead.at(s));
    const cut = balls
      .filter(({ s: at, ball }) => Math.abs(at - s) < ball.radius_mm)
      .map(({ s: at, ball }) => ({
        at: ball.at,
        radius_mm: Math.sqrt(ball.radius_mm ** 2 - (at - s) ** 2),
      }));
    const root: Point = [joined.lateral_mm, joined.normal_mm];
    const frame = line.at(s);
    for (const [l, n] of profileOf(steel, cut, root, { scanner, dirt, random })) {
      for (let axis = 0 as 0 | 1 | 2; axis < 3; axis++)
        xyz.push((frame.point[axis] ?? 0) + l * (frame.lateral[axis] ?? 0) + n * (frame.normal[axis] ?? 0));
      profiles.push(k);
    }
    return { ...here, station_mm: s };
  });
  const cloud = {
    xyz_mm: Float64Array.from(xyz),
    count: profiles.length,
    profiles: Int32Array.from(profiles),
    lost: 0,
  };
  return { name, model, cloud, weld_size_mm: bead.weld_size_mm, truth };
}
