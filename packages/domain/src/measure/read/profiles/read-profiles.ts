import { MM_PER, PointSink } from "../point-sink.ts";
import type { OpenFile } from "../scan-input.ts";
import { findColumns } from "../text/column-names.ts";
import { NumberRows } from "../text/number-rows.ts";
import { rowsExpected } from "../text/rows-expected.ts";
import type { TableLayout } from "../text/table-layout.ts";
import { PoseJoin } from "./pose-join.ts";
import type { PoseSet } from "./pose-set.ts";
import { keyColumn, keyScale, type ProfileKey } from "./profile-key.ts";

/** A table of profiles whose layout is known. */
export interface ProfilesTable {
  readonly layout: TableLayout;
  readonly names: readonly string[];
  readonly key: ProfileKey;
}

const ALLOWS = ["number", "nan", "empty"] as const;

/**
 * Reads profiles (key, x, z: one row a return) and carries each return into the part frame.
 * @param poses null where they could not be read: the profiles are then only checked
 */
export function readProfiles(table: ProfilesTable, poses: PoseSet | null, file: OpenFile): PointSink {
  const { layout, names, key } = table;
  const { units, faults } = file;
  const sink = new PointSink(true);
  const wanted = [keyColumn(key), ...["x", "z"].map((base) => ({ base, isLength: true }))];
  const header = { names, units, place: { line: layout.namesLine }, noun: "column" as const };
  const found = findColumns(header, wanted, faults);
  if (found === null) return sink;
  const columns = found.map((index, i) => ({ index, name: names[index]!, allows: ALLOWS[i]! }));
  const rows = new NumberRows(layout, columns, names.length, faults);
  if (poses === null) rows.pass();
  else
    carryRows(
      rows,
      { poses, scale: MM_PER[units], keyScaled: keyScale(key, units) },
      sink,
      new PoseJoin(poses, key, faults),
    );
  return sink;
}

interface Carrier {
  readonly poses: PoseSet;
  readonly scale: number;
  readonly keyScaled: number;
}

function carryRows(
  rows: NumberRows,
  { poses, scale, keyScaled }: Carrier,
  sink: PointSink,
  join: PoseJoin,
): void {
  const { values } = rows;
  const place = () => ({ line: rows.rows.line });
  sink.reserve(rowsExpected(rows.rows.bytes, rows.rows.at));
  while (rows.next()) {
    const index = join.find(values[0]! * keyScaled, place);
    if (rows.lost) sink.lose();
    else if (index >= 0) {
      poses.carry(index, values[1]! * scale, values[2]! * scale);
      sink.add(poses.x_mm, poses.y_mm, poses.z_mm, index);
    }
  }
}
