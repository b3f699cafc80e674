import { MM_PER } from "../point-sink.ts";
import type { OpenFile } from "../scan-input.ts";
import { findColumns } from "../text/column-names.ts";
import { NumberRows } from "../text/number-rows.ts";
import { tableLayout } from "../text/table-layout.ts";
import { ORIENTATIONS, type OrientationColumns } from "./orientation.ts";
import { type PoseSet, poseSetOf } from "./pose-set.ts";
import { keyColumn, keyScale, type ProfileKey } from "./profile-key.ts";
import { checkPose, type SensorPose } from "./sensor-pose.ts";

const POINT = ["px", "py", "pz"].map((base) => ({ base, isLength: true }));

/** The way a file writes orientations, by the names of its columns; quaternions where it names none. */
function orientationOf(names: readonly string[]): OrientationColumns {
  const lower = new Set(names.map((name) => name.trim().toLowerCase()));
  return ORIENTATIONS.find(({ columns }) => lower.has(columns[0] ?? "")) ?? ORIENTATIONS[0]!;
}

/**
 * Reads a poses file: one row a profile with the key, the sensor's point and its orientation, as a quaternion, a
 * matrix, or angles whose convention the columns' names declare.
 * @returns null where there are faults
 */
export function readPoses(file: OpenFile, key: ProfileKey): PoseSet | null {
  const { units, faults } = file;
  const layout = tableLayout(file);
  const { names } = layout;
  const orientation = orientationOf(names ?? []);
  const wanted = [
    keyColumn(key),
    ...POINT,
    ...orientation.columns.map((base) => ({ base, isLength: false })),
  ];
  if (names === null) {
    const bases = wanted.map(({ base }) => base).join(", ");
    faults.add("file-header-invalid", `the first row must name the columns ${bases}`, { line: 1 });
    return null;
  }
  const header = { names, units, place: { line: layout.namesLine }, noun: "column" as const };
  const found = findColumns(header, wanted, faults);
  if (found === null) return null;
  const columns = found.map((index) => ({ index, name: names[index]!, allows: "number" as const }));
  const rows = new NumberRows(layout, columns, names.length, faults);
  const poses: SensorPose[] = [];
  while (rows.next()) {
    const quaternion = orientation.quaternionOf(rows.values, 4, { line: rows.rows.line }, faults);
    const pose =
      quaternion && checkPose(poseOf(rows, quaternion, keyScale(key, units), MM_PER[units]), "qw", faults);
    if (pose) poses.push(pose);
  }
  return faults.any ? null : poseSetOf(poses, key, faults);
}

function poseOf(
  { values, rows }: NumberRows,
  quaternion: SensorPose["quaternion"],
  keyScaled: number,
  scale: number,
): SensorPose {
  return {
    key: values[0]! * keyScaled,
    point_mm: [values[1]! * scale, values[2]! * scale, values[3]! * scale],
    quaternion,
    place: { line: rows.line },
  };
}
