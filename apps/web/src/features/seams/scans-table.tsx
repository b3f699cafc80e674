import type { ScanRecord } from "@beadroll/domain/schemas/scan";
import type { ReactElement } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { saveStoredFile } from "./stored-file.ts";

const STAGES = { fitup: "Fit-up", bead: "Bead" } as const;

/** The scans of a seam; one of them is shown above. */
export function ScansTable(props: {
  scans: readonly ScanRecord[];
  shown: string | null;
  onShow: (id: string) => void;
}): ReactElement {
  const columns: Column<ScanRecord>[] = [
    {
      id: "taken",
      head: "Taken",
      cell: (scan) => <InstantText at={scan.taken_at} />,
      value: (scan) => scan.taken_at,
      width: "9.5rem",
    },
    {
      id: "verdict",
      head: "Verdict",
      cell: (scan) => <StateMark state={scan.verdict} />,
      value: (scan) => scan.verdict,
    },
    { id: "stage", head: "Stage", value: (scan) => STAGES[scan.stage], wideOnly: true },
    {
      id: "attempt",
      head: "Attempt",
      value: (scan) => scan.attempt,
      align: "right",
      figures: true,
      wideOnly: true,
    },
    {
      id: "points",
      head: "Points",
      value: (scan) => scan.points,
      align: "right",
      figures: true,
      wideOnly: true,
    },
    { id: "from", head: "From", value: (scan) => scan.cell_name ?? scan.received_from, wideOnly: true },
    {
      id: "file",
      head: "File",
      cell: (scan) => (
        <Button kind="quiet" onClick={() => void saveStoredFile(scan.file_digest, scan.file_name)}>
          {scan.file_name}
        </Button>
      ),
      value: (scan) => scan.file_name,
      wideOnly: true,
    },
    {
      id: "shown",
      head: "Above",
      cell: (scan) =>
        scan.id === props.shown ? "shown" : <Button onClick={() => props.onShow(scan.id)}>Show</Button>,
    },
  ];
  return (
    <DataTable
      caption="Scans of this seam"
      rows={props.scans}
      columns={columns}
      rowKey={(scan) => scan.id}
      plain
      dense
    />
  );
}
