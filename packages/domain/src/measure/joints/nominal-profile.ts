import type { SeamModel } from "../../schemas/seam-model.ts";

/** A point of a cross-section: lateral and normal, mm. */
export type SectionPoint = readonly [l_mm: number, n_mm: number];

/** The visible faces of both plates as polylines: plate A's ends at the root, plate B's begins there. */
export interface NominalProfile {
  readonly plate_a: readonly SectionPoint[];
  readonly plate_b: readonly SectionPoint[];
}

/** Plates whose size across the seam is not given are drawn this wide, mm. */
const WIDE_MM = 40;

const RAD = Math.PI / 180;

type Section = SeamModel["section"];

/** How far below its surface a butt joint's root edges lie: thickness less root face where nothing is given. */
function rootDepth(section: Section): number {
  return (
    section.root_depth_below_surface_mm ??
    Math.max(0, section.plate_a.thickness_mm - (section.root_face_mm ?? 0))
  );
}

/** One plate of a butt joint, from far to root, for the left side; angles from the vertical. */
function buttPlate(
  half_gap_mm: number,
  depth_mm: number,
  bevel_deg: number,
  face_mm: number,
): SectionPoint[] {
  const run_mm = depth_mm * Math.tan(bevel_deg * RAD);
  const top: SectionPoint[] = [
    [-half_gap_mm - run_mm - WIDE_MM, depth_mm],
    [-half_gap_mm - run_mm, depth_mm],
  ];
  const edge: SectionPoint = [-half_gap_mm, 0];
  const foot: SectionPoint[] = face_mm > 0 ? [[-half_gap_mm, -face_mm]] : [];
  return depth_mm > 0 ? [...top, edge, ...foot] : [...top, ...foot];
}

const mirrored = (points: readonly SectionPoint[]): SectionPoint[] =>
  points.map(([l, n]): SectionPoint => [-l, n]).reverse();

function buttProfile(section: Section, bevel_a_deg: number, bevel_b_deg: number): NominalProfile {
  const half_mm = (section.gap_mm ?? 0) / 2;
  const depth_mm = rootDepth(section);
  const face_mm = section.root_face_mm ?? 0;
  return {
    plate_a: buttPlate(half_mm, depth_mm, bevel_a_deg, face_mm),
    plate_b: mirrored(buttPlate(half_mm, depth_mm, bevel_b_deg, face_mm)),
  };
}

/** Plate B standing on plate A's surface, at the included angle. */
function standing(section: Section, height_mm: number): NominalProfile {
  const angle = (180 - (section.included_angle_deg ?? 90)) * RAD;
  const gap_mm = section.gap_mm ?? 0;
  const along = (by: number): SectionPoint => [by * Math.cos(angle), by * Math.sin(angle)];
  return {
    plate_a: [
      [-WIDE_MM, 0],
      [0, 0],
    ],
    plate_b: [along(gap_mm), along(gap_mm + height_mm)],
  };
}

/**
 * The visible faces of the nominal joint: the model's own, or worked out from its sizes. Definitions with pictures
 * stand in docs/measuring.md.
 */
export function nominalProfile(model: SeamModel): NominalProfile {
  const { section, joint_type } = model;
  if (section.nominal_profile) return section.nominal_profile;
  const { plate_a, plate_b } = section;
  switch (joint_type) {
    case "fillet_t":
    case "corner_closed":
      return standing(section, plate_b.height_mm ?? WIDE_MM);
    case "lap": {
      const top_mm = (section.gap_mm ?? 0) + plate_b.thickness_mm;
      const { plate_a: surface, plate_b: edge } = standing(section, plate_b.thickness_mm);
      return { plate_a: surface, plate_b: [...edge, [WIDE_MM, top_mm]] };
    }
    case "corner_open": {
      const gap_mm = section.gap_mm ?? 0;
      const top_mm = gap_mm + plate_a.thickness_mm;
      return {
        plate_a: [
          [-WIDE_MM, top_mm],
          [0, top_mm],
          [0, gap_mm],
        ],
        plate_b: [
          [0, 0],
          [plate_b.thickness_mm, 0],
          [plate_b.thickness_mm, -WIDE_MM],
        ],
      };
    }
    case "butt_v": {
      const half_deg = (section.groove_angle_deg ?? section.included_angle_deg ?? 60) / 2;
      return buttProfile(section, half_deg, half_deg);
    }
    case "butt_half_v":
      return buttProfile(section, 0, section.groove_angle_deg ?? section.included_angle_deg ?? 45);
    case "butt_square":
      return buttProfile({ root_depth_below_surface_mm: 0, ...section }, 0, 0);
  }
}
