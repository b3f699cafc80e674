import type { SeamModel } from "../../schemas/seam-model.ts";
import { nominalProfile } from "../joints/nominal-profile.ts";
import { lineFrames, type SeamFrames } from "../seam/seam-frames.ts";

type Segment = readonly [l0: number, n0: number, l1: number, n1: number];

function segmentsOf(model: SeamModel): Segment[] {
  const { plate_a, plate_b } = nominalProfile(model);
  return [plate_a, plate_b].flatMap((points) =>
    points.slice(1).map(([l1, n1], i): Segment => {
      const [l0 = 0, n0 = 0] = points[i] ?? [];
      return [l0, n0, l1, n1];
    }),
  );
}

function squareTo([l0, n0, l1, n1]: Segment, l: number, n: number): number {
  const [dl, dn] = [l1 - l0, n1 - n0];
  const whole = dl * dl + dn * dn;
  const share = whole > 0 ? Math.max(0, Math.min(1, ((l - l0) * dl + (n - n0) * dn) / whole)) : 0;
  return (l - l0 - share * dl) ** 2 + (n - n0 - share * dn) ** 2;
}

/** Walks from a station to the one whose plane a point is nearest to; scans come in order, so the way is short. */
function stationNear(
  { points_mm: p, tangents: t, count }: SeamFrames,
  from: number,
  xyz: ArrayLike<number>,
  k: number,
) {
  const along = (i: number) =>
    (xyz[k]! - p[3 * i]!) * t[3 * i]! +
    (xyz[k + 1]! - p[3 * i + 1]!) * t[3 * i + 1]! +
    (xyz[k + 2]! - p[3 * i + 2]!) * t[3 * i + 2]!;
  let best = from;
  let here = along(best);
  for (let step = 0; step < count; step++) {
    const next = here >= 0 ? best + 1 : best - 1;
    if (next < 0 || next >= count) break;
    const there = along(next);
    if (Math.abs(there) >= Math.abs(here)) break;
    [best, here] = [next, there];
  }
  return best;
}

/**
 * How far each point of a scan lies from the nominal faces of its section, mm: what a drawing is coloured by. Not a
 * measurement of the joint; that is `evaluateScan`.
 * @param xyz_mm x, y, z one after another, part frame
 */
export function offModel(model: SeamModel, xyz_mm: ArrayLike<number>): Float32Array {
  const frames = lineFrames(model);
  const segments = segmentsOf(model);
  const { points_mm: p, laterals, normals } = frames;
  const off = new Float32Array(xyz_mm.length / 3);
  let station = 0;
  for (let k = 0; k < off.length; k++) {
    station = stationNear(frames, station, xyz_mm, 3 * k);
    let [l, n] = [0, 0];
    for (let axis = 0; axis < 3; axis++) {
      const by = xyz_mm[3 * k + axis]! - p[3 * station + axis]!;
      l += by * laterals[3 * station + axis]!;
      n += by * normals[3 * station + axis]!;
    }
    let least = Number.POSITIVE_INFINITY;
    for (const segment of segments) least = Math.min(least, squareTo(segment, l, n));
    off[k] = Math.sqrt(least);
  }
  return off;
}
