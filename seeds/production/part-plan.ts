import type { Ref } from "../demo-event.ts";
import { LADDER_BRACKET } from "../design/brackets.ts";
import type { ProductDesign } from "../design/product.ts";
import { PUMP_BASE } from "../design/pump-base.ts";
import { SKID_FRAME } from "../design/skid-frame.ts";
import type { PassTrouble } from "../simulate/pass-log.ts";

/** Why a joint cannot be welded as it stands. */
export type Misfit = "gap" | "offset" | "mismatch" | "blind";

/** A part of the scenario and how far it has come; counts are of seams in welding sequence. */
export interface PartPlan {
  readonly ref: Ref;
  readonly serial: string;
  readonly product: ProductDesign;
  /** Place among the parts of its product, from 0: decides which heats went in. */
  readonly place: number;
  readonly order_no: string;
  readonly parent: Ref | null;
  readonly scanned: number;
  readonly welded: number;
  readonly inspected: number;
  /** Seams that are held to this day. */
  readonly held: Readonly<Record<string, Misfit>>;
  /** Seams that were held, fitted again, scanned again and then welded. */
  readonly refitted: Readonly<Record<string, Misfit>>;
  /** Seams that an inspection rejected, with what was seen. */
  readonly rejected: Readonly<Record<string, string>>;
  readonly troubles: Readonly<Record<string, PassTrouble>>;
}

type Progress = Pick<PartPlan, "scanned" | "welded" | "inspected">;
type Story = Partial<Pick<PartPlan, "held" | "refitted" | "rejected" | "troubles">> & Partial<Progress>;

const slow = (factor: number): PassTrouble => ({ kind: "slow", factor });
const restart = (at: number, off_s: number): PassTrouble => ({ kind: "restart", at, off_s });

/** What is not simply scanned, welded and accepted; everything else is. Keyed by serial. */
const STORIES: Readonly<Record<string, Story>> = {
  "0411": { refitted: { S13: "offset" }, troubles: { S5: restart(0.42, 1.8) } },
  "0412": {
    rejected: { S9: "Continuous undercut (5011) 0.9 mm over 60 mm from station 210." },
    troubles: { S4: { kind: "unsteady" } },
  },
  "0413": { refitted: { S2: "gap" }, troubles: { S7: slow(0.66) } },
  "0414": { held: { S11: "gap" }, troubles: { S17: { kind: "gas-low" }, S18: { kind: "gas-low" } } },
  "0415": { rejected: { S3: "End crater pipe (2025) 2 mm at the stop, surface pores (2017) beside it." } },
  "0416": { refitted: { S10: "offset" }, troubles: { S8: { kind: "spool-change", at: 0.55, off_s: 166 } } },
  "0417": {
    rejected: { S16: "Throat 3.9 to 4.2 mm through the corner, 5 required (5213)." },
    troubles: { S9: restart(0.7, 1.3) },
  },
  "0418": { held: { S4: "offset" }, refitted: { S15: "gap" } },
  "0419": {
    refitted: { S6: "blind" },
    rejected: { S12: "Poor restart (517) with a 1.5 mm step at station 160." },
  },
  "0420": { held: { S14: "offset" }, inspected: 13 },
  "0421": { held: { S5: "gap", S15: "offset" }, inspected: 0, troubles: { S10: slow(0.68) } },
  "0422": { held: { S2: "blind", S9: "offset" }, inspected: 0, troubles: { S12: { kind: "unsteady" } } },
  "0423": {
    held: { S6: "gap", S13: "offset", S18: "gap" },
    refitted: { S1: "offset" },
    inspected: 0,
    troubles: { S14: restart(0.5, 2.4) },
  },
  "0424": { held: { S8: "offset", S16: "gap" }, welded: 3 },
  "0425": { held: { S3: "blind", S7: "gap" }, scanned: 10, welded: 0 },
  "0426": { scanned: 0 },
  "0703": { troubles: { S3: restart(0.35, 1.6) } },
  "0704": { refitted: { S4: "gap" } },
  "0705": { rejected: { S1: "Lack of side wall fusion (4011), 22 mm long at station 140, depth 6 mm." } },
  "0706": { refitted: { S7: "offset" }, troubles: { S14: { kind: "gas-low" } } },
  "0707": { rejected: { S8: "Overlap (506) on the ring over 40 mm, intermittent undercut (5012) 0.6 mm." } },
  "0708": { held: { S8: "offset" }, troubles: { S11: { kind: "unsteady" } } },
  "0709": { refitted: { S1: "mismatch" }, troubles: { S4: slow(0.66) } },
  "0710": {
    rejected: { S6: "Incompletely filled groove (511), 1.4 mm low over 90 mm." },
    troubles: { S12: restart(0.6, 1.1) },
  },
  "0711": { held: { S3: "gap", S7: "offset" }, inspected: 4, troubles: { S9: slow(0.67) } },
  "0712": { held: { S2: "mismatch", S10: "blind" }, inspected: 0 },
  "0713": { held: { S6: "gap", S12: "offset" }, welded: 2 },
  "0714": { held: { S4: "gap" }, scanned: 6, welded: 0 },
  "0715": { scanned: 0 },
  "1134": { refitted: { S3: "gap" } },
  "1136": { rejected: { S2: "Surface pores (2017) up to 1.8 mm over the last 30 mm." } },
  "1138": { troubles: { S1: restart(0.48, 1.5) } },
  "1140": { held: { S5: "offset" }, inspected: 0 },
  "1141": { held: { S2: "offset" }, inspected: 0 },
  "1142": { welded: 0 },
};

function planOf(product: ProductDesign, first: number, place: number): PartPlan {
  const serial = String(first + place).padStart(4, "0");
  const { scanned = product.seams.length, ...story } = STORIES[serial] ?? {};
  const { welded = scanned, ...events } = story;
  const { inspected = welded < scanned ? 0 : welded } = events;
  return {
    ref: `part-${serial}`,
    serial,
    product,
    place,
    order_no: orderOf(product, place),
    parent: product === LADDER_BRACKET ? `part-${String(FIRST_SKID + place).padStart(4, "0")}` : null,
    scanned,
    welded,
    inspected,
    held: events.held ?? {},
    refitted: events.refitted ?? {},
    rejected: events.rejected ?? {},
    troubles: events.troubles ?? {},
  };
}

const FIRST_SKID = 410;
const FIRST_PUMP_BASE = 702;
const FIRST_BRACKET = 1131;

/** Orders run over several parts; a bracket belongs to the order of the frame it is built into. */
function orderOf(product: ProductDesign, place: number): string {
  if (product === PUMP_BASE) return `41-${2231 + Math.floor(place / 5)}`;
  return `41-${2207 + Math.floor(place / 6)}`;
}

const many = (product: ProductDesign, first: number, count: number): PartPlan[] =>
  Array.from({ length: count }, (_, place) => planOf(product, first, place));

const SKIDS = many(SKID_FRAME, FIRST_SKID, 17);
const PUMP_BASES = many(PUMP_BASE, FIRST_PUMP_BASE, 14);
const BRACKETS = many(LADDER_BRACKET, FIRST_BRACKET, 12);

/** The parts of each cell in the order it works on them: frames in one, bases and brackets by turns in the other. */
export const CELL_PARTS: readonly { readonly cell: Ref; readonly parts: readonly PartPlan[] }[] = [
  { cell: "cell-1", parts: SKIDS },
  {
    cell: "cell-2",
    parts: PUMP_BASES.flatMap((base, i) => {
      const bracket = BRACKETS[i];
      return bracket === undefined ? [base] : [base, bracket];
    }),
  },
];

/** Every part of the scenario. */
export const PARTS: readonly PartPlan[] = CELL_PARTS.flatMap(({ parts }) => parts);
