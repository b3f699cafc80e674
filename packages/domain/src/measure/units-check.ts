import type { SeamModel } from "../schemas/seam-model.ts";
import type { JointFaces } from "./joints/joint-faces.ts";
import type { ScanCloud } from "./scan-cloud.ts";
import { lineFrames } from "./seam/seam-frames.ts";
import { sectionPoints } from "./seam/section-points.ts";

/** What lengths are mistaken by: inches or metres taken for mm, and the other way round. */
const MISTAKES = [
  { factor: 25.4, unit: "in" },
  { factor: 1 / 25.4, unit: "mm (it was declared as in)" },
  { factor: 1000, unit: "m" },
  { factor: 0.001, unit: "mm (it was declared as m)" },
] as const;

/** Points asked. */
const ASKED = 3000;

/** A point this near to a face of the model speaks for the unit, mm. */
const NEAR_MM = 6;

/** The scan fits in another unit when this share of it lies at the joint and along this share of the seam… */
const FITS_SHARE = 0.5;
const FITS_LENGTH = 0.6;
/** …and in its own unit it reaches along less than this. */
const MISFITS_LENGTH = 0.3;

function thinned(cloud: ScanCloud, factor: number): ScanCloud {
  const every = Math.max(1, Math.floor(cloud.count / ASKED));
  const count = Math.floor(cloud.count / every);
  const xyz_mm = new Float64Array(3 * count);
  for (let k = 0; k < count; k++)
    for (let axis = 0; axis < 3; axis++) xyz_mm[3 * k + axis] = factor * cloud.xyz_mm[3 * k * every + axis]!;
  return { xyz_mm, count, profiles: null, lost: 0 };
}

function distanceToFaces(joint: JointFaces, l: number, n: number): number {
  return joint.faces.reduce((least, face) => {
    const [dl, dn] = [Math.cos(face.direction_rad), Math.sin(face.direction_rad)];
    const t = (l - face.near[0]) * dl + (n - face.near[1]) * dn;
    const on = Math.max(0, Math.min(face.length_mm, t));
    return Math.min(least, Math.hypot(l - face.near[0] - on * dl, n - face.near[1] - on * dn));
  }, Number.POSITIVE_INFINITY);
}

/** Share of the points at the joint, and share of the seam that those lie along. */
function reachOf(model: SeamModel, joint: JointFaces, cloud: ScanCloud) {
  const points = sectionPoints(lineFrames(model), cloud);
  let [near, least, most] = [0, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (let k = 0; k < points.count; k++) {
    if (distanceToFaces(joint, points.l_mm[k]!, points.n_mm[k]!) > NEAR_MM) continue;
    near += 1;
    least = Math.min(least, points.s_mm[k]!);
    most = Math.max(most, points.s_mm[k]!);
  }
  return {
    share: cloud.count > 0 ? near / cloud.count : 0,
    length: near > 0 ? (most - least) / model.seam.length_mm : 0,
  };
}

/**
 * Whether a scan would fit its model if it were in another unit than declared, though it does not as it is.
 * @returns a sentence for the person who declared it; null where nothing speaks for another unit
 */
export function unitMistake(model: SeamModel, joint: JointFaces, cloud: ScanCloud): string | null {
  const own = reachOf(model, joint, thinned(cloud, 1));
  if (own.share >= FITS_SHARE && own.length >= MISFITS_LENGTH) return null;
  for (const { factor, unit } of MISTAKES) {
    const other = reachOf(model, joint, thinned(cloud, factor));
    if (other.share >= FITS_SHARE && other.length >= FITS_LENGTH && own.length < MISFITS_LENGTH)
      return `as declared the scan reaches along ${Math.round(100 * own.length)} % of the seam; read as ${unit} it fits the model along ${Math.min(100, Math.round(100 * other.length))} % of it`;
  }
  return null;
}
