import type { LengthUnit } from "../../scan-cloud.ts";
import type { FaultList } from "../fault-list.ts";
import { MM_PER } from "../point-sink.ts";
import type { OpenFile } from "../scan-input.ts";
import { findColumns } from "../text/column-names.ts";
import { NumberRows } from "../text/number-rows.ts";
import { tableLayout } from "../text/table-layout.ts";
import { PoseSet, type SensorPose, STATION_TOLERANCE_MM } from "./pose-set.ts";
import { unitQuaternion } from "./unit-quaternion.ts";

/** What joins a profile and its pose: the station, or the profile's number. */
export type ProfileKey = "station" | "profile";

/**
 * Reads a poses file: one row a profile with the key, the sensor's point and its quaternion.
 * @returns null where there are faults
 */
export function readPoses({ bytes, from, units, faults }: OpenFile, key: ProfileKey): PoseSet | null {
  const layout = tableLayout(bytes, from);
  const { names } = layout;
  const expected = `${key}, px, py, pz, qw, qx, qy, qz`;
  if (names === null) {
    faults.add("file-header-invalid", `the first row must name the columns ${expected}`, { line: 1 });
    return null;
  }
  const lengths = ["px", "py", "pz"].map((base) => ({ base, isLength: true }));
  const turns = ["qw", "qx", "qy", "qz"].map((base) => ({ base, isLength: false }));
  const wanted = [{ base: key, isLength: key === "station" }, ...lengths, ...turns];
  const header = { names, units, line: layout.namesLine };
  const found = findColumns(header, wanted, faults);
  if (found === null) return null;
  const columns = found.map((index) => ({ index, name: names[index]!, allows: "number" as const }));
  const rows = new NumberRows(layout, columns, names.length, faults);
  const poses: SensorPose[] = [];
  while (rows.next()) addPose(rows, { units, key }, poses, faults);
  if (faults.any) return null;
  const set = new PoseSet(poses, key === "station" ? STATION_TOLERANCE_MM : 0);
  refuseTwins(set, key, faults);
  if (poses.length === 0) faults.add("scan-poses-missing", "the file has no pose");
  return faults.any ? null : set;
}

function addPose(
  rows: NumberRows,
  { units, key }: { readonly units: LengthUnit; readonly key: ProfileKey },
  poses: SensorPose[],
  faults: FaultList,
): void {
  const scale = MM_PER[units];
  const { values } = rows;
  const { line } = rows.rows;
  const turn = [values[4]!, values[5]!, values[6]!, values[7]!] as const;
  const quaternion = unitQuaternion(turn);
  if (quaternion === null) {
    const length = Math.hypot(...turn);
    const what = `the quaternion's length is ${Number(length.toPrecision(6))} where 1 was expected`;
    faults.add("scan-pose-invalid", what, { line, field: "qw" });
    return;
  }
  const at = values[0]! * (key === "station" ? scale : 1);
  const point_mm = [values[1]! * scale, values[2]! * scale, values[3]! * scale] as const;
  poses.push({ key: at, point_mm, quaternion, line });
}

function refuseTwins({ keys, lines }: PoseSet, key: ProfileKey, faults: FaultList): void {
  for (let i = 1; i < keys.length; i++) {
    if (keys[i] !== keys[i - 1]) continue;
    const what = `a second pose for ${key} ${keys[i]}; the first stands in line ${lines[i - 1]}`;
    faults.add("scan-pose-invalid", what, { line: lines[i]!, field: key });
  }
}
