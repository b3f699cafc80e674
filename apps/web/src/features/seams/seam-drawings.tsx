import type { PassRecord } from "@beadroll/domain/schemas/pass";
import type { ScanResult } from "@beadroll/domain/schemas/scan-result";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { type ReactElement, useMemo } from "react";
import { PlotStack } from "../../kit/plots/plot-stack.tsx";
import type { StationMark } from "../../kit/plots/station-marks.tsx";
import { BeadStrip } from "../../kit/strip/bead-strip.tsx";
import { TemperLegend } from "../../kit/strip/temper-legend.tsx";
import { passPlots } from "./pass-plots.ts";
import { scanPlots, scanRipples } from "./scan-plots.ts";

/** Where the arc struck again, and where a tack hides the root. */
function marksOf(result: ScanResult, pass: PassRecord | null): StationMark[] {
  const tacks = result.stations.filter(
    (station, index, all) => station.tack === true && all[index - 1]?.tack !== true,
  );
  const restarts = pass?.result.restarts.filter((restart) => restart.station_mm !== null) ?? [];
  return [
    ...tacks.map(({ station_mm }) => ({ station_mm, label: "tack", tone: "plain" as const })),
    ...restarts.map(({ station_mm }) => ({
      station_mm: station_mm ?? 0,
      label: "arc restart",
      tone: "attend" as const,
    })),
  ];
}

/** A seam's scan as a bead, its deviations and its pass on one axis, joined by one cursor. */
export function SeamDrawings(props: {
  label: string;
  result: ScanResult;
  model: SeamModel;
  pass: PassRecord | null;
}): ReactElement {
  const { result, model, pass } = props;
  const ripples = useMemo(() => scanRipples(result, model), [result, model]);
  const plots = useMemo(
    () => [...scanPlots(result, model), ...(pass === null ? [] : passPlots(pass))],
    [result, model, pass],
  );
  const marks = useMemo(() => marksOf(result, pass), [result, pass]);
  const { length_mm } = model.seam;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-3">
      <PlotStack
        label={props.label}
        plots={plots}
        length_mm={length_mm}
        marks={marks}
        height={104}
        above={(layout) => (
          <BeadStrip
            stations={ripples}
            label={props.label}
            size="sheet"
            length_mm={length_mm}
            inset={layout}
          />
        )}
      />
      <TemperLegend />
    </div>
  );
}
