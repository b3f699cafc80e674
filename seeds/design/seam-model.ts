import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { SENSORS } from "../simulate/sensor.ts";
import type { JointSizes, ProductDesign, SeamDesign } from "./product.ts";
import type { Vector } from "./seam-line.ts";

/** Stations of a nominal line stand this far apart; the last step may be shorter. */
export const STATION_STEP_MM = 5;

/** Reach of the outline beside the root, mm. */
const OUTLINE_MM = 40;
/** A last step shorter than this is left out. */
const SHORTEST_STEP_MM = 0.5;

const rounded = (value: number): number => Math.round(value * 1e6) / 1e6 + 0;
const roundedVector = ([x, y, z]: Vector): [number, number, number] => [rounded(x), rounded(y), rounded(z)];

/** Stations of a seam: every {@link STATION_STEP_MM} from its start, and its end. */
export function stationsOf(length_mm: number): number[] {
  const whole = Math.floor((length_mm - SHORTEST_STEP_MM) / STATION_STEP_MM);
  return [...Array.from({ length: whole + 1 }, (_, i) => i * STATION_STEP_MM), length_mm];
}

type Polyline = [number, number][];

function outlineOf(sizes: JointSizes): { plate_a: Polyline; plate_b: Polyline } {
  const { plate_a_mm, plate_b_mm, height_mm, gap_mm, groove_deg, root_face_mm } = sizes;
  const half_mm = gap_mm / 2;
  const depth_mm = plate_a_mm - root_face_mm;
  const open_mm = half_mm + depth_mm * Math.tan((groove_deg * Math.PI) / 360);
  switch (sizes.joint) {
    case "fillet_t":
      return {
        plate_a: [
          [-OUTLINE_MM, 0],
          [0, 0],
        ],
        plate_b: [
          [0, 0],
          [0, height_mm],
        ],
      };
    case "lap":
      return {
        plate_a: [
          [-OUTLINE_MM, 0],
          [0, 0],
        ],
        plate_b: [
          [0, 0],
          [0, plate_b_mm],
          [OUTLINE_MM, plate_b_mm],
        ],
      };
    case "corner_open":
      return {
        plate_a: [
          [-OUTLINE_MM, plate_a_mm],
          [0, plate_a_mm],
          [0, 0],
        ],
        plate_b: [
          [0, 0],
          [plate_b_mm, 0],
          [plate_b_mm, -OUTLINE_MM],
        ],
      };
    case "butt_v":
      return {
        plate_a: [
          [-OUTLINE_MM, depth_mm],
          [-open_mm, depth_mm],
          [-half_mm, 0],
          [-half_mm, -root_face_mm],
        ],
        plate_b: [
          [half_mm, -root_face_mm],
          [half_mm, 0],
          [open_mm, depth_mm],
          [OUTLINE_MM, depth_mm],
        ],
      };
  }
}

function sectionOf(sizes: JointSizes): SeamModel["section"] {
  const { joint, plate_a_mm, plate_b_mm, height_mm, gap_mm, groove_deg, root_face_mm } = sizes;
  const butt = joint === "butt_v";
  return {
    plate_a: { thickness_mm: plate_a_mm },
    plate_b: { thickness_mm: plate_b_mm, ...(joint === "fillet_t" ? { height_mm } : {}) },
    nominal_profile: outlineOf(sizes),
    gap_mm,
    mismatch_mm: butt ? 0 : null,
    included_angle_deg: butt ? groove_deg : 90,
    ...(butt
      ? { root_face_mm, groove_angle_deg: groove_deg, root_depth_below_surface_mm: plate_a_mm - root_face_mm }
      : {}),
  };
}

/** The seam's model as the product's files hold it (docs: layout of a model). */
export function seamModel(product: ProductDesign, seam: SeamDesign): SeamModel {
  const { number, revision } = product.fields;
  const { length_mm, frameAt } = seam.line;
  const stations_mm = stationsOf(length_mm);
  const sensor = SENSORS[seam.joint];
  return {
    case: `${number}-${revision}-${seam.number}`,
    title: seam.title,
    units: { length: "mm", angle: "deg" },
    joint_type: seam.joint,
    seam: {
      length_mm: rounded(length_mm),
      closed: false,
      vertices: stations_mm.map((station_mm) => {
        const frame = frameAt(station_mm);
        return {
          station_mm: rounded(station_mm),
          point: roundedVector(frame.point),
          tangent: roundedVector(frame.tangent),
          lateral: roundedVector(frame.lateral),
          normal: roundedVector(frame.normal),
        };
      }),
    },
    section: sectionOf(seam),
    scanner: {
      points_per_profile: sensor.points,
      field_of_view_mm: sensor.field_of_view_mm,
      range_mm: [-sensor.range_mm, sensor.range_mm],
      working_distance_mm: sensor.working_distance_mm,
      view_angle_deg: sensor.view_deg,
    },
    profile_count: stations_mm.length,
    profile_pitch_mm: STATION_STEP_MM,
    limits: seam.limits,
  };
}
