import { type Fault, good, type Outcome, refused } from "../../faults/fault.ts";
import type { FillAdvice, FillStation } from "../../schemas/fill-advice.ts";
import type { ProcedureRanges } from "../../schemas/procedure.ts";
import type { StationResult } from "../../schemas/scan-result.ts";
import type { SeamModel } from "../../schemas/seam-model.ts";
import { arcEfficiency, arcEnergyFromMeans, heatInput, runAtSpeed } from "../heat-input.ts";
import { filletLeg, gapExtraArea } from "./fillet.ts";
import { vGrooveFill } from "./groove.ts";

const NOTICE =
  "Advice for the welding coordinator, never a command to a robot. Wire feed is kept, bead over the plate is not counted.";

/** What the advice is worked out from. */
export interface FillInput {
  readonly model: SeamModel;
  /** Throat a of a fillet; depth of a butt weld; mm. */
  readonly weld_size_mm: number;
  /** ISO 4063 number. */
  readonly process: string;
  readonly ranges: ProcedureRanges;
  readonly stations: readonly StationResult[];
}

type Range = { readonly min: number; readonly max: number } | null;

const middle = (range: Range): number | null => (range === null ? null : (range.min + range.max) / 2);
const isIn = (value: number, range: Range): boolean =>
  range === null || (value >= range.min - 1e-9 && value <= range.max + 1e-9);
const rounded = (value: number) => Math.round(value * 1e3) / 1e3;

/** Weld metal that the joint takes at a gap, mm². */
function areaAt(model: SeamModel, weld_size_mm: number, gap_mm: number): number {
  const { section, joint_type } = model;
  if (!joint_type.startsWith("butt")) {
    const leg_mm = filletLeg(weld_size_mm);
    return (leg_mm * leg_mm) / 2 + gapExtraArea(leg_mm, gap_mm);
  }
  const whole = section.groove_angle_deg ?? section.included_angle_deg ?? 0;
  const thickness_mm = Math.min(weld_size_mm, section.plate_a.thickness_mm);
  const root_face_mm = Math.min(thickness_mm, section.root_face_mm ?? 0);
  const groove = { thickness_mm, gap_mm, root_face_mm, reinforcement_mm: 0 };
  if (joint_type === "butt_half_v") {
    // One bevel of the whole angle: half of a V with twice that angle.
    const full = vGrooveFill({ ...groove, included_angle_deg: Math.min(170, 2 * whole) });
    return full.area_mm2 - full.bevels_mm2 / 2;
  }
  return vGrooveFill({ ...groove, included_angle_deg: joint_type === "butt_square" ? 0 : whole }).area_mm2;
}

/** Heat input at a speed from the middles of the procedure's current and voltage, or of its own heat input range. */
function heatAt(input: FillInput, travel_mm_s: number, nominal_mm_s: number): number | null {
  const { ranges, process } = input;
  const [u, i, k] = [middle(ranges.voltage_v), middle(ranges.current_a), arcEfficiency(process)];
  if (u !== null && i !== null && k !== undefined)
    return heatInput(arcEnergyFromMeans(u, i, runAtSpeed(travel_mm_s)), k);
  const given = middle(ranges.heat_input_kj_mm);
  return given === null ? null : (given * nominal_mm_s) / travel_mm_s;
}

/**
 * The weld metal that each station's gap asks for, the travel speed that lays it at the same wire feed, and whether
 * speed and heat input then stay inside the procedure. Heat input grows as the travel slows: v = v₀ A₀ / A.
 * Fillets: both legs grow by the gap, so that the throat is kept (practice of AWS D1.1).
 * @returns the advice, or the fault that the procedure gives no travel speed
 */
export function fillAdvice(input: FillInput): Outcome<FillAdvice> {
  const { model, weld_size_mm, ranges } = input;
  const nominal_mm_s = middle(ranges.travel_mm_s);
  if (nominal_mm_s === null) {
    const fault: Fault = {
      code: "procedure-incomplete",
      detail: "The procedure gives no range of travel speed.",
    };
    return refused(fault);
  }
  const nominal_area_mm2 = areaAt(model, weld_size_mm, model.section.gap_mm ?? 0);
  const stations = input.stations.flatMap((station): FillStation[] => {
    if (station.gap_mm === undefined) return [];
    const area_mm2 = areaAt(model, weld_size_mm, station.gap_mm);
    const travel_mm_s = (nominal_mm_s * nominal_area_mm2) / area_mm2;
    const heat = heatAt(input, travel_mm_s, nominal_mm_s);
    return [
      {
        station_mm: station.station_mm,
        gap_mm: station.gap_mm,
        area_mm2: rounded(area_mm2),
        travel_mm_s: rounded(travel_mm_s),
        heat_input_kj_mm: heat === null ? null : rounded(heat),
        inside:
          isIn(travel_mm_s, ranges.travel_mm_s) && (heat === null || isIn(heat, ranges.heat_input_kj_mm)),
      },
    ];
  });
  const heat = heatAt(input, nominal_mm_s, nominal_mm_s);
  return good({
    nominal_area_mm2: rounded(nominal_area_mm2),
    nominal_travel_mm_s: rounded(nominal_mm_s),
    nominal_heat_input_kj_mm: heat === null ? null : rounded(heat),
    all_inside: stations.every((station) => station.inside),
    notice: NOTICE,
    stations,
  });
}
