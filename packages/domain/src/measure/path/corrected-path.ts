import type { CorrectedPath, PathPoint } from "../../schemas/corrected-path.ts";
import type { ScanResult, StationResult } from "../../schemas/scan-result.ts";
import type { SeamModel } from "../../schemas/seam-model.ts";
import { jointFaces } from "../joints/joint-faces.ts";
import { dot, minus, plus, times, type Vector } from "../result/rotation.ts";
import { type SeamFrames, stationFrames, toPart } from "../seam/seam-frames.ts";

const NOTICE =
  "Advice for the welding coordinator, no command to a robot. Prove it dry, behind the cell's guards, before the arc.";

const RAD = Math.PI / 180;

const at = (flat: Float64Array, i: number): Vector => [flat[3 * i]!, flat[3 * i + 1]!, flat[3 * i + 2]!];
const unit = (v: Vector): Vector => times(v, 1 / Math.hypot(...v));
const rounded = (v: Vector, digits: number): [number, number, number] => {
  const by = 10 ** digits;
  return [Math.round(v[0] * by) / by + 0, Math.round(v[1] * by) / by + 0, Math.round(v[2] * by) / by + 0];
};

/** Direction of the nominal tool axis in the section, radians: midway between the faces at the root, or square to a butt's surface. */
function toolDirection(model: SeamModel): number {
  const { faces, kind } = jointFaces(model);
  const [a, b] = faces;
  if (kind === "butt" || !a || !b) return Math.PI / 2;
  return Math.atan2(
    Math.sin(a.direction_rad) + Math.sin(b.direction_rad),
    Math.cos(a.direction_rad) + Math.cos(b.direction_rad),
  );
}

interface Seen {
  readonly index: number;
  readonly station: StationResult;
  readonly root: Vector;
}

/** Direction of travel at a place: toward the next root from the one before, or the nominal one where a neighbour is missing. */
function travel(seen: readonly Seen[], k: number, frames: SeamFrames): Vector {
  const here = seen[k]!;
  const beside = (other: Seen | undefined, by: number) =>
    other && Math.abs(other.index - here.index) === by ? other : here;
  const [before, after] = [beside(seen[k - 1], 1), beside(seen[k + 1], 1)];
  const nominal = at(frames.tangents, here.index);
  const along = minus(after.root, before.root);
  return before === after || dot(along, nominal) <= 0 ? nominal : unit(along);
}

function pathPoint(seen: readonly Seen[], k: number, frames: SeamFrames, direction_rad: number): PathPoint {
  const { index, station, root } = seen[k]!;
  const tangent = travel(seen, k, frames);
  const tilt_deg = ((station.plate_a_rot_deg ?? 0) + (station.plate_b_rot_deg ?? 0)) / 2;
  const angle = direction_rad + tilt_deg * RAD;
  const axis = plus(
    times(at(frames.laterals, index), Math.cos(angle)),
    times(at(frames.normals, index), Math.sin(angle)),
  );
  // Square to the travel as measured, which may differ from the nominal tangent by the turn of the joint.
  const tool = unit(minus(axis, times(tangent, dot(axis, tangent))));
  return {
    station_mm: station.station_mm,
    point_mm: rounded(root, 4),
    tangent: rounded(tangent, 6),
    tool_axis: rounded(tool, 6),
    tilt_deg: Math.round(tilt_deg * 1e3) / 1e3 + 0,
    shift_mm: Math.round(Math.hypot(...minus(root, at(frames.points_mm, index))) * 1e4) / 1e4,
  };
}

/**
 * The nominal line moved to the joint as measured, station by station, with the direction of travel and the tool axis,
 * tilted as the plates are. Stations that were not measured are left out, never bridged.
 * @param result from {@link evaluateScan} at the stations that `step_mm` gives (absent: the model's own)
 */
export function correctedPath(model: SeamModel, result: ScanResult, step_mm?: number): CorrectedPath {
  const frames = stationFrames(model, step_mm);
  if (frames.count !== result.stations.length)
    throw new RangeError(`stations: expected ${frames.count}, got ${result.stations.length}`);
  const seen = result.stations.flatMap((station, index): Seen[] =>
    station.lateral_mm === undefined || station.normal_mm === undefined
      ? []
      : [{ index, station, root: toPart(frames, index, station.lateral_mm, station.normal_mm) }],
  );
  const direction_rad = toolDirection(model);
  return {
    model: result.model,
    engine: result.engine,
    frame: "part",
    verdict: result.verdict,
    complete: seen.length === result.stations.length,
    notice: NOTICE,
    points: seen.map((_, k) => pathPoint(seen, k, frames, direction_rad)),
  };
}

const COLUMNS = [
  "station_mm",
  "x_mm",
  "y_mm",
  "z_mm",
  "tangent_x",
  "tangent_y",
  "tangent_z",
  "tool_x",
  "tool_y",
  "tool_z",
  "tilt_deg",
  "shift_mm",
] as const;

/** A corrected path as CSV: its notice as a comment, one row a point. */
export function pathCsv(path: CorrectedPath): string {
  const rows = path.points.map((p) =>
    [p.station_mm, ...p.point_mm, ...p.tangent, ...p.tool_axis, p.tilt_deg, p.shift_mm].join(","),
  );
  const head = `# ${path.model}, verdict ${path.verdict}, part frame. ${path.notice}`;
  return `${[head, COLUMNS.join(","), ...rows].join("\n")}\n`;
}
