import type { PointSink } from "./point-sink.ts";
import { readPoses } from "./profiles/read-poses.ts";
import { readProfiles } from "./profiles/read-profiles.ts";
import type { OpenFile } from "./scan-input.ts";
import { hasColumn } from "./text/column-names.ts";
import { tableLayout } from "./text/table-layout.ts";
import { readXyz } from "./xyz/read-xyz.ts";

/**
 * Reads a text of numbers: profiles where its columns are a station (or the profile's number), x and z, with the
 * poses beside them; else a cloud.
 */
export function readTable(scan: OpenFile, poses: OpenFile | null): PointSink {
  const layout = tableLayout(scan);
  const { names } = layout;
  const has = (base: string): boolean => names !== null && hasColumn(names, base);
  const key = has("station") ? "station" : "profile";
  if (names === null || !has(key) || has("y")) return readXyz(layout, scan);
  if (poses === null) {
    scan.faults.add(
      "scan-poses-missing",
      "it holds profiles in the sensor's frame; give the poses beside it",
      {
        line: layout.namesLine,
      },
    );
  }
  const set = poses === null || poses.faults.any ? null : readPoses(poses, key);
  return readProfiles({ layout, names, key }, set, scan);
}
