import { createContext, type ReactElement, type ReactNode, useContext } from "react";
import type { LengthUnits } from "./length-units.ts";

const UnitsContext = createContext<LengthUnits>("mm");

/** Gives the units of this screen to fields, strips and plots beneath it. */
export function UnitsProvider(props: { units: LengthUnits; children: ReactNode }): ReactElement {
  return <UnitsContext value={props.units}>{props.children}</UnitsContext>;
}

/** The units in which this screen shows lengths. */
export function useLengthUnits(): LengthUnits {
  return useContext(UnitsContext);
}
