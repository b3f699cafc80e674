import { lapJoint, type ProductDesign, type SeamDesign, tJoint } from "./product.ts";
import { seamLine, straight } from "./seam-line.ts";

/*
 * Plan of the skid frame, mm, z up from the base plate's surface (1500 x 700 x 12): two long webs with outer faces
 * at y = 100 and y = 600, three cross webs at x = 300, 750 and 1200, a machine pad in each bay, two lifting lugs.
 */
const A5 = { weld_size_mm: 5, quality_level: "C", procedure: "wps-fillet-a5" } as const;
const LUG = { ...A5, quality_level: "B" } as const;

const WEB = [12, 10, 120] as const;
const LUG_PLATES = [12, 20, 90] as const;
const PAD = [12, 8] as const;

const WEB_STARTS_MM = [60, 560, 1060] as const;
const WEB_RUN_MM = 380;
const CROSS_WEBS_MM = [300, 750, 1200] as const;

function longWebs(): SeamDesign[] {
  const left = WEB_STARTS_MM.map((x, i) =>
    tJoint(
      {
        number: `S${i + 1}`,
        title: `Left web to base, run ${i + 1}`,
        line: straight([x, 100, 0], 0, WEB_RUN_MM),
      },
      WEB,
      A5,
    ),
  );
  const right = WEB_STARTS_MM.toReversed().map((x, i) =>
    tJoint(
      {
        number: `S${i + 4}`,
        title: `Right web to base, run ${i + 1}`,
        line: straight([x + WEB_RUN_MM, 600, 0], 180, WEB_RUN_MM),
      },
      WEB,
      A5,
    ),
  );
  return [...left, ...right];
}

function crossWebs(): SeamDesign[] {
  return CROSS_WEBS_MM.flatMap((x, i) => [
    tJoint(
      {
        number: `S${7 + 2 * i}`,
        title: `Cross web ${i + 1} to base, near side`,
        line: straight([x, 560, 0], 270, 420),
      },
      WEB,
      A5,
    ),
    tJoint(
      {
        number: `S${8 + 2 * i}`,
        title: `Cross web ${i + 1} to base, far side`,
        line: straight([x + 10, 140, 0], 90, 420),
      },
      WEB,
      A5,
    ),
  ]);
}

/** A pad of 220 x 160 with corners of radius 20 is welded in two L-shaped halves. */
function pads(): SeamDesign[] {
  const half = [{ straight_mm: 180 }, { left_deg: 90, radius_mm: 20 }, { straight_mm: 120 }];
  return [420, 870].flatMap((x, i) => [
    lapJoint(
      {
        number: `S${13 + 2 * i}`,
        title: `Machine pad ${i + 1}, first half`,
        line: seamLine({ at_mm: [x + 20, 270, 0], heading_deg: 0 }, half),
      },
      PAD,
      A5,
    ),
    lapJoint(
      {
        number: `S${14 + 2 * i}`,
        title: `Machine pad ${i + 1}, second half`,
        line: seamLine({ at_mm: [x + 200, 430, 0], heading_deg: 180 }, half),
      },
      PAD,
      A5,
    ),
  ]);
}

function lugs(): SeamDesign[] {
  return [
    tJoint(
      { number: "S17", title: "Left lifting lug", line: straight([670, 40, 0], 0, 160) },
      LUG_PLATES,
      LUG,
    ),
    tJoint(
      { number: "S18", title: "Right lifting lug", line: straight([830, 660, 0], 180, 160) },
      LUG_PLATES,
      LUG,
    ),
  ].map((seam) => ({ ...seam, ends_free: true }));
}

export const SKID_FRAME: ProductDesign = {
  ref: "drawing-skid-c",
  fields: { number: "FW-2210", revision: "C", title: "Skid frame", status: "current" },
  program: "SKID",
  seams: [...longWebs(), ...crossWebs(), ...pads(), ...lugs()],
};

/** The revision before: without machine pads, welded to the procedure's first revision; kept for the record. */
export const SKID_FRAME_BEFORE: ProductDesign = {
  ref: "drawing-skid-b",
  fields: { number: "FW-2210", revision: "B", title: "Skid frame", status: "superseded" },
  program: "SKID",
  seams: [...longWebs(), ...crossWebs()].map((seam) => ({ ...seam, procedure: "wps-fillet-a5-before" })),
};
