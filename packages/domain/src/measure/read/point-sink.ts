import type { LengthUnit, ScanCloud } from "../scan-cloud.ts";

/** Millimetres in each unit; exact (the inch is 25.4 mm by definition, ISO 80000-3). */
export const MM_PER: Readonly<Record<LengthUnit, number>> = { mm: 1, in: 25.4, m: 1000 };

const FIRST_CAPACITY = 4096;

/** Takes points one by one, in mm and the part frame, and gives the cloud; lost returns are only counted. */
export class PointSink {
  #xyz_mm: Float64Array;
  #profiles: Int32Array | null;
  #count = 0;
  #lost = 0;

  /** @param withProfiles whether every point will name the profile it came from */
  constructor(withProfiles: boolean, capacity: number = FIRST_CAPACITY) {
    this.#xyz_mm = new Float64Array(3 * capacity);
    this.#profiles = withProfiles ? new Int32Array(capacity) : null;
  }

  get count(): number {
    return this.#count;
  }

  get lost(): number {
    return this.#lost;
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
    if (at >= this.#xyz_mm.length) this.#grow();
    this.#xyz_mm[at] = x_mm;
    this.#xyz_mm[at + 1] = y_mm;
    this.#xyz_mm[at + 2] = z_mm;
    if (this.#profiles !== null) this.#profiles[this.#count] = profile;
    this.#count++;
  }

  /** Gives every profile number its new number. */
  renumber(numbers: Int32Array): this {
    const profiles = this.#profiles;
    if (profiles !== null) for (let i = 0; i < this.#count; i++) profiles[i] = numbers[profiles[i]!]!;
    return this;
  }

  /** The cloud of all points so far, in arrays of exactly that length. */
  cloud(): ScanCloud {
    return {
      xyz_mm: this.#xyz_mm.slice(0, 3 * this.#count),
      count: this.#count,
      profiles: this.#profiles?.slice(0, this.#count) ?? null,
      lost: this.#lost,
    };
  }

  #grow(): void {
    const xyz_mm = new Float64Array(Math.max(3, 2 * this.#xyz_mm.length));
    xyz_mm.set(this.#xyz_mm);
    this.#xyz_mm = xyz_mm;
    if (this.#profiles === null) return;
    const profiles = new Int32Array(xyz_mm.length / 3);
    profiles.set(this.#profiles);
    this.#profiles = profiles;
  }
}
