import {
  getCorrectedPath,
  getCorrectedPathCsv,
  getFillAdvice,
} from "@beadroll/domain/contract/seams.contract";
import type { FillAdvice, FillStation } from "@beadroll/domain/schemas/fill-advice";
import { useQuery } from "@tanstack/react-query";
import { type ReactElement, useState } from "react";
import { api } from "../../app/client.ts";
import { Button } from "../../kit/actions/button.tsx";
import { toast } from "../../kit/states/announcements.ts";
import { FaultPanel } from "../../kit/states/fault-panel.tsx";
import { Loading } from "../../kit/states/loading.tsx";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { StateMark } from "../../kit/states/state-mark.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { saveFile } from "../../kit/tables/save-file.ts";
import { LengthText } from "../../kit/units/length-text.tsx";
import { formatFigure } from "../../kit/units/length-units.ts";

/** Saves what a call gives; a failure is said, nothing else happens. */
async function save(name: string, fetch: () => Promise<Blob>): Promise<void> {
  try {
    saveFile(await fetch(), name);
  } catch (error) {
    toast(`${name} could not be fetched. ${problemFrom(error).title}.`, "attend");
  }
}

const asJson = (value: unknown) => new Blob([JSON.stringify(value, null, 2)], { type: "application/json" });

/** What a scan advises: the corrected path to take away, and the fill that its gap asks for. */
export function ScanAdvice(props: { scanId: string }): ReactElement {
  const [isShown, setShown] = useState(false);
  const params = { id: props.scanId };
  return (
    <div className="screen-only mt-4 grid gap-3 border-t border-row pt-3">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
        <span className="text-ash">Advice, no command to a robot:</span>
        <Button
          kind="quiet"
          onClick={() => void save("path.csv", () => api.call(getCorrectedPathCsv, { params }))}
        >
          Corrected path, CSV
        </Button>
        <Button
          kind="quiet"
          onClick={() =>
            void save("path.json", async () => asJson(await api.call(getCorrectedPath, { params })))
          }
        >
          JSON
        </Button>
        <Button kind="quiet" aria-expanded={isShown} onClick={() => setShown(!isShown)}>
          {isShown ? "Hide the fill" : "Fill that the gap asks for"}
        </Button>
      </div>
      {isShown ? <Fill scanId={props.scanId} /> : null}
    </div>
  );
}

const COLUMNS: readonly Column<FillStation>[] = [
  {
    id: "station",
    head: "Station",
    value: (row) => row.station_mm,
    cell: (row) => <LengthText length_mm={row.station_mm} decimals={1} />,
    align: "right",
    figures: true,
  },
  {
    id: "gap",
    head: "Gap",
    value: (row) => row.gap_mm,
    cell: (row) => <LengthText length_mm={row.gap_mm} decimals={2} />,
    align: "right",
    figures: true,
  },
  {
    id: "area",
    head: "Area mm²",
    value: (row) => row.area_mm2,
    cell: (row) => formatFigure(row.area_mm2, 1),
    align: "right",
    figures: true,
  },
  {
    id: "travel",
    head: "Travel mm/s",
    value: (row) => row.travel_mm_s,
    cell: (row) => formatFigure(row.travel_mm_s, 2),
    align: "right",
    figures: true,
  },
  {
    id: "heat",
    head: "kJ/mm",
    value: (row) => row.heat_input_kj_mm,
    cell: (row) => (row.heat_input_kj_mm === null ? "" : formatFigure(row.heat_input_kj_mm, 2)),
    align: "right",
    figures: true,
  },
  {
    id: "inside",
    head: "Procedure",
    value: (row) => row.inside,
    cell: (row) => (
      <StateMark tone={row.inside ? "good" : "attend"} word={row.inside ? "inside" : "outside"} />
    ),
  },
];

function Fill(props: { scanId: string }): ReactElement {
  const query = useQuery({
    queryKey: ["scans", "fill", props.scanId],
    queryFn: ({ signal }) => api.call(getFillAdvice, { params: { id: props.scanId }, signal }),
  });
  if (query.isError) return <FaultPanel problem={problemFrom(query.error)} />;
  if (query.data === undefined) return <Loading label="The fill" rows={4} />;
  return <FillTable advice={query.data} />;
}

function FillTable(props: { advice: FillAdvice }): ReactElement {
  const { advice } = props;
  const heat =
    advice.nominal_heat_input_kj_mm === null
      ? ""
      : `, ${formatFigure(advice.nominal_heat_input_kj_mm, 2)} kJ/mm`;
  return (
    <div className="grid gap-2">
      <p>
        As designed {formatFigure(advice.nominal_area_mm2, 1)} mm² at{" "}
        {formatFigure(advice.nominal_travel_mm_s, 2)} mm/s{heat}. {advice.notice}
      </p>
      <div className="max-h-80 overflow-auto">
        <DataTable
          plain
          dense
          caption="Fill by station"
          rows={advice.stations}
          columns={COLUMNS}
          rowKey={(row) => String(row.station_mm)}
          empty={<p className="text-ash">No gap was measured on this scan.</p>}
        />
      </div>
    </div>
  );
}
