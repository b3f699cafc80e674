import type { ScanPage } from "@beadroll/domain/schemas/scan";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { keepPreviousData, useQuery } from "@tanstack/react-query";
import { type ReactElement, useDeferredValue, useEffect, useState } from "react";
import { useStationCursor } from "../../kit/cursor/cursor-context.tsx";
import { KeyValue } from "../../kit/page/key-value.tsx";
import { valueText } from "../../kit/plots/plot-spec.ts";
import { SectionView } from "../../kit/section/section-view.tsx";
import { FaultPanel } from "../../kit/states/fault-panel.tsx";
import { Loading } from "../../kit/states/loading.tsx";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { LengthText } from "../../kit/units/length-text.tsx";
import { beadPlots } from "../beads/bead-plots.ts";
import { scanPlots } from "./scan-plots.ts";
import { seamQueries } from "./seams.queries.ts";

/** A cursor that is moved asks for one section when it rests, not for every one it passes. */
const REST_MS = 120;

function useRested(value: number): number {
  const [rested, setRested] = useState(value);
  // Time is outside React.
  useEffect(() => {
    const timer = setTimeout(() => setRested(value), REST_MS);
    return () => clearTimeout(timer);
  }, [value]);
  return rested;
}

/** Where the section is cut before somebody moves the cursor: at the worst station, else in the middle. */
function firstStation(scan: ScanPage): number {
  const worst =
    scan.stage === "bead"
      ? scan.result.findings.find(({ state }) => state !== "met")
      : scan.result.reasons[0];
  if (worst !== undefined) return worst.station_mm;
  const { stations } = scan.result;
  return stations[Math.floor(stations.length / 2)]?.station_mm ?? 0;
}

/** The joint's section at the cursor, with its numbers; a finished bead over the fit-up it was made on. */
export function SectionAtCursor(props: {
  scan: ScanPage;
  model: SeamModel;
  /** The scan of the fit-up to lay a finished bead over. */
  fitUpId?: string | null;
}): ReactElement {
  const { scan, model } = props;
  const [cursor_mm] = useStationCursor();
  const station_mm = useDeferredValue(cursor_mm ?? firstStation(scan));
  const rested_mm = useRested(station_mm);
  const section = useQuery({ ...seamQueries.section(scan.id, rested_mm), placeholderData: keepPreviousData });
  const under = useQuery({
    ...seamQueries.section(props.fitUpId ?? "", rested_mm),
    placeholderData: keepPreviousData,
    enabled: props.fitUpId !== null && props.fitUpId !== undefined,
  });
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-3">
      <p className="text-sm text-ash" aria-live="off">
        Station <LengthText length_mm={station_mm} decimals={1} />
        {cursor_mm === null ? ", move the cursor along the strip" : ""}
      </p>
      {section.isError ? (
        <FaultPanel problem={problemFrom(section.error)} onRetry={() => void section.refetch()} />
      ) : section.data === undefined ? (
        <Loading label="The section" rows={6} />
      ) : (
        <div className={section.isPlaceholderData ? "opacity-60" : ""}>
          <SectionView
            section={section.data}
            height={300}
            {...(under.data !== undefined && { under: under.data })}
          />
        </div>
      )}
      <StationFigures scan={scan} model={model} station_mm={station_mm} />
    </div>
  );
}

/** The numbers at a station, each with its expanded uncertainty. */
function StationFigures(props: { scan: ScanPage; model: SeamModel; station_mm: number }): ReactElement {
  const { scan, model } = props;
  const { stations } = scan.result;
  const index = stations.findIndex((station) => station.station_mm >= props.station_mm - 1e-6);
  const at = index < 0 ? stations.length - 1 : index;
  const plots = scan.stage === "bead" ? beadPlots(scan.result) : scanPlots(scan.result, model);
  const rows = plots.map((plot) => ({
    key: plot.title,
    value: (
      <span className="figures">
        {valueText(plot, at)} {plot.values[at] === null ? "" : plot.unit}
      </span>
    ),
  }));
  return <KeyValue rows={rows} />;
}
