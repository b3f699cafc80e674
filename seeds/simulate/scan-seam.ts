import type { SeamDesign } from "../design/product.ts";
import type { Frame, Vector } from "../design/seam-line.ts";
import { stationsOf } from "../design/seam-model.ts";
import type { Random } from "../random.ts";
import { type FitUp, type JointState, jointAt } from "./fit-up.ts";
import { cloudPly } from "./ply.ts";
import { type Returns, roomFor, type SpatterCut, takeProfile } from "./profile.ts";
import { sectionFaces } from "./section.ts";
import { FINISHED_SENSOR, SENSORS } from "./sensor.ts";
import { type FilletWeld, finishedFaces } from "./weld-face.ts";

/** The scan runs on past each end by this, so that ends can be seen. */
const RUN_ON_MM = 5;
/** The robot takes a profile this near to where it meant to (standard deviation). */
const PLACING_MM = 0.12;

/** How the whole part stands in its fixture: a small move and a turn about z, about a point. */
export interface PartPose {
  readonly move_mm: Vector;
  readonly turn_deg: number;
  readonly about_mm: readonly [x: number, y: number];
}

export interface SeamOnPart {
  readonly seam: SeamDesign;
  readonly fitUp: FitUp;
  readonly pose: PartPose;
  /** Once it is welded; a T joint's only. */
  readonly weld?: FilletWeld;
}

const dot = (one: Vector, other: Vector): number => one[0] * other[0] + one[1] * other[1] + one[2] * other[2];

/** The joint's state with the part's own displacement added to it. */
export function displaced(joint: JointState, frame: Frame, pose: PartPose): JointState {
  const turn = (pose.turn_deg * Math.PI) / 180;
  const moved: Vector = [
    pose.move_mm[0] - turn * (frame.point[1] - pose.about_mm[1]),
    pose.move_mm[1] + turn * (frame.point[0] - pose.about_mm[0]),
    pose.move_mm[2],
  ];
  return {
    ...joint,
    lateral_mm: joint.lateral_mm + dot(moved, frame.lateral),
    normal_mm: joint.normal_mm + dot(moved, frame.normal),
  };
}

interface Ball {
  readonly at_mm: number;
  readonly l: number;
  readonly radius_mm: number;
}

/** Spatter of earlier welds lies on plate A's side of the joint. */
function strewn({ seam, fitUp }: SeamOnPart, random: Random): Ball[] {
  const balls = Math.round((fitUp.spatter * seam.line.length_mm) / 100);
  const surface = seam.joint === "butt_v" || seam.joint === "corner_open" ? -8 : -2;
  return Array.from({ length: balls }, () => ({
    at_mm: random.between(0, seam.line.length_mm),
    l: surface - random.between(0, 9),
    radius_mm: random.between(0.4, 1.1),
  }));
}

/** The balls that a profile's plane cuts, resting on plate A's surface. */
function cutBalls(balls: readonly Ball[], station_mm: number, surface_n: number): SpatterCut[] {
  return balls.flatMap(({ at_mm, l, radius_mm }) => {
    const off_mm = station_mm - at_mm;
    const room = radius_mm * radius_mm - off_mm * off_mm;
    return room > 0 ? [{ l, n: surface_n + 0.3 * radius_mm, radius_mm: Math.sqrt(room) }] : [];
  });
}

function surfaceHeight(seam: SeamDesign): number {
  if (seam.joint === "corner_open") return seam.plate_a_mm;
  return seam.joint === "butt_v" ? seam.plate_a_mm - seam.root_face_mm : 0;
}

/** Puts a profile's returns into the part frame. Writes `xyz_mm` from point `count` on; gives the new count. */
function intoPartFrame(returns: Returns, frame: Frame, xyz_mm: Float32Array, count: number): number {
  const { point, lateral, normal } = frame;
  for (let i = 0; i < returns.count; i++) {
    const l = returns.l[i] ?? 0;
    const n = returns.n[i] ?? 0;
    const at = 3 * (count + i);
    xyz_mm[at] = point[0] + l * lateral[0] + n * normal[0];
    xyz_mm[at + 1] = point[1] + l * lateral[1] + n * normal[1];
    xyz_mm[at + 2] = point[2] + l * lateral[2] + n * normal[2];
  }
  return count + returns.count;
}

/**
 * Scans a seam: one profile at each station of its model and one past each end.
 * @returns a binary PLY in the part frame
 */
export function scanSeam(onPart: SeamOnPart, random: Random): Uint8Array {
  const { seam, fitUp, pose, weld } = onPart;
  const { length_mm, frameAt } = seam.line;
  const sensor = weld ? FINISHED_SENSOR : SENSORS[seam.joint];
  const stations_mm = [-RUN_ON_MM, ...stationsOf(length_mm), length_mm + RUN_ON_MM];
  const balls = strewn(onPart, random);
  const returns = roomFor(sensor);
  const xyz_mm = new Float32Array(3 * sensor.points * stations_mm.length);
  let count = 0;
  for (const nominal_mm of stations_mm) {
    const station_mm = nominal_mm + PLACING_MM * random.normal();
    const frame = frameAt(station_mm);
    const joint = displaced(jointAt(fitUp, station_mm, length_mm), frame, pose);
    if (joint.blind) continue;
    const withPlateB = !seam.ends_free || (nominal_mm >= 0 && nominal_mm <= length_mm);
    const faces = weld ? finishedFaces(seam, joint, weld, station_mm) : sectionFaces(seam, joint, withPlateB);
    const spatter = cutBalls(balls, station_mm, surfaceHeight(seam) + joint.normal_mm);
    takeProfile(faces, spatter, { sensor, random }, returns);
    count = intoPartFrame(returns, frame, xyz_mm, count);
  }
  return cloudPly(xyz_mm, count);
}
