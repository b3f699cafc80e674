/** Numbers stations as they come and tells afterwards their rank along the seam. */
export class StationOrder {
  #last = Number.NaN;
  #number = -1;
  readonly #numbers = new Map<number, number>();

  /** Number of this station: 0 for the first met, 1 for the next new one. */
  add(station: number): number {
    if (station === this.#last) return this.#number;
    this.#last = station;
    const known = this.#numbers.get(station);
    this.#number = known ?? this.#numbers.size;
    if (known === undefined) this.#numbers.set(station, this.#number);
    return this.#number;
  }

  /** For each number given by `add`, the station's rank in ascending order. */
  ranks(): Int32Array {
    const ranks = new Int32Array(this.#numbers.size);
    [...this.#numbers]
      .sort(([a], [b]) => a - b)
      .forEach(([, number], rank) => {
        ranks[number] = rank;
      });
    return ranks;
  }
}
