import type { ScanCloud } from "@beadroll/domain/measure/scan-cloud";
import { type JointType, parseSeamModel, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type Random, randomFrom } from "./random.ts";
import { type Design, depthOf, mismatchOf, type Point, type Real, steel } from "./real-joint.ts";
import { arc, type Line, straight } from "./seam-line.ts";
import { type Ball, type Dirt, profileOf, type Scanner } from "./sensor.ts";

/** The truth at one station. */
export interface TrueStation {
  readonly station_mm: number;
  readonly lateral_mm: number;
  readonly normal_mm: number;
  readonly gap_mm: number;
  readonly mismatch_mm: number | null;
  readonly angle_deg: number;
  /** False where the profile was lost. */
  readonly scanned: boolean;
  readonly tack: boolean;
}

/** A simulated scan with its model and its truth. */
export interface Simulated {
  readonly name: string;
  readonly model: SeamModel;
  readonly cloud: ScanCloud;
  readonly truth: readonly TrueStation[];
}

/** Direction that a joint is looked at from, from plate A's normal toward plate B, degrees. */
export const VIEWS: Readonly<Record<JointType, number>> = {
  fillet_t: -38,
  corner_closed: -40,
  lap: -30,
  corner_open: 45,
  butt_v: 0,
  butt_half_v: -4,
  butt_square: 3,
};

export function designFor(joint: JointType, random: Random): Design {
  const a_mm = random.pick([6, 8, 10, 12]);
  return {
    joint,
    a_mm,
    b_mm: joint.startsWith("butt") ? a_mm : random.pick([5, 6, 8, 10]),
    height_mm: random.pick([15, 60, 100]),
    root_face_mm: joint === "butt_square" ? 0 : random.pick([1, 2]),
    groove_deg: joint === "butt_half_v" ? random.pick([40, 45, 50]) : random.pick([50, 60, 70]),
  };
}

function sectionOf(design: Design, gap_mm: number): object {
  const isButt = design.joint.startsWith("butt");
  const included = design.joint === "butt_square" ? 0 : isButt ? design.groove_deg : 90;
  return {
    plate_a: { thickness_mm: design.a_mm },
    plate_b: {
      thickness_mm: design.b_mm,
      ...(["fillet_t", "corner_closed"].includes(design.joint) && { height_mm: design.height_mm }),
    },
    gap_mm,
    included_angle_deg: included,
    ...(isButt && {
      mismatch_mm: 0,
      root_face_mm: design.root_face_mm,
      groove_angle_deg: design.joint === "butt_square" ? 0 : design.groove_deg,
      root_depth_below_surface_mm: depthOf(design),
    }),
  };
}

export type Course = (station_mm: number) => number;

/** A slow change along the seam: offset, slope, wave and, now and then, a step. */
export function course(random: Random, size: number, length_mm: number, stepChance = 0): Course {
  const [offset, slope] = [random.even(-size, size), random.even(-size, size) * 0.5];
  const [wave, period, phase] = [
    random.even(0, 0.3 * size),
    random.even(0.6, 2) * length_mm,
    random.even(0, 6),
  ];
  const step = random.chance(stepChance) ? random.even(-0.4, 0.4) * size : 0;
  const at = random.even(0.3, 0.7) * length_mm;
  return (s) =>
    offset +
    slope * (s / length_mm - 0.5) +
    wave * Math.sin((2 * Math.PI * s) / period + phase) +
    (s > at ? step : 0);
}

function realityFor(design: Design, line: Line, random: Random, hard: number): (s: number) => Real {
  const isButt = design.joint.startsWith("butt");
  const L = line.length_mm;
  const lateral = course(random, 1 + 5 * hard, L, 0.2);
  const normal = course(random, 0.5 + hard, L, 0.2);
  const nominalGap = isButt ? 2 : 0;
  const gap = course(random, isButt ? 0.8 : 0.6, L);
  const height = course(random, 0.8, L);
  const [turnA, turnB] = [random.even(-1.5, 1.5) * hard, random.even(-2, 2) * hard];
  const tacks = Array.from({ length: random.pick([0, 1, 2]) }, () => random.even(0.1, 0.9) * L);
  return (s) => ({
    lateral_mm: lateral(s),
    normal_mm: normal(s),
    gap_mm: Math.max(isButt ? 0.6 : 0, nominalGap + gap(s)),
    step_mm: isButt ? height(s) : 0,
    turn_a_deg: turnA,
    turn_b_deg: turnB,
    tack_mm: tacks.some((at) => Math.abs(s - at) < 7) ? 3.5 : 0,
  });
}

export function spatterOver(line: Line, random: Random, hard: number): { s: number; ball: Ball }[] {
  return Array.from({ length: Math.round(25 * hard) }, () => ({
    s: random.even(0, line.length_mm),
    ball: { at: [random.even(-12, 12), random.even(-1, 6)] as Point, radius_mm: random.even(0.3, 1.1) },
  }));
}

export function lineFor(random: Random): Line {
  const kind = random.pick(["straight", "straight", "arc", "circle"] as const);
  if (kind === "straight") return straight(random.pick([120, 200, 300]));
  const radius_mm = random.pick([60, 120, 150]);
  return arc(radius_mm, kind === "circle" ? 2 * Math.PI * radius_mm : random.even(1.2, 2.2) * radius_mm);
}

export function modelOf(name: string, design: Design, line: Line, pitch_mm: number): SeamModel {
  const steps = Math.floor(line.length_mm / pitch_mm + 1e-6);
  const count = line.closed ? steps : steps + 1;
  const parsed = parseSeamModel({
    case: name,
    joint_type: design.joint,
    seam: {
      length_mm: line.length_mm,
      closed: line.closed,
      vertices: Array.from({ length: count }, (_, i) => ({
        station_mm: i * pitch_mm,
        ...line.at(i * pitch_mm),
      })),
    },
    section: sectionOf(design, design.joint.startsWith("butt") ? 2 : 0),
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

/**
 * A seam scanned by chance.
 * @param hard 0: clean and near the model, 1: dirty, turned and far off
 */
export function simulate(joint: JointType, seed: number, hard: number): Simulated {
  const random = randomFrom(seed * 7919 + 17);
  const [design, line] = [designFor(joint, random), lineFor(random)];
  const name = `${joint}-${seed}`;
  const pitch_mm = random.pick([1, 1.5, 2]);
  const model = modelOf(name, design, line, pitch_mm);
  const real = realityFor(design, line, random, hard);
  const balls = spatterOver(line, random, hard);
  const scanner: Scanner = {
    points: random.pick([280, 320, 480]),
    field_mm: random.pick([34, 40]),
    distance_mm: 150,
    view_deg: VIEWS[joint] + random.even(-3, 3),
  };
  const dirt: Dirt = {
    noise_mm: random.even(0.02, 0.04),
    shared: random.even(0.2, 0.6),
    lost_share: 0.01 + 0.03 * hard,
    spike_share: 0.006 * hard,
    ghost_share: joint.startsWith("butt") ? 0 : 0.12 * hard,
    burst_chance: 0.4 * hard,
  };
  const xyz: number[] = [];
  const profiles: number[] = [];
  const truth: TrueStation[] = [];
  model.seam.vertices.forEach((vertex, k) => {
    const s = vertex.station_mm;
    const scanned = !random.chance(0.02 * hard);
    const here = real(s);
    truth.push({
      station_mm: s,
      lateral_mm: here.lateral_mm,
      normal_mm: here.normal_mm,
      gap_mm: here.gap_mm,
      mismatch_mm: joint.startsWith("butt") ? mismatchOf(design, here) : null,
      angle_deg: here.turn_a_deg - here.turn_b_deg,
      scanned,
      tack: here.tack_mm > 0,
    });
    if (!scanned) return;
    const taken_mm = s + (line.closed ? 0 : 0.3 * Math.sin(s / 30));
    const joined = real(taken_mm);
    const cut = balls
      .filter(({ s: at, ball }) => Math.abs(at - taken_mm) < ball.radius_mm)
      .map(({ s: at, ball }) => ({
        at: ball.at,
        radius_mm: Math.sqrt(ball.radius_mm ** 2 - (at - taken_mm) ** 2),
      }));
    const root: Point = [joined.lateral_mm, joined.normal_mm];
    const shift: Point = [0.01 * random.normal(), 0.01 * random.normal()];
    const frame = line.at(taken_mm);
    for (const [l, n] of profileOf(steel(design, joined), cut, root, { scanner, dirt, random })) {
      for (let axis = 0 as 0 | 1 | 2; axis < 3; axis++)
        xyz.push(
          (frame.point[axis] ?? 0) +
            (l + shift[0]) * (frame.lateral[axis] ?? 0) +
            (n + shift[1]) * (frame.normal[axis] ?? 0),
        );
      profiles.push(k);
    }
  });
  const cloud = {
    xyz_mm: Float64Array.from(xyz),
    count: profiles.length,
    profiles: Int32Array.from(profiles),
    lost: 0,
  };
  return { name, model, cloud, truth };
}
