import type { LengthUnit, ScanCloud } from "../scan-cloud.ts";

/** Millimetres in each unit; exact (the inch is 25.4 mm by definition, ISO 80000-3). */
export const MM_PER: Readonly<Record<LengthUnit, number>> = { mm: 1, in: 25.4, m: 1000 };

const FIRST_CAPACITY = 4096;

/** Points that one scan may hold: 480 MB as doubles, twenty times what a seam needs. */
export const MAX_POINTS = 20_000_000;

/** Takes points one by one, in mm and the part frame, and gives the cloud; lost returns are only counted. */
export class PointSink {
  #xyz_mm: Float64Array;
  #profiles: Int32Array | null;
  #count = 0;
  #lost = 0;
  #isOver = false;

  /** @param withProfiles whether every point will name the profile it came from */
  constructor(withProfiles: boolean) {
    this.#xyz_mm = new Float64Array(3 * FIRST_CAPACITY);
    this.#profiles = withProfiles ? new Int32Array(FIRST_CAPACITY) : null;
  }

  get count(): number {
    return this.#count;
  }

  get lost(): number {
    return this.#lost;
  }

  /** Makes room for this many points at once. */
  reserve(count: number): void {
    this.#resize(Math.min(count, MAX_POINTS));
  }

  /** True where more points came than a scan may hold; the rest was dropped. */
  get isOver(): boolean {
    return this.#isOver;
  }

  /** A return without a usable number. */
  lose(): void {
    this.#lost++;
  }

  /** One point; counted as lost where a coordinate is not finite. `profile` is ignored by a plain cloud. */
  add(x_mm: number, y_mm: number, z_mm: number, profile: number): void {
    // x - x is 0 for a finite number, nan for the others; one comparison for the three.
    if (x_mm - x_mm + (y_mm - y_mm) + (z_mm - z_mm) !== 0) {
      this.#lost++;
      return;
    }
    const at = 3 * this.#count;
    if (at >= this.#xyz_mm.length && !this.#grow()) return;
    this.#xyz_mm[at] = x_mm;
    this.#xyz_mm[at + 1] = y_mm;
    this.#xyz_mm[at + 2] = z_mm;
    if (this.#profiles !== null) this.#profiles[this.#count] = profile;
    this.#count++;
  }

  /** An empty plain cloud's array for this many points, to be written and then declared with `fill`; null if too many. */
  room(count: number): Float64Array | null {
    this.#isOver = count > MAX_POINTS;
    if (this.#isOver) return null;
    this.#xyz_mm = new Float64Array(3 * count);
    return this.#xyz_mm;
  }

  /** Takes the points written into `room`; those that are not finite are closed up and counted as lost. */
  fill(count: number): void {
    const xyz_mm = this.#xyz_mm;
    let kept = 0;
    for (let at = 0; at < 3 * count; at += 3) {
      const [x, y, z] = [xyz_mm[at]!, xyz_mm[at + 1]!, xyz_mm[at + 2]!];
      if (x - x + (y - y) + (z - z) !== 0) continue;
      if (kept < at) {
        xyz_mm[kept] = x;
        xyz_mm[kept + 1] = y;
        xyz_mm[kept + 2] = z;
      }
      kept += 3;
    }
    this.#count = kept / 3;
    this.#lost = count - this.#count;
  }

  /** Gives every profile number its new number. */
  renumber(numbers: Int32Array): this {
    const profiles = this.#profiles;
    if (profiles !== null) for (let i = 0; i < this.#count; i++) profiles[i] = numbers[profiles[i]!]!;
    return this;
  }

  /** The cloud of all points so far, in arrays of exactly that length. */
  cloud(): ScanCloud {
    const full = this.#xyz_mm.length === 3 * this.#count;
    return {
      xyz_mm: full ? this.#xyz_mm : this.#xyz_mm.slice(0, 3 * this.#count),
      count: this.#count,
      profiles: this.#profiles?.slice(0, this.#count) ?? null,
      lost: this.#lost,
    };
  }

  #grow(): boolean {
    this.#isOver = this.#count >= MAX_POINTS;
    if (!this.#isOver) this.#resize(Math.min(MAX_POINTS, 2 * this.#count));
    return !this.#isOver;
  }

  #resize(capacity: number): void {
    if (3 * capacity <= this.#xyz_mm.length) return;
    const xyz_mm = new Float64Array(3 * capacity);
    xyz_mm.set(this.#xyz_mm);
    this.#xyz_mm = xyz_mm;
    if (this.#profiles === null) return;
    const profiles = new Int32Array(capacity);
    profiles.set(this.#profiles);
    this.#profiles = profiles;
  }
}
