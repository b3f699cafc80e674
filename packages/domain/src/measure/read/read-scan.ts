import { good, type Outcome, refused } from "../../faults/fault.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import { MAX_FAULTS } from "./fault-list.ts";
import { openFile } from "./open-file.ts";
import { readPcd } from "./pcd/read-pcd.ts";
import { readPly } from "./ply/read-ply.ts";
import { MAX_POINTS, PointSink } from "./point-sink.ts";
import { readProfilesJson } from "./profiles/read-profiles-json.ts";
import { readTable } from "./read-table.ts";
import type { OpenFile, ScanInput } from "./scan-input.ts";
import { sniffFormat } from "./sniff-format.ts";

/**
 * Reads a scan in any layout of docs/formats/scans.md into points in mm in the part frame.
 * @param input the files, their units and how to unpack; the format is found from the content
 * @returns the cloud, points in the order of the file, or up to 10 faults, each naming file, place and field
 *
 * Cost: linear in the bytes. Example: the bytes of `0 0 0\n1 2 3\n` in inches give the points (0, 0, 0) and
 * (25.4, 50.8, 76.2).
 */
export function readScan(input: ScanInput): Outcome<ScanCloud> {
  const { units, gunzip } = input;
  const scan = openFile(input, units, gunzip);
  const poses = input.poses === undefined ? null : openFile(input.poses, input.poses_units ?? units, gunzip);
  const sink = scan.faults.any ? new PointSink(false) : readFormat(scan, poses);
  if (sink.isOver) scan.faults.add("file-too-large", `it holds more than ${MAX_POINTS} points`);
  const found = [...(poses?.faults.faults ?? []), ...scan.faults.faults];
  if (found.length > 0) return refused(...found.slice(0, MAX_FAULTS));
  if (sink.count > 0) return good(sink.cloud());
  const why = sink.lost > 0 ? `it holds no point: all ${sink.lost} returns are lost` : "it holds no point";
  scan.faults.add("scan-too-few-points", why);
  return scan.faults.refusal();
}

function readFormat(scan: OpenFile, poses: OpenFile | null): PointSink {
  const format = sniffFormat(scan.name, scan.bytes, scan.from);
  switch (format) {
    case "ply":
      return readPly(scan);
    case "pcd":
      return readPcd(scan);
    case "table":
      return readTable(scan, poses);
    case "json":
      return readProfilesJson(scan, poses);
    case "gzip":
      return refuse(scan, "a gzip file inside a gzip file");
    case "utf16":
      return refuse(scan, "UTF-16 text; save it as UTF-8");
    case "unknown":
      return refuse(scan, "no text of numbers, PLY, PCD or JSON");
    default:
      return format satisfies never;
  }
}

function refuse({ faults }: OpenFile, found: string): PointSink {
  faults.add("file-format-unknown", `it is ${found}`, { byte: 0 });
  return new PointSink(false);
}
