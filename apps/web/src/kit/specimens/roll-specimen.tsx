import type { ReactElement } from "react";
import { KeyValue } from "../page/key-value.tsx";
import { Sheet, SheetGrid } from "../page/sheet.tsx";
import { TagText } from "../page/tag-text.tsx";
import { StateMark } from "../states/state-mark.tsx";
import { BeadStrip } from "../strip/bead-strip.tsx";
import { TemperLegend } from "../strip/temper-legend.tsx";
import type { Column } from "../tables/columns.ts";
import { DataTable } from "../tables/data-table.tsx";
import { formatFigure } from "../units/length-units.ts";
import { SPECIMEN_SEAMS, type SpecimenSeam } from "./specimen-data.ts";

export const ROLL_COLUMNS: readonly Column<SpecimenSeam>[] = [
  { id: "seam", head: "Seam", value: (row) => row.seam, figures: true, width: "3.25rem" },
  { id: "joint", head: "Joint", value: (row) => row.joint, width: "3.75rem", wideOnly: true },
  {
    id: "strip",
    head: "Deviation along the seam, start to end",
    cell: (row) => (
      <BeadStrip stations={row.stations} label={`Seam ${row.seam}, lateral deviation`} tabStop={false} />
    ),
  },
  {
    id: "largest",
    head: "Largest",
    field: "largest_mm",
    value: (row) => row.largest_mm,
    cell: (row) => `${formatFigure(row.largest_mm, 2)} mm`,
    align: "right",
    figures: true,
    width: "5.75rem",
    wideOnly: true,
  },
  {
    id: "heat_input",
    head: "kJ/mm",
    field: "heat_input_kj_mm",
    value: (row) => row.heat_input_kj_mm,
    cell: (row) => formatFigure(row.heat_input_kj_mm, 2),
    align: "right",
    figures: true,
    width: "4rem",
    wideOnly: true,
  },
  {
    id: "verdict",
    head: "Verdict",
    value: (row) => row.verdict,
    cell: (row) => <StateMark state={row.verdict} />,
    width: "7rem",
  },
];

/** The roll: a part as a list of bead strips, and what went into it. */
export function RollSpecimen(): ReactElement {
  return (
    <SheetGrid>
      <Sheet title="The roll">
        <DataTable
          plain
          caption="Seams of the part"
          rows={SPECIMEN_SEAMS}
          columns={ROLL_COLUMNS}
          rowKey={(row) => row.seam}
        />
        <div className="mt-3">
          <TemperLegend />
        </div>
      </Sheet>
      <Sheet title="What went in">
        <KeyValue
          rows={[
            {
              key: "Web plate",
              value: (
                <>
                  heat <TagText text="H48812" to="/kit" />
                </>
              ),
            },
            {
              key: "Flange",
              value: (
                <>
                  heat <TagText text="H50217" to="/kit" />
                </>
              ),
            },
            {
              key: "Wire 1.2 mm",
              value: (
                <>
                  lot <TagText text="W-3391" to="/kit" />
                </>
              ),
            },
            {
              key: "Gas M21",
              value: (
                <>
                  lot <TagText text="G-118" to="/kit" />
                </>
              ),
            },
            { key: "Procedure", value: "PB-135-07 rev 2" },
            { key: "Operator", value: "I. Varga, valid to 14 Mar" },
          ]}
        />
      </Sheet>
    </SheetGrid>
  );
}
