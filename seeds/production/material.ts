import type { Ref } from "../demo-event.ts";
import { LADDER_BRACKET } from "../design/brackets.ts";
import { PUMP_BASE } from "../design/pump-base.ts";
import { DOUBTFUL_LOT, QUARANTINED_LOT } from "../shop/lot-list.ts";
import type { PartPlan } from "./part-plan.ts";

/** A piece of a part and the heat it was cut from. */
export interface PlannedPiece {
  readonly position: string;
  readonly lot: Ref;
}

/** The heat in use at a place in the series: the last whose first place is reached. */
function heatAt(place: number, heats: readonly (readonly [from: number, lot: Ref])[]): Ref {
  const found = heats.findLast(([from]) => place >= from);
  if (found === undefined) throw new RangeError(`place: expected a heat in use at ${place}`);
  return found[1];
}

function skidPieces(place: number): PlannedPiece[] {
  const webs = heatAt(place, [
    [0, "lot-H48812"],
    [3, DOUBTFUL_LOT],
    [7, "lot-H49120"],
  ]);
  return [
    {
      position: "Base plate",
      lot: heatAt(place, [
        [0, "lot-H50217"],
        [8, "lot-H50388"],
      ]),
    },
    { position: "Left web", lot: webs },
    { position: "Right web", lot: webs },
    {
      position: "Cross webs",
      lot: heatAt(place, [
        [0, "lot-H48812"],
        [7, "lot-H49120"],
        [9, QUARANTINED_LOT],
        [10, "lot-H49120"],
      ]),
    },
    {
      position: "Machine pads",
      lot: heatAt(place, [
        [0, "lot-H47120"],
        [8, "lot-H47391"],
      ]),
    },
    { position: "Lifting lugs", lot: "lot-H60233" },
  ];
}

function pumpBasePieces(place: number): PlannedPiece[] {
  const deck = heatAt(place, [
    [0, "lot-H49544"],
    [5, "lot-H49561"],
    [10, "lot-H49730"],
  ]);
  // The left half of one deck was the last of its heat; its right half came from the next.
  const left = place === 5 ? "lot-H49544" : deck;
  const plate_8 = heatAt(place, [
    [0, "lot-H47120"],
    [7, "lot-H47391"],
  ]);
  return [
    { position: "Deck, left half", lot: left },
    { position: "Deck, right half", lot: deck },
    { position: "Skirts", lot: plate_8 },
    {
      position: "Ring",
      lot: heatAt(place, [
        [0, "lot-T7718"],
        [7, "lot-T7725"],
      ]),
    },
    { position: "Motor rails", lot: "lot-F33107" },
    { position: "Ribs", lot: plate_8 },
  ];
}

function bracketPieces(place: number): PlannedPiece[] {
  return [
    {
      position: "Back plate",
      lot: heatAt(place, [
        [0, "lot-H48812"],
        [6, "lot-H49120"],
      ]),
    },
    {
      position: "Arms",
      lot: heatAt(place, [
        [0, "lot-H48812"],
        [2, DOUBTFUL_LOT],
        [5, "lot-H48812"],
        [7, "lot-H49120"],
      ]),
    },
    { position: "Doubler", lot: "lot-H46008" },
  ];
}

/** What is built into a part. */
export function piecesOf({ product, place }: PartPlan): PlannedPiece[] {
  if (product === PUMP_BASE) return pumpBasePieces(place);
  return product === LADDER_BRACKET ? bracketPieces(place) : skidPieces(place);
}
