import type { LotPatch } from "@beadroll/domain/schemas/lot";
import { type Calendar, dayOf, instantOf } from "../calendar.ts";
import type { PlannedEvent, Ref } from "../demo-event.ts";
import { certificatePdf, issuerOf } from "./certificates.ts";
import { LOTS, QUARANTINED_LOT, type ShopLot } from "./lot-list.ts";

const GOODS_IN = "y.demir";
const QUALITY = "s.kowal";
const HOUR_MS = 3_600_000;

/** Working hour at which the laminated heat was put aside. */
export const QUARANTINE_HOUR = 171;

/** Lots come in, get their certificate and are released; one is put aside later. */
export function lotEvents(calendar: Calendar): PlannedEvent[] {
  const events = LOTS.flatMap((lot, i) => receipt(lot, calendar, i));
  const quarantined_ms = calendar.at(QUARANTINE_HOUR);
  const quarantine = lotDecision(QUARANTINED_LOT, quarantined_ms, {
    state: "quarantined",
    note: "Lamination seen on two cut edges. Nothing more to be cut from this heat until ultrasonic examination is done.",
  });
  return [...events, quarantine];
}

/** A decision about a lot by the quality lead. */
export function lotDecision(lot: Ref, at_ms: number, fields: LotPatch): PlannedEvent {
  return { at_ms, make: () => ({ kind: "lot-state", at: instantOf(at_ms), by: QUALITY, lot, fields }) };
}

function receipt(lot: ShopLot, calendar: Calendar, place: number): PlannedEvent[] {
  // What is there before work begins was unloaded one lot after another on the day before.
  const came_ms =
    lot.received_hour === 0
      ? calendar.at(0) - 24 * HOUR_MS + place * 240_000
      : calendar.at(lot.received_hour);
  const filed_ms = came_ms + 1.2 * HOUR_MS;
  const { ref, certificate } = lot;
  const issued_on = dayOf(came_ms, -11);
  return [
    {
      at_ms: came_ms,
      make: () => ({
        kind: "lot",
        at: instantOf(came_ms),
        by: GOODS_IN,
        ref,
        fields: {
          kind: lot.kind,
          number: lot.number,
          supplier: lot.supplier,
          grade: lot.grade,
          dimension: lot.dimension,
          thickness_mm: lot.thickness_mm,
          quantity: lot.quantity,
          unit: lot.unit,
          received_on: dayOf(came_ms),
        },
      }),
    },
    {
      at_ms: filed_ms,
      make: () => ({
        kind: "certificate",
        at: instantOf(filed_ms),
        by: QUALITY,
        lot: ref,
        fields: { ...certificate, issuer: issuerOf(lot), issued_on },
        file: { name: `${certificate.number}.pdf`, bytes: certificatePdf(lot, issued_on) },
      }),
    },
    lotDecision(ref, filed_ms + 0.3 * HOUR_MS, { state: "released" }),
  ];
}
