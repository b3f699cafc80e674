import type { Fault } from "../faults/fault.ts";

type Vector = readonly [number, number, number];

/** The nominal line as far as its geometry is checked. */
export interface NominalLine {
  readonly length_mm: number;
  readonly closed?: boolean | undefined;
  readonly vertices: readonly {
    readonly station_mm: number;
    readonly point: Vector;
    readonly tangent: Vector;
    readonly lateral: Vector;
    readonly normal: Vector;
  }[];
}

/** Files round to four to six decimals; a thousandth catches every real mistake and no rounding. */
const FRAME_TOLERANCE = 1e-3;

const dot = (a: Vector, b: Vector) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

const fault = (pointer: string, detail: string): Fault => ({ code: "model-invalid", pointer, detail });

function checkFrame(vertex: NominalLine["vertices"][number], index: number): Fault[] {
  const at = `/seam/vertices/${index}`;
  const axes = ["tangent", "lateral", "normal"] as const;
  const faults: Fault[] = [];
  for (const axis of axes) {
    const length = Math.sqrt(dot(vertex[axis], vertex[axis]));
    if (Math.abs(length - 1) > FRAME_TOLERANCE)
      faults.push(
        fault(`${at}/${axis}`, `${axis} has length ${length.toFixed(4)}; a unit vector is expected`),
      );
  }
  if (faults.length > 0) return faults;
  for (const [one, other] of [
    ["lateral", "tangent"],
    ["normal", "tangent"],
    ["normal", "lateral"],
  ] as const) {
    const cosine = dot(vertex[one], vertex[other]);
    if (Math.abs(cosine) > FRAME_TOLERANCE)
      faults.push(
        fault(`${at}/${one}`, `${one} is not square to ${other}: their product is ${cosine.toFixed(4)}`),
      );
  }
  return faults;
}

/** Chord against arc: a coarse polygon of a curve may be shorter than its stations say, never longer. */
function checkStep(line: NominalLine, index: number): Fault[] {
  const here = line.vertices[index];
  const before = line.vertices[index - 1];
  if (here === undefined || before === undefined) return [];
  const at = `/seam/vertices/${index}`;
  const step_mm = here.station_mm - before.station_mm;
  if (step_mm <= 0)
    return [
      fault(
        `${at}/station_mm`,
        `station ${here.station_mm} does not follow ${before.station_mm}; stations must grow`,
      ),
    ];
  const chord_mm = Math.hypot(
    here.point[0] - before.point[0],
    here.point[1] - before.point[1],
    here.point[2] - before.point[2],
  );
  if (chord_mm > step_mm * 1.01 + 0.01 || chord_mm < step_mm * 0.6 - 0.01)
    return [
      fault(
        `${at}/point`,
        `the point lies ${chord_mm.toFixed(3)} mm from the one before, but the stations are ${step_mm.toFixed(3)} mm apart`,
      ),
    ];
  return [];
}

/**
 * Every fault of a nominal line's geometry, each with its JSON pointer into the model.
 * Frames may be left-handed: a mirrored part has such frames, and its signs follow them.
 */
export function checkVertices(line: NominalLine): Fault[] {
  const faults = line.vertices.flatMap((vertex, index) => [
    ...checkFrame(vertex, index),
    ...checkStep(line, index),
  ]);
  const first = line.vertices[0];
  const last = line.vertices.at(-1);
  if (first !== undefined && last !== undefined) {
    const span_mm = last.station_mm - first.station_mm;
    if (span_mm > line.length_mm * 1.001 + 0.05)
      faults.push(
        fault("/seam/length_mm", `the stations span ${span_mm.toFixed(2)} mm, more than the length given`),
      );
  }
  return faults;
}
