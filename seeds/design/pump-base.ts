import { openCorner, type ProductDesign, type SeamDesign, tJoint, vButt } from "./product.ts";
import { seamLine, straight } from "./seam-line.ts";

/*
 * Plan of the pump base, mm, z up from the underside of the deck (1000 x 600 x 10, two plates joined at x = 500):
 * skirts under the long edges, a ring of tube 219.1 on the deck, two motor rails, two ribs.
 */
const DECK_MM = 10;
const A4 = { weld_size_mm: 4, quality_level: "C", procedure: "wps-fillet-a4" } as const;
const BUTT = { weld_size_mm: 10, quality_level: "B", procedure: "wps-v-butt" } as const;
const CORNER = { weld_size_mm: 8, quality_level: "C", procedure: "wps-open-corner" } as const;

/** Root edges of the deck's butt stand a root face above its underside. */
const BUTT_ROOT_Z_MM = 2;

function deckButts(): SeamDesign[] {
  return [
    vButt(
      { number: "S1", title: "Deck butt, near half", line: straight([500, 20, BUTT_ROOT_Z_MM], 90, 270) },
      DECK_MM,
      BUTT,
    ),
    vButt(
      { number: "S2", title: "Deck butt, far half", line: straight([500, 310, BUTT_ROOT_Z_MM], 90, 270) },
      DECK_MM,
      BUTT,
    ),
  ];
}

function skirts(): SeamDesign[] {
  const edges = [
    { number: "S3", title: "Near skirt, left run", at: [460, 0, 0], heading: 180 },
    { number: "S4", title: "Near skirt, right run", at: [940, 0, 0], heading: 180 },
    { number: "S5", title: "Far skirt, left run", at: [60, 600, 0], heading: 0 },
    { number: "S6", title: "Far skirt, right run", at: [540, 600, 0], heading: 0 },
  ] as const;
  return edges.map(({ number, title, at, heading }) =>
    openCorner({ number, title, line: straight(at, heading, 400) }, [DECK_MM, 8], CORNER),
  );
}

const RING_RADIUS_MM = 109.55;

/** Half of the ring from an angle on, counter-clockwise about its centre at (250, 300). */
function ringHalf(number: string, from_deg: number): SeamDesign {
  const from_rad = (from_deg * Math.PI) / 180;
  const start = {
    at_mm: [250 + RING_RADIUS_MM * Math.cos(from_rad), 300 + RING_RADIUS_MM * Math.sin(from_rad), DECK_MM],
    heading_deg: from_deg + 90,
  } as const;
  const line = seamLine(start, [{ left_deg: 150, radius_mm: RING_RADIUS_MM }]);
  return tJoint({ number, title: `Ring to deck from ${from_deg} degrees`, line }, [DECK_MM, 10, 50], A4);
}

function rails(): SeamDesign[] {
  const faces = [
    { number: "S9", title: "Motor rail 1, near side", at: [590, 180, DECK_MM], heading: 0 },
    { number: "S10", title: "Motor rail 1, far side", at: [870, 200, DECK_MM], heading: 180 },
    { number: "S11", title: "Motor rail 2, near side", at: [590, 400, DECK_MM], heading: 0 },
    { number: "S12", title: "Motor rail 2, far side", at: [870, 420, DECK_MM], heading: 180 },
  ] as const;
  return faces
    .map(({ number, title, at, heading }) =>
      tJoint({ number, title, line: straight(at, heading, 280) }, [DECK_MM, 20, 60], A4),
    )
    .map((seam) => ({ ...seam, ends_free: true }));
}

function ribs(): SeamDesign[] {
  return [
    tJoint(
      { number: "S13", title: "Far rib to deck", line: straight([530, 570, DECK_MM], 270, 140) },
      [DECK_MM, 8, 70],
      A4,
    ),
    tJoint(
      { number: "S14", title: "Near rib to deck", line: straight([530, 170, DECK_MM], 270, 140) },
      [DECK_MM, 8, 70],
      A4,
    ),
  ];
}

export const PUMP_BASE: ProductDesign = {
  ref: "drawing-pump-base",
  fields: { number: "PB-3140", revision: "A", title: "Pump base", status: "current" },
  program: "PUMP",
  seams: [...deckButts(), ...skirts(), ringHalf("S7", 15), ringHalf("S8", 195), ...rails(), ...ribs()],
};
