import type { ScanResult, StationResult } from "../../schemas/scan-result.ts";
import type { SeamFrames } from "../seam/seam-frames.ts";
import type { RigidMotion } from "./rigid.ts";
import { dot, minus, plus, turned, type Vector } from "./rotation.ts";

const at = (flat: Float64Array, i: number): Vector => [flat[3 * i]!, flat[3 * i + 1]!, flat[3 * i + 2]!];
const rounded = (value: number) => Math.round(value * 1e4) / 1e4 + 0;

/** What is left of one station's deviation, in the moved section frame, mm. */
interface Rest {
  readonly station_mm: number;
  readonly lateral_mm: number;
  readonly normal_mm: number;
}

function restsOf(stations: readonly StationResult[], frames: SeamFrames, motion: RigidMotion): Rest[] {
  return stations.flatMap((station, i) => {
    if (!station.root_mm) return [];
    const arm = turned(motion.rotation, minus(at(frames.points_mm, i), motion.centre_mm));
    const off = minus(station.root_mm, plus(plus(arm, motion.centre_mm), motion.translation_mm));
    return {
      station_mm: station.station_mm,
      lateral_mm: dot(off, turned(motion.rotation, at(frames.laterals, i))),
      normal_mm: dot(off, turned(motion.rotation, at(frames.normals, i))),
    };
  });
}

/** The middle against the chord of the ends. */
function bow(rests: readonly Rest[], key: "lateral_mm" | "normal_mm"): number {
  const [first, last] = [rests[0], rests.at(-1)];
  if (!first || !last || first === last) return 0;
  const half_mm = (first.station_mm + last.station_mm) / 2;
  const middle = rests.reduce((a, b) =>
    Math.abs(b.station_mm - half_mm) < Math.abs(a.station_mm - half_mm) ? b : a,
  );
  const share = (middle.station_mm - first.station_mm) / (last.station_mm - first.station_mm);
  return middle[key] - first[key] - share * (last[key] - first[key]);
}

/** What is left of the deviation when the rigid motion is taken out: its size, bow and twist. */
export function remainingPart(
  stations: readonly StationResult[],
  frames: SeamFrames,
  motion: RigidMotion,
): NonNullable<ScanResult["remaining"]> {
  const rests = restsOf(stations, frames, motion);
  let [max_abs_mm, at_mm, square] = [0, rests[0]?.station_mm ?? 0, 0];
  for (const rest of rests) {
    const left_mm = Math.hypot(rest.lateral_mm, rest.normal_mm);
    square += left_mm ** 2;
    if (left_mm > max_abs_mm) [max_abs_mm, at_mm] = [left_mm, rest.station_mm];
  }
  const turns = stations.flatMap((station) => station.plate_a_rot_deg ?? []);
  return {
    max_abs_mm: rounded(max_abs_mm),
    at_mm,
    rms_mm: rounded(Math.sqrt(square / Math.max(1, rests.length))),
    bend_lateral_mm: rounded(bow(rests, "lateral_mm")),
    bend_normal_mm: rounded(bow(rests, "normal_mm")),
    twist_deg: rounded((turns.at(-1) ?? 0) - (turns[0] ?? 0)),
  };
}
