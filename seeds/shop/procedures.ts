import type { ProcedureCreate } from "@beadroll/domain/schemas/procedure";
import type { Ref } from "../demo-event.ts";

/** What the cell is set to, inside the procedure's ranges. */
export interface Settings {
  readonly current_a: number;
  readonly voltage_v: number;
  readonly wire_feed_m_min: number;
  readonly travel_mm_s: number;
  readonly gas_l_min: number;
}

export interface ShopProcedure {
  readonly ref: Ref;
  readonly status: "approved" | "draft" | "withdrawn";
  readonly fields: ProcedureCreate;
  readonly settings: Settings;
}

const range = (min: number, max: number) => ({ min, max });

const FILLET_A5: ShopProcedure = {
  ref: "wps-fillet-a5",
  status: "approved",
  fields: {
    number: "PB-135-07",
    revision: "2",
    title: "Fillet a5, plate 8 to 15, PB",
    process: "135",
    position: "PB",
    ranges: {
      current_a: range(220, 280),
      voltage_v: range(26, 30),
      wire_feed_m_min: range(7, 9.5),
      travel_mm_s: range(4.6, 6.5),
      gas_l_min: range(15, 20),
      heat_input_kj_mm: range(0.8, 1.4),
      interpass_c: null,
    },
  },
  settings: { current_a: 252, voltage_v: 27.9, wire_feed_m_min: 8.3, travel_mm_s: 5.4, gas_l_min: 17.5 },
};

const FILLET_A4: ShopProcedure = {
  ref: "wps-fillet-a4",
  status: "approved",
  fields: {
    number: "PB-138-03",
    revision: "1",
    title: "Fillet a4, metal-cored, plate 6 to 12, PB",
    process: "138",
    position: "PB",
    ranges: {
      current_a: range(205, 265),
      voltage_v: range(25, 29),
      wire_feed_m_min: range(8, 10.5),
      travel_mm_s: range(5.4, 7.5),
      gas_l_min: range(15, 20),
      heat_input_kj_mm: range(0.6, 1.1),
      interpass_c: null,
    },
  },
  settings: { current_a: 236, voltage_v: 27, wire_feed_m_min: 9.2, travel_mm_s: 6.4, gas_l_min: 17 },
};

const V_BUTT: ShopProcedure = {
  ref: "wps-v-butt",
  status: "approved",
  fields: {
    number: "PA-136-11",
    revision: "1",
    title: "V butt, plate 8 to 16, multi-run, PA",
    process: "136",
    position: "PA",
    ranges: {
      current_a: range(190, 255),
      voltage_v: range(24, 28.5),
      wire_feed_m_min: range(7.5, 10),
      travel_mm_s: range(4.2, 6),
      gas_l_min: range(16, 22),
      heat_input_kj_mm: range(0.7, 1.3),
      interpass_c: null,
    },
  },
  settings: { current_a: 224, voltage_v: 26.2, wire_feed_m_min: 8.8, travel_mm_s: 5, gas_l_min: 18.5 },
};

const OPEN_CORNER: ShopProcedure = {
  ref: "wps-open-corner",
  status: "approved",
  fields: {
    number: "PA-138-05",
    revision: "3",
    title: "Open corner, plate 8 to 12, two runs, PA",
    process: "138",
    position: "PA",
    ranges: {
      current_a: range(200, 260),
      voltage_v: range(24.5, 28.5),
      wire_feed_m_min: range(7.8, 10.2),
      travel_mm_s: range(4.8, 6.6),
      gas_l_min: range(15, 20),
      heat_input_kj_mm: range(0.65, 1.2),
      interpass_c: null,
    },
  },
  settings: { current_a: 228, voltage_v: 26.6, wire_feed_m_min: 8.9, travel_mm_s: 5.6, gas_l_min: 17 },
};

const FILLET_A5_BEFORE: ShopProcedure = {
  ...FILLET_A5,
  ref: "wps-fillet-a5-before",
  status: "withdrawn",
  fields: {
    ...FILLET_A5.fields,
    revision: "1",
    ranges: { ...FILLET_A5.fields.ranges, travel_mm_s: range(4, 7), heat_input_kj_mm: range(0.7, 1.6) },
  },
};

const SADDLE_FILLET: ShopProcedure = {
  ...FILLET_A5,
  ref: "wps-saddle-fillet",
  status: "draft",
  fields: {
    ...FILLET_A5.fields,
    number: "PB-135-21",
    revision: "1",
    title: "Fillet a6 on curved saddle, S460N",
  },
};

/** The shop's procedures: four in force, one withdrawn for its newer revision, one not yet approved. */
export const PROCEDURES: readonly ShopProcedure[] = [
  FILLET_A5_BEFORE,
  FILLET_A5,
  FILLET_A4,
  V_BUTT,
  OPEN_CORNER,
  SADDLE_FILLET,
];

/**
 * The procedure of a name.
 * @throws RangeError for a name that the shop does not have
 */
export function procedureOf(ref: Ref): ShopProcedure {
  const found = PROCEDURES.find((procedure) => procedure.ref === ref);
  if (found === undefined) throw new RangeError(`ref: expected a procedure, got "${ref}"`);
  return found;
}
