import type { Random } from "../random.ts";
import type { Face } from "./section.ts";
import type { Sensor } from "./sensor.ts";

/** One profile's returns, (lateral, normal) in mm; lost returns are absent. */
export interface Returns {
  readonly l: Float64Array;
  readonly n: Float64Array;
  count: number;
}

/** A ball of spatter, cut by this profile's plane. */
export interface SpatterCut {
  readonly l: number;
  readonly n: number;
  readonly radius_mm: number;
}

/** Speckle of a laser line on mill scale, mm, seen square on. */
const SPECKLE_MM = 0.026;
/** How much of a return's error its neighbour shares. */
const NEIGHBOUR_SHARE = 0.35;
const LOST_SHARE = 0.012;
const SPIKE_SHARE = 0.0025;
/** Ranges of neighbours further apart than this are an edge, where the line's width mixes both. */
const EDGE_MM = 0.6;
const MIXED_SHARE = 0.3;

interface Hit {
  range_mm: number;
  /** Cosine between the ray and the face's normal. */
  facing: number;
}

/** Room for one profile, reused for all. */
export function roomFor(sensor: Sensor): Returns {
  return { l: new Float64Array(sensor.points), n: new Float64Array(sensor.points), count: 0 };
}

/** The nearest face along a ray. Writes `hit`; its range is infinite where the ray meets nothing. */
function nearest(faces: readonly Face[], ol: number, on: number, dl: number, dn: number, hit: Hit): void {
  hit.range_mm = Number.POSITIVE_INFINITY;
  for (const face of faces) {
    const el = face.to_l - face.from_l;
    const en = face.to_n - face.from_n;
    const cross = dl * en - dn * el;
    if (cross === 0) continue;
    const al = face.from_l - ol;
    const an = face.from_n - on;
    const range = (al * en - an * el) / cross;
    const share = (al * dn - an * dl) / cross;
    if (share < 0 || share > 1 || range <= 0 || range >= hit.range_mm) continue;
    hit.range_mm = range;
    hit.facing = Math.abs(cross) / Math.hypot(el, en);
  }
}

/** The range to a ball of spatter along a ray, if it is nearer. */
function overSpatter(
  spatter: readonly SpatterCut[],
  ol: number,
  on: number,
  dl: number,
  dn: number,
  range_mm: number,
): number {
  let nearest_mm = range_mm;
  for (const { l, n, radius_mm } of spatter) {
    const middle_mm = (l - ol) * dl + (n - on) * dn;
    const off_mm = (l - ol) * dn - (n - on) * dl;
    const room = radius_mm * radius_mm - off_mm * off_mm;
    if (room > 0) nearest_mm = Math.min(nearest_mm, middle_mm - Math.sqrt(room));
  }
  return nearest_mm;
}

/**
 * Takes one profile of a section: a fan of rays from the scanner, each returning the nearest face it meets, with the
 * speckle, lost returns, spikes and mixed points at edges that a laser line has.
 * @param faces   in the nominal section frame
 * @param returns written: the returns in order along the line
 */
export function takeProfile(
  faces: readonly Face[],
  spatter: readonly SpatterCut[],
  { sensor, random }: { readonly sensor: Sensor; readonly random: Random },
  returns: Returns,
): void {
  const view = (sensor.view_deg * Math.PI) / 180;
  const [ol, on] = [
    -Math.sin(view) * sensor.working_distance_mm,
    Math.cos(view) * sensor.working_distance_mm,
  ];
  const halfFan = Math.atan(sensor.field_of_view_mm / 2 / sensor.working_distance_mm);
  const hit: Hit = { range_mm: 0, facing: 1 };
  let [shared, before_mm] = [0, Number.NaN];
  returns.count = 0;
  for (let i = 0; i < sensor.points; i++) {
    const angle = view + halfFan * ((2 * i) / (sensor.points - 1) - 1);
    const [dl, dn] = [Math.sin(angle), -Math.cos(angle)];
    nearest(faces, ol, on, dl, dn, hit);
    const seen_mm = overSpatter(spatter, ol, on, dl, dn, hit.range_mm);
    if (Math.abs(seen_mm - sensor.working_distance_mm) > sensor.range_mm || random.chance(LOST_SHARE))
      continue;
    shared = NEIGHBOUR_SHARE * shared + random.normal();
    // Grazing light widens the spot, so the error grows as the face turns away.
    const error_mm = (SPECKLE_MM * shared) / Math.sqrt(Math.max(0.3, hit.facing));
    let range_mm = seen_mm + error_mm;
    if (Math.abs(seen_mm - before_mm) > EDGE_MM && random.chance(MIXED_SHARE)) {
      range_mm = before_mm + (seen_mm - before_mm) * random.uniform();
    }
    if (random.chance(SPIKE_SHARE)) range_mm += random.either(1, 8);
    before_mm = seen_mm;
    returns.l[returns.count] = ol + dl * range_mm;
    returns.n[returns.count] = on + dn * range_mm;
    returns.count++;
  }
}
