import { lapJoint, type ProductDesign, type SeamDesign, tJoint } from "./product.ts";
import { seamLine, straight, type Vector } from "./seam-line.ts";

const A4 = { weld_size_mm: 4, quality_level: "C", procedure: "wps-fillet-a4" } as const;
const SADDLE = { weld_size_mm: 6, quality_level: "B", procedure: "wps-saddle-fillet" } as const;

/** Two arms and a foot cleat stand on the back plate (400 x 260 x 10). */
function arms(): SeamDesign[] {
  const faces = [
    { number: "S1", title: "Arm 1, near side", at: [40, 60, 0], heading: 0, length_mm: 160 },
    { number: "S2", title: "Arm 1, far side", at: [200, 70, 0], heading: 180, length_mm: 160 },
    { number: "S3", title: "Arm 2, near side", at: [40, 190, 0], heading: 0, length_mm: 160 },
    { number: "S4", title: "Arm 2, far side", at: [200, 200, 0], heading: 180, length_mm: 160 },
    { number: "S7", title: "Foot cleat, near side", at: [380, 190, 0], heading: 270, length_mm: 120 },
    { number: "S8", title: "Foot cleat, far side", at: [390, 70, 0], heading: 90, length_mm: 120 },
  ] as const;
  return faces.map(({ number, title, at, heading, length_mm }) =>
    tJoint({ number, title, line: straight(at, heading, length_mm) }, [10, 10, 60], A4),
  );
}

/** A doubler of 120 x 100 with corners of radius 15, welded in two L-shaped halves. */
function doubler(): SeamDesign[] {
  const half = [{ straight_mm: 90 }, { left_deg: 90, radius_mm: 15 }, { straight_mm: 70 }];
  const starts: readonly { number: string; title: string; at_mm: Vector; heading_deg: number }[] = [
    { number: "S5", title: "Doubler, first half", at_mm: [250, 80, 0], heading_deg: 0 },
    { number: "S6", title: "Doubler, second half", at_mm: [340, 180, 0], heading_deg: 180 },
  ];
  return starts.map(({ number, title, at_mm, heading_deg }) =>
    lapJoint({ number, title, line: seamLine({ at_mm, heading_deg }, half) }, [10, 6], A4),
  );
}

const bySeamNumber = (one: SeamDesign, other: SeamDesign) =>
  Number(one.number.slice(1)) - Number(other.number.slice(1));

export const LADDER_BRACKET: ProductDesign = {
  ref: "drawing-ladder-bracket",
  fields: { number: "LB-1175", revision: "A", title: "Ladder bracket", status: "current" },
  program: "LADDER",
  seams: [...arms(), ...doubler()].toSorted(bySeamNumber),
};

/** Saddle ribs bent to a tank's radius; still on the drawing board, no part is made to it. */
function saddleSeams(): SeamDesign[] {
  return [-125, -55].flatMap((from_deg, i) => {
    const from_rad = (from_deg * Math.PI) / 180;
    const radius_mm = 320;
    const at_mm: Vector = [400 + radius_mm * Math.cos(from_rad), 360 + radius_mm * Math.sin(from_rad), 0];
    const line = seamLine({ at_mm, heading_deg: from_deg + 90 }, [{ left_deg: 60, radius_mm }]);
    return tJoint(
      { number: `S${i + 1}`, title: `Saddle rib ${i + 1} to sole plate`, line },
      [16, 12, 90],
      SADDLE,
    );
  });
}

export const TANK_SUPPORT: ProductDesign = {
  ref: "drawing-tank-support",
  fields: { number: "TS-4052", revision: "A", title: "Tank support", status: "draft" },
  program: "TANK",
  seams: [
    ...saddleSeams(),
    tJoint(
      { number: "S3", title: "Gusset, near side", line: straight([120, 420, 0], 0, 200) },
      [16, 10, 90],
      SADDLE,
    ),
    tJoint(
      { number: "S4", title: "Gusset, far side", line: straight([320, 430, 0], 180, 200) },
      [16, 10, 90],
      SADDLE,
    ),
  ],
};
