import { type Calendar, instantOf } from "../calendar.ts";
import type { PlannedEvent } from "../demo-event.ts";
import { PROCEDURES, type ShopProcedure } from "../shop/procedures.ts";
import { LADDER_BRACKET, TANK_SUPPORT } from "./brackets.ts";
import type { ProductDesign, SeamDesign } from "./product.ts";
import { PUMP_BASE } from "./pump-base.ts";
import { seamModel } from "./seam-model.ts";
import { SKID_FRAME, SKID_FRAME_BEFORE } from "./skid-frame.ts";

const COORDINATOR = "h.oyelaran";
const HOUR_MS = 3_600_000;

/** Drawings of the scenario: three in force, one superseded, one not yet in force. */
export const DRAWINGS: readonly ProductDesign[] = [
  SKID_FRAME_BEFORE,
  SKID_FRAME,
  PUMP_BASE,
  LADDER_BRACKET,
  TANK_SUPPORT,
];

/** Procedures with their approval, and drawings with their model seams, recorded one after another before work begins. */
export function designEvents(calendar: Calendar): PlannedEvent[] {
  const start_ms = calendar.at(0) - 22 * HOUR_MS;
  let step = 0;
  const next = () => {
    step += 1;
    return start_ms + step * 140_000;
  };
  return [
    ...PROCEDURES.flatMap((procedure) => procedureEvents(procedure, next)),
    ...DRAWINGS.flatMap((product) => drawingEvents(product, next)),
  ];
}

function procedureEvents({ ref, status, fields }: ShopProcedure, next: () => number): PlannedEvent[] {
  const made_ms = next();
  const made: PlannedEvent = {
    at_ms: made_ms,
    make: () => ({ kind: "procedure", at: instantOf(made_ms), by: COORDINATOR, ref, fields }),
  };
  if (status === "draft") return [made];
  const decided_ms = next();
  const decided: PlannedEvent = {
    at_ms: decided_ms,
    make: () => ({
      kind: "procedure-approval",
      at: instantOf(decided_ms),
      by: COORDINATOR,
      procedure: ref,
      fields: { status },
    }),
  };
  return [made, decided];
}

function drawingEvents(product: ProductDesign, next: () => number): PlannedEvent[] {
  const made_ms = next();
  return [
    {
      at_ms: made_ms,
      make: () => ({
        kind: "drawing",
        at: instantOf(made_ms),
        by: COORDINATOR,
        ref: product.ref,
        fields: product.fields,
      }),
    },
    ...product.seams.map((seam, i) => modelSeamEvent(product, seam, i + 1, next())),
  ];
}

function modelSeamEvent(
  product: ProductDesign,
  seam: SeamDesign,
  sequence: number,
  at_ms: number,
): PlannedEvent {
  const { number, weld_size_mm, quality_level, procedure } = seam;
  return {
    at_ms,
    make: () => ({
      kind: "model-seam",
      at: instantOf(at_ms),
      by: COORDINATOR,
      drawing: product.ref,
      procedure,
      fields: {
        number,
        sequence,
        weld_size_mm,
        quality_level,
        scan_rule: "always",
        model: seamModel(product, seam),
      },
    }),
  };
}
