import type { FaultList } from "../fault-list.ts";
import { MM_PER, PointSink } from "../point-sink.ts";
import type { OpenFile } from "../scan-input.ts";
import { findColumns } from "../text/column-names.ts";
import { NumberRows } from "../text/number-rows.ts";
import type { TableLayout } from "../text/table-layout.ts";
import type { PoseSet } from "./pose-set.ts";
import type { ProfileKey } from "./read-poses.ts";

/** The profiles' table and how it is written. */
export interface ProfilesSource {
  readonly layout: TableLayout;
  readonly names: readonly string[];
  readonly key: ProfileKey;
}

/**
 * Reads profiles (key, x, z: one row a return) and carries each return into the part frame.
 * @param poses null where they could not be read: the profiles are then only checked
 */
export function readProfiles(
  { layout, names, key }: ProfilesSource,
  poses: PoseSet | null,
  { units, faults }: OpenFile,
): PointSink {
  const sink = new PointSink(true);
  const wanted = [
    { base: key, isLength: key === "station" },
    ...["x", "z"].map((base) => ({ base, isLength: true })),
  ];
  const found = findColumns({ names, units, line: layout.namesLine }, wanted, faults);
  if (found === null) return sink;
  const allows = ["number", "nan", "empty"] as const;
  const columns = found.map((index, i) => ({ index, name: names[index]!, allows: allows[i]! }));
  const rows = new NumberRows(layout, columns, names.length, faults);
  const scale = MM_PER[units];
  const join = new PoseJoin(poses, key, key === "station" ? scale : 1, faults);
  const { values } = rows;
  while (rows.next()) {
    const index = join.find(values[0]!, rows.rows.line);
    if (rows.lost) sink.lose();
    else if (index >= 0 && poses !== null) {
      poses.carry(index, values[1]! * scale, values[2]! * scale);
      sink.add(poses.x_mm, poses.y_mm, poses.z_mm, index);
    }
  }
  return sink;
}

/** Finds the pose of each row; rows of one profile stand together, so the last answer mostly serves again. */
class PoseJoin {
  #key = Number.NaN;
  #index = -1;
  readonly #poses: PoseSet | null;
  readonly #name: ProfileKey;
  readonly #scale: number;
  readonly #faults: FaultList;
  readonly #missing = new Set<number>();

  constructor(poses: PoseSet | null, name: ProfileKey, scale: number, faults: FaultList) {
    this.#poses = poses;
    this.#name = name;
    this.#scale = scale;
    this.#faults = faults;
  }

  /** Index of the pose, -1 where there is none, which is a fault once for each key. */
  find(key: number, line: number): number {
    if (key === this.#key || this.#poses === null) return this.#index;
    this.#key = key;
    this.#index = this.#poses.find(key * this.#scale);
    if (this.#index < 0 && !this.#missing.has(key)) this.#refuse(key, line);
    return this.#index;
  }

  #refuse(key: number, line: number): void {
    this.#missing.add(key);
    const place = { line, field: this.#name };
    const station = this.#name === "station" ? { station_mm: key * this.#scale } : {};
    this.#faults.add("scan-poses-missing", `no pose for ${this.#name} ${key}`, { ...place, ...station });
  }
}
