import type { Floor, FloorCell } from "@beadroll/domain/schemas/floor";

/** The key of one of a cell's counts of today. */
export const countKey = (cell: FloorCell["cell"], count: keyof FloorCell["today"]): string =>
  `${cell.id} ${count}`;

/** The key of what is mounted on a slot of a cell. */
export const mountKey = (mount: FloorCell["mounts"][number]): string => `${mount.cell_id} ${mount.slot}`;

/** The keys of the two counts of seams that wait: the newest is not among the first rows, so its count has to tell. */
export const HELD_COUNT = "held";
export const TO_INSPECT_COUNT = "to inspect";

/** Everything on the floor that is marked when it changes: seams by id, counts and mounts by their cell. */
export function floorValues(floor: Floor): ReadonlyMap<string, string> {
  const seams = [...floor.held, ...floor.to_inspect, ...floor.cells.flatMap(({ latest }) => latest)];
  return new Map([
    [HELD_COUNT, String(floor.held_count)],
    [TO_INSPECT_COUNT, String(floor.to_inspect_count)],
    ...seams.map((seam) => [seam.id, seam.changed_at] as const),
    ...floor.cells.flatMap(({ cell, today, mounts }) => [
      ...(["scans", "holds", "passes"] as const).map(
        (count) => [countKey(cell, count), String(today[count])] as const,
      ),
      ...mounts.map((mount) => [mountKey(mount), mount.id] as const),
    ]),
  ]);
}
