import { type Fault, good, type Outcome, refused } from "../../faults/fault.ts";
import type { ScanResult } from "../../schemas/scan-result.ts";
import type { SeamModel } from "../../schemas/seam-model.ts";
import { jointSeries } from "../along/joint-series.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import { rigidPart } from "../result/rigid.ts";
import {
  type Matrix,
  minus,
  plus,
  product,
  rotationOf,
  times,
  turned,
  type Vector,
  vectorOf,
} from "../result/rotation.ts";
import { stationResults } from "../result/station-results.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import { measureSeam } from "../seam/measure-seam.ts";
import { lineFrames, type SeamFrames, stationFrames } from "../seam/seam-frames.ts";
import { motionWords, type PlanePair, registerPlanes } from "./register-planes.ts";
import { type DatumPoint, registerPoints } from "./register-points.ts";
import { targetError } from "./registration-error.ts";

/** How a scan is brought into the part frame before it is measured. */
export type Registering =
  | { readonly by: "datums"; readonly datums: readonly DatumPoint[] }
  | { readonly by: "plates" };

type Report = NonNullable<ScanResult["registration"]>;

/** A scan in the part frame, and how it came there. */
export interface RegisteredScan {
  readonly cloud: ScanCloud;
  readonly report: Report;
}

const DEG = 180 / Math.PI;

/** Points asked for their plates. */
const ASKED = 3000;

/** A point within this of a nominal face is taken to be the face's, mm: registration by plates begins near. */
const NEAR_MM = 3;

/** Points this near to a corner may belong to either face, mm. */
const CORNER_MM = 1.5;

const rounded = (v: Vector): [number, number, number] => [
  Math.round(v[0] * 1e5) / 1e5 + 0,
  Math.round(v[1] * 1e5) / 1e5 + 0,
  Math.round(v[2] * 1e5) / 1e5 + 0,
];

function movedCloud(cloud: ScanCloud, rotation: Matrix, translation: Vector): ScanCloud {
  const xyz_mm = new Float64Array(cloud.xyz_mm.length);
  for (let k = 0; k < cloud.count; k++) {
    const p = turned(rotation, [cloud.xyz_mm[3 * k]!, cloud.xyz_mm[3 * k + 1]!, cloud.xyz_mm[3 * k + 2]!]);
    xyz_mm[3 * k] = p[0] + translation[0];
    xyz_mm[3 * k + 1] = p[1] + translation[1];
    xyz_mm[3 * k + 2] = p[2] + translation[2];
  }
  return { ...cloud, xyz_mm };
}

function byDatums(
  model: SeamModel,
  cloud: ScanCloud,
  datums: readonly DatumPoint[],
): Outcome<RegisteredScan> {
  const found = registerPoints(datums);
  if (!found.ok) return found;
  const { rotation, translation_mm, rms_mm, condition, mirrored } = found.value;
  if (mirrored) {
    const fault: Fault = {
      code: "registration-undetermined",
      detail: `The datum points fit only as a mirror image (${rms_mm.toFixed(2)} mm are left): two of them are swapped, or the part is mirrored.`,
    };
    return refused(fault);
  }
  const middle = model.seam.vertices[model.seam.vertices.length >> 1]?.point ?? [0, 0, 0];
  // What is left at the points tells of their error only with points to spare (Sibson 1979).
  const error_mm = datums.length > 3 ? rms_mm / Math.sqrt(1 - 2 / datums.length) : rms_mm;
  const u_mm =
    targetError(
      datums.map((datum) => datum.nominal),
      error_mm,
      middle,
    ) / Math.sqrt(3);
  return good({
    cloud: movedCloud(cloud, rotation, translation_mm),
    report: {
      by: "datums",
      translation_mm: rounded(translation_mm),
      rotation_deg: rounded(times(vectorOf(rotation), DEG)),
      rms_mm,
      condition,
      u_mm,
      free: [],
    },
  });
}

const at = (flat: Float64Array, i: number): Vector => [flat[3 * i]!, flat[3 * i + 1]!, flat[3 * i + 2]!];

function nearestStation(frames: SeamFrames, p: Vector): number {
  let best = 0;
  let least = Number.POSITIVE_INFINITY;
  for (let i = 0; i < frames.count; i++) {
    const q = at(frames.points_mm, i);
    const square = (p[0] - q[0]) ** 2 + (p[1] - q[1]) ** 2 + (p[2] - q[2]) ** 2;
    if (square < least) [least, best] = [square, i];
  }
  return best;
}

/** The nominal face that a point lies on, as a plane in the part frame; null where it lies on none or near a corner. */
function planeOf(model: SeamModel, frames: SeamFrames, p: Vector): PlanePair | null {
  const i = nearestStation(frames, p);
  const [o, l, n] = [at(frames.points_mm, i), at(frames.laterals, i), at(frames.normals, i)];
  const off: Vector = [p[0] - o[0], p[1] - o[1], p[2] - o[2]];
  const [a, b] = [
    off[0] * l[0] + off[1] * l[1] + off[2] * l[2],
    off[0] * n[0] + off[1] * n[1] + off[2] * n[2],
  ];
  let pair: PlanePair | null = null;
  let least = NEAR_MM;
  for (const face of jointFacesOf(model)) {
    const [c, s] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
    const t = (a - face.near[0]) * c + (b - face.near[1]) * s;
    const d = (b - face.near[1]) * c - (a - face.near[0]) * s;
    if (t < CORNER_MM || t > face.length_mm - CORNER_MM || Math.abs(d) > least) continue;
    least = Math.abs(d);
    const normal = plus(times(l, -s), times(n, c));
    const on = plus(o, plus(times(l, face.near[0]), times(n, face.near[1])));
    pair = { point: p, on, normal };
  }
  return pair;
}

const facesByModel = new WeakMap<SeamModel, ReturnType<typeof jointFaces>["faces"]>();
function jointFacesOf(model: SeamModel) {
  const kept = facesByModel.get(model) ?? jointFaces(model).faces;
  facesByModel.set(model, kept);
  return kept;
}

/** A motion of points: p goes to R p + t. */
interface Motion {
  readonly rotation: Matrix;
  readonly translation: Vector;
}

/** The motion that takes the joint, as it is found in a scan, back to the model: near enough to begin with. */
function firstMotion(model: SeamModel, cloud: ScanCloud): Motion {
  const seam = measureSeam(model, cloud);
  const frames = stationFrames(model);
  const along = jointSeries(seam);
  const stations = stationResults({ seam, along, frames, scanner_accuracy_mm: 0, u_registration_mm: 0 });
  const rigid = rigidPart(stations, frames);
  if (!rigid) return { rotation: rotationOf([0, 0, 0]), translation: [0, 0, 0] };
  const { rotation: out, centre_mm: c, translation_mm: t } = rigid.motion;
  const rotation: Matrix = [
    [out[0][0], out[1][0], out[2][0]],
    [out[0][1], out[1][1], out[2][1]],
    [out[0][2], out[1][2], out[2][2]],
  ];
  return { rotation, translation: minus(c, turned(rotation, plus(c, t))) };
}

function byPlates(model: SeamModel, scan: ScanCloud): Outcome<RegisteredScan> {
  const frames = lineFrames(model);
  const first = firstMotion(model, scan);
  const cloud = movedCloud(scan, first.rotation, first.translation);
  const every = Math.max(1, Math.floor(cloud.count / ASKED));
  const asked = Array.from({ length: Math.floor(cloud.count / every) }, (_, k) =>
    at(cloud.xyz_mm, k * every),
  );
  const found = registerPlanes((moved) => asked.flatMap((p) => planeOf(model, frames, moved(p)) ?? []), {
    leave_out: true,
  });
  if (!found.ok) return found;
  const { rms_mm, condition, free } = found.value;
  // A slide along a straight seam, or round a circle, moves the joint onto itself; more than that must not stay open.
  if (free.length > 1) {
    const fault: Fault = {
      code: "registration-undetermined",
      detail: `The plates near the model do not show ${free.map(motionWords).join(", nor ")}. Bring the scan nearer, or give datum points.`,
    };
    return refused(fault);
  }
  const rotation = product(found.value.rotation, first.rotation);
  const translation_mm = plus(turned(found.value.rotation, first.translation), found.value.translation_mm);
  return good({
    cloud: movedCloud(scan, rotation, translation_mm),
    report: {
      by: "plates",
      translation_mm: rounded(translation_mm),
      rotation_deg: rounded(times(vectorOf(rotation), DEG)),
      rms_mm,
      condition,
      u_mm: rms_mm / Math.sqrt(asked.length),
      free: free.map((motion) => (Math.hypot(...motion.slice(3)) > 0.7 ? "along_seam" : "turn")),
    },
  });
}

/**
 * Brings a scan into the part frame: by datum points, or by its own plates. By its plates the rigid part of the
 * deviation is taken out: what remains is the joint's own shape, gap and angle.
 * @returns the moved scan, or `registration-undetermined`, naming what is not determined
 */
export function registerScan(model: SeamModel, cloud: ScanCloud, how: Registering): Outcome<RegisteredScan> {
  return how.by === "datums" ? byDatums(model, cloud, how.datums) : byPlates(model, cloud);
}
