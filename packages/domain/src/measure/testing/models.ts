import { type JointType, parseSeamModel, type SeamModel } from "../../schemas/seam-model.ts";
import type { ScanCloud } from "../scan-cloud.ts";

type Vector = readonly [number, number, number];

interface Place {
  readonly point: Vector;
  readonly tangent: Vector;
  readonly lateral: Vector;
  readonly normal: Vector;
}

function modelOf(length_mm: number, step_mm: number, at: (s: number) => Place, more: object = {}): SeamModel {
  const count = Math.round(length_mm / step_mm) + 1;
  const parsed = parseSeamModel({
    case: "test",
    joint_type: "fillet_t" satisfies JointType,
    seam: {
      length_mm,
      vertices: Array.from({ length: count }, (_, i) => ({ station_mm: i * step_mm, ...at(i * step_mm) })),
    },
    section: { plate_a: { thickness_mm: 10 }, plate_b: { thickness_mm: 6, height_mm: 60 }, gap_mm: 0 },
    ...more,
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

/** A T joint along x, the upright toward +y. */
export const straightModel = (length_mm: number, step_mm: number, more: object = {}): SeamModel =>
  modelOf(
    length_mm,
    step_mm,
    (s) => ({ point: [s, 0, 0], tangent: [1, 0, 0], lateral: [0, 1, 0], normal: [0, 0, 1] }),
    more,
  );

/** A T joint along an arc about the z axis, the upright inside. */
export const arcModel = (radius_mm: number, length_mm: number, step_mm: number): SeamModel =>
  modelOf(length_mm, step_mm, (s) => {
    const [c, d] = [Math.cos(s / radius_mm), Math.sin(s / radius_mm)];
    return {
      point: [radius_mm * c, radius_mm * d, 0],
      tangent: [-d, c, 0],
      lateral: [-c, -d, 0],
      normal: [0, 0, 1],
    };
  });

/** The same all round: a closed circle whose end joins its start. */
export function circleModel(radius_mm: number, stations: number): SeamModel {
  const length_mm = 2 * Math.PI * radius_mm;
  const open = arcModel(radius_mm, length_mm, length_mm / stations);
  const parsed = parseSeamModel({
    ...open,
    seam: { ...open.seam, closed: true, vertices: open.seam.vertices.slice(0, stations) },
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}

/** Points as a cloud. */
export function cloudOf(points: readonly Vector[], profiles: readonly number[] | null = null): ScanCloud {
  return {
    xyz_mm: Float64Array.from(points.flat()),
    count: points.length,
    profiles: profiles && Int32Array.from(profiles),
    lost: 0,
  };
}

/** A little noise that is the same every time. */
const ripple = (a: number, b: number) => 0.02 * Math.sin(12.9898 * a + 78.233 * b);

/**
 * A clean scan of the straight T joint: one profile a millimetre, the upright off by `lateral_mm`.
 * @param only leave one plate out
 */
export function scanOfT(
  length_mm: number,
  options: { readonly lateral_mm?: (x: number) => number; readonly only?: "a" | "b" } = {},
): ScanCloud {
  const points: Vector[] = [];
  const profiles: number[] = [];
  for (let x = 0; x <= length_mm; x++) {
    const y = options.lateral_mm?.(x) ?? 0;
    for (let d = 0.3; d <= 15; d += 0.15) {
      if (options.only !== "b") points.push([x, y - d, ripple(x, d)]);
      if (options.only !== "a") points.push([x, y + ripple(d, x), d]);
    }
    while (profiles.length < points.length) profiles.push(x);
  }
  return cloudOf(points, profiles);
}
