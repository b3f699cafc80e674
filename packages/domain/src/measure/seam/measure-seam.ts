import type { SeamModel } from "../../schemas/seam-model.ts";
import { type JointFaces, jointFaces } from "../joints/joint-faces.ts";
import type { ScanCloud } from "../scan-cloud.ts";
import type { SliceOutcome } from "../section/measure-slice.ts";
import { measureSlices } from "./measure-slices.ts";
import { placeSeam } from "./place-seam.ts";
import { lineFrames } from "./seam-frames.ts";
import { sectionPoints } from "./section-points.ts";
import { type Slices, slicesOf } from "./slices.ts";

/** A scan cut into slices, each measured by itself. */
export interface MeasuredSeam {
  readonly joint: JointFaces;
  readonly slices: Slices;
  readonly outcomes: readonly SliceOutcome[];
  /** Points near no place of the seam. */
  readonly outside: number;
}

/** Cuts a scan into slices along the model's seam and measures the joint in each. */
export function measureSeam(model: SeamModel, cloud: ScanCloud): MeasuredSeam {
  const points = sectionPoints(lineFrames(model), cloud);
  const slices = slicesOf(points);
  const joint = jointFaces(model);
  const placed = placeSeam(slices, joint);
  const blind = (): SliceOutcome => ({ found: false, why: "plate_a_not_found" });
  const outcomes = placed
    ? measureSlices(slices, joint, placed)
    : Array.from({ length: slices.count }, blind);
  return { joint, slices, outcomes, outside: points.outside };
}
