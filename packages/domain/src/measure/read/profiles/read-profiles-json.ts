import type { FaultList } from "../fault-list.ts";
import { type Json, readJson } from "../json/json-bytes.ts";
import { MM_PER, PointSink } from "../point-sink.ts";
import type { OpenFile } from "../scan-input.ts";
import { hasColumn } from "../text/column-names.ts";
import { checkProfile, isObject, type JsonProfile, shown } from "./json-profile.ts";
import { PoseJoin } from "./pose-join.ts";
import { type PoseSet, poseSetOf } from "./pose-set.ts";
import type { ProfileKey } from "./profile-key.ts";
import { readPoses } from "./read-poses.ts";

/**
 * Reads profiles written as JSON, each with its pose, or with the poses beside them in a file.
 * Layout: `{ units, profiles: [{ station_mm, pose: { point, quaternion }, x_mm: [], z_mm: [] }] }`.
 */
export function readProfilesJson(file: OpenFile, poses: OpenFile | null): PointSink {
  const sink = new PointSink(true);
  const list = profilesIn(file);
  if (list === null) return sink;
  const { units, faults } = file;
  const first = list[0];
  const key =
    isObject(first) && !hasColumn(Object.keys(first), "station") && hasColumn(Object.keys(first), "profile")
      ? "profile"
      : "station";
  const profiles: JsonProfile[] = [];
  for (let i = 0; i < list.length && !faults.full; i++) {
    const profile = checkProfile(list[i]!, `/profiles/${i}`, { units, key, faults });
    if (profile !== null) profiles.push(profile);
  }
  const set = posesOf(profiles, key, file, poses);
  if (set === null) return sink;
  const join = new PoseJoin(set, key, faults);
  for (const profile of profiles) carryProfile(profile, { set, join, scale: MM_PER[units], faults }, sink);
  return sink;
}

/** The list of profiles; null where the file is no JSON, has another layout or names another unit. */
function profilesIn({ bytes, from, units, faults }: OpenFile): readonly Json[] | null {
  const read = readJson(bytes, from);
  if ("fault" in read) {
    const { why, line, isCut } = read.fault;
    faults.add(isCut ? "file-truncated" : "file-header-invalid", why, { line });
    return null;
  }
  const { value } = read;
  const list = isObject(value) ? value["profiles"] : undefined;
  if (!isObject(value) || !Array.isArray(list)) {
    faults.add("file-header-invalid", "an object with a list named profiles was expected", { pointer: "" });
    return null;
  }
  const declared = value["units"];
  if (declared === undefined || declared === units) return list;
  const what = `units is ${shown(declared)}, but the file was declared in "${units}"`;
  faults.add("scan-units-contradict", what, { pointer: "/units", field: "units" });
  return null;
}

/** The poses that the profiles carry; those of the file beside them where none carries one. */
function posesOf(
  profiles: readonly JsonProfile[],
  key: ProfileKey,
  { faults }: OpenFile,
  poses: OpenFile | null,
): PoseSet | null {
  const without = profiles.filter(({ pose }) => pose === null);
  if (faults.any || profiles.length === 0) return null;
  if (without.length === profiles.length && poses !== null)
    return poses.faults.any ? null : readPoses(poses, key);
  for (const { pointer, key: at } of without) {
    faults.add("scan-poses-missing", `${key} ${at} carries no pose`, { pointer, field: "pose" });
  }
  return faults.any
    ? null
    : poseSetOf(
        profiles.map(({ pose }) => pose!),
        key,
        faults,
      );
}

interface Carrier {
  readonly set: PoseSet;
  readonly join: PoseJoin;
  readonly scale: number;
  readonly faults: FaultList;
}

/** Adds the returns of one profile: null for z is a lost return. */
function carryProfile(profile: JsonProfile, { set, join, scale, faults }: Carrier, sink: PointSink): void {
  const { key, x: xs, z: zs, pointer, xPointer, zPointer } = profile;
  const index = join.find(key, () => ({ pointer }));
  if (index < 0) return;
  for (let i = 0; i < xs.length && !faults.full; i++) {
    const x = xs[i]!;
    const z = zs[i]!;
    if (z === null && (x === null || typeof x === "number")) sink.lose();
    else if (typeof x !== "number") refuseValue(x, `${xPointer}/${i}`, faults);
    else if (typeof z !== "number") refuseValue(z, `${zPointer}/${i}`, faults);
    else {
      set.carry(index, x * scale, z * scale);
      sink.add(set.x_mm, set.y_mm, set.z_mm, index);
    }
  }
}

function refuseValue(value: Json, pointer: string, faults: FaultList): void {
  faults.add("file-value-invalid", `${shown(value)} stands where a number was expected`, { pointer });
}
