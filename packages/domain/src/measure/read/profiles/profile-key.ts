import type { LengthUnit } from "../../scan-cloud.ts";
import { MM_PER } from "../point-sink.ts";
import type { WantedColumn } from "../text/column-names.ts";

/** What joins a profile and its pose: the station, or the profile's number. */
export type ProfileKey = "station" | "profile";

/** The column that holds the key. */
export function keyColumn(key: ProfileKey): WantedColumn {
  return { base: key, isLength: key === "station" };
}

/** What a key is multiplied with: a station becomes mm, a number stays. */
export function keyScale(key: ProfileKey, units: LengthUnit): number {
  return key === "station" ? MM_PER[units] : 1;
}
