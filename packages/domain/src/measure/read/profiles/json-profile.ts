import type { LengthUnit } from "../../scan-cloud.ts";
import { type FaultList, quoted } from "../fault-list.ts";
import type { Json } from "../json/json-bytes.ts";
import { MM_PER } from "../point-sink.ts";
import { findColumns, hasColumn } from "../text/column-names.ts";
import { keyColumn, keyScale, type ProfileKey } from "./profile-key.ts";
import { checkPose, type SensorPose } from "./sensor-pose.ts";

/** One profile of a JSON scan, checked but for the numbers in its lists. */
export interface JsonProfile {
  /** Station in mm, or the profile's number. */
  readonly key: number;
  /** The pose it carries; null where it carries none. */
  readonly pose: SensorPose | null;
  readonly x: readonly Json[];
  readonly z: readonly Json[];
  /** JSON pointers of the profile and of its two lists. */
  readonly pointer: string;
  readonly xPointer: string;
  readonly zPointer: string;
}

/** What all profiles of a file share. */
export interface JsonRules {
  readonly units: LengthUnit;
  readonly key: ProfileKey;
  readonly faults: FaultList;
}

/** Checks one profile; null with every fault noted. */
export function checkProfile(profile: Json, pointer: string, rules: JsonRules): JsonProfile | null {
  const { units, key, faults } = rules;
  const wanted = [keyColumn(key), { base: "x", isLength: true }, { base: "z", isLength: true }];
  const fields = fieldsOf(profile, pointer, wanted, rules);
  if (fields === null) return null;
  const [at, x, z] = fields;
  const keyValue = numberIn(at!, faults);
  const xs = listIn(x!, faults);
  const zs = listIn(z!, faults);
  if (keyValue === null || xs === null || zs === null) return null;
  if (xs.length !== zs.length) {
    const what = `${x!.name} has ${xs.length} values, ${z!.name} has ${zs.length}`;
    faults.add("file-row-invalid", what, { pointer });
    return null;
  }
  const keyed = keyValue * keyScale(key, units);
  const carried = isObject(profile) && hasColumn(Object.keys(profile), "pose");
  const pose = carried ? jsonPose(profile["pose"] ?? null, `${pointer}/pose`, keyed, rules) : null;
  return { key: keyed, pose, x: xs, z: zs, pointer, xPointer: x!.pointer, zPointer: z!.pointer };
}

/** A pose in JSON: a point of three numbers and a quaternion w, x, y, z; null with every fault noted. */
function jsonPose(pose: Json, pointer: string, key: number, rules: JsonRules): SensorPose | null {
  const { units, faults } = rules;
  const wanted = [
    { base: "point", isLength: true },
    { base: "quaternion", isLength: false },
  ];
  const fields = fieldsOf(pose, pointer, wanted, rules);
  if (fields === null) return null;
  const point = numbersIn(fields[0]!, 3, faults);
  const turn = numbersIn(fields[1]!, 4, faults);
  if (point === null || turn === null) return null;
  const scale = MM_PER[units];
  const candidate: SensorPose = {
    key,
    point_mm: [point[0]! * scale, point[1]! * scale, point[2]! * scale],
    quaternion: [turn[0]!, turn[1]!, turn[2]!, turn[3]!],
    place: { pointer },
  };
  return checkPose(candidate, "quaternion", faults);
}

interface Field {
  readonly name: string;
  readonly value: Json;
  readonly pointer: string;
}

/** True for what JSON writes in braces. */
export function isObject(value: Json | undefined): value is { readonly [name: string]: Json } {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

type Wanted = Parameters<typeof findColumns>[1];

function fieldsOf(
  value: Json,
  pointer: string,
  wanted: Wanted,
  { units, faults }: JsonRules,
): Field[] | null {
  if (!isObject(value)) {
    faults.add("file-value-invalid", `${shown(value)} stands where an object was expected`, { pointer });
    return null;
  }
  const names = Object.keys(value);
  const found = findColumns({ names, units, place: { pointer }, noun: "field" }, wanted, faults);
  if (found === null) return null;
  return found.map((index) => {
    const name = names[index]!;
    return {
      name,
      value: value[name]!,
      pointer: `${pointer}/${name.replace(/~/g, "~0").replace(/\//g, "~1")}`,
    };
  });
}

function numberIn({ value, pointer, name }: Field, faults: FaultList): number | null {
  if (typeof value === "number" && Number.isFinite(value)) return value;
  const what = `${shown(value)} stands where a number was expected`;
  faults.add("file-value-invalid", what, { pointer, field: name });
  return null;
}

function listIn({ value, pointer, name }: Field, faults: FaultList): readonly Json[] | null {
  if (Array.isArray(value)) return value;
  const what = `${shown(value)} stands where a list of numbers was expected`;
  faults.add("file-value-invalid", what, { pointer, field: name });
  return null;
}

function numbersIn(field: Field, count: number, faults: FaultList): readonly number[] | null {
  const { value, pointer, name } = field;
  const isFit = Array.isArray(value) && value.length === count && value.every(Number.isFinite);
  if (isFit) return value as readonly number[];
  const what = `${shown(value)} stands where ${count} numbers were expected`;
  faults.add("scan-pose-invalid", what, { pointer, field: name });
  return null;
}

/** A piece of JSON as a fault quotes it. */
export function shown(value: Json): string {
  return quoted(JSON.stringify(value).slice(0, 80));
}
