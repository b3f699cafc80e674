import type { SeamModel, SeamVertex } from "../../schemas/seam-model.ts";

/** Frames closer than this (mm, and as a difference of unit vectors) count as one straight line. */
const STRAIGHT_MM = 1e-4;

type Vector = readonly [number, number, number];

/** Stations along the nominal line with their section frames, part frame, stored flat (length 3 count). */
export interface SeamFrames {
  readonly count: number;
  readonly closed: boolean;
  /** Length of the nominal line, mm. */
  readonly length_mm: number;
  /** True when all frames are the same and the points lie on one line. */
  readonly straight: boolean;
  readonly stations_mm: Float64Array;
  readonly points_mm: Float64Array;
  readonly tangents: Float64Array;
  readonly laterals: Float64Array;
  readonly normals: Float64Array;
}

interface Frame {
  readonly station_mm: number;
  readonly point: Vector;
  readonly tangent: Vector;
  readonly lateral: Vector;
  readonly normal: Vector;
}

const add = (a: Vector, b: Vector, by: number): Vector => [
  a[0] + by * b[0],
  a[1] + by * b[1],
  a[2] + by * b[2],
];
const dot = (a: Vector, b: Vector) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const unit = (a: Vector): Vector => {
  const length = Math.hypot(...a);
  return [a[0] / length, a[1] / length, a[2] / length];
};
const mix = (a: Vector, b: Vector, share: number): Vector => [
  a[0] + share * (b[0] - a[0]),
  a[1] + share * (b[1] - a[1]),
  a[2] + share * (b[2] - a[2]),
];

/** Lateral and normal made orthonormal to the tangent again, handedness kept. */
function squared(station_mm: number, point: Vector, tangent: Vector, lateral: Vector, normal: Vector): Frame {
  const t = unit(tangent);
  const n = unit(add(normal, t, -dot(normal, t)));
  const flat = add(lateral, t, -dot(lateral, t));
  return { station_mm, point, tangent: t, normal: n, lateral: unit(add(flat, n, -dot(flat, n))) };
}

/** Cubic (Hermite) between two vertices, so that a coarse polygon of an arc stays an arc. */
function between(a: SeamVertex, b: SeamVertex, station_mm: number): Frame {
  const span_mm = b.station_mm - a.station_mm;
  const u = (station_mm - a.station_mm) / span_mm;
  const bow = u * (1 - u);
  let point = mix(a.point, b.point, u * u * (3 - 2 * u));
  point = add(point, a.tangent, span_mm * bow * (1 - u));
  point = add(point, b.tangent, -span_mm * bow * u);
  return squared(
    station_mm,
    point,
    mix(a.tangent, b.tangent, u),
    mix(a.lateral, b.lateral, u),
    mix(a.normal, b.normal, u),
  );
}

function everyStep(vertices: readonly SeamVertex[], step_mm: number): Frame[] {
  const start_mm = vertices[0]?.station_mm ?? 0;
  const end_mm = vertices.at(-1)?.station_mm ?? 0;
  const frames: Frame[] = [];
  let k = 1;
  for (let i = 0; start_mm + i * step_mm <= end_mm + 1e-6; i++) {
    const at_mm = Math.min(start_mm + i * step_mm, end_mm);
    while (k < vertices.length - 1 && (vertices[k]?.station_mm ?? 0) < at_mm) k += 1;
    const a = vertices[k - 1];
    const b = vertices[k];
    if (a && b) frames.push(between(a, b, at_mm));
  }
  return frames;
}

function isStraight(frames: readonly Frame[]): boolean {
  const first = frames[0];
  if (!first) return true;
  return frames.every((frame) => {
    const along = frame.station_mm - first.station_mm;
    const off = add(add(frame.point, first.point, -1), first.tangent, -along);
    return (
      Math.hypot(...off) < STRAIGHT_MM * (1 + along) &&
      Math.hypot(...add(frame.lateral, first.lateral, -1)) < STRAIGHT_MM &&
      Math.hypot(...add(frame.normal, first.normal, -1)) < STRAIGHT_MM
    );
  });
}

/** The last vertex of a closed seam often repeats the first: one station is enough there. */
function withoutRepeat(frames: Frame[], closed: boolean): Frame[] {
  const first = frames[0];
  const last = frames.at(-1);
  if (!closed || !first || !last || frames.length < 4) return frames;
  return Math.hypot(...add(last.point, first.point, -1)) < 1e-3 ? frames.slice(0, -1) : frames;
}

const ownFrames = (model: SeamModel) =>
  model.seam.vertices.map((v) => squared(v.station_mm, v.point, v.tangent, v.lateral, v.normal));

/** Frames along the nominal line, at the model's own vertices: what points are placed by. */
export function lineFrames(model: SeamModel): SeamFrames {
  const closed = model.seam.closed ?? false;
  return flat(withoutRepeat(ownFrames(model), closed), { closed, length_mm: model.seam.length_mm });
}

/**
 * Frames of the stations that results stand at: the model's own vertices, or every `step_mm` from the first on.
 * @param step_mm > 0; absent: the vertices themselves
 * @throws RangeError for a step that is not positive
 */
export function stationFrames(model: SeamModel, step_mm?: number): SeamFrames {
  if (step_mm !== undefined && !(step_mm > 0)) throw new RangeError(`step_mm: expected > 0, got ${step_mm}`);
  const frames = step_mm === undefined ? ownFrames(model) : everyStep(model.seam.vertices, step_mm);
  return flat(frames, { closed: model.seam.closed ?? false, length_mm: model.seam.length_mm });
}

function flat(
  frames: readonly Frame[],
  { closed, length_mm }: { readonly closed: boolean; readonly length_mm: number },
): SeamFrames {
  const vectors = (key: "point" | "tangent" | "lateral" | "normal") =>
    Float64Array.from(frames.flatMap((frame) => frame[key]));
  return {
    count: frames.length,
    closed,
    length_mm,
    straight: !closed && isStraight(frames),
    stations_mm: Float64Array.from(frames, (frame) => frame.station_mm),
    points_mm: vectors("point"),
    tangents: vectors("tangent"),
    laterals: vectors("lateral"),
    normals: vectors("normal"),
  };
}

/** A point given in a station's section frame, in the part frame, mm. */
export function toPart(frames: SeamFrames, i: number, l_mm: number, n_mm: number): [number, number, number] {
  const at = (k: number) =>
    frames.points_mm[3 * i + k]! + l_mm * frames.laterals[3 * i + k]! + n_mm * frames.normals[3 * i + k]!;
  return [at(0), at(1), at(2)];
}
