import type { Random } from "./random.ts";
import type { Edge, Point } from "./real-joint.ts";

/** How dirty a scan is. */
export interface Dirt {
  /** Standard deviation of the range, mm. */
  readonly noise_mm: number;
  /** Share of a return's error that its neighbour has too. */
  readonly shared: number;
  readonly lost_share: number;
  readonly spike_share: number;
  /** Share of the returns near the root that come by way of the other plate. */
  readonly ghost_share: number;
  /** Chance that a profile loses a run of returns. */
  readonly burst_chance: number;
}

/** A scanner as set up for a joint. */
export interface Scanner {
  readonly points: number;
  readonly field_mm: number;
  readonly distance_mm: number;
  /** Direction it looks from, from plate A's normal toward plate B, degrees. */
  readonly view_deg: number;
}

/** A ball of spatter in the section. */
export interface Ball {
  readonly at: Point;
  readonly radius_mm: number;
}

/** Half the width of the laser line on the steel: what lies within it is seen as one, mm. */
const HALF_LINE_MM = 0.1;
/** Ranges further apart than this are an edge, where the peak may lie on either side or between. */
const EDGE_MM = 0.6;

interface Ray {
  readonly from: Point;
  readonly along: Point;
}

/** Where a ray first meets steel; infinity where it meets none. */
function meet(steel: readonly Edge[], { from, along }: Ray): number {
  let nearest = Number.POSITIVE_INFINITY;
  for (const [p, q] of steel) {
    const [el, en] = [q[0] - p[0], q[1] - p[1]];
    const det = el * along[1] - en * along[0];
    if (Math.abs(det) < 1e-12) continue;
    const [wl, wn] = [p[0] - from[0], p[1] - from[1]];
    const range = (el * wn - en * wl) / det;
    const share = (along[0] * wn - along[1] * wl) / det;
    if (share >= 0 && share <= 1 && range > 0 && range < nearest) nearest = range;
  }
  return nearest;
}

function meetBalls(balls: readonly Ball[], { from, along }: Ray): number {
  return balls.reduce((nearest, { at, radius_mm }) => {
    const [wl, wn] = [at[0] - from[0], at[1] - from[1]];
    const middle = wl * along[0] + wn * along[1];
    const off = wl * along[1] - wn * along[0];
    const half = radius_mm ** 2 - off ** 2;
    return half > 0 ? Math.min(nearest, middle - Math.sqrt(half)) : nearest;
  }, Number.POSITIVE_INFINITY);
}

/** The range of a laser line of some width: the mean of what it covers, or one side of an edge. */
function rangeOf(
  steel: readonly Edge[],
  balls: readonly Ball[],
  rays: readonly Ray[],
  random: Random,
): number {
  const ranges = rays.map((ray) => Math.min(meet(steel, ray), meetBalls(balls, ray)));
  const [low, high] = [Math.min(...ranges), Math.max(...ranges)];
  if (high - low > EDGE_MM) {
    if (!Number.isFinite(high)) return random.chance(0.5) ? Number.POSITIVE_INFINITY : low;
    return random.chance(0.4) ? random.even(low, high) : random.pick(ranges);
  }
  return ranges.reduce((sum, range) => sum + range, 0) / ranges.length;
}

/** A point mirrored behind a face near the root: light that came by way of the other plate. */
function ghostOf([l, n]: Point, root: Point, random: Random): Point {
  const turn = random.even(0, 2 * Math.PI);
  const reach = Math.hypot(l - root[0], n - root[1]);
  return [root[0] + reach * Math.cos(turn), root[1] + reach * Math.sin(turn)];
}

/** Ghosts lie within this of the root, mm. */
const GHOST_REACH_MM = 5;

/** One profile: its returns in the section, in the order of the line. */
export function profileOf(
  steel: readonly Edge[],
  balls: readonly Ball[],
  root: Point,
  { scanner, dirt, random }: { scanner: Scanner; dirt: Dirt; random: Random },
): Point[] {
  const view = (scanner.view_deg * Math.PI) / 180;
  const from: Point = [Math.sin(view) * scanner.distance_mm, Math.cos(view) * scanner.distance_mm];
  const half = Math.atan(scanner.field_mm / 2 / scanner.distance_mm);
  const rayAt = (angle: number): Ray => ({ from, along: [-Math.sin(angle), -Math.cos(angle)] });
  const burst = random.chance(dirt.burst_chance)
    ? { from: random.even(0, 0.9), length: random.even(0.02, 0.12) }
    : { from: 2, length: 0 };
  const returns: Point[] = [];
  let shared = 0;
  for (let i = 0; i < scanner.points; i++) {
    const share = i / (scanner.points - 1);
    const angle = view + half * (1 - 2 * share);
    const spread = HALF_LINE_MM / scanner.distance_mm;
    const rays = [angle - spread, angle, angle + spread].map(rayAt);
    const range = rangeOf(steel, balls, rays, random);
    shared = dirt.shared * shared + Math.sqrt(1 - dirt.shared ** 2) * random.heavy();
    const isLost =
      random.chance(dirt.lost_share) || (share >= burst.from && share < burst.from + burst.length);
    if (isLost || Math.abs(range - scanner.distance_mm) > 35) continue;
    const spike = random.chance(dirt.spike_share) ? random.even(-8, 8) : 0;
    const at = range + dirt.noise_mm * shared + spike;
    const ray = rayAt(angle);
    const point: Point = [from[0] + at * ray.along[0], from[1] + at * ray.along[1]];
    const isNear = Math.hypot(point[0] - root[0], point[1] - root[1]) < GHOST_REACH_MM;
    returns.push(isNear && random.chance(dirt.ghost_share) ? ghostOf(point, root, random) : point);
  }
  return returns;
}
