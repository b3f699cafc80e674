import type { FaultList, FaultPlace } from "../fault-list.ts";
import type { PoseSet } from "./pose-set.ts";
import type { ProfileKey } from "./profile-key.ts";

/** Finds the pose of each row; rows of one profile stand together, so the last answer mostly serves again. */
export class PoseJoin {
  #key = Number.NaN;
  #index = -1;
  readonly #poses: PoseSet;
  readonly #name: ProfileKey;
  readonly #faults: FaultList;
  readonly #missing = new Set<number>();

  constructor(poses: PoseSet, name: ProfileKey, faults: FaultList) {
    this.#poses = poses;
    this.#name = name;
    this.#faults = faults;
  }

  /**
   * Index of the pose; -1 where there is none, which is a fault once for each key.
   * @param key station in mm, or the profile's number
   * @param place where the row stands, asked only for a fault
   */
  find(key: number, place: () => FaultPlace): number {
    if (key === this.#key) return this.#index;
    this.#key = key;
    this.#index = this.#poses.find(key);
    if (this.#index < 0 && !this.#missing.has(key)) {
      this.#missing.add(key);
      const station = this.#name === "station" ? { station_mm: key } : {};
      const what = `no pose for ${this.#name} ${key}${this.#name === "station" ? " mm" : ""}`;
      this.#faults.add("scan-poses-missing", what, { ...place(), field: this.#name, ...station });
    }
    return this.#index;
  }
}
