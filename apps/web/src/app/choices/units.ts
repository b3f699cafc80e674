import { useSyncExternalStore } from "react";
import type { LengthUnits } from "../../kit/units/length-units.ts";
import { storedChoice } from "./stored-choice.ts";

export const unitsChoice = storedChoice<LengthUnits>("beadroll.units", ["mm", "in"]);

/** The units chosen on this screen, kept up to date. */
export function useUnitsChoice(): LengthUnits {
  return useSyncExternalStore(unitsChoice.subscribe, unitsChoice.read, () => "mm");
}
