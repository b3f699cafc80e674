import { type ReactElement, useState } from "react";
import { Sheet } from "../page/sheet.tsx";
import { Tabs } from "../page/tabs.tsx";
import { EmptyState } from "../states/empty-state.tsx";
import { StateMark } from "../states/state-mark.tsx";
import { BeadStrip } from "../strip/bead-strip.tsx";
import type { Column } from "../tables/columns.ts";
import { DataTable } from "../tables/data-table.tsx";
import { FilterChoice, FilterText } from "../tables/filters.tsx";
import { useUrlChoice, useUrlSort, useUrlText } from "../tables/url-state.ts";
import { formatFigure } from "../units/length-units.ts";
import { SPECIMEN_SEAMS, type SpecimenSeam } from "./specimen-data.ts";

interface ListedSeam extends SpecimenSeam {
  readonly key: string;
  readonly part: string;
}

const MANY: readonly ListedSeam[] = Array.from({ length: 1200 }, (_, index) => {
  const seam = SPECIMEN_SEAMS[index % SPECIMEN_SEAMS.length];
  if (seam === undefined) throw new RangeError("specimens: expected seams");
  const part = `Skid frame ${String(200 + Math.floor(index / 6)).padStart(4, "0")}`;
  return { ...seam, key: `${part} ${seam.seam}`, part };
});

const COLUMNS: readonly Column<ListedSeam>[] = [
  {
    id: "part",
    head: "Part",
    value: (row) => row.part,

    width: "10rem",
  },
  { id: "seam", head: "Seam", value: (row) => row.seam, figures: true, width: "3.25rem" },
  {
    id: "strip",
    head: "Deviation",
    cell: (row) => (
      <BeadStrip stations={row.stations} label={`${row.key}, lateral deviation`} tabStop={false} />
    ),
  },
  {
    id: "largest",
    head: "Largest, mm",
    field: "largest_mm",
    value: (row) => row.largest_mm,
    cell: (row) => formatFigure(row.largest_mm, 2),
    align: "right",
    figures: true,
    width: "6.5rem",
    wideOnly: true,
  },
  { id: "joint", head: "Joint", value: (row) => row.joint, width: "4rem", optional: true },
  {
    id: "verdict",
    head: "Verdict",
    value: (row) => row.verdict,
    cell: (row) => <StateMark state={row.verdict} />,
    width: "7rem",
  },
];

const VERDICTS = [
  { value: "within", label: "Within" },
  { value: "adapt", label: "Adapt" },
  { value: "hold", label: "Hold" },
  { value: "accepted", label: "Accepted" },
] as const;

/** A long list with filters, and tabs. */
export function TableSpecimens(): ReactElement {
  const [tab, setTab] = useState("seams");
  return (
    <Sheet title="A long list">
      <Tabs
        label="Lists"
        open={tab}
        onOpen={setTab}
        tabs={[
          { id: "seams", label: "Seams", panel: <SeamList /> },
          { id: "inspections", label: "Inspections", panel: <p className="text-ash">The second panel.</p> },
        ]}
      />
    </Sheet>
  );
}

function SeamList(): ReactElement {
  const [text, setText] = useUrlText("seam");
  const [verdict, setVerdict] = useUrlChoice(
    "verdict",
    VERDICTS.map((option) => option.value),
  );
  const [sort, setSort] = useUrlSort();
  const rows = MANY.filter((row) => row.key.includes(text) && (verdict === "" || row.verdict === verdict));
  return (
    <DataTable
      caption="Seams of all parts"
      rows={rows}
      columns={COLUMNS}
      rowKey={(row) => row.key}
      rowHref={(row) => `/kit?open=${encodeURIComponent(row.key)}`}
      changed={new Set(["Skid frame 0200 S2"])}
      sort={sort}
      onSort={setSort}
      storeKey="kit-seams"
      fileName="seams"
      filters={
        <>
          <FilterText label="Part or seam" value={text} onChange={setText} placeholder="0412 S3" />
          <FilterChoice label="Verdict" value={verdict} onChange={setVerdict} options={VERDICTS} />
        </>
      }
      empty={
        <EmptyState title="No seam fits these filters">
          Take a filter away, or search with the field at the top.
        </EmptyState>
      }
    />
  );
}
